// Siggaard-Andersen's standard base excess with rounded constants: blood base excess at the 5 g/dL
// of haemoglobin that extracellular fluid is taken to hold.
#pragma once

#include "isohydric/chem/base_excess.hpp"
#include "isohydric/num/number.hpp"

namespace isohydric::chem::siggaard_andersen_ecf {

/// Weight of the distribution. Measured. Unchecked: from memory; equals 1 - 0.014 dL/g x 5 g/dL.
/// Source: [@siggaard-andersen1977, extracellular fluid].
inline constexpr double k_weight = 0.93;

/// Reference bicarbonate, mmol/L; goes with solubility 0.0306 and pK' 6.1. Unchecked: from memory.
/// Source: [@siggaard-andersen1977, equation].
inline constexpr double k_reference_hco3_mmol_L = 24.4;

/// Buffer value, mmol/L per unit of pH. Measured. Unchecked: from memory.
/// Source: [@siggaard-andersen1977, extracellular fluid].
inline constexpr double k_buffer_mmol_L = 14.8;

/// Form for extracellular fluid. Source: [@siggaard-andersen1977, extracellular fluid]. Unchecked:
/// from memory.
template <num::Number T>
[[nodiscard]] BaseExcessForm<T> extracellular_fluid() {
    return {.weight = T(k_weight),
            .reference_hco3_mmol_L = T(k_reference_hco3_mmol_L),
            .buffer_value_mmol_L = T(k_buffer_mmol_L)};
}

}  // namespace isohydric::chem::siggaard_andersen_ecf
