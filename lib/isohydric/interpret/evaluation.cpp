#include "isohydric/interpret/detail/evaluation.hpp"

#include "isohydric/rule/walk.hpp"

#include <algorithm>
#include <functional>
#include <set>

namespace isohydric::interpret {

namespace {

/// Calls `visit` for every expression that a quantity is computed from.
template <class Visit>
void for_each_source(const rule::Quantity& quantity, Visit&& visit) {
    for (const rule::Alternative& alternative : quantity.alternatives) {
        visit(*alternative.formula);
    }
    if (quantity.model) {
        for (const rule::ExpressionPtr& input : quantity.model->inputs) {
            visit(*input);
        }
    }
}

/// All names that an expression rests on, through quantities and conditions.
class Closure {
  public:
    explicit Closure(const rule::RuleSet& rules) : rules_(rules) {}

    [[nodiscard]] bool any(const rule::Expression& expression,
                           const std::function<bool(const rule::Symbol&)>& test) {
        const std::vector<rule::Symbol> names = rule::names_of(expression);
        return std::any_of(
            names.begin(), names.end(), [&](const rule::Symbol& name) { return any(name, test); });
    }

  private:
    bool any(const rule::Symbol& name, const std::function<bool(const rule::Symbol&)>& test) {
        if (test(name)) {
            return true;
        }
        if (!seen_.emplace(name.kind, name.index).second) {
            return false;
        }
        bool found = false;
        if (name.kind == rule::SymbolKind::quantity) {
            for_each_source(rules_.quantities[name.index], [&](const rule::Expression& part) {
                found = found || any(part, test);
            });
        } else if (name.kind == rule::SymbolKind::condition) {
            found = any(*rules_.conditions[name.index].when, test);
        }
        return found;
    }

    const rule::RuleSet& rules_;
    std::set<std::pair<rule::SymbolKind, std::uint32_t>> seen_;
};

}  // namespace

Contradicted::Contradicted(const rule::RuleSet& rules, const std::vector<std::uint32_t>& analytes)
    : analytes_(panel::k_analyte_count, false),
      quantities_(rules.quantities.size(), false),
      conditions_(rules.conditions.size(), false),
      findings_(rules.findings.size(), false) {
    for (const std::uint32_t analyte : analytes) {
        analytes_[analyte] = true;
    }
    while (!analytes.empty() && spread(rules)) {
    }
    any_explanation_ =
        std::any_of(rules.explanations.begin(),
                    rules.explanations.end(),
                    [&](const rule::Explanation& entry) { return rests(*entry.when); });
}

bool Contradicted::rests(const rule::Symbol& symbol) const {
    switch (symbol.kind) {
    case rule::SymbolKind::analyte:
    case rule::SymbolKind::rounding:
        return analytes_[symbol.index];
    case rule::SymbolKind::quantity:
        return quantities_[symbol.index];
    case rule::SymbolKind::condition:
        return conditions_[symbol.index];
    case rule::SymbolKind::finding:
        return findings_[symbol.index];
    case rule::SymbolKind::limit:
    case rule::SymbolKind::context:
        return false;
    }
    return false;
}

bool Contradicted::rests(const rule::Expression& expression) const {
    const std::vector<rule::Symbol> names = rule::names_of(expression);
    return std::any_of(
        names.begin(), names.end(), [&](const rule::Symbol& name) { return rests(name); });
}

bool Contradicted::rests(const rule::Quantity& quantity) const {
    bool found = false;
    for_each_source(quantity, [&](const rule::Expression& part) { found = found || rests(part); });
    return found;
}

bool Contradicted::spread(const rule::RuleSet& rules) {
    bool changed = false;
    const auto mark = [&](std::vector<bool>& marks, std::size_t index, bool value) {
        changed = changed || (value && !marks[index]);
        marks[index] = marks[index] || value;
    };
    for (std::size_t i = 0; i < rules.quantities.size(); ++i) {
        mark(quantities_, i, rests(rules.quantities[i]));
    }
    for (std::size_t i = 0; i < rules.conditions.size(); ++i) {
        mark(conditions_, i, rests(*rules.conditions[i].when));
    }
    for (std::size_t i = 0; i < rules.findings.size(); ++i) {
        mark(findings_, i, rests(*rules.findings[i].when));
    }
    return changed;
}

Truth Evaluation::truth(std::optional<engine::Slot> slot, std::size_t row) const {
    return slot ? scratch_.truth(*slot, row) : Truth::unknown;
}

std::optional<double> Evaluation::number(std::optional<engine::Slot> slot, std::size_t row) const {
    return slot ? scratch_.value(*slot, row) : std::nullopt;
}

std::string Evaluation::fill(const std::string& sentence) const {
    return engine::fill(program_, scratch_, k_panel_row, sentence);
}

std::vector<engine::Reason> Evaluation::because(const rule::Expression& expression) const {
    return engine::explain(program_, scratch_, k_panel_row, expression);
}

std::vector<panel::Analyte> Evaluation::needs(const rule::Expression& expression) const {
    return engine::needs(program_, scratch_, k_panel_row, expression);
}

const rule::Interval* Evaluation::interval(const std::string& name) const {
    const std::optional<std::uint32_t> index = rules().find_interval_name(name);
    if (!index) {
        return nullptr;
    }
    const std::optional<engine::Slot> slot = program_.interval(*index);
    const std::int32_t chosen = slot ? scratch_.index(*slot, k_panel_row) : -1;
    return chosen < 0 ? nullptr : &rules().intervals[static_cast<std::size_t>(chosen)];
}

std::optional<std::size_t> Evaluation::alternative(std::uint32_t quantity) const {
    const std::span<const engine::Slot> slots = program_.alternatives(quantity);
    for (std::size_t i = 0; i < slots.size(); ++i) {
        if (!scratch_.missing(slots[i], k_panel_row)) {
            return i;
        }
    }
    return std::nullopt;
}

bool Evaluation::rests_on_shipped_limit(const rule::Expression& expression) const {
    return Closure(rules()).any(expression, [&](const rule::Symbol& name) {
        if (name.kind != rule::SymbolKind::limit) {
            return false;
        }
        const rule::Interval* interval_in_force = interval(rules().interval_names[name.index]);
        return interval_in_force != nullptr && interval_in_force->shipped_default;
    });
}

}  // namespace isohydric::interpret
