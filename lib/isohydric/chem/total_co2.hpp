// Total CO2 of plasma: bicarbonate and dissolved CO2. Carbonate (about 0.03 mmol/L at pH 7.4) and
// carbamate are left out.
#pragma once

#include "isohydric/chem/carbonic_acid.hpp"
#include "isohydric/num/number.hpp"

namespace isohydric::chem::total_co2 {

/// Total CO2, mmol/L. Domain: usual::k_pco2_mmHg, usual::k_hco3_mmol_L.
template <num::Number T>
[[nodiscard]] T
total_co2_mmol_L(const CarbonicAcid<T>& constants, const T& pco2_mmHg, const T& hco3_mmol_L) {
    return hco3_mmol_L + carbonic_acid::dissolved_co2_mmol_L(constants, pco2_mmHg);
}

/// Bicarbonate from a measured total CO2, mmol/L; negative where total CO2 is less than what pCO2
/// alone dissolves. Domain: usual::k_pco2_mmHg, total CO2 as usual::k_hco3_mmol_L.
template <num::Number T>
[[nodiscard]] T
bicarbonate_mmol_L(const CarbonicAcid<T>& constants, const T& pco2_mmHg, const T& tco2_mmol_L) {
    return tco2_mmol_L - carbonic_acid::dissolved_co2_mmol_L(constants, pco2_mmHg);
}

}  // namespace isohydric::chem::total_co2
