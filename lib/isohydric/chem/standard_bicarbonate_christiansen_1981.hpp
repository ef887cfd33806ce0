// Standard bicarbonate by Christiansen's polynomial in base excess, haemoglobin in mmol/L of the
// monomer.
#pragma once

#include "isohydric/num/number.hpp"

namespace isohydric::chem::christiansen_1981 {

/// Standard bicarbonate at base excess 0, mmol/L. Measured.
/// Source: [@christiansen1981, equation] in [@mentel, appendix].
inline constexpr double k_standard_bicarbonate_mmol_L = 24.47;

/// Standard bicarbonate per base excess. Measured.
/// Source: [@christiansen1981, equation] in [@mentel, appendix].
inline constexpr double k_per_base_excess = 0.919;

/// Curvature, L/mmol: its constant, and its rise per haemoglobin (L2/mmol2). Measured.
/// Source: [@christiansen1981, equation] in [@mentel, appendix].
inline constexpr double k_curvature = 4.04e-3;
inline constexpr double k_curvature_per_hb = 4.25e-4;

/// Base excess at which the curvature has no part, mmol/L. Measured.
/// Source: [@christiansen1981, equation] in [@mentel, appendix].
inline constexpr double k_straight_base_excess_mmol_L = 8.0;

/// Base excess lent by deoxygenation per haemoglobin. Measured.
/// Source: [@christiansen1981, equation] in [@mentel, appendix].
inline constexpr double k_oxygen_per_hb = 0.3062;

/// Standard bicarbonate, mmol/L, 37 degC; `base_excess_mmol_L` is that of a form without oxygen
/// term. More than 1 mmol/L above the definition beyond a base excess of 12. Domain:
/// usual::k_base_excess_mmol_L, usual::k_ct_hb_mmol_L, usual::k_so2. Source:
/// [@christiansen1981, equation] in [@mentel, appendix].
template <num::Number T>
[[nodiscard]] T
standard_bicarbonate_mmol_L(const T& base_excess_mmol_L, const T& ct_hb_mmol_L, const T& so2) {
    const T oxygenated_mmol_L = base_excess_mmol_L - k_oxygen_per_hb * ct_hb_mmol_L * (1.0 - so2);
    const T curvature = k_curvature + k_curvature_per_hb * ct_hb_mmol_L;
    return k_standard_bicarbonate_mmol_L + k_per_base_excess * oxygenated_mmol_L +
           oxygenated_mmol_L * curvature * (oxygenated_mmol_L - k_straight_base_excess_mmol_L);
}

}  // namespace isohydric::chem::christiansen_1981
