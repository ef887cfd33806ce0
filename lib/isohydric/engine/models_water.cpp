// The ion product of water by temperature, and the neutral pH that follows from it.
#include "isohydric/chem/conditions.hpp"
#include "isohydric/chem/harned_owen.hpp"
#include "isohydric/chem/iapws_water_ionization.hpp"
#include "isohydric/chem/kell_1975.hpp"
#include "isohydric/chem/marshall_franck_1981.hpp"
#include "isohydric/chem/neutral_ph.hpp"
#include "isohydric/engine/model_registry.hpp"

namespace isohydric::engine {

namespace {

/// Registers a relation of the temperature alone, over a span in degC.
template <typename Formula>
void add_by_temperature(Models& models,
                        std::string id,
                        Formula formula,
                        rule::ModelPort output,
                        chem::Domain domain_degC) {
    add_model(models, std::move(id), formula, std::move(output), temperature_port(domain_degC));
}

[[nodiscard]] rule::ModelPort pkw() {
    return result("pKw", "1");
}

}  // namespace

void add_water_models(Models& models) {
    using chem::kell_1975::density_g_cm3;
    constexpr chem::Domain k_liquid_degC = chem::kell_1975::k_temperature_degC;
    constexpr chem::Domain k_harned_owen_degC{
        chem::harned_owen::k_temperature_K.low - chem::k_zero_celsius_K,
        chem::harned_owen::k_temperature_K.high - chem::k_zero_celsius_K};
    add_by_temperature(
        models,
        "water.pKwIapwsR1124",
        [](auto temperature_degC) {
            return chem::iapws_water_ionization::pkw(chem::iapws_water_ionization::k_r11_24,
                                                     temperature_degC + chem::k_zero_celsius_K,
                                                     density_g_cm3(temperature_degC));
        },
        pkw(),
        k_liquid_degC);
    add_by_temperature(
        models,
        "water.pKwIapwsR1107",
        [](auto temperature_degC) {
            return chem::iapws_water_ionization::pkw(chem::iapws_water_ionization::k_r11_07,
                                                     temperature_degC + chem::k_zero_celsius_K,
                                                     density_g_cm3(temperature_degC));
        },
        pkw(),
        k_liquid_degC);
    add_by_temperature(
        models,
        "water.pKwMarshallFranck1981",
        [](auto temperature_degC) {
            return chem::marshall_franck_1981::pkw(temperature_degC + chem::k_zero_celsius_K,
                                                   density_g_cm3(temperature_degC));
        },
        pkw(),
        k_liquid_degC);
    add_by_temperature(
        models,
        "water.pKwHarnedOwen",
        [](auto temperature_degC) {
            return chem::harned_owen::pkw(temperature_degC + chem::k_zero_celsius_K);
        },
        pkw(),
        k_harned_owen_degC);
    add_by_temperature(
        models,
        "water.densityKell1975",
        [](auto temperature_degC) { return density_g_cm3(temperature_degC); },
        result("density", "g/cm3"),
        k_liquid_degC);
    add_by_temperature(
        models,
        "water.neutralPH",
        [](auto temperature_degC) { return chem::neutral_ph::at_temperature(temperature_degC); },
        result("pH", "1"),
        k_liquid_degC);
}

}  // namespace isohydric::engine
