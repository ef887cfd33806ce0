// The osmolality models of the list in models.hpp.
#pragma once

#include "isohydric/chem/osmolality.hpp"

#include "chem/models.hpp"

namespace isohydric::chem::testing {

template <num::Number T>
Models<T> osmolality_models() {
    using X = std::span<const T>;
    const Input sodium{"sodium_mmol_L", usual::k_sodium_mmol_L};
    const Input potassium{"potassium_mmol_L", usual::k_potassium_mmol_L};
    const Input glucose{"glucose_mmol_L", usual::k_glucose_mmol_L};
    const Input urea{"urea_mmol_L", usual::k_urea_mmol_L};
    const std::vector<Input> solutes{sodium, potassium, glucose, urea};
    const std::vector<Input> conventional{sodium,
                                          {"glucose_mg_dL", usual::k_glucose_mg_dL},
                                          {"urea_nitrogen_mg_dL", usual::k_urea_nitrogen_mg_dL}};
    return {
        {"smithline_gardner_1976::osmolality",
         solutes,
         [](X x) {
             return osmolality::smithline_gardner_1976::osmolality_mOsm_kg(
                 osmolality::Solutes<T>{x[0], x[1], x[2], x[3]});
         }},
        {"smithline_gardner_1976::conventional",
         conventional,
         [](X x) {
             return osmolality::smithline_gardner_1976::osmolality_mOsm_kg(
                 osmolality::ConventionalSolutes<T>{x[0], x[1], x[2]});
         }},
        {"dorwart_chalmers_1975::osmolality",
         conventional,
         [](X x) {
             return osmolality::dorwart_chalmers_1975::osmolality_mOsm_kg(
                 osmolality::ConventionalSolutes<T>{x[0], x[1], x[2]});
         }},
        {"laboratory_handbook::osmolality",
         conventional,
         [](X x) {
             return osmolality::laboratory_handbook::osmolality_mOsm_kg(
                 osmolality::ConventionalSolutes<T>{x[0], x[1], x[2]});
         }},
        {"khajuria_krahn_2005::osmolality",
         solutes,
         [](X x) {
             return osmolality::khajuria_krahn_2005::osmolality_mOsm_kg(
                 osmolality::Solutes<T>{x[0], x[1], x[2], x[3]});
         }},
        {"rasouli_kalantari_2005::osmolality",
         solutes,
         [](X x) {
             return osmolality::rasouli_kalantari_2005::osmolality_mOsm_kg(
                 osmolality::Solutes<T>{x[0], x[1], x[2], x[3]});
         }},
        {"rasouli_kalantari_2005::osmolality_with_potassium",
         solutes,
         [](X x) {
             return osmolality::rasouli_kalantari_2005::osmolality_with_potassium_mOsm_kg(
                 osmolality::Solutes<T>{x[0], x[1], x[2], x[3]});
         }},
    };
}

template <num::Number T>
Models<T> osmolality_by_parts_models() {
    using X = std::span<const T>;
    const Input factor{"factor", {1.0, 1.25}};
    const Input divisor{"divisor_mg_dL", {3.7, 4.7}};
    return {
        {"zander::osmolality",
         {{"sodium_mmol_L", usual::k_sodium_mmol_L},
          {"potassium_mmol_L", usual::k_potassium_mmol_L},
          {"glucose_mmol_L", usual::k_glucose_mmol_L},
          {"urea_mmol_L", usual::k_urea_mmol_L},
          {"chloride_mmol_L", usual::k_chloride_mmol_L},
          {"lactate_mmol_L", usual::k_lactate_mmol_L},
          k_hco3},
         [](X x) {
             return osmolality::zander::osmolality_mOsm_kg(
                 osmolality::Solutes<T>{x[0], x[1], x[2], x[3]},
                 osmolality::zander::Anions<T>{x[4], x[5], x[6]});
         }},
        {"ethanol::contribution",
         {factor, {"ethanol_mmol_L", usual::k_ethanol_mmol_L}},
         [](X x) {
             return osmolality::ethanol::contribution_mOsm_kg(x[0], x[1]);
         }},
        {"ethanol::contribution_by_divisor",
         {divisor, {"ethanol_mg_dL", usual::k_ethanol_mg_dL}},
         [](X x) {
             return osmolality::ethanol::contribution_by_divisor_mOsm_kg(x[0], x[1]);
         }},
    };
}

}  // namespace isohydric::chem::testing
