// Base excess of blood and of extracellular fluid as NCCLS C12-A and its successor CLSI C46 give
// it.
#pragma once

#include "isohydric/chem/base_excess.hpp"
#include "isohydric/num/number.hpp"

namespace isohydric::chem::clsi {

/// Reference bicarbonate, mmol/L; goes with solubility 0.0307 and pK' 6.095.
/// Source: [@pmc6090410, table 1] [@nccls1994, base excess].
inline constexpr double k_reference_hco3_mmol_L = 24.8;

/// Loss of weight per haemoglobin, dL/g. Measured. Unchecked: from memory.
/// Source: [@clsi2009, base excess of blood].
inline constexpr double k_weight_per_hb = 0.014;

/// Buffer value of plasma, mmol/L per unit of pH. Measured. Unchecked: from memory.
/// Source: [@clsi2009, base excess of blood].
inline constexpr double k_plasma_buffer_mmol_L = 7.7;

/// Buffer value per haemoglobin, mmol/L per unit of pH and g/dL. Measured. Unchecked: from memory.
/// Source: [@clsi2009, base excess of blood].
inline constexpr double k_buffer_per_hb = 1.43;

/// Buffer value of extracellular fluid, mmol/L per unit of pH. Measured. Source:
/// [@pmc6090410, table 1].
inline constexpr double k_ecf_buffer_mmol_L = 16.2;

/// Form for whole blood. Domain: usual::k_ct_hb_g_dL. Source: [@clsi2009, base excess of blood].
template <num::Number T>
[[nodiscard]] BaseExcessForm<T> blood(const T& ct_hb_g_dL) {
    return {.weight = 1.0 - k_weight_per_hb * ct_hb_g_dL,
            .reference_hco3_mmol_L = T(k_reference_hco3_mmol_L),
            .buffer_value_mmol_L = k_plasma_buffer_mmol_L + k_buffer_per_hb * ct_hb_g_dL};
}

/// Form for extracellular fluid: weight 1. Source: [@pmc6090410, table 1].
template <num::Number T>
[[nodiscard]] BaseExcessForm<T> extracellular_fluid() {
    return {.weight = T(1.0),
            .reference_hco3_mmol_L = T(k_reference_hco3_mmol_L),
            .buffer_value_mmol_L = T(k_ecf_buffer_mmol_L)};
}

}  // namespace isohydric::chem::clsi
