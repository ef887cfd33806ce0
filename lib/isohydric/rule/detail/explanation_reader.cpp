// Reads explanations: combinations of disorders with the band that each expects.
#include "isohydric/rule/detail/entry_reader.hpp"

#include <array>

namespace isohydric::rule::detail {
namespace {

// In the order of the enumeration, whose first value, none, is written null.
constexpr std::array<std::string_view, 4> k_onsets{
    "acute", "chronic", "acute-on-chronic", "baseline"};

Onset read_onset(diag::ObjectReader& reader, const EntryContext& context) {
    const auto word = read_written(reader, "onset");
    const auto index = word ? read_word(*word, k_onsets, "onset", context.report) : std::nullopt;
    return index ? static_cast<Onset>(*index + 1) : Onset::none;
}

std::optional<Compensation> read_compensation(diag::ObjectReader& entry,
                                              const EntryContext& context) {
    const diag::Json* json = entry.optional("compensation", diag::Kind::object);
    if (json == nullptr) {
        return std::nullopt;
    }
    diag::ObjectReader reader(*json, context.report, "compensation");
    Compensation compensation;
    Wanted wanted{.type = Type::number, .unit = std::nullopt};
    if (const diag::Json* quantity = reader.required("quantity", diag::Kind::string)) {
        if (const auto index = refer(written(*quantity), EntryKind::quantity, context)) {
            compensation.quantity = *index;
            wanted.unit = context.rules.quantities[*index].unit;
        }
    }
    compensation.low = read_optional_formula(reader, "low", wanted, context);
    compensation.high = read_optional_formula(reader, "high", wanted, context);
    compensation.from = reader.required_text("from").value_or("");
    if (json->find("low") == nullptr && json->find("high") == nullptr) {
        context.report.error("rule-interval-empty",
                             json->place(),
                             "a compensation band needs \"low\", \"high\" or both");
    }
    reader.finish();
    return compensation;
}

void read_early(diag::ObjectReader& entry, Explanation& explanation, const EntryContext& context) {
    const diag::Json* json = entry.optional("early", diag::Kind::object);
    if (json == nullptr) {
        return;
    }
    diag::ObjectReader reader(*json, context.report, "early explanation");
    reader.required("beside", diag::Kind::array);
    explanation.early_beside = read_main_disorders(reader, "beside", context);
    explanation.early_states = read_sentence(reader, "states", context);
    if (reader.any("when") != nullptr) {
        explanation.early_when = read_truth(reader, "when", context);
    }
    reader.finish();
}

}  // namespace

Explanation read_explanation(const diag::Json& json, const EntryContext& context) {
    diag::ObjectReader reader(json, context.report, "explanation");
    Explanation explanation;
    explanation.head = read_head(reader, context);
    explanation.approach = read_approach(reader, context);
    reader.required("disorders", diag::Kind::array);
    explanation.disorders = read_main_disorders(reader, "disorders", context);
    explanation.onset = read_onset(reader, context);
    explanation.when = read_truth(reader, "when", context);
    explanation.compensation = read_compensation(reader, context);
    read_early(reader, explanation, context);
    explanation.states = read_sentence(reader, "states", context);
    reader.finish();
    return explanation;
}

}  // namespace isohydric::rule::detail
