// Solubility of CO2 in plasma by temperature: a parabola through the measurements of Austin and
// others.
#pragma once

#include "isohydric/chem/conditions.hpp"
#include "isohydric/chem/domain.hpp"
#include "isohydric/num/number.hpp"

namespace isohydric::chem::austin_1963 {

/// Temperatures measured. Source: [@austin1963, measured range].
inline constexpr Domain k_temperature_degC{15.0, 38.0};

/// Solubility at 37 degC, mmol/L/mmHg. Measured. As general physiology libraries carry it.
/// Source: [@kelman1967, solubility] after [@austin1963, data].
inline constexpr double k_solubility_37_mmol_L_mmHg = 0.0307;

/// Solubility per degC of cooling, mmol/L/mmHg/degC. Measured. As general physiology libraries
/// carry it. Source: [@kelman1967, solubility] after [@austin1963, data].
inline constexpr double k_linear = 0.00057;

/// Solubility per degC of cooling squared, mmol/L/mmHg/degC^2. Measured. As general physiology
/// libraries carry it. Source: [@kelman1967, solubility] after [@austin1963, data].
inline constexpr double k_quadratic = 0.00002;

/// Solubility of CO2 in plasma, mmol/L/mmHg. Domain: k_temperature_degC.
/// Source: [@kelman1967, solubility] after [@austin1963, data].
template <num::Number T>
[[nodiscard]] T co2_solubility_mmol_L_mmHg(const T& temperature_degC) {
    const T cooling_degC = k_body_temperature_degC - temperature_degC;
    return k_solubility_37_mmol_L_mmHg + cooling_degC * (k_linear + k_quadratic * cooling_degC);
}

}  // namespace isohydric::chem::austin_1963
