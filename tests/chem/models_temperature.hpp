// The temperature models of the list in models.hpp.
#pragma once

#include "isohydric/chem/po2_temperature_clsi.hpp"
#include "isohydric/chem/severinghaus_1979.hpp"
#include "isohydric/chem/temperature.hpp"

#include "chem/models.hpp"

namespace isohydric::chem::testing {

template <num::Number T>
Models<T> ph_temperature_models() {
    using X = std::span<const T>;
    return {
        {"temperature::ph_rosenthal",
         {k_ph, k_temperature},
         [](X x) {
             return temperature::ph_at(temperature::k_rosenthal, x[0], x[1]);
         }},
        {"temperature::ph_clsi",
         {k_ph, k_temperature},
         [](X x) {
             return temperature::ph_at(temperature::k_clsi, x[0], x[1]);
         }},
        {"temperature::ph_clsi_0146",
         {k_ph, k_temperature},
         [](X x) {
             return temperature::ph_at(temperature::k_clsi_0146, x[0], x[1]);
         }},
        {"temperature::ph_at_37_clsi",
         {k_ph, k_temperature},
         [](X x) {
             return temperature::ph_at_37(temperature::k_clsi, x[0], x[1]);
         }},
    };
}

template <num::Number T>
Models<T> gas_temperature_models() {
    using X = std::span<const T>;
    return {
        {"temperature::pco2_nunn",
         {k_pco2, k_temperature},
         [](X x) {
             return temperature::pco2_at_mmHg(temperature::k_pco2_nunn, x[0], x[1]);
         }},
        {"temperature::pco2_bradley",
         {k_pco2, k_temperature},
         [](X x) {
             return temperature::pco2_at_mmHg(temperature::k_pco2_bradley, x[0], x[1]);
         }},
        {"temperature::pco2_steep",
         {k_pco2, k_temperature},
         [](X x) {
             return temperature::pco2_at_mmHg(temperature::k_pco2_steep, x[0], x[1]);
         }},
        {"temperature::pco2_at_37_nunn",
         {k_pco2, k_temperature},
         [](X x) {
             return temperature::pco2_at_37_mmHg(temperature::k_pco2_nunn, x[0], x[1]);
         }},
        {"severinghaus_1979::ln_po2_per_degC",
         {k_po2},
         [](X x) {
             return severinghaus_1979::ln_po2_per_degC(x[0]);
         }},
        {"po2_temperature_clsi::log10_po2_per_degC",
         {k_po2},
         [](X x) {
             return po2_temperature_clsi::log10_po2_per_degC(x[0]);
         }},
        {"po2_temperature_clsi::po2",
         {k_po2, k_temperature},
         [](X x) {
             return po2_temperature_clsi::po2_at_mmHg(x[0], x[1]);
         }},
    };
}

template <num::Number T>
Models<T> po2_at_37_models() {
    using X = std::span<const T>;
    return {
        {"po2_temperature_clsi::po2_at_37",
         {k_po2, k_temperature},
         [](X x) {
             return po2_temperature_clsi::po2_at_37_mmHg(x[0], x[1]);
         }},
    };
}

}  // namespace isohydric::chem::testing
