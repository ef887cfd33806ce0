// Siggaard-Andersen's base excess of the 1960s: the steeper buffer line, haemoglobin in g/dL.
#pragma once

#include "isohydric/chem/base_excess.hpp"
#include "isohydric/num/number.hpp"

namespace isohydric::chem::siggaard_andersen_1960s {

/// Loss of weight per haemoglobin, dL/g. Measured. Source: [@lang2002, abstract].
inline constexpr double k_weight_per_hb = 0.0143;

/// Reference bicarbonate, mmol/L; goes with solubility 0.0301 and pK' 6.1. Unchecked: from memory.
/// Source: [@siggaard-andersen1960s, reference bicarbonate].
inline constexpr double k_reference_hco3_mmol_L = 24.0;

/// Buffer value of plasma, mmol/L per unit of pH. Measured. Source: [@lang2002, abstract].
inline constexpr double k_plasma_buffer_mmol_L = 9.5;

/// Buffer value per haemoglobin, mmol/L per unit of pH and g/dL. Measured. Source:
/// [@lang2002, abstract].
inline constexpr double k_buffer_per_hb = 1.63;

/// Form for whole blood. Domain: usual::k_ct_hb_g_dL. Source: [@siggaard-andersen1960s, equation].
template <num::Number T>
[[nodiscard]] BaseExcessForm<T> blood(const T& ct_hb_g_dL) {
    return {.weight = 1.0 - k_weight_per_hb * ct_hb_g_dL,
            .reference_hco3_mmol_L = T(k_reference_hco3_mmol_L),
            .buffer_value_mmol_L = k_plasma_buffer_mmol_L + k_buffer_per_hb * ct_hb_g_dL};
}

}  // namespace isohydric::chem::siggaard_andersen_1960s
