// Which combinations of disorders account for the panel: those that fit and are minimal, those that fit if a response is not
// yet complete, and those missed by less than the margin of the measurement.
#include "isohydric/interpret/detail/assemble.hpp"

#include <algorithm>
#include <cmath>
#include <tuple>

namespace isohydric::interpret {

namespace {

using DisorderSet = std::vector<std::uint32_t>;  // sorted indices

/// A set of disorders with the entries (onset variants) under which it holds.
struct Candidate {
    DisorderSet disorders;
    std::vector<std::uint32_t> entries;
    Fit fit = Fit::fits;
};

constexpr std::size_t k_most_listed = 6;

bool proper_subset(const DisorderSet& smaller, const DisorderSet& larger) {
    return smaller.size() < larger.size() &&
           std::includes(larger.begin(), larger.end(), smaller.begin(), smaller.end());
}

std::vector<std::uint32_t> entries_that_hold(const Evaluation& evaluation, std::size_t row) {
    std::vector<std::uint32_t> held;
    for (std::uint32_t i = 0; i < evaluation.rules().explanations.size(); ++i) {
        if (evaluation.truth(evaluation.program().explanation(i), row) == Truth::yes) {
            held.push_back(i);
        }
    }
    return held;
}

/// Drops an entry of whose disorders a proper subset holds at the same onset or without one; merges the rest by set.
std::vector<Candidate> minimal(const rule::RuleSet& rules, const std::vector<std::uint32_t>& held) {
    const auto superfluous = [&](const rule::Explanation& entry) {
        return std::any_of(held.begin(), held.end(), [&](std::uint32_t other_index) {
            const rule::Explanation& other = rules.explanations[other_index];
            return proper_subset(other.disorders, entry.disorders) &&
                   (other.onset == entry.onset || other.onset == rule::Onset::none);
        });
    };
    std::vector<Candidate> merged;
    for (const std::uint32_t index : held) {
        const rule::Explanation& entry = rules.explanations[index];
        if (superfluous(entry)) {
            continue;
        }
        const auto same =
            std::find_if(merged.begin(), merged.end(), [&](const Candidate& candidate) {
                return candidate.disorders == entry.disorders;
            });
        if (same == merged.end()) {
            merged.push_back({entry.disorders, {index}, Fit::fits});
        } else {
            same->entries.push_back(index);
        }
    }
    return merged;
}

bool has_set(const std::vector<Candidate>& candidates, const DisorderSet& disorders) {
    return std::any_of(candidates.begin(), candidates.end(), [&](const Candidate& candidate) {
        return candidate.disorders == disorders;
    });
}

/// Explanations that hold if a response is not yet complete: named beside a fit of the disorders they wait for, in which the
/// respiratory one has no onset of its own.
std::vector<Candidate> early(const Evaluation& evaluation, const std::vector<Candidate>& fits) {
    const rule::RuleSet& rules = evaluation.rules();
    const auto waits = [&](const rule::Explanation& entry) {
        return std::any_of(fits.begin(), fits.end(), [&](const Candidate& candidate) {
            return candidate.disorders == entry.early_beside &&
                   std::any_of(
                       candidate.entries.begin(), candidate.entries.end(), [&](std::uint32_t fit) {
                           return rules.explanations[fit].onset == rule::Onset::none;
                       });
        });
    };
    const auto applies = [&](const rule::Explanation& entry) {
        return !entry.early_when ||
               evaluation.truth(evaluation.program().node(*entry.early_when)) == Truth::yes;
    };
    std::vector<Candidate> found;
    for (std::uint32_t i = 0; i < rules.explanations.size(); ++i) {
        const rule::Explanation& entry = rules.explanations[i];
        if (!entry.early_beside.empty() && waits(entry) && applies(entry) &&
            !has_set(fits, entry.disorders)) {
            found.push_back({entry.disorders, {i}, Fit::early});
        }
    }
    return found;
}

/// Explanations missed by less than the margin of the measurement; never a superset of a fit.
std::vector<Candidate> near(const Evaluation& evaluation,
                            const std::vector<Candidate>& fits,
                            const std::vector<Candidate>& early_ones) {
    std::vector<Candidate> found;
    for (Candidate& candidate :
         minimal(evaluation.rules(), entries_that_hold(evaluation, k_near_row))) {
        const bool covered = std::any_of(fits.begin(), fits.end(), [&](const Candidate& fit) {
            return fit.disorders == candidate.disorders ||
                   proper_subset(fit.disorders, candidate.disorders);
        });
        if (!covered && !has_set(early_ones, candidate.disorders)) {
            candidate.fit = Fit::near;
            found.push_back(std::move(candidate));
        }
    }
    return found;
}

std::optional<CompensationResult> compensation(const Evaluation& evaluation, std::uint32_t index) {
    const std::optional<rule::Compensation>& rule =
        evaluation.rules().explanations[index].compensation;
    const std::optional<engine::BandSlots> band = evaluation.program().band(index);
    if (!rule || !band) {
        return std::nullopt;
    }
    const rule::Quantity& quantity = evaluation.rules().quantities[rule->quantity];
    const std::optional<double> measured =
        evaluation.number(evaluation.program().quantity(rule->quantity));
    const std::optional<double> low = evaluation.number(band->low);
    const std::optional<double> high = evaluation.number(band->high);
    if (!measured || !low || !high) {
        return std::nullopt;
    }
    CompensationResult result;
    result.quantity = quantity.head.id;
    result.state = *measured > *high  ? BandState::above
                   : *measured < *low ? BandState::below
                                      : BandState::within;
    result.measured = *measured;
    result.expected_low = *low;
    result.expected_high = *high;
    result.unit = quantity.unit.code();
    result.decimals = quantity.decimals;
    result.from = rule->from;
    const std::optional<std::size_t> alternative = evaluation.alternative(rule->quantity);
    if (alternative && *alternative > 0) {
        result.from += "; " + quantity.label + " " + quantity.alternatives[*alternative].from;
    }
    return result;
}

double distance_outside(const CompensationResult& band) {
    return std::max({band.expected_low - band.measured, band.measured - band.expected_high, 0.0});
}

/// Distance from the centre of the band in half-widths; 1 where the disorder lies on one side of it, 0 without a band.
double eccentricity(const std::optional<CompensationResult>& band) {
    if (!band) {
        return 0;
    }
    const double half_width = (band->expected_high - band->expected_low) / 2;
    if (band->state != BandState::within || half_width <= 0) {
        return 1;
    }
    return std::fabs(band->measured - (band->expected_low + half_width)) / half_width;
}

/// The onset variant that tells most about the panel: nearest to its band's centre, for a near one least outside.
std::uint32_t representative(const Evaluation& evaluation, const Candidate& candidate) {
    const auto rank = [&](std::uint32_t entry) {
        const std::optional<CompensationResult> band = compensation(evaluation, entry);
        return std::make_pair(band ? distance_outside(*band) * (candidate.fit == Fit::near ? 1 : 0)
                                   : 0,
                              eccentricity(band));
    };
    return *std::min_element(candidate.entries.begin(),
                             candidate.entries.end(),
                             [&](std::uint32_t a, std::uint32_t b) { return rank(a) < rank(b); });
}

/// Kinds of the main disorders that a finding of the approach asserts.
void add_kinds(const Evaluation& evaluation,
               const rule::Explanation& entry,
               std::vector<std::string>& disorders) {
    const rule::RuleSet& rules = evaluation.rules();
    for (std::uint32_t f = 0; f < rules.findings.size(); ++f) {
        if (rules.findings[f].approach != entry.approach ||
            evaluation.truth(evaluation.program().finding(f)) != Truth::yes) {
            continue;
        }
        for (const std::uint32_t index : rules.findings[f].asserts) {
            const rule::Disorder& kind = rules.disorders[index];
            const bool belongs =
                kind.kind_of &&
                std::binary_search(entry.disorders.begin(), entry.disorders.end(), *kind.kind_of);
            if (belongs &&
                std::find(disorders.begin(), disorders.end(), kind.head.id) == disorders.end()) {
                disorders.push_back(kind.head.id);
            }
        }
    }
}

ExplanationResult explanation_result(const Evaluation& evaluation, const Candidate& candidate) {
    const rule::RuleSet& rules = evaluation.rules();
    const std::uint32_t chosen = representative(evaluation, candidate);
    const rule::Explanation& entry = rules.explanations[chosen];
    ExplanationResult result;
    result.id = entry.head.id;
    result.fit = candidate.fit;
    for (const std::uint32_t disorder : candidate.disorders) {
        result.disorders.push_back(rules.disorders[disorder].head.id);
    }
    add_kinds(evaluation, entry, result.disorders);
    result.onsets.push_back(entry.onset);
    for (const std::uint32_t other : candidate.entries) {
        const rule::Onset onset = rules.explanations[other].onset;
        if (std::find(result.onsets.begin(), result.onsets.end(), onset) == result.onsets.end()) {
            result.onsets.push_back(onset);
        }
    }
    result.compensation = compensation(evaluation, chosen);
    if (candidate.fit == Fit::near && result.compensation) {
        result.miss = distance_outside(*result.compensation);
        result.miss_unit = result.compensation->unit;
    }
    result.statement = evaluation.fill(
        candidate.fit == Fit::early ? entry.states + ", " + entry.early_states : entry.states);
    if (candidate.fit == Fit::fits) {
        result.because = evaluation.because(*entry.when);
    }
    result.sources = entry.head.sources;
    result.unchecked = entry.head.unchecked();
    return result;
}

}  // namespace

std::vector<ExplanationResult> explanation_results(const Evaluation& evaluation) {
    const rule::RuleSet& rules = evaluation.rules();
    std::vector<Candidate> listed = minimal(rules, entries_that_hold(evaluation, k_panel_row));
    const std::vector<Candidate> early_ones = early(evaluation, listed);
    std::vector<Candidate> near_ones = near(evaluation, listed, early_ones);
    listed.insert(listed.end(), early_ones.begin(), early_ones.end());
    listed.insert(listed.end(), near_ones.begin(), near_ones.end());

    std::vector<std::tuple<Fit, std::size_t, double, ExplanationResult>> ranked;
    for (const Candidate& candidate : listed) {
        ExplanationResult result = explanation_result(evaluation, candidate);
        const double off_centre = eccentricity(result.compensation);
        ranked.emplace_back(
            candidate.fit, candidate.disorders.size(), off_centre, std::move(result));
    }
    std::sort(ranked.begin(), ranked.end(), [](const auto& a, const auto& b) {
        return std::tie(std::get<0>(a), std::get<1>(a), std::get<2>(a), std::get<3>(a).id) <
               std::tie(std::get<0>(b), std::get<1>(b), std::get<2>(b), std::get<3>(b).id);
    });
    std::vector<ExplanationResult> results;
    for (auto& entry : ranked) {
        if (results.size() < k_most_listed) {
            results.push_back(std::move(std::get<3>(entry)));
        }
    }
    return results;
}

}  // namespace isohydric::interpret
