// Siggaard-Andersen's Van Slyke equation of 1977, haemoglobin in mmol/L of the monomer: a tetramer
// value would be a silent error by a factor of four.
#pragma once

#include "isohydric/chem/base_excess.hpp"
#include "isohydric/num/number.hpp"

namespace isohydric::chem::siggaard_andersen_1977 {

/// Loss of weight per haemoglobin, L/mmol. Measured. As a physiology library carries it, rounded
/// from 1/43. Source: [@siggaard-andersen1977, equation].
inline constexpr double k_weight_per_hb = 0.023;

/// Reference bicarbonate, mmol/L; goes with solubility 0.0306 and pK' 6.1. Unchecked: from memory.
/// Source: [@siggaard-andersen1977, equation].
inline constexpr double k_reference_hco3_mmol_L = 24.4;

/// Buffer value of plasma, mmol/L per unit of pH. Measured. Unchecked: from memory.
/// Source: [@siggaard-andersen1977, equation].
inline constexpr double k_plasma_buffer_mmol_L = 7.7;

/// Buffer value per haemoglobin, 1 per unit of pH. Measured. As a physiology library carries it.
/// Source: [@siggaard-andersen1977, equation].
inline constexpr double k_buffer_per_hb = 2.3;

/// Extracellular fluid holds the blood's haemoglobin diluted by this factor. Defined. Unchecked:
/// from memory. Source: [@siggaard-andersen1977, extracellular fluid].
inline constexpr double k_ecf_dilution = 3.0;

/// Form for whole blood. Domain: usual::k_ct_hb_mmol_L. Source: [@siggaard-andersen1977, equation].
template <num::Number T>
[[nodiscard]] BaseExcessForm<T> blood(const T& ct_hb_mmol_L) {
    return {.weight = 1.0 - k_weight_per_hb * ct_hb_mmol_L,
            .reference_hco3_mmol_L = T(k_reference_hco3_mmol_L),
            .buffer_value_mmol_L = k_plasma_buffer_mmol_L + k_buffer_per_hb * ct_hb_mmol_L};
}

/// Form for extracellular fluid, from the haemoglobin of blood. Domain: usual::k_ct_hb_mmol_L.
/// Source: [@siggaard-andersen1977, extracellular fluid]. Unchecked: from memory.
template <num::Number T>
[[nodiscard]] BaseExcessForm<T> extracellular_fluid(const T& ct_hb_mmol_L) {
    return blood(ct_hb_mmol_L / k_ecf_dilution);
}

}  // namespace isohydric::chem::siggaard_andersen_1977
