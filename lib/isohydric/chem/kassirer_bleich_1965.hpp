// Kassirer and Bleich's bedside rule: hydrogen ion from pCO2 and bicarbonate by one rounded factor.
#pragma once

#include "isohydric/num/number.hpp"

namespace isohydric::chem::kassirer_bleich_1965 {

/// nmol/L of hydrogen ion per mmHg of pCO2 over mmol/L of bicarbonate. Defined by the authors as a
/// rounding; their own solubility 0.0301 and pK' 6.10 give 23.909. Source:
/// [@kassirer1965, abstract].
inline constexpr double k_factor = 24.0;

/// Hydrogen ion, nmol/L. Domain: usual::k_pco2_mmHg, usual::k_hco3_mmol_L.
/// Source: [@kassirer1965, abstract].
template <num::Number T>
[[nodiscard]] T hydrogen_ion_nmol_L(const T& pco2_mmHg, const T& hco3_mmol_L) {
    return k_factor * pco2_mmHg / hco3_mmol_L;
}

}  // namespace isohydric::chem::kassirer_bleich_1965
