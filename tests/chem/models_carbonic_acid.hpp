// The carbonic acid models of the list in models.hpp.
#pragma once

#include "isohydric/chem/austin_1963.hpp"
#include "isohydric/chem/carbonic_acid.hpp"
#include "isohydric/chem/christiansen_1981.hpp"
#include "isohydric/chem/hydrogen_ion.hpp"
#include "isohydric/chem/kassirer_bleich_1965.hpp"
#include "isohydric/chem/kelman_1967.hpp"
#include "isohydric/chem/severinghaus_1976.hpp"
#include "isohydric/chem/siggaard_andersen_1988.hpp"
#include "isohydric/chem/total_co2.hpp"

#include "chem/models.hpp"

namespace isohydric::chem::testing {

inline constexpr Input k_kelman_temperature{"temperature_degC", austin_1963::k_temperature_degC};

template <num::Number T>
Models<T> carbonic_acid_models() {
    using X = std::span<const T>;
    using Pair = CarbonicAcid<T>;
    return {
        {"carbonic_acid::bicarbonate",
         {k_solubility, k_pk, k_ph, k_pco2},
         [](X x) {
             return carbonic_acid::bicarbonate_mmol_L(Pair{x[0], x[1]}, x[2], x[3]);
         }},
        {"carbonic_acid::ph",
         {k_solubility, k_pk, k_pco2, k_hco3},
         [](X x) {
             return carbonic_acid::ph(Pair{x[0], x[1]}, x[2], x[3]);
         }},
        {"carbonic_acid::pco2",
         {k_solubility, k_pk, k_ph, k_hco3},
         [](X x) {
             return carbonic_acid::pco2_mmHg(Pair{x[0], x[1]}, x[2], x[3]);
         }},
        {"carbonic_acid::hydrogen_ion",
         {k_solubility, k_pk, k_pco2, k_hco3},
         [](X x) {
             return hydrogen_ion::hydrogen_ion_nmol_L(
                 carbonic_acid::ph(Pair{x[0], x[1]}, x[2], x[3]));
         }},
        {"total_co2::total_co2",
         {k_solubility, k_pk, k_pco2, k_hco3},
         [](X x) {
             return total_co2::total_co2_mmol_L(Pair{x[0], x[1]}, x[2], x[3]);
         }},
        {"total_co2::bicarbonate",
         {k_solubility, k_pk, k_pco2, k_tco2},
         [](X x) {
             return total_co2::bicarbonate_mmol_L(Pair{x[0], x[1]}, x[2], x[3]);
         }},
        {"hydrogen_ion::hydrogen_ion",
         {k_ph},
         [](X x) {
             return hydrogen_ion::hydrogen_ion_nmol_L(x[0]);
         }},
        {"hydrogen_ion::ph",
         {k_hydrogen_ion},
         [](X x) {
             return hydrogen_ion::ph(x[0]);
         }},
        {"kassirer_bleich_1965::hydrogen_ion",
         {k_pco2, k_hco3},
         [](X x) {
             return kassirer_bleich_1965::hydrogen_ion_nmol_L(x[0], x[1]);
         }},
    };
}

template <num::Number T>
Models<T> carbonic_acid_by_ph_models() {
    using X = std::span<const T>;
    return {
        {"severinghaus_1976::bicarbonate",
         {k_ph, k_pco2},
         [](X x) {
             return severinghaus_1976::bicarbonate_mmol_L(x[0], x[1]);
         }},
        {"severinghaus_1976::ph",
         {k_pco2, k_hco3},
         [](X x) {
             return severinghaus_1976::ph(x[0], x[1]);
         }},
        {"christiansen_1981::bicarbonate",
         {k_ph, k_pco2_kPa},
         [](X x) {
             return christiansen_1981::bicarbonate_mmol_L(x[0], x[1]);
         }},
        {"christiansen_1981::ph",
         {k_pco2_kPa, k_hco3},
         [](X x) {
             return christiansen_1981::ph(x[0], x[1]);
         }},
        {"siggaard_andersen_1988::pk",
         {k_ph},
         [](X x) {
             return siggaard_andersen_1988::pk(x[0]);
         }},
        {"siggaard_andersen_1988::bicarbonate",
         {k_ph, k_pco2_kPa},
         [](X x) {
             return siggaard_andersen_1988::bicarbonate_mmol_L(x[0], x[1]);
         }},
        {"siggaard_andersen_1988::ph",
         {k_pco2_kPa, k_hco3},
         [](X x) {
             return siggaard_andersen_1988::ph(x[0], x[1]);
         }},
    };
}

template <num::Number T>
Models<T> carbonic_acid_by_temperature_models() {
    using X = std::span<const T>;
    return {
        {"siggaard_andersen_1988::co2_solubility",
         {k_temperature},
         [](X x) {
             return siggaard_andersen_1988::co2_solubility_mmol_L_kPa(x[0]);
         }},
        {"siggaard_andersen_1988::pk_at_temperature",
         {k_temperature},
         [](X x) {
             return siggaard_andersen_1988::pk_at_temperature(x[0]);
         }},
        {"austin_1963::co2_solubility",
         {k_kelman_temperature},
         [](X x) {
             return austin_1963::co2_solubility_mmol_L_mmHg(x[0]);
         }},
        {"kelman_1967::pk",
         {k_ph, k_kelman_temperature},
         [](X x) {
             return kelman_1967::pk(x[0], x[1]);
         }},
        {"kelman_1967::bicarbonate",
         {k_ph, k_pco2, k_kelman_temperature},
         [](X x) {
             return carbonic_acid::bicarbonate_mmol_L(
                 kelman_1967::constants(x[0], x[2]), x[0], x[1]);
         }},
        {"kelman_1967::ph",
         {k_pco2, k_hco3, k_kelman_temperature},
         [](X x) {
             return kelman_1967::ph(x[0], x[1], x[2]);
         }},
    };
}

}  // namespace isohydric::chem::testing
