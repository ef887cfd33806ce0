// Carbonic acid: pH, pCO2, bicarbonate, total CO2 and hydrogen ion, with constants given or of one published relation.
#include "isohydric/chem/austin_1963.hpp"
#include "isohydric/chem/carbonic_acid.hpp"
#include "isohydric/chem/christiansen_1981.hpp"
#include "isohydric/chem/hydrogen_ion.hpp"
#include "isohydric/chem/kassirer_bleich_1965.hpp"
#include "isohydric/chem/kelman_1967.hpp"
#include "isohydric/chem/severinghaus_1976.hpp"
#include "isohydric/chem/siggaard_andersen_1988.hpp"
#include "isohydric/chem/total_co2.hpp"
#include "isohydric/engine/model_registry.hpp"

namespace isohydric::engine {

namespace {

[[nodiscard]] rule::ModelPort pco2_kPa_port() {
    return port("pCO2", "kPa", chem::usual::k_pco2_kPa);
}

void add_equilibrium(Models& models) {
    namespace model = chem::carbonic_acid;
    add_model(
        models,
        "carbonicAcid.dissolved",
        []<num::Number T>(T pco2_mmHg, T solubility) {
            // pK' plays no part; the pair of constants asks for one all the same.
            return model::dissolved_co2_mmol_L<T>({solubility, T(0.0)}, pco2_mmHg);
        },
        result("dissolvedCO2", "mmol/L"),
        pco2_port(),
        solubility_port());
    add_model(
        models,
        "carbonicAcid.bicarbonate",
        []<num::Number T>(T ph, T pco2_mmHg, T solubility, T pk) {
            return model::bicarbonate_mmol_L<T>({solubility, pk}, ph, pco2_mmHg);
        },
        result("HCO3", "mmol/L"),
        ph_port(),
        pco2_port(),
        solubility_port(),
        pk_port());
    add_model(
        models,
        "carbonicAcid.pH",
        []<num::Number T>(T pco2_mmHg, T hco3_mmol_L, T solubility, T pk) {
            return model::ph<T>({solubility, pk}, pco2_mmHg, hco3_mmol_L);
        },
        result("pH", "1"),
        pco2_port(),
        hco3_port(),
        solubility_port(),
        pk_port());
    add_model(
        models,
        "carbonicAcid.pCO2",
        []<num::Number T>(T ph, T hco3_mmol_L, T solubility, T pk) {
            return model::pco2_mmHg<T>({solubility, pk}, ph, hco3_mmol_L);
        },
        result("pCO2", "mm[Hg]"),
        ph_port(),
        hco3_port(),
        solubility_port(),
        pk_port());
}

void add_total_co2(Models& models) {
    // Total CO2 does not depend on pK'; the pair of constants asks for one all the same.
    namespace model = chem::total_co2;
    add_model(
        models,
        "carbonicAcid.total",
        []<num::Number T>(T pco2_mmHg, T hco3_mmol_L, T solubility) {
            return model::total_co2_mmol_L<T>({solubility, T(0.0)}, pco2_mmHg, hco3_mmol_L);
        },
        result("TCO2", "mmol/L"),
        pco2_port(),
        hco3_port(),
        solubility_port());
    add_model(
        models,
        "carbonicAcid.bicarbonateFromTotal",
        []<num::Number T>(T pco2_mmHg, T tco2_mmol_L, T solubility) {
            return model::bicarbonate_mmol_L<T>({solubility, T(0.0)}, pco2_mmHg, tco2_mmol_L);
        },
        result("HCO3", "mmol/L"),
        pco2_port(),
        port("TCO2", "mmol/L", chem::usual::k_hco3_mmol_L),
        solubility_port());
}

void add_hydrogen_ion(Models& models) {
    add_model(
        models,
        "hydrogenIon.fromPH",
        [](auto ph) { return chem::hydrogen_ion::hydrogen_ion_nmol_L(ph); },
        result("H", "nmol/L"),
        ph_port());
    add_model(
        models,
        "hydrogenIon.toPH",
        [](auto hydrogen_ion_nmol_L) { return chem::hydrogen_ion::ph(hydrogen_ion_nmol_L); },
        result("pH", "1"),
        port("H", "nmol/L", chem::usual::k_hydrogen_ion_nmol_L));
    add_model(
        models,
        "hydrogenIon.kassirerBleich1965",
        [](auto pco2_mmHg, auto hco3_mmol_L) {
            return chem::kassirer_bleich_1965::hydrogen_ion_nmol_L(pco2_mmHg, hco3_mmol_L);
        },
        result("H", "nmol/L"),
        pco2_port(),
        hco3_port());
}

void add_published_bicarbonate(Models& models) {
    add_model(
        models,
        "bicarbonate.severinghaus1976",
        [](auto ph, auto pco2_mmHg) {
            return chem::severinghaus_1976::bicarbonate_mmol_L(ph, pco2_mmHg);
        },
        result("HCO3", "mmol/L"),
        ph_port(),
        pco2_port());
    add_model(
        models,
        "bicarbonate.christiansen1981",
        [](auto ph, auto pco2_kPa) {
            return chem::christiansen_1981::bicarbonate_mmol_L(ph, pco2_kPa);
        },
        result("HCO3", "mmol/L"),
        ph_port(),
        pco2_kPa_port());
    add_model(
        models,
        "bicarbonate.siggaardAndersen1988",
        [](auto ph, auto pco2_kPa) {
            return chem::siggaard_andersen_1988::bicarbonate_mmol_L(ph, pco2_kPa);
        },
        result("HCO3", "mmol/L"),
        ph_port(),
        pco2_kPa_port());
}

void add_published_ph(Models& models) {
    add_model(
        models,
        "pH.severinghaus1976",
        [](auto pco2_mmHg, auto hco3_mmol_L) {
            return chem::severinghaus_1976::ph(pco2_mmHg, hco3_mmol_L);
        },
        result("pH", "1"),
        pco2_port(),
        hco3_port());
    add_model(
        models,
        "pH.christiansen1981",
        [](auto pco2_kPa, auto hco3_mmol_L) {
            return chem::christiansen_1981::ph(pco2_kPa, hco3_mmol_L);
        },
        result("pH", "1"),
        pco2_kPa_port(),
        hco3_port());
    add_model(
        models,
        "pH.siggaardAndersen1988",
        [](auto pco2_kPa, auto hco3_mmol_L) {
            return chem::siggaard_andersen_1988::ph(pco2_kPa, hco3_mmol_L);
        },
        result("pH", "1"),
        pco2_kPa_port(),
        hco3_port());
    add_model(
        models,
        "pH.kelman1967",
        [](auto pco2_mmHg, auto hco3_mmol_L, auto temperature_degC) {
            return chem::kelman_1967::ph(pco2_mmHg, hco3_mmol_L, temperature_degC);
        },
        result("pH", "1"),
        pco2_port(),
        hco3_port(),
        temperature_port(chem::austin_1963::k_temperature_degC));
}

void add_constants(Models& models) {
    add_model(
        models,
        "pK.siggaardAndersen1988",
        [](auto ph) { return chem::siggaard_andersen_1988::pk(ph); },
        result("pK", "1"),
        ph_port());
    add_model(
        models,
        "pK.siggaardAndersen1988AtTemperature",
        [](auto temperature_degC) {
            return chem::siggaard_andersen_1988::pk_at_temperature(temperature_degC);
        },
        result("pK", "1"),
        temperature_port());
    add_model(
        models,
        "pK.kelman1967",
        [](auto ph, auto temperature_degC) { return chem::kelman_1967::pk(ph, temperature_degC); },
        result("pK", "1"),
        ph_port(),
        temperature_port(chem::austin_1963::k_temperature_degC));
    add_model(
        models,
        "solubility.austin1963",
        [](auto temperature_degC) {
            return chem::austin_1963::co2_solubility_mmol_L_mmHg(temperature_degC);
        },
        result("solubility", "mmol/L/mm[Hg]"),
        temperature_port(chem::austin_1963::k_temperature_degC));
    add_model(
        models,
        "solubility.siggaardAndersen1988",
        [](auto temperature_degC) {
            return chem::siggaard_andersen_1988::co2_solubility_mmol_L_kPa(temperature_degC);
        },
        result("solubility", "mmol/L/kPa"),
        temperature_port());
}

}  // namespace

void add_carbonic_acid_models(Models& models) {
    add_equilibrium(models);
    add_total_co2(models);
    add_hydrogen_ion(models);
    add_published_bicarbonate(models);
    add_published_ph(models);
    add_constants(models);
}

}  // namespace isohydric::engine
