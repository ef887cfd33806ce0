// Severinghaus's 1979 equations of blood oxygen: how pO2 changes with temperature.
#pragma once

#include "isohydric/num/number.hpp"

namespace isohydric::chem::severinghaus_1979 {

/// ln of pO2 per degC that saturation takes away, at low pO2. Measured. Source:
/// [@severinghaus1979, abstract].
inline constexpr double k_saturable_per_degC = 0.058;

/// ln of pO2 per degC that stays at full saturation. Measured. Source:
/// [@severinghaus1979, abstract].
inline constexpr double k_dissolved_per_degC = 0.013;

/// Weight of the pO2 term. Measured. Source: [@severinghaus1979, abstract].
inline constexpr double k_weight = 0.243;

/// pO2 that the term is scaled by, mmHg. Defined. Source: [@severinghaus1979, abstract].
inline constexpr double k_scale_mmHg = 100.0;

/// Power of the scaled pO2; the weight stands outside it. Measured. Source:
/// [@severinghaus1979, abstract].
inline constexpr double k_power = 3.88;

/// Change of ln pO2 per degC at 37 degC. Domain: usual::k_po2_mmHg. Source:
/// [@severinghaus1979, abstract].
template <num::Number T>
[[nodiscard]] T ln_po2_per_degC(const T& po2_mmHg) {
    const T saturation_term = k_weight * num::pow(po2_mmHg / k_scale_mmHg, T(k_power));
    return k_saturable_per_degC / (saturation_term + 1.0) + k_dissolved_per_degC;
}

}  // namespace isohydric::chem::severinghaus_1979
