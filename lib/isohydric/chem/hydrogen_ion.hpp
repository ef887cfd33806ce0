// Hydrogen ion activity in nmol/L beside pH: the same quantity on two scales.
#pragma once

#include "isohydric/num/number.hpp"

namespace isohydric::chem::hydrogen_ion {

/// log10 of nmol per mol. Defined.
inline constexpr double k_log10_nmol_per_mol = 9.0;

/// Hydrogen ion, nmol/L. Domain: usual::k_ph.
template <num::Number T>
[[nodiscard]] T hydrogen_ion_nmol_L(const T& ph) {
    return num::pow10(k_log10_nmol_per_mol - ph);
}

/// pH from hydrogen ion. Domain: usual::k_hydrogen_ion_nmol_L.
template <num::Number T>
[[nodiscard]] T ph(const T& hydrogen_ion_nmol_L) {
    return k_log10_nmol_per_mol - num::log10(hydrogen_ion_nmol_L);
}

}  // namespace isohydric::chem::hydrogen_ion
