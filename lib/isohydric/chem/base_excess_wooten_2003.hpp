// Base excess of plasma with Wooten's buffer values of albumin and phosphate.
#pragma once

#include "isohydric/chem/base_excess.hpp"
#include "isohydric/num/number.hpp"

namespace isohydric::chem::wooten_2003 {

/// Reference bicarbonate, mmol/L. Unchecked: from memory. Source:
/// [@wooten2003, base excess of plasma].
inline constexpr double k_reference_hco3_mmol_L = 24.4;

/// Buffer value of albumin, 1 per unit of pH. Unchecked: from memory; a corrigendum exists and was
/// not read. Source: [@wooten2003, base excess of plasma].
inline constexpr double k_buffer_per_albumin = 8.0;

/// Buffer value of phosphate, 1 per unit of pH. Unchecked: from memory; a corrigendum exists and
/// was not read. Source: [@wooten2003, base excess of plasma].
inline constexpr double k_buffer_per_phosphate = 0.30;

/// Form for plasma of measured albumin and phosphate.
/// Domain: usual::k_albumin_mmol_L, usual::k_phosphate_mmol_L.
/// Source: [@wooten2003, base excess of plasma]. Unchecked: from memory.
template <num::Number T>
[[nodiscard]] BaseExcessForm<T> plasma(const T& albumin_mmol_L, const T& phosphate_mmol_L) {
    return {.weight = T(1.0),
            .reference_hco3_mmol_L = T(k_reference_hco3_mmol_L),
            .buffer_value_mmol_L =
                k_buffer_per_albumin * albumin_mmol_L + k_buffer_per_phosphate * phosphate_mmol_L};
}

}  // namespace isohydric::chem::wooten_2003
