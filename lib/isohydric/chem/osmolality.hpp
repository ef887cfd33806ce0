// Calculated osmolality of plasma by the published sums, and the part that ethanol adds to any of
// them. They differ by up to 14 mOsm/kg for one normal panel: the choice is a convention.
#pragma once

#include "isohydric/num/number.hpp"

namespace isohydric::chem::osmolality {

/// Solutes of plasma, mmol/L. Domains: the spans of `usual` by the same names.
template <num::Number T>
struct Solutes {
    T sodium_mmol_L;
    T potassium_mmol_L;
    T glucose_mmol_L;
    T urea_mmol_L;
};

/// Sodium in mmol/L with glucose and urea nitrogen in mg/dL, as the conventional sums are printed.
/// Domains: the spans of `usual` by the same names.
template <num::Number T>
struct ConventionalSolutes {
    T sodium_mmol_L;
    T glucose_mg_dL;
    T urea_nitrogen_mg_dL;
};

/// mg/dL per mmol/L of glucose and of urea nitrogen, as rounded in print. Defined.
/// Source: [@smithline1976, formula] [@dorwart1975, formula].
inline constexpr double k_glucose_divisor = 18.0;
inline constexpr double k_urea_nitrogen_divisor = 2.8;

namespace smithline_gardner_1976 {

/// Osmoles per sodium, its anion counted. Defined. Source: [@smithline1976, formula].
inline constexpr double k_per_sodium = 2.0;

/// Osmolality, mOsm/kg. Potassium is not used. Source: [@smithline1976, formula].
template <num::Number T>
[[nodiscard]] T osmolality_mOsm_kg(const Solutes<T>& plasma) {
    return k_per_sodium * plasma.sodium_mmol_L + plasma.glucose_mmol_L + plasma.urea_mmol_L;
}

/// Osmolality, mOsm/kg, with the rounded divisors. Source: [@smithline1976, formula].
template <num::Number T>
[[nodiscard]] T osmolality_mOsm_kg(const ConventionalSolutes<T>& plasma) {
    return k_per_sodium * plasma.sodium_mmol_L + plasma.glucose_mg_dL / k_glucose_divisor +
           plasma.urea_nitrogen_mg_dL / k_urea_nitrogen_divisor;
}

}  // namespace smithline_gardner_1976

namespace dorwart_chalmers_1975 {

/// Osmoles per sodium. Measured (regression, 715 sera). Source: [@dorwart1975, formula].
inline constexpr double k_per_sodium = 1.86;

/// Constant term, mOsm/kg. Measured (regression, 715 sera). Source: [@dorwart1975, formula].
inline constexpr double k_constant_mOsm_kg = 9.0;

/// Osmolality, mOsm/kg. Source: [@dorwart1975, formula].
template <num::Number T>
[[nodiscard]] T osmolality_mOsm_kg(const ConventionalSolutes<T>& plasma) {
    return k_per_sodium * plasma.sodium_mmol_L + plasma.glucose_mg_dL / k_glucose_divisor +
           plasma.urea_nitrogen_mg_dL / k_urea_nitrogen_divisor + k_constant_mOsm_kg;
}

}  // namespace dorwart_chalmers_1975

namespace laboratory_handbook {

/// Osmoles per sodium; mg/dL per mOsm/kg of glucose and of urea nitrogen. Measured (regression).
/// Source: [@university-laboratory-handbook, osmolality].
inline constexpr double k_per_sodium = 1.91;
inline constexpr double k_glucose_divisor = 15.0;
inline constexpr double k_urea_nitrogen_divisor = 2.25;

/// Osmolality, mOsm/kg. Source: [@university-laboratory-handbook, osmolality].
template <num::Number T>
[[nodiscard]] T osmolality_mOsm_kg(const ConventionalSolutes<T>& plasma) {
    return k_per_sodium * plasma.sodium_mmol_L + plasma.glucose_mg_dL / k_glucose_divisor +
           plasma.urea_nitrogen_mg_dL / k_urea_nitrogen_divisor;
}

}  // namespace laboratory_handbook

namespace khajuria_krahn_2005 {

/// Osmoles per sodium and potassium, per glucose; constant term, mOsm/kg. Measured (regression).
/// Source: [@hooper2015, formulas compared] [@khajuria2005, formula].
inline constexpr double k_per_cation = 1.86;
inline constexpr double k_per_glucose = 1.15;
inline constexpr double k_constant_mOsm_kg = 14.0;

/// Osmolality, mOsm/kg. Source: [@hooper2015, formulas compared] [@khajuria2005, formula].
template <num::Number T>
[[nodiscard]] T osmolality_mOsm_kg(const Solutes<T>& plasma) {
    return k_per_cation * (plasma.sodium_mmol_L + plasma.potassium_mmol_L) +
           k_per_glucose * plasma.glucose_mmol_L + plasma.urea_mmol_L + k_constant_mOsm_kg;
}

}  // namespace khajuria_krahn_2005

namespace rasouli_kalantari_2005 {

/// Form without potassium: osmoles per sodium; constant term, mOsm/kg. Measured (regression).
/// Source: [@rasouli2005, formulas].
inline constexpr double k_per_sodium = 1.897;
inline constexpr double k_constant_mOsm_kg = 13.5;

/// Form with potassium: osmoles per sodium and potassium; constant term, mOsm/kg. Measured
/// (regression). Source: [@rasouli2005, formulas].
inline constexpr double k_per_cation = 1.90;
inline constexpr double k_constant_with_potassium_mOsm_kg = 5.0;

/// Osmolality, mOsm/kg. Potassium is not used. Source: [@rasouli2005, formulas].
template <num::Number T>
[[nodiscard]] T osmolality_mOsm_kg(const Solutes<T>& plasma) {
    return k_per_sodium * plasma.sodium_mmol_L + plasma.glucose_mmol_L + plasma.urea_mmol_L +
           k_constant_mOsm_kg;
}

/// Osmolality with potassium, mOsm/kg. Source: [@rasouli2005, formulas].
template <num::Number T>
[[nodiscard]] T osmolality_with_potassium_mOsm_kg(const Solutes<T>& plasma) {
    return k_per_cation * (plasma.sodium_mmol_L + plasma.potassium_mmol_L) + plasma.glucose_mmol_L +
           plasma.urea_mmol_L + k_constant_with_potassium_mOsm_kg;
}

}  // namespace rasouli_kalantari_2005

namespace zander {

/// Solutes that the sum leaves out, mmol/L. Unchecked: from memory. Source:
/// [@fazekas2013, formula].
inline constexpr double k_others_mmol_L = 6.5;

/// kg of water and osmotic activity per litre, together. Unchecked: from memory. Source:
/// [@fazekas2013, formula].
inline constexpr double k_activity = 0.985;

/// The anions that this sum counts one by one, mmol/L. Domains: the spans of `usual` by the same
/// names.
template <num::Number T>
struct Anions {
    T chloride_mmol_L;
    T lactate_mmol_L;
    T hco3_mmol_L;
};

/// Osmolality, mOsm/kg. Source: [@fazekas2013, formula].
template <num::Number T>
[[nodiscard]] T osmolality_mOsm_kg(const Solutes<T>& plasma, const Anions<T>& anions) {
    const T sum_mmol_L = plasma.sodium_mmol_L + plasma.potassium_mmol_L + anions.chloride_mmol_L +
                         anions.lactate_mmol_L + plasma.glucose_mmol_L + anions.hco3_mmol_L +
                         plasma.urea_mmol_L + k_others_mmol_L;
    return sum_mmol_L * k_activity;
}

}  // namespace zander

/// The part of osmolality that ethanol makes.
namespace ethanol {

/// mOsm/kg per mmol/L. Ideal; a cohort of given doses found no more. Source:
/// [@nguyen2020, abstract].
inline constexpr double k_ideal = 1.00;

/// mOsm/kg per mmol/L. Measured. Source: [@fung, abstract].
inline constexpr double k_fung = 1.15;

/// mmol/L of ethanol per mOsm/kg of gap. Measured. Source: [@geller1986, abstract].
inline constexpr double k_geller_ethanol_per_gap = 0.83;

/// mOsm/kg per mmol/L. Derived. Source: [@geller1986, abstract].
inline constexpr double k_geller = 1.0 / k_geller_ethanol_per_gap;

/// mOsm/kg per mmol/L. Measured. Source: [@purssell2001, formula] in [@lynd2008, table].
inline constexpr double k_purssell = 1.25;

/// mg/dL per mOsm/kg. Measured, as printed; not quite k_purssell. Source: [@lynd2008, table].
inline constexpr double k_purssell_divisor_mg_dL = 3.7;

/// mg/dL per mOsm/kg, from the molar mass as rounded in print. Source: [@nguyen2020, abstract].
inline constexpr double k_ideal_divisor_mg_dL = 4.6;

/// Contribution, mOsm/kg, by one of the factors above. Domain: usual::k_ethanol_mmol_L.
template <num::Number T>
[[nodiscard]] T contribution_mOsm_kg(const T& factor, const T& ethanol_mmol_L) {
    return factor * ethanol_mmol_L;
}

/// Contribution, mOsm/kg, by one of the divisors above. Domain: usual::k_ethanol_mg_dL.
template <num::Number T>
[[nodiscard]] T contribution_by_divisor_mOsm_kg(const T& divisor_mg_dL, const T& ethanol_mg_dL) {
    return ethanol_mg_dL / divisor_mg_dL;
}

}  // namespace ethanol

}  // namespace isohydric::chem::osmolality
