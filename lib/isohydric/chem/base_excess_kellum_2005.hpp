// Standard base excess as Kellum's review writes it, and its form corrected for albumin and
// phosphate.
#pragma once

#include "isohydric/chem/base_excess.hpp"
#include "isohydric/num/number.hpp"

namespace isohydric::chem::kellum_2005 {

/// Weight of the distribution. Unchecked: from memory; equals 1 - 0.023 L/mmol x 3.1 mmol/L of
/// haemoglobin. Source: [@kellum2005, standard base excess].
inline constexpr double k_weight = 0.9287;

/// Reference bicarbonate, mmol/L. Unchecked: from memory. Source:
/// [@kellum2005, standard base excess].
inline constexpr double k_reference_hco3_mmol_L = 24.4;

/// Buffer value, mmol/L per unit of pH. Unchecked: from memory; equals 2.3 x 3.1 + 7.7.
/// Source: [@kellum2005, standard base excess].
inline constexpr double k_buffer_mmol_L = 14.83;

/// Buffer value of albumin, 1 per unit of pH. Unchecked: from memory.
/// Source: [@kellum2005, corrected standard base excess].
inline constexpr double k_buffer_per_albumin = 8.3;

/// Buffer value of phosphate, 1 per unit of pH. Unchecked: from memory.
/// Source: [@kellum2005, corrected standard base excess].
inline constexpr double k_buffer_per_phosphate = 0.29;

/// mmol/L of albumin per g/dL. Unchecked: from memory. Source:
/// [@kellum2005, corrected standard base excess].
inline constexpr double k_albumin_mmol_L_per_g_dL = 0.15;

/// mmol/L of phosphate per mg/dL. Unchecked: from memory.
/// Source: [@kellum2005, corrected standard base excess].
inline constexpr double k_phosphate_mmol_L_per_mg_dL = 0.32;

/// Form for extracellular fluid. Source: [@kellum2005, standard base excess]. Unchecked: from
/// memory.
template <num::Number T>
[[nodiscard]] BaseExcessForm<T> extracellular_fluid() {
    return {.weight = T(k_weight),
            .reference_hco3_mmol_L = T(k_reference_hco3_mmol_L),
            .buffer_value_mmol_L = T(k_buffer_mmol_L)};
}

/// Form for plasma of measured albumin and phosphate.
/// Domain: usual::k_albumin_g_dL, usual::k_phosphate_mg_dL.
/// Source: [@kellum2005, corrected standard base excess]. Unchecked: from memory.
template <num::Number T>
[[nodiscard]] BaseExcessForm<T> plasma(const T& albumin_g_dL, const T& phosphate_mg_dL) {
    return {.weight = T(1.0),
            .reference_hco3_mmol_L = T(k_reference_hco3_mmol_L),
            .buffer_value_mmol_L =
                k_buffer_per_albumin * (k_albumin_mmol_L_per_g_dL * albumin_g_dL) +
                k_buffer_per_phosphate * (k_phosphate_mmol_L_per_mg_dL * phosphate_mg_dL)};
}

}  // namespace isohydric::chem::kellum_2005
