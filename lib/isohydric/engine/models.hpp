// The chemistry models that rules may call, with the units and domains of their inputs.
#pragma once

#include "isohydric/rule/rule_set.hpp"

#include <span>

namespace isohydric::engine {

/// Signatures of every registered model, for the rule reader. The order is the model's index.
[[nodiscard]] std::span<const rule::ModelSignature> model_signatures();

/// Evaluates one model over a column of rows. A row whose input is missing or outside the domain gets a missing result.
/// `inputs[i]` are arrays of `rows` values and masks in the order of the signature.
struct ModelColumns {
    std::span<const double* const> values;
    std::span<const std::uint8_t* const> missing;
    double* result;
    std::uint8_t* result_missing;
    std::size_t rows;
};

void evaluate_model(std::uint32_t model, const ModelColumns& columns);

}  // namespace isohydric::engine
