// The models of water of the list in models.hpp.
#pragma once

#include "isohydric/chem/conditions.hpp"
#include "isohydric/chem/harned_owen.hpp"
#include "isohydric/chem/iapws_water_ionization.hpp"
#include "isohydric/chem/kell_1975.hpp"
#include "isohydric/chem/marshall_franck_1981.hpp"
#include "isohydric/chem/neutral_ph.hpp"

#include "chem/models.hpp"

namespace isohydric::chem::testing {

template <num::Number T>
Models<T> water_models() {
    using X = std::span<const T>;
    namespace iapws = iapws_water_ionization;
    const Input iapws_temperature{"temperature_K", iapws::k_temperature_K};
    const Input iapws_density{"density_g_cm3", iapws::k_density_g_cm3};
    const Input liquid_temperature{"temperature_degC", kell_1975::k_temperature_degC};
    return {
        {"iapws_r11_07::pkw",
         {iapws_temperature, iapws_density},
         [](X x) {
             return iapws::pkw(iapws::k_r11_07, x[0], x[1]);
         }},
        {"iapws_r11_24::pkw",
         {iapws_temperature, iapws_density},
         [](X x) {
             return iapws::pkw(iapws::k_r11_24, x[0], x[1]);
         }},
        {"iapws_r11_07::pkw_at_one_atmosphere",
         {liquid_temperature},
         [](X x) {
             return iapws::pkw(
                 iapws::k_r11_07, T(x[0] + k_zero_celsius_K), kell_1975::density_g_cm3(x[0]));
         }},
        {"marshall_franck_1981::pkw",
         {{"temperature_K", marshall_franck_1981::k_temperature_K},
          {"density_g_cm3", marshall_franck_1981::k_density_g_cm3}},
         [](X x) {
             return marshall_franck_1981::pkw(x[0], x[1]);
         }},
        {"harned_owen::pkw",
         {{"temperature_K", harned_owen::k_temperature_K}},
         [](X x) {
             return harned_owen::pkw(x[0]);
         }},
        {"kell_1975::density",
         {liquid_temperature},
         [](X x) {
             return kell_1975::density_g_cm3(x[0]);
         }},
        {"neutral_ph::at_temperature",
         {liquid_temperature},
         [](X x) {
             return neutral_ph::at_temperature(x[0]);
         }},
    };
}

}  // namespace isohydric::chem::testing
