#include "isohydric/rule/detail/entry_fields.hpp"

#include "isohydric/diag/text.hpp"
#include "isohydric/rule/sentence.hpp"

#include <algorithm>
#include <array>
#include <utility>

#include <fmt/format.h>

namespace isohydric::rule::detail {
namespace {

constexpr std::array<std::string_view, 4> k_approaches{
    "general", "bicarbonate", "base-excess", "strong-ion"};
constexpr std::string_view k_common_practice = "common-practice";

Citation read_citation(const diag::Json& source, diag::Report& report) {
    diag::ObjectReader reader(source, report, "source");
    Citation citation;
    citation.ref = reader.required_text("ref").value_or("");
    citation.at = reader.optional_text("at").value_or("");
    citation.checked = reader.optional_bool("checked").value_or(true);
    citation.note = reader.optional_text("note").value_or("");
    reader.finish();
    const bool common = citation.ref == k_common_practice;
    if (!citation.ref.empty() && common != citation.at.empty()) {
        report.error("rule-source-place",
                     source.place(),
                     common ? "common practice has no place; take \"at\" out, or name a work in "
                              "\"ref\""
                            : "a source needs its place: add \"at\" with page, table or section");
    }
    return citation;
}

std::vector<std::string> ids_of_kind(const RuleSet& rules, EntryKind kind) {
    std::vector<std::string> ids;
    for (const auto& [id, entry] : rules.by_id) {
        if (entry.kind == kind) {
            ids.push_back(id);
        }
    }
    return ids;
}

void check_place_in_sentence(const diag::Json& sentence,
                             const SentencePlace& place,
                             const EntryContext& context) {
    const auto named = context.names.find(place.name);
    if (named && named->type == Type::number) {
        return;
    }
    context.report.error(
        "rule-sentence",
        diag::string_place(sentence, place.begin, place.end),
        named ? fmt::format("{{{}}} is no number and cannot be put into a sentence", place.name)
              : fmt::format("nothing is called \"{}\"; a place in a sentence names a quantity, an "
                            "analyte or a limit{}",
                            place.name,
                            diag::did_you_mean(place.name, context.names.candidates())));
}

}  // namespace

std::vector<Citation> read_citations(const diag::Json& source, diag::Report& report) {
    if (source.kind() != diag::Kind::array) {
        return {read_citation(source, report)};
    }
    std::vector<Citation> citations;
    for (const diag::Json& item : source.items()) {
        citations.push_back(read_citation(item, report));
    }
    if (citations.empty()) {
        report.error("rule-source-place",
                     source.place(),
                     "no source is named; name one, or {\"ref\": \"common-practice\"}");
    }
    return citations;
}

EntryHead read_head(diag::ObjectReader& reader, const EntryContext& context) {
    EntryHead head;
    if (const diag::Json* id = reader.required("id", diag::Kind::string)) {
        head.id = id->text();
        head.place = id->place();
    }
    if (const diag::Json* source = reader.any("source")) {
        head.sources = read_citations(*source, context.report);
    } else {
        context.report.error("rule-source-place",
                             head.place,
                             fmt::format("\"{}\" has no \"source\"; name one, or "
                                         "{{\"ref\": \"common-practice\"}}",
                                         head.id));
    }
    if (const diag::Json* reviewed = reader.required("reviewed", diag::Kind::string)) {
        head.reviewed = checked_date(*reviewed, context.report);
    }
    head.policy = reader.optional_bool("policy").value_or(false);
    return head;
}

ExpressionPtr read_formula(diag::ObjectReader& reader,
                           std::string_view name,
                           const Wanted& wanted,
                           const EntryContext& context) {
    const diag::Json* text = reader.required(name, diag::Kind::string);
    return text == nullptr ? nullptr
                           : read_expression(*text, context.names, wanted, context.report);
}

ExpressionPtr read_optional_formula(diag::ObjectReader& reader,
                                    std::string_view name,
                                    const Wanted& wanted,
                                    const EntryContext& context) {
    const diag::Json* text = reader.optional(name, diag::Kind::string);
    return text == nullptr ? nullptr
                           : read_expression(*text, context.names, wanted, context.report);
}

ExpressionPtr
read_truth(diag::ObjectReader& reader, std::string_view name, const EntryContext& context) {
    return read_formula(reader, name, k_wanted_truth, context);
}

std::string
read_sentence(diag::ObjectReader& reader, std::string_view name, const EntryContext& context) {
    const diag::Json* sentence = reader.required(name, diag::Kind::string);
    if (sentence == nullptr) {
        return {};
    }
    const SentencePlaces found = find_places(sentence->text());
    for (const SentencePlace& place : found.places) {
        check_place_in_sentence(*sentence, place, context);
    }
    if (found.stray != std::string_view::npos) {
        context.report.error("rule-sentence",
                             diag::string_place(*sentence, found.stray, found.stray + 1),
                             "this brace has no partner; write a place as {name}");
    }
    return std::string(sentence->text());
}

std::optional<std::uint32_t> refer(const Written& id, EntryKind kind, const EntryContext& context) {
    if (const auto index = context.rules.find(id.text, kind)) {
        return index;
    }
    const auto other = context.rules.find(id.text);
    context.report.error(
        "rule-id-unknown",
        id.place,
        fmt::format("there is no {} \"{}\" in this set{}",
                    describe(kind),
                    id.text,
                    other ? fmt::format("; it is of kind {}", describe(other->kind))
                          : diag::did_you_mean(id.text, ids_of_kind(context.rules, kind))));
    return std::nullopt;
}

std::vector<std::uint32_t> read_references(diag::ObjectReader& reader,
                                           std::string_view name,
                                           EntryKind kind,
                                           const EntryContext& context) {
    std::vector<std::uint32_t> indices;
    for (const Written& id : read_list(reader, name, context.report)) {
        if (const auto index = refer(id, kind, context)) {
            indices.push_back(*index);
        }
    }
    return indices;
}

std::vector<std::uint32_t> read_main_disorders(diag::ObjectReader& reader,
                                               std::string_view name,
                                               const EntryContext& context) {
    std::vector<std::uint32_t> indices;
    for (const Written& id : read_list(reader, name, context.report)) {
        const auto index = refer(id, EntryKind::disorder, context);
        if (!index) {
            continue;
        }
        if (!context.rules.disorders[*index].main) {
            context.report.error("rule-disorder-kind",
                                 id.place,
                                 fmt::format("\"{}\" is no main disorder; explanations name main "
                                             "disorders only, kinds follow from findings",
                                             id.text));
        }
        indices.push_back(*index);
    }
    std::ranges::sort(indices);
    return indices;
}

std::string checked_approach(const Written& approach, diag::Report& report) {
    return read_word(approach, k_approaches, "approach", report) ? approach.text : std::string();
}

std::string read_approach(diag::ObjectReader& reader, const EntryContext& context) {
    const diag::Json* approach = reader.required("approach", diag::Kind::string);
    return approach == nullptr ? std::string()
                               : checked_approach(written(*approach), context.report);
}

std::vector<std::string>
read_texts(diag::ObjectReader& reader, std::string_view name, diag::Report& report) {
    std::vector<std::string> texts;
    for (Written& text : read_list(reader, name, report)) {
        texts.push_back(std::move(text.text));
    }
    return texts;
}

}  // namespace isohydric::rule::detail
