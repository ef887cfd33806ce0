// The synthesis in words: the reading, the alternatives, what hides, what is missing. Never a cause, never a treatment.
#include "isohydric/engine/explain.hpp"
#include "isohydric/interpret/detail/assemble.hpp"
#include "isohydric/interpret/words.hpp"

#include <algorithm>

#include <fmt/format.h>

namespace isohydric::interpret {

namespace {

std::string with_response(const ExplanationResult& explanation) {
    std::string text = disorder_words(explanation.disorders) + onset_words(explanation.onsets);
    if (explanation.fit == Fit::early) {
        const std::size_t comma = explanation.statement.rfind(", if ");
        return comma == std::string::npos ? text : text + explanation.statement.substr(comma);
    }
    if (explanation.miss) {
        text += fmt::format(", missed by {} {}",
                            engine::printed(*explanation.miss, 1),
                            unit_words(explanation.miss_unit));
    }
    return text;
}

std::string compensation_words(const CompensationResult& band) {
    const double limit = band.state == BandState::above ? band.expected_high : band.expected_low;
    return fmt::format("{} {} {}, {} {} to {} ({})",
                       band.quantity,
                       engine::printed(band.measured, band.decimals, limit),
                       unit_words(band.unit),
                       band.state == BandState::within  ? "within the expected"
                       : band.state == BandState::above ? "above the expected"
                                                        : "below the expected",
                       engine::printed(band.expected_low, band.decimals),
                       engine::printed(band.expected_high, band.decimals),
                       band.from);
}

void add_reading(const Interpretation& so_far, std::vector<std::string>& said) {
    if (so_far.explanations.empty()) {
        said.emplace_back("No combination of disorders can be judged from what was given.");
        return;
    }
    const ExplanationResult& first = so_far.explanations.front();
    said.push_back("Reading: " + with_response(first) +
                   (first.unchecked
                        ? " [rests on a value not checked against its source: " + first.id + "]."
                        : "."));
    if (first.compensation) {
        said.push_back(capitalised(compensation_words(*first.compensation)) + ".");
    }
    for (std::size_t i = 1; i < so_far.explanations.size(); ++i) {
        const ExplanationResult& other = so_far.explanations[i];
        const std::string_view lead = other.fit == Fit::fits    ? "Fits as well: "
                                      : other.fit == Fit::early ? "Possible: "
                                                                : "Nearly fits: ";
        said.push_back(std::string(lead) + with_response(other) + ".");
    }
}

void add_findings(const Interpretation& so_far, std::vector<std::string>& said) {
    for (const FindingResult& finding : so_far.findings) {
        if (finding.state == Truth::yes && !finding.statement.empty()) {
            said.push_back(
                capitalised(finding.statement) +
                (finding.shipped_limit ? " (shipped limit, not your laboratory's)." : "."));
        }
    }
}

}  // namespace

std::vector<std::string> sentences(const Interpretation& so_far, const Evaluation&) {
    std::vector<std::string> said;
    if (!so_far.interpretable) {
        for (const CheckResult& check : so_far.checks) {
            if (check.outcome == Outcome::stop) {
                said.push_back("Not interpretable: " + check.detail);
            }
        }
    } else {
        add_reading(so_far, said);
    }
    add_findings(so_far, said);
    return said;
}

}  // namespace isohydric::interpret
