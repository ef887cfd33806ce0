// pH, pCO2 and pO2 of the same blood at another temperature, and back to 37 degC.
#include "isohydric/chem/po2_temperature_clsi.hpp"
#include "isohydric/chem/severinghaus_1979.hpp"
#include "isohydric/chem/temperature.hpp"
#include "isohydric/engine/model_registry.hpp"

namespace isohydric::engine {

namespace {

namespace model = chem::temperature;

/// pH by a slope, there and back.
template <const model::PhSlope& Slope>
void add_ph(Models& models, const std::string& name) {
    add_model(
        models,
        "temperature.pH" + name,
        [](auto ph_37, auto temperature_degC) {
            return model::ph_at(Slope, ph_37, temperature_degC);
        },
        result("pH", "1"),
        ph_port(),
        temperature_port());
    add_model(
        models,
        "temperature.pH" + name + "At37",
        [](auto ph, auto temperature_degC) { return model::ph_at_37(Slope, ph, temperature_degC); },
        result("pH", "1"),
        ph_port(),
        temperature_port());
}

/// pCO2 by a coefficient, there and back.
template <const double& Coefficient>
void add_pco2(Models& models, const std::string& name) {
    add_model(
        models,
        "temperature.pCO2" + name,
        [](auto pco2_37_mmHg, auto temperature_degC) {
            return model::pco2_at_mmHg(Coefficient, pco2_37_mmHg, temperature_degC);
        },
        result("pCO2", "mm[Hg]"),
        pco2_port(),
        temperature_port());
    add_model(
        models,
        "temperature.pCO2" + name + "At37",
        [](auto pco2_mmHg, auto temperature_degC) {
            return model::pco2_at_37_mmHg(Coefficient, pco2_mmHg, temperature_degC);
        },
        result("pCO2", "mm[Hg]"),
        pco2_port(),
        temperature_port());
}

void add_po2(Models& models) {
    const auto po2_port = port("pO2", "mm[Hg]", chem::usual::k_po2_mmHg);
    add_model(
        models,
        "temperature.pO2Clsi",
        [](auto po2_37_mmHg, auto temperature_degC) {
            return chem::po2_temperature_clsi::po2_at_mmHg(po2_37_mmHg, temperature_degC);
        },
        result("pO2", "mm[Hg]"),
        po2_port,
        temperature_port());
    add_model(
        models,
        "temperature.pO2ClsiAt37",
        [](auto po2_mmHg, auto temperature_degC) {
            return chem::po2_temperature_clsi::po2_at_37_mmHg(po2_mmHg, temperature_degC);
        },
        result("pO2", "mm[Hg]"),
        po2_port,
        temperature_port());
    add_model(
        models,
        "temperature.log10PO2PerDegCClsi",
        [](auto po2_mmHg) { return chem::po2_temperature_clsi::log10_po2_per_degC(po2_mmHg); },
        result("slope", "/K"),
        po2_port);
    add_model(
        models,
        "temperature.lnPO2PerDegCSeveringhaus1979",
        [](auto po2_mmHg) { return chem::severinghaus_1979::ln_po2_per_degC(po2_mmHg); },
        result("slope", "/K"),
        po2_port);
}

}  // namespace

void add_temperature_models(Models& models) {
    add_ph<model::k_rosenthal>(models, "Rosenthal1948");
    add_ph<model::k_clsi>(models, "Clsi");
    add_ph<model::k_clsi_0146>(models, "Clsi0146");
    add_pco2<model::k_pco2_nunn>(models, "Nunn1965");
    add_pco2<model::k_pco2_bradley>(models, "Bradley1956");
    add_pco2<model::k_pco2_steep>(models, "Steep");
    add_po2(models);
}

}  // namespace isohydric::engine
