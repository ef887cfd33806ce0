// Molar masses of what is measured by mass and by amount, computed from formulas and the conventional atomic weights.
#pragma once

#include "isohydric/units/unit.hpp"

#include <array>
#include <optional>
#include <string_view>

namespace isohydric::units {

/// Conventional atomic weights. Measured. [@ciaaw2021, table of abridged standard atomic weights]
inline constexpr double k_hydrogen_g_mol = 1.008;
inline constexpr double k_carbon_g_mol = 12.011;
inline constexpr double k_nitrogen_g_mol = 14.007;
inline constexpr double k_oxygen_g_mol = 15.999;
inline constexpr double k_magnesium_g_mol = 24.305;
inline constexpr double k_phosphorus_g_mol = 30.974;
inline constexpr double k_calcium_g_mol = 40.078;

/// How many atoms of each common element a molecule has.
struct Formula {
    int carbon{};
    int hydrogen{};
    int nitrogen{};
    int oxygen{};
};

[[nodiscard]] constexpr double molar_mass_g_mol(const Formula& formula) {
    return formula.carbon * k_carbon_g_mol + formula.hydrogen * k_hydrogen_g_mol +
           formula.nitrogen * k_nitrogen_g_mol + formula.oxygen * k_oxygen_g_mol;
}

inline constexpr double k_glucose_g_mol =
    molar_mass_g_mol({.carbon = 6, .hydrogen = 12, .nitrogen = 0, .oxygen = 6});
inline constexpr double k_urea_g_mol =
    molar_mass_g_mol({.carbon = 1, .hydrogen = 4, .nitrogen = 2, .oxygen = 1});
/// Of the two nitrogen atoms in a molecule of urea: mg/dL of urea nitrogen count only these.
inline constexpr double k_urea_nitrogen_g_mol = 2 * k_nitrogen_g_mol;
/// As lactic acid, which gives the customary 9.008 mg/dL per mmol/L; the ion would give 8.907.
inline constexpr double k_lactate_g_mol =
    molar_mass_g_mol({.carbon = 3, .hydrogen = 6, .nitrogen = 0, .oxygen = 3});
inline constexpr double k_creatinine_g_mol =
    molar_mass_g_mol({.carbon = 4, .hydrogen = 7, .nitrogen = 3, .oxygen = 1});
inline constexpr double k_ethanol_g_mol =
    molar_mass_g_mol({.carbon = 2, .hydrogen = 6, .nitrogen = 0, .oxygen = 1});
/// As the acid.
inline constexpr double k_beta_hydroxybutyrate_g_mol =
    molar_mass_g_mol({.carbon = 4, .hydrogen = 8, .nitrogen = 0, .oxygen = 3});

/// Human haemoglobin, four chains with their haems. Measured. [@nlm-flowsheet-units, column R, code 59260-0]
inline constexpr double k_haemoglobin_tetramer_g_mol = 64458;
/// One chain with its haem, a quarter of the tetramer: what most laboratories and the base excess formulas count.
inline constexpr double k_haemoglobin_monomer_g_mol = k_haemoglobin_tetramer_g_mol / 4;
/// Human serum albumin. Measured. [@anstey-sig-monte-carlo, glossary]
inline constexpr double k_albumin_g_mol = 66500;

/// A substance by the name that rule files use for it.
struct Substance {
    std::string_view name;
    double molar_mass_g_mol;
};

inline constexpr std::array k_substances{
    Substance{"albumin", k_albumin_g_mol},
    Substance{"beta-hydroxybutyrate", k_beta_hydroxybutyrate_g_mol},
    Substance{"calcium", k_calcium_g_mol},
    Substance{"creatinine", k_creatinine_g_mol},
    Substance{"ethanol", k_ethanol_g_mol},
    Substance{"glucose", k_glucose_g_mol},
    Substance{"haemoglobin monomer", k_haemoglobin_monomer_g_mol},
    Substance{"haemoglobin tetramer", k_haemoglobin_tetramer_g_mol},
    Substance{"lactate", k_lactate_g_mol},
    Substance{"magnesium", k_magnesium_g_mol},
    Substance{"phosphorus", k_phosphorus_g_mol},
    Substance{"urea", k_urea_g_mol},
    Substance{"urea nitrogen", k_urea_nitrogen_g_mol},
};

/// The molar mass of one of k_substances, or none.
[[nodiscard]] std::optional<double> molar_mass_g_mol(std::string_view substance);

/// How many of `to` one of `from` is, where one is a mass and the other an amount of substance, each alone or over the
/// same thing: mg/dL and mmol/L. None if the two do not differ so.
[[nodiscard]] std::optional<double>
factor_by_molar_mass(const Unit& from, const Unit& to, double molar_mass_g_mol);

}  // namespace isohydric::units
