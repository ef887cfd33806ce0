// Kelman's pK' of carbonic acid by pH and temperature, with Austin's solubility of CO2.
#pragma once

#include "isohydric/chem/austin_1963.hpp"
#include "isohydric/chem/carbonic_acid.hpp"
#include "isohydric/chem/conditions.hpp"
#include "isohydric/num/number.hpp"

namespace isohydric::chem::kelman_1967 {

/// pK' at pH 7.40 and k_reference_temperature_degC. Measured. As general physiology libraries carry
/// it. Source: [@kelman1967, pK'] [@douglas1988, abstract].
inline constexpr double k_pk = 6.086;

/// Temperature of k_pk. Defined. Source: [@kelman1967, pK'] [@douglas1988, abstract].
inline constexpr double k_reference_temperature_degC = 38.0;

/// pK' per unit of pH below 7.40. Measured. As general physiology libraries carry it.
/// Source: [@kelman1967, pK'] [@douglas1988, abstract].
inline constexpr double k_pk_per_ph = 0.042;

/// pK' per degC of cooling. Measured. As general physiology libraries carry it.
/// Source: [@kelman1967, pK'] [@douglas1988, abstract].
inline constexpr double k_pk_per_degC = 0.00472;

/// pK' per degC of cooling and unit of pH below 7.40. Measured. As general physiology libraries
/// carry it. Source: [@kelman1967, pK'] [@douglas1988, abstract].
inline constexpr double k_pk_per_degC_ph = 0.00139;

/// pK' of carbonic acid. Domain: usual::k_ph, austin_1963::k_temperature_degC.
/// Source: [@kelman1967, pK'] [@douglas1988, abstract].
template <num::Number T>
[[nodiscard]] T pk(const T& ph, const T& temperature_degC) {
    const T acidity = k_reference_ph - ph;
    const T cooling_degC = k_reference_temperature_degC - temperature_degC;
    return k_pk + k_pk_per_ph * acidity +
           cooling_degC * (k_pk_per_degC + k_pk_per_degC_ph * acidity);
}

/// Solubility and pK' at a pH and temperature. Domain: as pk.
/// Source: [@kelman1967, pK' and solubility].
template <num::Number T>
[[nodiscard]] CarbonicAcid<T> constants(const T& ph, const T& temperature_degC) {
    return {.solubility_mmol_L_mmHg = austin_1963::co2_solubility_mmol_L_mmHg(temperature_degC),
            .pk = pk(ph, temperature_degC)};
}

/// pH from pCO2 and bicarbonate at a temperature: pK' is linear in pH, so the relation solves in
/// closed form. Domain: usual::k_pco2_mmHg, usual::k_hco3_mmol_L, austin_1963::k_temperature_degC.
/// Source: [@kelman1967, pK' and solubility].
template <num::Number T>
[[nodiscard]] T ph(const T& pco2_mmHg, const T& hco3_mmol_L, const T& temperature_degC) {
    const CarbonicAcid<T> at_reference = constants(T(k_reference_ph), temperature_degC);
    const T ph_if_pk_were_fixed = carbonic_acid::ph(at_reference, pco2_mmHg, hco3_mmol_L);
    const T cooling_degC = k_reference_temperature_degC - temperature_degC;
    const T fall_per_ph = k_pk_per_ph + k_pk_per_degC_ph * cooling_degC;
    return k_reference_ph + (ph_if_pk_were_fixed - k_reference_ph) / (1.0 + fall_per_ph);
}

}  // namespace isohydric::chem::kelman_1967
