// Marshall and Franck's ionization constant of water.
#pragma once

#include "isohydric/chem/domain.hpp"
#include "isohydric/num/number.hpp"

namespace isohydric::chem::marshall_franck_1981 {

/// Temperatures, K: liquid water up to 100 degC, the rows its printed table was checked on.
inline constexpr Domain k_temperature_K{273.15, 373.15};

/// Densities, g/cm3, of liquid water in k_temperature_K.
inline constexpr Domain k_density_g_cm3{0.95, 1.01};

/// Coefficients A to G in the order and units of the paper (K, g/cm3). Measured (fitted). From
/// memory, and proved by the printed row of saturated liquid. Source: [@marshall1981, equation].
inline constexpr double k_a = -4.098;
inline constexpr double k_b = -3245.2;
inline constexpr double k_c = 2.2362e5;
inline constexpr double k_d = -3.984e7;
inline constexpr double k_e = 13.957;
inline constexpr double k_f = -1262.3;
inline constexpr double k_g = 8.5641e5;

/// Negative decimal logarithm of the ionization constant, mol2/kg2. Domain: k_temperature_K,
/// k_density_g_cm3. Source: [@marshall1981, equation].
template <num::Number T>
[[nodiscard]] T pkw(const T& temperature_K, const T& density_g_cm3) {
    const T inverse_K = 1.0 / temperature_K;
    const T temperature_term = k_a + inverse_K * (k_b + inverse_K * (k_c + inverse_K * k_d));
    const T density_factor = k_e + inverse_K * (k_f + inverse_K * k_g);
    return -(temperature_term + density_factor * num::log10(density_g_cm3));
}

}  // namespace isohydric::chem::marshall_franck_1981
