#include "isohydric/rule/detail/consistency.hpp"

#include "isohydric/diag/text.hpp"
#include "isohydric/rule/dependencies.hpp"
#include "isohydric/rule/detail/fields.hpp"

#include <algorithm>
#include <array>
#include <limits>

#include <fmt/format.h>

namespace isohydric::rule::detail {
namespace {

// Whoever follows the references, here or later, may do so by recursion.
constexpr std::size_t k_deepest = 1000;

/// Looks for circles depth first; `path_` is the way from where the search began.
class CycleFinder {
  public:
    CycleFinder(const RuleSet& rules, diag::Report& report) : rules_(rules), report_(report) {
        states_[0].resize(rules.quantities.size());
        states_[1].resize(rules.conditions.size());
        states_[2].resize(rules.findings.size());
    }

    void run() {
        constexpr std::array<SymbolKind, 3> k_kinds{
            SymbolKind::quantity, SymbolKind::condition, SymbolKind::finding};
        for (std::size_t i = 0; i < k_kinds.size(); ++i) {
            for (std::size_t index = 0; index < states_[i].size(); ++index) {
                visit({.kind = k_kinds[i], .index = static_cast<std::uint32_t>(index)});
            }
        }
    }

  private:
    enum class State : std::uint8_t { fresh, open, done };

    void visit(const Symbol& symbol) {
        State* state = state_of(symbol);
        if (state == nullptr || *state == State::done) {
            return;
        }
        if (*state == State::open) {
            complain(symbol);
            return;
        }
        *state = State::open;
        path_.push_back(symbol);
        if (path_.size() == k_deepest) {
            report_.error("rule-too-deep",
                          head_of(symbol).place,
                          fmt::format("more than {} entries hang on each other in one line; name "
                                      "less, or write some in one expression",
                                      k_deepest));
        }
        if (path_.size() < k_deepest) {
            visit_needed(symbol);
        }
        path_.pop_back();
        *state = State::done;
    }

    void visit_needed(const Symbol& symbol) {
        for (const Symbol& needed : dependencies_of(rules_, symbol)) {
            visit(needed);
        }
    }

    void complain(const Symbol& symbol) {
        std::string circle;
        for (auto at = std::ranges::find(path_, symbol); at != path_.end(); ++at) {
            circle += head_of(*at).id + " -> ";
        }
        circle += head_of(symbol).id;
        report_.error(
            "rule-cycle",
            head_of(symbol).place,
            fmt::format("this hangs on itself: {}; take one of these references out", circle));
    }

    State* state_of(const Symbol& symbol) {
        switch (symbol.kind) {
        case SymbolKind::quantity:
            return &states_[0][symbol.index];
        case SymbolKind::condition:
            return &states_[1][symbol.index];
        case SymbolKind::finding:
            return &states_[2][symbol.index];
        case SymbolKind::analyte:
        case SymbolKind::rounding:
        case SymbolKind::limit:
        case SymbolKind::context:
            return nullptr;
        }
        ISOHYDRIC_NEVER();
    }

    [[nodiscard]] const EntryHead& head_of(const Symbol& symbol) const {
        if (symbol.kind == SymbolKind::quantity) {
            return rules_.quantities[symbol.index].head;
        }
        return symbol.kind == SymbolKind::condition ? rules_.conditions[symbol.index].head
                                                    : rules_.findings[symbol.index].head;
    }

