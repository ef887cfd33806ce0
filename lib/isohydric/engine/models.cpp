// The register of chemistry models.
#include "isohydric/engine/models.hpp"

#include "isohydric/engine/model_registry.hpp"

namespace isohydric::engine {

namespace {

[[nodiscard]] const Models& all_models() {
    static const Models k_models = [] {
        Models models;
        add_carbonic_acid_models(models);
        add_base_excess_models(models);
        add_standard_bicarbonate_models(models);
        add_osmolality_models(models);
        add_temperature_models(models);
        add_water_models(models);
        return models;
    }();
    return k_models;
}

}  // namespace

std::span<const rule::ModelSignature> model_signatures() {
    static const std::vector<rule::ModelSignature> k_signatures = [] {
        std::vector<rule::ModelSignature> signatures;
        for (const Model& model : all_models()) {
            signatures.push_back(model.signature);
        }
        return signatures;
    }();
    return k_signatures;
}

void evaluate_model(std::uint32_t model, const ModelColumns& columns) {
    const Model& chosen = all_models().at(model);
    chosen.evaluate(chosen.signature, columns);
}

}  // namespace isohydric::engine
