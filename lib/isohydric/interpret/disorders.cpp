// What each approach says of each disorder, and what would help to say more.
#include "isohydric/interpret/detail/assemble.hpp"

#include <algorithm>

namespace isohydric::interpret {

namespace {

constexpr std::string_view k_explaining_approach = "bicarbonate";

bool contains(const std::vector<std::string>& list, std::string_view wanted) {
    return std::find(list.begin(), list.end(), wanted) != list.end();
}

Verdict verdict_of(Truth truth) {
    return truth == Truth::yes ? Verdict::yes : truth == Truth::no ? Verdict::no : Verdict::unknown;
}

/// `or` over the findings of an approach that assert the disorder; silent if there are none.
Verdict
asserted(const Interpretation& so_far, std::string_view disorder, std::string_view approach) {
    Verdict verdict = Verdict::silent;
    for (const FindingResult& finding : so_far.findings) {
        if (finding.approach != approach || !contains(finding.asserts, disorder)) {
            continue;
        }
        const Verdict said = verdict_of(finding.state);
        if (said == Verdict::yes || verdict == Verdict::silent ||
            (said == Verdict::unknown && verdict == Verdict::no)) {
            verdict = said;
        }
        if (verdict == Verdict::yes) {
            break;
        }
    }
    return verdict;
}

/// A main disorder is there if every fitting explanation has it, absent if none has; else it depends on the explanation.
Verdict explained(const Interpretation& so_far,
                  const Evaluation& evaluation,
                  const rule::Disorder& disorder) {
    if (disorder.judged_when &&
        evaluation.truth(evaluation.program().node(*disorder.judged_when)) != Truth::yes) {
        return Verdict::unknown;
    }
    std::size_t fitting = 0;
    std::size_t having = 0;
    for (const ExplanationResult& explanation : so_far.explanations) {
        if (explanation.fit == Fit::fits) {
            ++fitting;
            having += contains(explanation.disorders, disorder.head.id) ? 1U : 0U;
        }
    }
    if (fitting == 0 || (having != 0 && having != fitting)) {
        return Verdict::unknown;
    }
    return having == fitting ? Verdict::yes : Verdict::no;
}

/// A kind is asserted only together with its main disorder.
Verdict kind_verdict(Verdict main, Verdict kind) {
    if (main == Verdict::no || kind == Verdict::no) {
        return Verdict::no;
    }
    return main == Verdict::yes ? kind : Verdict::unknown;
}

Verdict verdict(const Interpretation& so_far,
                const Evaluation& evaluation,
                const rule::Disorder& disorder,
                std::string_view approach) {
    if (!contains(disorder.approaches, approach)) {
        return Verdict::silent;
    }
    if (approach != k_explaining_approach) {
        return asserted(so_far, disorder.head.id, approach);
    }
    if (disorder.main) {
        return explained(so_far, evaluation, disorder);
    }
    const Verdict kind = asserted(so_far, disorder.head.id, approach);
    if (kind == Verdict::silent || !disorder.kind_of) {
        return kind;
    }
    return kind_verdict(
        explained(so_far, evaluation, evaluation.rules().disorders[*disorder.kind_of]), kind);
}

/// Analytes missing from the alternatives of a shown quantity that come before the one that counted.
void add_better_alternatives(const Evaluation& evaluation, std::vector<std::string>& wanted) {
    const rule::RuleSet& rules = evaluation.rules();
    for (std::uint32_t i = 0; i < rules.quantities.size(); ++i) {
        const rule::Quantity& quantity = rules.quantities[i];
        const std::optional<std::size_t> counted = evaluation.alternative(i);
        if (quantity.internal || !counted || *counted == 0) {
            continue;
        }
        for (const panel::Analyte analyte :
             evaluation.needs(*quantity.alternatives.front().formula)) {
            wanted.emplace_back(panel::id_of(analyte));
        }
    }
}

}  // namespace

std::vector<DisorderResult> disorder_results(const Interpretation& so_far,
                                             const Evaluation& evaluation) {
    std::vector<DisorderResult> results;
    for (const rule::Disorder& disorder : evaluation.rules().disorders) {
        DisorderResult result;
        result.id = disorder.head.id;
        result.label = disorder.label;
        result.bicarbonate = verdict(so_far, evaluation, disorder, k_explaining_approach);
        result.base_excess = verdict(so_far, evaluation, disorder, "base-excess");
        result.strong_ion = verdict(so_far, evaluation, disorder, "strong-ion");
        results.push_back(std::move(result));
    }
    return results;
}

std::vector<std::string> would_help(const Interpretation& so_far, const Evaluation& evaluation) {
    std::vector<std::string> wanted;
    add_better_alternatives(evaluation, wanted);
    for (const FindingResult& finding : so_far.findings) {
        const bool open = finding.state == Truth::unknown && !finding.asserts.empty();
        const bool matters = std::any_of(
            so_far.disorders.begin(), so_far.disorders.end(), [&](const DisorderResult& disorder) {
                return contains(finding.asserts, disorder.id) &&
                       (disorder.bicarbonate == Verdict::unknown ||
                        disorder.base_excess == Verdict::unknown ||
                        disorder.strong_ion == Verdict::unknown);
            });
        if (open && matters) {
            wanted.insert(wanted.end(), finding.needs.begin(), finding.needs.end());
        }
    }
    std::vector<std::string> ordered;
    for (const std::string_view id : panel::k_analyte_ids) {
        if (contains(wanted, id)) {
            ordered.emplace_back(id);
        }
    }
    return ordered;
}

}  // namespace isohydric::interpret