    const RuleSet& rules_;
    diag::Report& report_;
    std::array<std::vector<State>, 3> states_;
    std::vector<Symbol> path_;
};

// Empty means any.
template <class Code>
bool meet(const std::vector<Code>& a, const std::vector<Code>& b) {
    const auto in_b = [&](Code code) {
        return std::ranges::find(b, code) != b.end();
    };
    return a.empty() || b.empty() || std::ranges::any_of(a, in_b);
}

bool meet(const Range& a, const Range& b) {
    constexpr double k_infinity = std::numeric_limits<double>::infinity();
    return a.from.value_or(-k_infinity) < b.below.value_or(k_infinity) &&
           b.from.value_or(-k_infinity) < a.below.value_or(k_infinity);
}

bool can_both_hold(const Interval& a, const Interval& b) {
    return a.name == b.name && meet(a.specimens, b.specimens) &&
           meet(a.populations, b.populations) && meet(a.age_a, b.age_a) &&
           meet(a.altitude_m, b.altitude_m);
}

/// The unit of each quantity that a convention defines, by id.
std::map<std::string, const Declared*> members_of(std::string_view convention,
                                                  const std::vector<Declared>& declared) {
    std::map<std::string, const Declared*> members;
    for (const Declared& entry : declared) {
        if (entry.convention == convention) {
            members.emplace(entry.json->find("id")->text(), &entry);
        }
    }
    return members;
}

std::string_view unit_of(const Declared& entry) {
    const diag::Json* unit = peek(*entry.json, "unit", diag::Kind::string);
    return unit == nullptr ? "1" : unit->text();
}

bool same_unit(const Declared& a, const Declared& b) {
    const auto unit_a = units::parse_unit(unit_of(a));
    const auto unit_b = units::parse_unit(unit_of(b));
    return !unit_a || !unit_b || *unit_a == *unit_b;  // an unreadable one is reported elsewhere
}

void compare_members(const Convention& other,
                     const Convention& chosen,
                     const std::vector<Declared>& declared,
                     diag::Report& report) {
    const auto wanted = members_of(chosen.head.id, declared);
    const auto found = members_of(other.head.id, declared);
    const auto complain = [&](const diag::Place& place, const std::string& what) {
        report
            .error("rule-alternative",
                   place,
                   fmt::format("{}; alternatives of \"{}\" define the same names in the same units",
                               what,
                               chosen.choice))
            .notes.push_back({"the chosen alternative is here", chosen.head.place});
    };
    for (const auto& [id, entry] : wanted) {
        const auto match = found.find(id);
        if (match == found.end()) {
            complain(other.head.place,
                     fmt::format("\"{}\" does not define \"{}\"", other.head.id, id));
        } else if (match->second->kind != entry->kind) {
            complain(match->second->json->find("id")->place(),
                     fmt::format("\"{}\" is a {} here and a {} in the chosen alternative",
                                 id,
                                 describe(match->second->kind),
                                 describe(entry->kind)));
        } else if (!same_unit(*match->second, *entry)) {
            complain(match->second->json->find("id")->place(),
                     fmt::format("\"{}\" is in {} here and in {} in the chosen alternative",
                                 id,
                                 unit_of(*match->second),
                                 unit_of(*entry)));
        }
    }
    for (const auto& [id, entry] : found) {
        if (!wanted.contains(id)) {
            complain(entry->json->find("id")->place(),
                     fmt::format("the chosen alternative does not define \"{}\"", id));
        }
    }
}

}  // namespace

void check_cycles(const RuleSet& rules, diag::Report& report) {
    CycleFinder(rules, report).run();
}

void check_overlaps(const RuleSet& rules, diag::Report& report) {
    for (auto later = rules.intervals.begin(); later != rules.intervals.end(); ++later) {
        for (auto earlier = rules.intervals.begin(); earlier != later; ++earlier) {
            if (can_both_hold(*earlier, *later)) {
                report
                    .error(
                        "rule-interval-overlap",
                        later->head.place,
                        fmt::format("\"{}\" and \"{}\" are both intervals of \"{}\" and can hold "
                                    "at once; narrow one of them in \"for\"",
                                    earlier->head.id,
                                    later->head.id,
                                    rules.interval_names[later->name]))
                    .notes.push_back({"the other is here", earlier->head.place});
            }
        }
    }
}

void check_alternatives(const RuleSet& rules,
                        const std::vector<Declared>& declared,
                        diag::Report& report) {
    for (const Convention& chosen : rules.conventions) {
        if (!chosen.chosen) {
            continue;
        }
        for (const Convention& other : rules.conventions) {
            if (!other.chosen && other.choice == chosen.choice) {
                compare_members(other, chosen, declared, report);
            }
        }
    }
}

}  // namespace isohydric::rule::detail
