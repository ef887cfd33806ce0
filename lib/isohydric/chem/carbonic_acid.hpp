// The carbonic acid equilibrium: any two of pH, pCO2 and bicarbonate give the third. Solubility and
// pK' are one choice, made by a convention, and therefore an argument without a default.
#pragma once

#include "isohydric/num/number.hpp"

namespace isohydric::chem {

/// Solubility of CO2 and apparent pK' of carbonic acid that belong together. `pk` is the mixed
/// constant: activity for the hydrogen ion, concentration for CO2 and bicarbonate; a pK of
/// concentrations alone differs by about 0.1. Source: [@putnam1991, abstract].
template <num::Number T>
struct CarbonicAcid {
    T solubility_mmol_L_mmHg;
    T pk;
};

namespace carbonic_acid {

/// Dissolved CO2, mmol/L. Domain: usual::k_pco2_mmHg.
template <num::Number T>
[[nodiscard]] T dissolved_co2_mmol_L(const CarbonicAcid<T>& constants, const T& pco2_mmHg) {
    return constants.solubility_mmol_L_mmHg * pco2_mmHg;
}

/// Bicarbonate from pH and pCO2, mmol/L. Domain: usual::k_ph, usual::k_pco2_mmHg.
/// Source: [@putnam1991, abstract].
template <num::Number T>
[[nodiscard]] T
bicarbonate_mmol_L(const CarbonicAcid<T>& constants, const T& ph, const T& pco2_mmHg) {
    return dissolved_co2_mmol_L(constants, pco2_mmHg) * num::pow10(ph - constants.pk);
}

/// pH from pCO2 and bicarbonate. Domain: usual::k_pco2_mmHg, usual::k_hco3_mmol_L.
/// Source: [@putnam1991, abstract].
template <num::Number T>
[[nodiscard]] T ph(const CarbonicAcid<T>& constants, const T& pco2_mmHg, const T& hco3_mmol_L) {
    return constants.pk + num::log10(hco3_mmol_L / dissolved_co2_mmol_L(constants, pco2_mmHg));
}

/// pCO2 from pH and bicarbonate, mmHg. Domain: usual::k_ph, usual::k_hco3_mmol_L.
/// Source: [@putnam1991, abstract].
template <num::Number T>
[[nodiscard]] T pco2_mmHg(const CarbonicAcid<T>& constants, const T& ph, const T& hco3_mmol_L) {
    return hco3_mmol_L * num::pow10(constants.pk - ph) / constants.solubility_mmol_L_mmHg;
}

}  // namespace carbonic_acid

}  // namespace isohydric::chem
