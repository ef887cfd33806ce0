// Severinghaus's one-line bicarbonate of plasma, whose pK' falls 0.044 per unit of pH.
#pragma once

#include "isohydric/chem/conditions.hpp"
#include "isohydric/num/number.hpp"

namespace isohydric::chem::severinghaus_1976 {

/// Bicarbonate per pCO2 at pH 7.40, mmol/L/mmHg. Measured. Source: [@severinghaus1976, abstract].
inline constexpr double k_bicarbonate_per_pco2 = 0.61;

/// log10 of bicarbonate per unit of pH. Measured. Source: [@severinghaus1976, abstract].
inline constexpr double k_ph_slope = 1.044;

/// Bicarbonate, mmol/L, 37 degC. Domain: usual::k_ph, usual::k_pco2_mmHg.
/// Source: [@severinghaus1976, abstract].
template <num::Number T>
[[nodiscard]] T bicarbonate_mmol_L(const T& ph, const T& pco2_mmHg) {
    return k_bicarbonate_per_pco2 * pco2_mmHg * num::pow10(k_ph_slope * (ph - k_reference_ph));
}

/// pH, 37 degC: the same relation solved for pH. Domain: usual::k_pco2_mmHg, usual::k_hco3_mmol_L.
/// Source: [@severinghaus1976, abstract].
template <num::Number T>
[[nodiscard]] T ph(const T& pco2_mmHg, const T& hco3_mmol_L) {
    return k_reference_ph +
           num::log10(hco3_mmol_L / (k_bicarbonate_per_pco2 * pco2_mmHg)) / k_ph_slope;
}

}  // namespace isohydric::chem::severinghaus_1976
