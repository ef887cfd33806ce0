// Standard bicarbonate by a polynomial that circulates without a source that we could read,
// haemoglobin in g/dL. For comparison only.
#pragma once

#include "isohydric/num/number.hpp"

namespace isohydric::chem::unattributed_standard_bicarbonate {

/// Coefficients of the polynomial, in its own order: mmol/L; 1; mmol/L; L/mol; L/mol per g/dL of
/// haemoglobin. Common practice. Unchecked: from memory.
inline constexpr double k_constant_mmol_L = 24.5;
inline constexpr double k_per_base_excess = 0.9;
inline constexpr double k_least_curved_mmol_L = 2.9;
inline constexpr double k_curvature = 2.65;
inline constexpr double k_curvature_per_hb = 0.31;
inline constexpr double k_curvature_scale = 1000.0;

/// Base excess lent by deoxygenation, mmol/L per g/dL of haemoglobin. Common practice. Unchecked:
/// from memory.
inline constexpr double k_oxygen_per_hb = 0.2;

/// Standard bicarbonate, mmol/L, 37 degC; `base_excess_mmol_L` is that of a form without oxygen
/// term. More than 1 mmol/L above the definition beyond a base excess of 12. Domain:
/// usual::k_base_excess_mmol_L, usual::k_ct_hb_g_dL, usual::k_so2. Common practice. Unchecked: from
/// memory.
template <num::Number T>
[[nodiscard]] T
standard_bicarbonate_mmol_L(const T& base_excess_mmol_L, const T& ct_hb_g_dL, const T& so2) {
    const T oxygenated_mmol_L = base_excess_mmol_L - k_oxygen_per_hb * ct_hb_g_dL * (1.0 - so2);
    const T from_least_curved = oxygenated_mmol_L - k_least_curved_mmol_L;
    const T curvature = (k_curvature + k_curvature_per_hb * ct_hb_g_dL) / k_curvature_scale;
    return k_constant_mmol_L + k_per_base_excess * oxygenated_mmol_L +
           from_least_curved * from_least_curved * curvature;
}

}  // namespace isohydric::chem::unattributed_standard_bicarbonate
