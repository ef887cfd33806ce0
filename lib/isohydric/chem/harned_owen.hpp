// The short form of the ionization constant of water, after Harned and Owen, that water chemistry
// uses.
#pragma once

#include "isohydric/chem/domain.hpp"
#include "isohydric/num/number.hpp"

namespace isohydric::chem::harned_owen {

/// Temperatures, K: 0 to 50 degC. Unchecked: from memory. Source: [@stumm1981, p. 127].
inline constexpr Domain k_temperature_K{273.15, 323.15};

/// Coefficient of 1/T, K. Measured (fitted). As water-chemistry codes carry it. Source:
/// [@stumm1981, p. 127].
inline constexpr double k_inverse_K = 4470.99;

/// Constant term. Measured (fitted). As water-chemistry codes carry it. Source:
/// [@stumm1981, p. 127].
inline constexpr double k_constant = -6.0875;

/// Coefficient of T, 1/K. Measured (fitted). As water-chemistry codes carry it. Source:
/// [@stumm1981, p. 127].
inline constexpr double k_per_K = 0.01706;

/// Negative decimal logarithm of the ionization constant. Domain: k_temperature_K.
/// Source: [@stumm1981, p. 127].
template <num::Number T>
[[nodiscard]] T pkw(const T& temperature_K) {
    return k_inverse_K / temperature_K + k_constant + k_per_K * temperature_K;
}

}  // namespace isohydric::chem::harned_owen
