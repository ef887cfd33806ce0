// Calculated osmolality by the published sums, and the part of ethanol.
#include "isohydric/chem/osmolality.hpp"
#include "isohydric/engine/model_registry.hpp"

namespace isohydric::engine {

namespace {

namespace sums = chem::osmolality;

[[nodiscard]] rule::ModelPort osmolality() {
    return result("osmolality", "mosm/kg");
}

[[nodiscard]] rule::ModelPort sodium_port() {
    return port("Na", "mmol/L", chem::usual::k_sodium_mmol_L);
}

[[nodiscard]] rule::ModelPort potassium_port() {
    return port("K", "mmol/L", chem::usual::k_potassium_mmol_L);
}

[[nodiscard]] rule::ModelPort glucose_port() {
    return port("glucose", "mmol/L", chem::usual::k_glucose_mmol_L);
}

[[nodiscard]] rule::ModelPort urea_port() {
    return port("urea", "mmol/L", chem::usual::k_urea_mmol_L);
}

/// A sum of sodium, glucose and urea, all in mmol/L.
template <typename Formula>
void add_molar_sum(Models& models, std::string id, Formula formula) {
    add_model(
        models, std::move(id), formula, osmolality(), sodium_port(), glucose_port(), urea_port());
}

/// A sum with potassium, all in mmol/L.
template <typename Formula>
void add_potassium_sum(Models& models, std::string id, Formula formula) {
    add_model(models,
              std::move(id),
              formula,
              osmolality(),
              sodium_port(),
              potassium_port(),
              glucose_port(),
              urea_port());
}

/// A sum of sodium in mmol/L with glucose and urea nitrogen in mg/dL.
template <typename Formula>
void add_conventional_sum(Models& models, std::string id, Formula formula) {
    add_model(models,
              std::move(id),
              formula,
              osmolality(),
              sodium_port(),
              port("glucose", "mg/dL", chem::usual::k_glucose_mg_dL),
              port("ureaNitrogen", "mg/dL", chem::usual::k_urea_nitrogen_mg_dL));
}

void add_molar_sums(Models& models) {
    add_molar_sum(
        models, "osmolality.smithlineGardner1976", []<num::Number T>(T na, T glucose, T urea) {
            return sums::smithline_gardner_1976::osmolality_mOsm_kg(
                sums::Solutes<T>{na, T(0.0), glucose, urea});
        });
    add_molar_sum(
        models, "osmolality.rasouliKalantari2005", []<num::Number T>(T na, T glucose, T urea) {
            return sums::rasouli_kalantari_2005::osmolality_mOsm_kg(
                sums::Solutes<T>{na, T(0.0), glucose, urea});
        });
    add_potassium_sum(models,
                      "osmolality.rasouliKalantari2005WithPotassium",
                      []<num::Number T>(T na, T k, T glucose, T urea) {
                          return sums::rasouli_kalantari_2005::osmolality_with_potassium_mOsm_kg(
                              sums::Solutes<T>{na, k, glucose, urea});
                      });
    add_potassium_sum(
        models, "osmolality.khajuriaKrahn2005", []<num::Number T>(T na, T k, T glucose, T urea) {
            return sums::khajuria_krahn_2005::osmolality_mOsm_kg(
                sums::Solutes<T>{na, k, glucose, urea});
        });
    add_model(
        models,
        "osmolality.zander",
        []<num::Number T>(T na, T k, T glucose, T urea, T chloride, T lactate, T hco3) {
            return sums::zander::osmolality_mOsm_kg(sums::Solutes<T>{na, k, glucose, urea},
                                                    {chloride, lactate, hco3});
        },
        osmolality(),
        sodium_port(),
        potassium_port(),
        glucose_port(),
        urea_port(),
        port("Cl", "mmol/L", chem::usual::k_chloride_mmol_L),
        port("lactate", "mmol/L", chem::usual::k_lactate_mmol_L),
        hco3_port());
}

void add_conventional_sums(Models& models) {
    add_conventional_sum(models,
                         "osmolality.smithlineGardner1976Conventional",
                         []<num::Number T>(T na, T glucose, T urea_nitrogen) {
                             return sums::smithline_gardner_1976::osmolality_mOsm_kg(
                                 sums::ConventionalSolutes<T>{na, glucose, urea_nitrogen});
                         });
    add_conventional_sum(models,
                         "osmolality.dorwartChalmers1975",
                         []<num::Number T>(T na, T glucose, T urea_nitrogen) {
                             return sums::dorwart_chalmers_1975::osmolality_mOsm_kg(
                                 sums::ConventionalSolutes<T>{na, glucose, urea_nitrogen});
                         });
    add_conventional_sum(models,
                         "osmolality.laboratoryHandbook",
                         []<num::Number T>(T na, T glucose, T urea_nitrogen) {
                             return sums::laboratory_handbook::osmolality_mOsm_kg(
                                 sums::ConventionalSolutes<T>{na, glucose, urea_nitrogen});
                         });
}

void add_ethanol(Models& models) {
    constexpr chem::Domain k_factor{0.5, 2.0};
    constexpr chem::Domain k_divisor{2.0, 8.0};
    add_model(
        models,
        "osmolality.ethanol",
        [](auto factor, auto ethanol_mmol_L) {
            return sums::ethanol::contribution_mOsm_kg(factor, ethanol_mmol_L);
        },
        osmolality(),
        port("factor", "mosm.L/kg/mmol", k_factor),
        port("ethanol", "mmol/L", chem::usual::k_ethanol_mmol_L));
    add_model(
        models,
        "osmolality.ethanolByDivisor",
        [](auto divisor_mg_dL, auto ethanol_mg_dL) {
            return sums::ethanol::contribution_by_divisor_mOsm_kg(divisor_mg_dL, ethanol_mg_dL);
        },
        osmolality(),
        port("divisor", "mg.kg/dL/mosm", k_divisor),
        port("ethanol", "mg/dL", chem::usual::k_ethanol_mg_dL));
}

}  // namespace

void add_osmolality_models(Models& models) {
    add_molar_sums(models);
    add_conventional_sums(models);
    add_ethanol(models);
}

}  // namespace isohydric::engine
