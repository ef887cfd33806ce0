#include "isohydric/rule/detail/entry_reader.hpp"

#include "isohydric/diag/text.hpp"

#include <algorithm>
#include <array>
#include <utility>

#include <fmt/format.h>

namespace isohydric::rule::detail {
namespace {

std::vector<std::uint32_t>
read_analytes(diag::ObjectReader& reader, std::string_view name, const EntryContext& context) {
    std::vector<std::uint32_t> indices;
    for (const Written& id : read_list(reader, name, context.report)) {
        if (const auto index = read_word(id, panel::k_analyte_ids, "analyte", context.report)) {
            indices.push_back(static_cast<std::uint32_t>(*index));
        }
    }
    return indices;
}

Symbol read_value_name(diag::ObjectReader& reader, const EntryContext& context) {
    const diag::Json* value = reader.required("value", diag::Kind::string);
    if (value == nullptr) {
        return {};
    }
    const auto named = context.names.find(value->text());
    const bool fits = named && (named->symbol.kind == SymbolKind::analyte ||
                                named->symbol.kind == SymbolKind::quantity);
    if (!fits) {
        context.report.error(
            "rule-value-name",
            value->place(),
            fmt::format("\"{}\" is no analyte or quantity; name the number that "
                        "is critical, as expressions do{}",
                        value->text(),
                        diag::did_you_mean(value->text(), context.names.candidates())));
        return {};
    }
    return named->symbol;
}

void put_table(const Declared& declared, RuleSet& rules, const EntryContext& context) {
    TableRows rows = read_table(*declared.json, context);
    rows.table.rows = rules.tables[declared.index].rows;
    rules.tables[declared.index] = std::move(rows.table);
    for (Finding& finding : rows.findings) {
        if (const auto index = rules.find_finding(finding.head.id)) {
            rules.findings[*index] = std::move(finding);
        }
    }
    for (Check& check : rows.checks) {
        if (const auto index = rules.find(check.head.id, EntryKind::check)) {
            rules.checks[*index] = std::move(check);
        }
    }
}

template <class Entry>
void put_member(Entry entry, const Declared& declared, std::vector<Entry>& entries) {
    if (declared.in_force) {
        entry.convention = declared.convention;
        entries[declared.index] = std::move(entry);
    }
}

}  // namespace

void read_entry(const Declared& declared, RuleSet& rules, const EntryContext& context) {
    const diag::Json& json = *declared.json;
    const std::uint32_t at = declared.index;
    switch (declared.kind) {
    case EntryKind::quantity:
        put_member(read_quantity(json, context), declared, rules.quantities);
        break;
    case EntryKind::condition:
        put_member(read_condition(json, context), declared, rules.conditions);
        break;
    case EntryKind::interval:
        rules.intervals[at] = read_interval(json, context);
        break;
    case EntryKind::finding:
        rules.findings[at] = read_finding(json, context);
        break;
    case EntryKind::table:
        put_table(declared, rules, context);
        break;
    case EntryKind::explanation:
        rules.explanations[at] = read_explanation(json, context);
        break;
    case EntryKind::group:
        rules.groups[at] = read_group(json, context);
        break;
    case EntryKind::check:
        rules.checks[at] = read_check(json, context);
        break;
    case EntryKind::critical:
        rules.criticals[at] = read_critical(json, context);
        break;
    case EntryKind::disorder:
        rules.disorders[at] = read_disorder(json, context);
        break;
    case EntryKind::convention:
        rules.conventions[at] = read_convention(json, std::move(rules.conventions[at]), context);
        break;
    }
}

Condition read_condition(const diag::Json& json, const EntryContext& context) {
    diag::ObjectReader reader(json, context.report, "condition");
    Condition condition;
    condition.head = read_head(reader, context);
    condition.when = read_truth(reader, "when", context);
    reader.finish();
    return condition;
}

void read_statement(diag::ObjectReader& reader, Finding& finding, const EntryContext& context) {
    finding.label = reader.optional_text("label").value_or("");
    finding.unless = read_references(reader, "unless", EntryKind::finding, context);
    finding.asserts = read_references(reader, "asserts", EntryKind::disorder, context);
    finding.consider = read_texts(reader, "consider", context.report);
}

Finding read_finding(const diag::Json& json, const EntryContext& context) {
    diag::ObjectReader reader(json, context.report, "finding");
    Finding finding;
    finding.head = read_head(reader, context);
    finding.approach = read_approach(reader, context);
    finding.when = read_truth(reader, "when", context);
    finding.states = read_sentence(reader, "states", context);
    read_statement(reader, finding, context);
    reader.finish();
    return finding;
}

Check read_check(const diag::Json& json, const EntryContext& context) {
    constexpr std::array<std::string_view, 2> k_outcomes{"warns", "stops"};
    diag::ObjectReader reader(json, context.report, "check");
    Check check;
    check.head = read_head(reader, context);
    check.when = read_truth(reader, "when", context);
    if (const diag::Json* then = reader.required("then", diag::Kind::string)) {
        check.stops = read_word(written(*then), k_outcomes, "outcome", context.report) == 1U;
    }
    check.states = read_sentence(reader, "states", context);
    check.contradicts = read_analytes(reader, "contradicts", context);
    reader.finish();
    return check;
}

Critical read_critical(const diag::Json& json, const EntryContext& context) {
    diag::ObjectReader reader(json, context.report, "critical value");
    Critical critical;
    critical.head = read_head(reader, context);
    critical.when = read_truth(reader, "when", context);
    critical.states = read_sentence(reader, "states", context);
    critical.value = read_value_name(reader, context);
    reader.finish();
    return critical;
}

Disorder read_disorder(const diag::Json& json, const EntryContext& context) {
    diag::ObjectReader reader(json, context.report, "disorder");
    Disorder disorder;
    disorder.head = read_head(reader, context);
    disorder.label = reader.required_text("label").value_or("");
    disorder.main = reader.optional_bool("main").value_or(false);
    if (const auto kind_of = read_written(reader, "kindOf")) {
        disorder.kind_of = refer(*kind_of, EntryKind::disorder, context);
        if (disorder.main ||
            (disorder.kind_of && !context.rules.disorders[*disorder.kind_of].main)) {
            context.report.error("rule-disorder-kind",
                                 kind_of->place,
                                 "\"kindOf\" makes a disorder a kind of a main one; it must name a "
                                 "main disorder and stand in one that is not");
        }
    }
    disorder.judged_when = read_optional_formula(reader, "judgedWhen", k_wanted_truth, context);
    for (const Written& approach : read_list(reader, "approaches", context.report)) {
        disorder.approaches.push_back(checked_approach(approach, context.report));
    }
    reader.finish();
    return disorder;
}

Convention
read_convention(const diag::Json& json, Convention declared, const EntryContext& context) {
    diag::ObjectReader reader(json, context.report, "convention");
    declared.head = read_head(reader, context);
    reader.required_text("choice");
    declared.title = reader.required_text("title").value_or("");
    declared.why = reader.required_text("why").value_or("");
    // The members are entries of their own.
    reader.optional("quantities", diag::Kind::array);
    reader.optional("conditions", diag::Kind::array);
    reader.finish();
    return declared;
}

}  // namespace isohydric::rule::detail
