// The synthesis in words: the reading, the alternatives, what hides, what is missing. Never a cause, never a treatment.
#include "isohydric/engine/explain.hpp"
#include "isohydric/interpret/detail/assemble.hpp"
#include "isohydric/interpret/words.hpp"
#include "isohydric/rule/sentence.hpp"

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

/// The first explanation with what its statement says of the specimen; without a disorder, the statement tells why.
std::string as_reading(const ExplanationResult& explanation) {
    const std::string& statement = explanation.statement;
    if (explanation.disorders.empty()) {
        return statement.starts_with("no ") ? statement : "no disorder: " + statement;
    }
    const std::size_t reservation = statement.find(';');
    return with_response(explanation) +
           (reservation == std::string::npos ? std::string() : statement.substr(reservation));
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

/// Said after a sentence that rests on a limit which belongs to an analyser and was not replaced.
std::string whose_limit(bool shipped) {
    return shipped ? " (shipped limit, not your laboratory's)" : "";
}

bool contains(const std::vector<std::string>& ids, const std::string& id) {
    return std::find(ids.begin(), ids.end(), id) != ids.end();
}

/// Whether a kind of acidosis that the explanation names was told by such a limit.
bool kind_rests_on_shipped_limit(const Interpretation& so_far,
                                 const ExplanationResult& explanation) {
    return std::any_of(
        so_far.findings.begin(), so_far.findings.end(), [&](const FindingResult& finding) {
            return finding.state == Truth::yes && finding.shipped_limit &&
                   std::any_of(
                       finding.asserts.begin(), finding.asserts.end(), [&](const std::string& id) {
                           return contains(explanation.disorders, id);
                       });
        });
}

void add_reading(const Interpretation& so_far, std::vector<std::string>& said) {
    if (so_far.explanations.empty()) {
        said.emplace_back("No combination of disorders can be judged from what was given.");
        return;
    }
    const ExplanationResult& first = so_far.explanations.front();
    said.push_back(
        "Reading: " + as_reading(first) + whose_limit(kind_rests_on_shipped_limit(so_far, first)) +
        (first.unchecked ? " [rests on a value not checked against its source: " + first.id + "]."
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

/// The values that a sentence says; limits are not news.
std::vector<std::string> numbers_said(const std::string& sentence) {
    std::vector<std::string> names;
    for (const rule::SentencePlace& place : rule::find_places(sentence).places) {
        if (!place.name.starts_with("limits.")) {
            names.emplace_back(place.name);
        }
    }
    return names;
}

/// Tells which of the findings that hold change what a reader thinks after the reading itself.
class Selection {
  public:
    Selection(const Interpretation& so_far, const rule::RuleSet& rules)
        : so_far_(so_far), rules_(rules) {
        for (std::size_t i = 0; i < rules.criticals.size(); ++i) {
            const bool said = std::any_of(
                so_far.critical.begin(), so_far.critical.end(), [&](const CriticalValue& value) {
                    return value.id == rules.criticals[i].head.id;
                });
            if (said) {
                said_.push_back(numbers_said(rules.criticals[i].states));
            }
        }
        for (std::size_t i = 0; i < so_far.findings.size(); ++i) {
            if (so_far.findings[i].state == Truth::yes && !so_far.findings[i].asserts.empty()) {
                said_.push_back(numbers_said(rules.findings[i].states));
            }
        }
    }

    /// Results stand in the order of the rules.
    [[nodiscard]] bool tells(std::size_t index) const {
        const FindingResult& finding = so_far_.findings[index];
        if (finding.state != Truth::yes || finding.statement.empty()) {
            return false;
        }
        if (so_far_.explanations.empty()) {
            return true;
        }
        return finding.asserts.empty() ? adds_numbers(rules_.findings[index])
                                       : differs_from_reading(finding);
    }

  private:
    /// A row of a table names the pattern that the reading explains; a sentence about numbers that a critical value or an
    /// asserting finding has given already repeats it.
    [[nodiscard]] bool adds_numbers(const rule::Finding& finding) const {
        if (!finding.table.empty()) {
            return false;
        }
        const std::vector<std::string> names = numbers_said(finding.states);
        return names.empty() || std::none_of(said_.begin(), said_.end(), [&](const auto& other) {
                   return std::all_of(names.begin(), names.end(), [&](const std::string& name) {
                       return contains(other, name);
                   });
               });
    }

    /// Whether a finding asserts a main disorder that the reading leaves out, or another approach anything that it does.
    [[nodiscard]] bool differs_from_reading(const FindingResult& finding) const {
        const ExplanationResult& reading = so_far_.explanations.front();
        const std::optional<std::uint32_t> entry = rules_.find_explanation(reading.id);
        const bool same_approach =
            entry && rules_.explanations[*entry].approach == finding.approach;
        return std::any_of(
            finding.asserts.begin(), finding.asserts.end(), [&](const std::string& id) {
                const std::optional<std::uint32_t> disorder = rules_.find_disorder(id);
                const bool main = disorder && rules_.disorders[*disorder].main;
                return (main || !same_approach) && !contains(reading.disorders, id);
            });
    }

    const Interpretation& so_far_;
    const rule::RuleSet& rules_;
    std::vector<std::vector<std::string>> said_;
};

std::string ended(std::string statement) {
    return statement.ends_with('.') ? statement : statement + ".";
}

void add_findings(const Interpretation& so_far,
                  const rule::RuleSet& rules,
                  std::vector<std::string>& said) {
    const Selection selection(so_far, rules);
    for (std::size_t i = 0; i < so_far.findings.size(); ++i) {
        const FindingResult& finding = so_far.findings[i];
        if (selection.tells(i)) {
            said.push_back(
                ended(capitalised(finding.statement) + whose_limit(finding.shipped_limit)));
        }
    }
}

}  // namespace

std::vector<std::string> sentences(const Interpretation& so_far, const Evaluation& evaluation) {
    std::vector<std::string> said;
    if (!so_far.interpretable) {
        for (const CheckResult& check : so_far.checks) {
            if (check.outcome == Outcome::stop) {
                said.push_back("Not interpretable: " + ended(check.detail));
            }
        }
    } else {
        add_reading(so_far, said);
    }
    add_findings(so_far, evaluation.rules(), said);
    return said;
}

}  // namespace isohydric::interpret
