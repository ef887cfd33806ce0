// How a template of chem becomes a model that rules can call: its ports, and a loop over rows.
#pragma once

#include "isohydric/chem/domain.hpp"
#include "isohydric/engine/columns.hpp"
#include "isohydric/engine/models.hpp"

#include <cstddef>
#include <limits>
#include <string>
#include <utility>
#include <vector>

namespace isohydric::engine {

/// A registered model.
struct Model {
    rule::ModelSignature signature;
    void (*evaluate)(const rule::ModelSignature& signature, const ModelColumns& columns);
};

using Models = std::vector<Model>;

/// An input or a result: its name, UCUM unit and domain.
[[nodiscard]] inline rule::ModelPort port(std::string name, std::string unit, chem::Domain domain) {
    return {std::move(name), std::move(unit), domain.low, domain.high};
}

/// A result; any finite number is one.
[[nodiscard]] inline rule::ModelPort result(std::string name, std::string unit) {
    constexpr double k_largest = std::numeric_limits<double>::max();
    return port(std::move(name), std::move(unit), {-k_largest, k_largest});
}

/// Applies a formula, a lambda that captures nothing, to each row whose inputs are all present and in their domains.
template <typename Formula, std::size_t... Input>
void evaluate_rows(const rule::ModelSignature& signature, const ModelColumns& columns) {
    const auto usable = [&](std::size_t input, std::size_t row) {
        const double value = columns.values[input][row];
        const rule::ModelPort& domain = signature.inputs[input];
        return (columns.missing[input][row] == 0) & (value >= domain.low) & (value <= domain.high);
    };
    for (std::size_t row = 0; row < columns.rows; ++row) {
        const bool all_usable = (... & usable(Input, row));
        const double value = Formula{}(columns.values[Input][row]...);
        const bool absent = !all_usable | !is_finite(value);
        columns.result[row] = absent ? 0.0 : value;
        columns.result_missing[row] = absent ? 1 : 0;
    }
}

/// Registers a formula whose arguments are the inputs in their order.
template <typename Formula, typename... Ports>
void add_model(Models& models, std::string id, Formula, rule::ModelPort output, Ports... inputs) {
    const auto loop = []<std::size_t... Input>(std::index_sequence<Input...>) {
        return &evaluate_rows<Formula, Input...>;
    };
    models.push_back({{std::move(id), {std::move(inputs)...}, std::move(output)},
                      loop(std::index_sequence_for<Ports...>{})});
}

// The models of one part of chem each.
void add_carbonic_acid_models(Models& models);
void add_base_excess_models(Models& models);
void add_standard_bicarbonate_models(Models& models);
void add_osmolality_models(Models& models);
void add_temperature_models(Models& models);
void add_water_models(Models& models);

// Ports that several models have.
[[nodiscard]] inline rule::ModelPort ph_port() {
    return port("pH", "1", chem::usual::k_ph);
}

[[nodiscard]] inline rule::ModelPort pco2_port() {
    return port("pCO2", "mm[Hg]", chem::usual::k_pco2_mmHg);
}

[[nodiscard]] inline rule::ModelPort hco3_port() {
    return port("HCO3", "mmol/L", chem::usual::k_hco3_mmol_L);
}

[[nodiscard]] inline rule::ModelPort solubility_port() {
    return port("solubility", "mmol/L/mm[Hg]", chem::usual::k_solubility_mmol_L_mmHg);
}

[[nodiscard]] inline rule::ModelPort pk_port() {
    return port("pK", "1", chem::usual::k_pk);
}

[[nodiscard]] inline rule::ModelPort hb_g_dL_port() {
    return port("Hb", "g/dL", chem::usual::k_ct_hb_g_dL);
}

[[nodiscard]] inline rule::ModelPort hb_mmol_L_port() {
    return port("Hb", "mmol/L", chem::usual::k_ct_hb_mmol_L);
}

[[nodiscard]] inline rule::ModelPort so2_port() {
    return port("sO2", "1", chem::usual::k_so2);
}

[[nodiscard]] inline rule::ModelPort
temperature_port(chem::Domain domain = chem::usual::k_temperature_degC) {
    return port("temperature", "Cel", domain);
}

}  // namespace isohydric::engine
