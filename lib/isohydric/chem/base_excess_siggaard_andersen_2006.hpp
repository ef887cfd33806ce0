// Siggaard-Andersen's later Van Slyke equation (1995 to 2006), whose plasma buffer value comes from
// the proteins and phosphate measured.
#pragma once

#include "isohydric/chem/base_excess.hpp"
#include "isohydric/num/number.hpp"

namespace isohydric::chem::siggaard_andersen_2006 {

/// Haemoglobin at which the weight would vanish, mmol/L of the monomer. Measured. As a physiology
/// library carries it. Source: [@siggaard-andersen2006, equation].
inline constexpr double k_hb_of_no_weight_mmol_L = 43.0;

/// Reference bicarbonate, mmol/L. Measured. As a physiology library carries it.
/// Source: [@siggaard-andersen2006, equation].
inline constexpr double k_reference_hco3_mmol_L = 24.5;

/// Buffer values per unit of pH: of haemoglobin and of albumin, 1; of globulin, mmol/g; of
/// phosphate, 1. Measured. As a physiology library carries them. Source:
/// [@siggaard-andersen2006, equation].
inline constexpr double k_buffer_per_hb = 2.3;
inline constexpr double k_buffer_per_albumin = 8.0;
inline constexpr double k_buffer_per_globulin = 0.075;
inline constexpr double k_buffer_per_phosphate = 0.309;

/// The non-bicarbonate buffers of blood.
template <num::Number T>
struct Buffers {
    /// Haemoglobin as monomer. Domain: usual::k_ct_hb_mmol_L.
    T ct_hb_mmol_L;
    /// Domain: usual::k_albumin_mmol_L.
    T albumin_mmol_L;
    /// Domain: usual::k_globulin_g_L.
    T globulin_g_L;
    /// Domain: usual::k_phosphate_mmol_L.
    T phosphate_mmol_L;
};

/// Form for whole blood. Domain: as Buffers. Source: [@siggaard-andersen2006, equation].
template <num::Number T>
[[nodiscard]] BaseExcessForm<T> blood(const Buffers<T>& buffers) {
    return {.weight = 1.0 - buffers.ct_hb_mmol_L / k_hb_of_no_weight_mmol_L,
            .reference_hco3_mmol_L = T(k_reference_hco3_mmol_L),
            .buffer_value_mmol_L = k_buffer_per_hb * buffers.ct_hb_mmol_L +
                                   k_buffer_per_albumin * buffers.albumin_mmol_L +
                                   k_buffer_per_globulin * buffers.globulin_g_L +
                                   k_buffer_per_phosphate * buffers.phosphate_mmol_L};
}

}  // namespace isohydric::chem::siggaard_andersen_2006
