// Lang and Zander's base excess from pH, pCO2, haemoglobin (g/dL) and saturation, with its own
// solubility and pK' and a term for the deoxygenated haemoglobin.
#pragma once

#include "isohydric/chem/base_excess.hpp"
#include "isohydric/chem/carbonic_acid.hpp"
#include "isohydric/chem/domain.hpp"
#include "isohydric/num/number.hpp"

namespace isohydric::chem::lang_zander_2002 {

/// pCO2 of the blood that the equation was compared with. Source: [@lang2002, abstract].
inline constexpr Domain k_pco2_mmHg{12.0, 96.0};

/// Solubility of CO2, mmol/L/mmHg. Measured. Source: [@lang2002, abstract].
inline constexpr double k_solubility_mmol_L_mmHg = 0.0304;

/// pK' of carbonic acid. Measured. Source: [@lang2002, abstract].
inline constexpr double k_pk = 6.1;

/// Loss of weight per haemoglobin, dL/g. Measured. Source: [@lang2002, abstract].
inline constexpr double k_weight_per_hb = 0.0143;

/// Reference bicarbonate, mmol/L. Measured. Source: [@lang2002, abstract].
inline constexpr double k_reference_hco3_mmol_L = 24.26;

/// Buffer value of plasma, mmol/L per unit of pH. Measured. Source: [@lang2002, abstract].
inline constexpr double k_plasma_buffer_mmol_L = 9.5;

/// Buffer value per haemoglobin, mmol/L per unit of pH and g/dL. Measured. Source:
/// [@lang2002, abstract].
inline constexpr double k_buffer_per_hb = 1.63;

/// Base excess lent by deoxygenation, mmol/L per g/dL of haemoglobin. Measured. Source:
/// [@lang2002, abstract].
inline constexpr double k_oxygen_per_hb = 0.2;

/// Solubility and pK' that belong to the form. Source: [@lang2002, abstract].
template <num::Number T>
[[nodiscard]] CarbonicAcid<T> constants() {
    return {.solubility_mmol_L_mmHg = T(k_solubility_mmol_L_mmHg), .pk = T(k_pk)};
}

/// Form for oxygenated whole blood. Domain: usual::k_ct_hb_g_dL. Source: [@lang2002, abstract].
template <num::Number T>
[[nodiscard]] BaseExcessForm<T> blood(const T& ct_hb_g_dL) {
    return {.weight = 1.0 - k_weight_per_hb * ct_hb_g_dL,
            .reference_hco3_mmol_L = T(k_reference_hco3_mmol_L),
            .buffer_value_mmol_L = k_plasma_buffer_mmol_L + k_buffer_per_hb * ct_hb_g_dL};
}

/// Base excess lent by deoxygenation, mmol/L: what the form gives too much.
/// Domain: usual::k_ct_hb_g_dL, usual::k_so2. Source: [@lang2002, abstract].
template <num::Number T>
[[nodiscard]] T oxygen_term_mmol_L(const T& ct_hb_g_dL, const T& so2) {
    return k_oxygen_per_hb * ct_hb_g_dL * (1.0 - so2);
}

/// One blood sample as this model wants it.
template <num::Number T>
struct Blood {
    /// Domain: usual::k_ph.
    T ph;
    /// Domain: k_pco2_mmHg.
    T pco2_mmHg;
    /// Domain: usual::k_ct_hb_g_dL.
    T ct_hb_g_dL;
    /// Saturation, a fraction. Domain: usual::k_so2.
    T so2;
};

/// Base excess of whole blood at its own saturation, mmol/L, 37 degC. Compared over -30 to +30
/// mmol/L. Domain: as Blood. Source: [@lang2002, abstract].
template <num::Number T>
[[nodiscard]] T base_excess_mmol_L(const Blood<T>& sample) {
    const T hco3_mmol_L =
        carbonic_acid::bicarbonate_mmol_L(constants<T>(), sample.ph, sample.pco2_mmHg);
    return chem::base_excess_mmol_L(blood(sample.ct_hb_g_dL), sample.ph, hco3_mmol_L) -
           oxygen_term_mmol_L(sample.ct_hb_g_dL, sample.so2);
}

}  // namespace isohydric::chem::lang_zander_2002
