// The pH at which pure water holds as much hydrogen ion as hydroxide.
#pragma once

#include "isohydric/chem/conditions.hpp"
#include "isohydric/chem/iapws_water_ionization.hpp"
#include "isohydric/chem/kell_1975.hpp"
#include "isohydric/num/number.hpp"

namespace isohydric::chem::neutral_ph {

/// Neutral pH of a given ionization constant. Derived: half of pKw.
template <num::Number T>
[[nodiscard]] T from_pkw(const T& pkw) {
    return pkw / 2.0;
}

/// Neutral pH of liquid water at one atmosphere. Domain: kell_1975::k_temperature_degC.
/// Source: [@iapws-r11-24, equation] with the density of [@kell1975, equation 16].
template <num::Number T>
[[nodiscard]] T at_temperature(const T& temperature_degC) {
    const T temperature_K = temperature_degC + k_zero_celsius_K;
    return from_pkw(iapws_water_ionization::pkw(iapws_water_ionization::k_r11_24,
                                                temperature_K,
                                                kell_1975::density_g_cm3(temperature_degC)));
}

}  // namespace isohydric::chem::neutral_ph
