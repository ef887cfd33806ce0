// How a template of chem becomes a model that rules can call: its ports, and a loop over rows.
#pragma once

#include "isohydric/chem/domain.hpp"
#include "isohydric/engine/columns.hpp"
#include "isohydric/engine/models.hpp"

#include <array>
#include <cstddef>
#include <limits>
#include <string>
#include <utility>
#include <vector>

namespace isohydric::engine {

/// A registered model.
struct Model {
    rule::ModelSignature signature;
    void (*evaluate)(const rule::ModelSignature& signature, const ModelColumns& columns) = nullptr;
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

/// One input of a model over rows.
struct ModelInput {
    const double* __restrict values;
    const std::uint8_t* __restrict missing;
    double low, high;

    /// 1 where it is missing or outside its domain, by the signs of the distances to the ends (-0 made 0).
    [[nodiscard]] Flag unusable(std::size_t row) const {
        const auto above_low = std::bit_cast<Flag>((values[row] - low) + 0.0);
        const auto below_high = std::bit_cast<Flag>((high - values[row]) + 0.0);
        return missing[row] | ((above_low | below_high) >> 63);
    }
};

/// Applies a formula, a lambda that captures nothing, to each row whose inputs are all present and in their domains.
template <typename Formula, std::size_t... Input>
void evaluate_rows(const rule::ModelSignature& signature, const ModelColumns& columns) {
    const std::array<ModelInput, sizeof...(Input)> inputs{
        ModelInput{columns.values[Input],
                   columns.missing[Input],
                   signature.inputs[Input].low,
                   signature.inputs[Input].high}...};
    double* __restrict result = columns.result;
    std::uint8_t* __restrict result_missing = columns.result_missing;
    const std::size_t rows = columns.rows;
    for (std::size_t row = 0; row < rows; ++row) {
        const double value = Formula{}(inputs[Input].values[row]...);
        const Flag absent = (... | inputs[Input].unusable(row)) | not_finite(value);
        result[row] = zero_if(absent, value);
        result_missing[row] = static_cast<std::uint8_t>(absent);
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
