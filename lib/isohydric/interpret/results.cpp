// Checks, critical values, quantities and findings: what each entry says of the panel by itself.
#include "isohydric/interpret/detail/assemble.hpp"

#include <algorithm>

namespace isohydric::interpret {

namespace {

Outcome outcome_of(const rule::Check& check, Truth wrong) {
    switch (wrong) {
    case Truth::no:
        return Outcome::pass;
    case Truth::yes:
        return check.stops ? Outcome::stop : Outcome::warn;
    case Truth::unknown:
        break;
    }
    return Outcome::not_applicable;
}

std::string unit_text(const units::Unit& unit) {
    return unit.code() == "1" ? std::string() : unit.code();
}

std::string origin(const Evaluation& evaluation, std::uint32_t index) {
    const rule::Quantity& quantity = evaluation.rules().quantities[index];
    if (quantity.model) {
        return evaluation.rules().models[quantity.model->model].id;
    }
    const std::optional<std::size_t> alternative = evaluation.alternative(index);
    return alternative ? quantity.alternatives[*alternative].from : std::string();
}

/// Limits and their note, the same for entered values and for quantities.
template <class Result>
void set_interval(Result& result, const rule::Interval* interval) {
    if (interval == nullptr) {
        return;
    }
    result.low = interval->low;
    result.high = interval->high;
    result.interval_note = interval->shown_as;
    if (interval->shipped_default) {
        result.interval_note += result.interval_note.empty() ? "" : "; ";
        result.interval_note += "shipped limit, not your laboratory's";
    }
}

QuantityResult quantity_result(const Evaluation& evaluation, std::uint32_t index) {
    const rule::Quantity& quantity = evaluation.rules().quantities[index];
    QuantityResult result;
    result.name = quantity.head.id;
    result.label = quantity.label;
    result.value = evaluation.number(evaluation.program().quantity(index));
    result.unit = unit_text(quantity.unit);
    result.decimals = quantity.decimals;
    result.from = origin(evaluation, index);
    result.sources = quantity.head.sources;
    set_interval(result, evaluation.interval(quantity.interval));
    return result;
}

FindingResult finding_result(const Evaluation& evaluation,
                             const Contradicted& contradicted,
                             std::uint32_t index) {
    const rule::RuleSet& rules = evaluation.rules();
    const rule::Finding& finding = rules.findings[index];
    FindingResult result;
    result.id = finding.head.id;
    result.label = finding.label;
    result.approach = finding.approach;
    result.sources = finding.head.sources;
    for (const std::uint32_t disorder : finding.asserts) {
        result.asserts.push_back(rules.disorders[disorder].head.id);
    }
    result.state = contradicted.finding(index)
                       ? Truth::unknown
                       : evaluation.truth(evaluation.program().finding(index));
    if (result.state == Truth::yes) {
        result.statement = evaluation.fill(finding.states);
        result.because = evaluation.because(*finding.when);
        result.consider = finding.consider;
        result.shipped_limit = evaluation.rests_on_shipped_limit(*finding.when);
    } else if (result.state == Truth::unknown) {
        for (const panel::Analyte analyte : evaluation.needs(*finding.when)) {
            result.needs.emplace_back(panel::id_of(analyte));
        }
    }
    return result;
}

}  // namespace

std::vector<CheckResult> check_results(const Evaluation& evaluation) {
    std::vector<CheckResult> results;
    const rule::RuleSet& rules = evaluation.rules();
    for (std::uint32_t i = 0; i < rules.checks.size(); ++i) {
        const rule::Check& check = rules.checks[i];
        CheckResult result{check.head.id,
                           outcome_of(check, evaluation.truth(evaluation.program().check(i))),
                           {},
                           check.head.sources};
        if (result.outcome == Outcome::warn || result.outcome == Outcome::stop) {
            result.detail = evaluation.fill(check.states);
        }
        results.push_back(std::move(result));
    }
    return results;
}

std::vector<CriticalValue> critical_values(const Evaluation& evaluation) {
    std::vector<CriticalValue> results;
    const rule::RuleSet& rules = evaluation.rules();
    for (std::uint32_t i = 0; i < rules.criticals.size(); ++i) {
        const rule::Critical& critical = rules.criticals[i];
        if (evaluation.truth(evaluation.program().critical(i)) != Truth::yes) {
            continue;
        }
        CriticalValue result{
            critical.head.id, evaluation.fill(critical.states), 0, {}, 0, critical.head.sources};
        if (critical.value.kind == rule::SymbolKind::analyte) {
            const panel::AnalyteInfo& info = rules.catalogue->analytes[critical.value.index];
            result.value = evaluation.panel().values[critical.value.index]->value;
            result.unit = unit_text(info.unit);
            result.decimals = info.decimals;
        } else {
            const rule::Quantity& quantity = rules.quantities[critical.value.index];
            result.value =
                evaluation.number(evaluation.program().quantity(critical.value.index)).value_or(0);
            result.unit = unit_text(quantity.unit);
            result.decimals = quantity.decimals;
        }
        results.push_back(std::move(result));
    }
    return results;
}

std::vector<AnalyteResult> analyte_results(const Evaluation& evaluation) {
    std::vector<AnalyteResult> results;
    for (std::size_t i = 0; i < panel::k_analyte_count; ++i) {
        if (evaluation.panel().values[i]) {
            AnalyteResult result;
            result.analyte = static_cast<panel::Analyte>(i);
            set_interval(result, evaluation.interval(std::string(panel::k_analyte_ids[i])));
            results.push_back(std::move(result));
        }
    }
    return results;
}

std::vector<QuantityResult> quantity_results(const Evaluation& evaluation,
                                             const Contradicted& contradicted) {
    std::vector<QuantityResult> results;
    const rule::RuleSet& rules = evaluation.rules();
    for (std::uint32_t i = 0; i < rules.quantities.size(); ++i) {
        if (!rules.quantities[i].internal && !contradicted.quantity(i)) {
            results.push_back(quantity_result(evaluation, i));
        }
    }
    return results;
}

std::vector<FindingResult> finding_results(const Evaluation& evaluation,
                                           const Contradicted& contradicted) {
    std::vector<FindingResult> results;
    results.reserve(evaluation.rules().findings.size());
    for (std::uint32_t i = 0; i < evaluation.rules().findings.size(); ++i) {
        results.push_back(finding_result(evaluation, contradicted, i));
    }
    return results;
}

}  // namespace isohydric::interpret
