// The base-excess and standard-bicarbonate models of the list in models.hpp. Each form is reached
// from bicarbonate, and those whose worked values start from pCO2 from their solubility and pK'
// also.
#pragma once

#include "isohydric/chem/base_excess.hpp"
#include "isohydric/chem/base_excess_clsi.hpp"
#include "isohydric/chem/base_excess_kellum_2005.hpp"
#include "isohydric/chem/base_excess_lang_zander_2002.hpp"
#include "isohydric/chem/base_excess_siggaard_andersen_1960s.hpp"
#include "isohydric/chem/base_excess_siggaard_andersen_1977.hpp"
#include "isohydric/chem/base_excess_siggaard_andersen_2006.hpp"
#include "isohydric/chem/base_excess_siggaard_andersen_ecf.hpp"
#include "isohydric/chem/base_excess_wooten_2003.hpp"
#include "isohydric/chem/carbonic_acid.hpp"
#include "isohydric/chem/standard_bicarbonate.hpp"
#include "isohydric/chem/standard_bicarbonate_christiansen_1981.hpp"
#include "isohydric/chem/standard_bicarbonate_unattributed.hpp"

#include "chem/models.hpp"

namespace isohydric::chem::testing {

/// Base excess from {solubility, pK', pH, pCO2, ...}.
template <num::Number T>
T base_excess_of_gas(const BaseExcessForm<T>& form, std::span<const T> x) {
    return base_excess_mmol_L(
        form, x[2], carbonic_acid::bicarbonate_mmol_L(CarbonicAcid<T>{x[0], x[1]}, x[2], x[3]));
}

inline constexpr Input k_albumin{"albumin_mmol_L", usual::k_albumin_mmol_L};
inline constexpr Input k_phosphate{"phosphate_mmol_L", usual::k_phosphate_mmol_L};

template <num::Number T>
Models<T> siggaard_andersen_models() {
    using X = std::span<const T>;
    return {
        {"siggaard_andersen_1960s::blood",
         {k_ph, k_hco3, k_ct_hb_g_dL},
         [](X x) {
             return base_excess_mmol_L(siggaard_andersen_1960s::blood(x[2]), x[0], x[1]);
         }},
        {"siggaard_andersen_1977::blood",
         {k_ph, k_hco3, k_ct_hb_mmol_L},
         [](X x) {
             return base_excess_mmol_L(siggaard_andersen_1977::blood(x[2]), x[0], x[1]);
         }},
        {"siggaard_andersen_1977::extracellular_fluid",
         {k_ph, k_hco3, k_ct_hb_mmol_L},
         [](X x) {
             return base_excess_mmol_L(
                 siggaard_andersen_1977::extracellular_fluid(x[2]), x[0], x[1]);
         }},
        {"siggaard_andersen_2006::blood",
         {k_ph,
          k_hco3,
          k_ct_hb_mmol_L,
          k_albumin,
          {"globulin_g_L", usual::k_globulin_g_L},
          k_phosphate},
         [](X x) {
             const siggaard_andersen_2006::Buffers<T> buffers{x[2], x[3], x[4], x[5]};
             return base_excess_mmol_L(siggaard_andersen_2006::blood(buffers), x[0], x[1]);
         }},
        {"siggaard_andersen_ecf::extracellular_fluid",
         {k_ph, k_hco3},
         [](X x) {
             return base_excess_mmol_L(siggaard_andersen_ecf::extracellular_fluid<T>(), x[0], x[1]);
         }},
    };
}

template <num::Number T>
Models<T> base_excess_models() {
    using X = std::span<const T>;
    return {
        {"clsi::blood",
         {k_ph, k_hco3, k_ct_hb_g_dL},
         [](X x) {
             return base_excess_mmol_L(clsi::blood(x[2]), x[0], x[1]);
         }},
        {"clsi::extracellular_fluid",
         {k_ph, k_hco3},
         [](X x) {
             return base_excess_mmol_L(clsi::extracellular_fluid<T>(), x[0], x[1]);
         }},
        {"kellum_2005::extracellular_fluid",
         {k_ph, k_hco3},
         [](X x) {
             return base_excess_mmol_L(kellum_2005::extracellular_fluid<T>(), x[0], x[1]);
         }},
        {"kellum_2005::plasma",
         {k_ph,
          k_hco3,
          {"albumin_g_dL", usual::k_albumin_g_dL},
          {"phosphate_mg_dL", usual::k_phosphate_mg_dL}},
         [](X x) {
             return base_excess_mmol_L(kellum_2005::plasma(x[2], x[3]), x[0], x[1]);
         }},
        {"wooten_2003::plasma",
         {k_ph, k_hco3, k_albumin, k_phosphate},
         [](X x) {
             return base_excess_mmol_L(wooten_2003::plasma(x[2], x[3]), x[0], x[1]);
         }},
    };
}

template <num::Number T>
Models<T> base_excess_of_gas_models() {
    using X = std::span<const T>;
    return {
        {"siggaard_andersen_1960s::blood_of_gas",
         {k_solubility, k_pk, k_ph, k_pco2, k_ct_hb_g_dL},
         [](X x) {
             return base_excess_of_gas(siggaard_andersen_1960s::blood(x[4]), x);
         }},
        {"siggaard_andersen_1977::blood_of_gas",
         {k_solubility, k_pk, k_ph, k_pco2, k_ct_hb_mmol_L},
         [](X x) {
             return base_excess_of_gas(siggaard_andersen_1977::blood(x[4]), x);
         }},
        {"siggaard_andersen_ecf::extracellular_fluid_of_gas",
         {k_solubility, k_pk, k_ph, k_pco2},
         [](X x) {
             return base_excess_of_gas(siggaard_andersen_ecf::extracellular_fluid<T>(), x);
         }},
        {"clsi::blood_of_gas",
         {k_solubility, k_pk, k_ph, k_pco2, k_ct_hb_g_dL},
         [](X x) {
             return base_excess_of_gas(clsi::blood(x[4]), x);
         }},
        {"clsi::extracellular_fluid_of_gas",
         {k_solubility, k_pk, k_ph, k_pco2},
         [](X x) {
             return base_excess_of_gas(clsi::extracellular_fluid<T>(), x);
         }},
        {"lang_zander_2002::base_excess",
         {k_ph, {"pco2_mmHg", lang_zander_2002::k_pco2_mmHg}, k_ct_hb_g_dL, k_so2},
         [](X x) {
             return lang_zander_2002::base_excess_mmol_L(
                 lang_zander_2002::Blood<T>{x[0], x[1], x[2], x[3]});
         }},
        {"christiansen_1981::standard_bicarbonate",
         {k_base_excess, k_ct_hb_mmol_L, k_so2},
         [](X x) {
             return christiansen_1981::standard_bicarbonate_mmol_L(x[0], x[1], x[2]);
         }},
        {"unattributed_standard_bicarbonate::standard_bicarbonate",
         {k_base_excess, k_ct_hb_g_dL, k_so2},
         [](X x) {
             return unattributed_standard_bicarbonate::standard_bicarbonate_mmol_L(
                 x[0], x[1], x[2]);
         }},
    };
}

/// By definition, from the form of Siggaard-Andersen 1977.
template <num::Number T>
Models<T> standard_bicarbonate_models() {
    using X = std::span<const T>;
    return {
        {"standard_bicarbonate::by_definition",
         {k_solubility, k_pk, k_ct_hb_mmol_L, k_base_excess},
         [](X x) {
             return standard_bicarbonate_mmol_L(
                 siggaard_andersen_1977::blood(x[2]), CarbonicAcid<T>{x[0], x[1]}, x[3]);
         }},
    };
}

}  // namespace isohydric::chem::testing
