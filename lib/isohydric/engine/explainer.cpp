// Truths: which parts of an expression decide, and how a comparison is written so that it is true.
#include "isohydric/engine/explainer.hpp"

#include "isohydric/diag/assert.hpp"
#include "isohydric/num/rounding.hpp"
#include "isohydric/rule/walk.hpp"

#include <algorithm>
#include <array>

namespace isohydric::engine {

namespace {

using rule::NodeKind;

/// Digits of a comparison of which no name knows any.
constexpr int k_default_decimals = 2;

/// A relation, and the one that holds where it does not.
struct Relation {
    NodeKind kind;
    const char* sign;
    const char* opposite;
};

constexpr std::array<Relation, 6> k_relations{{{NodeKind::equal, "=", "!="},
                                               {NodeKind::not_equal, "!=", "="},
                                               {NodeKind::less, "<", ">="},
                                               {NodeKind::less_equal, "<=", ">"},
                                               {NodeKind::greater, ">", "<="},
                                               {NodeKind::greater_equal, ">=", "<"}}};

[[nodiscard]] const Relation* find_relation(NodeKind kind) {
    const auto* const found =
        std::find_if(k_relations.begin(), k_relations.end(), [kind](const Relation& relation) {
            return relation.kind == kind;
        });
    return found == k_relations.end() ? nullptr : found;
}

[[nodiscard]] bool is_connective(NodeKind kind) {
    return kind == NodeKind::logical_and || kind == NodeKind::logical_or ||
           kind == NodeKind::logical_xor || kind == NodeKind::logical_implies;
}

[[nodiscard]] bool is_presence(NodeKind kind) {
    return kind == NodeKind::call_exists || kind == NodeKind::call_empty;
}

[[nodiscard]] bool is_limit(const rule::Expression& expression) {
    return expression.kind == NodeKind::name && expression.symbol.kind == rule::SymbolKind::limit;
}

}  // namespace

void Explainer::tell(const rule::Expression& expression, int depth) {
    if (is_connective(expression.kind)) {
        tell_parts(expression, depth);
    } else if (expression.kind == NodeKind::call_not) {
        tell(*expression.children[0], depth);
    } else if (find_relation(expression.kind) != nullptr) {
        tell_comparison(expression, depth);
    } else if (is_presence(expression.kind)) {
        tell_presence(expression, depth);
    } else if (expression.kind == NodeKind::name) {
        tell(expression.symbol, depth);
    }
}

void Explainer::tell(const rule::Symbol& name, int depth) {
    if (name.kind == rule::SymbolKind::finding) {
        tell_finding(name.index, depth);
    } else if (name.kind == rule::SymbolKind::condition) {
        tell_condition(name.index, depth);
    } else if (name.kind == rule::SymbolKind::quantity) {
        tell_quantity(name.index, depth);
    } else if (RowView::is_truth(name)) {
        add(view_.truth(name) == Truth::yes ? "bands widened by the margin of the measurement"
                                            : "bands not widened by the margin of the measurement",
            depth);
    }
}

/// Of an `and` that does not hold the sides that do not, of an `or` that holds those that do, of an unknown one the unknown;
/// else both sides.
void Explainer::tell_parts(const rule::Expression& expression, int depth) {
    const Truth truth = view_.truth(expression);
    const bool is_and = expression.kind == NodeKind::logical_and;
    const bool is_or = expression.kind == NodeKind::logical_or;
    const bool some_decide =
        truth == Truth::unknown || (is_and && truth == Truth::no) || (is_or && truth == Truth::yes);
    const bool premise_decides = expression.kind == NodeKind::logical_implies &&
                                 view_.truth(*expression.children[0]) == Truth::no;
    if (premise_decides) {
        return tell(*expression.children[0], depth);
    }
    for (const rule::ExpressionPtr& child : expression.children) {
        if (!some_decide || view_.truth(*child) == truth) {
            tell(*child, depth);
        }
    }
}

void Explainer::tell_comparison(const rule::Expression& expression, int depth) {
    const rule::Expression& left = *expression.children[0];
    const rule::Expression& right = *expression.children[1];
    if (left.type == rule::Type::code) {
        return tell_code(expression, depth);
    }
    if (left.type == rule::Type::truth) {
        tell(left, depth);
        return tell(right, depth);
    }
    const Truth truth = view_.truth(expression);
    if (truth == Truth::unknown) {
        tell_unknown(left, depth);
        return tell_unknown(right, depth);
    }
    const Relation& relation = *find_relation(expression.kind);
    add(side_text(left, right) + " " + (truth == Truth::yes ? relation.sign : relation.opposite) +
            " " + side_text(right, left),
        depth,
        limit_sources(expression));
    tell_quantities(expression, depth + 1);
}

/// "anion gap 27.4" for a name, "12.0" for a literal, "12.0 (upper limit)", "HCO3 - 24 (= 5.0)" for anything else.
std::string Explainer::side_text(const rule::Expression& side,
                                 const rule::Expression& other) const {
    const double value = view_.number(side).value_or(0.0);
    const double against = view_.number(other).value_or(0.0);
    const int decimals =
        view_.decimals(side).value_or(view_.decimals(other).value_or(k_default_decimals));
    if (side.kind == NodeKind::number_literal) {
        return exactly(value, decimals);
    }
    if (is_limit(side)) {
        return exactly(value, decimals) + " (" + limit_text(side.symbol, other) + ")";
    }
    if (side.kind != NodeKind::name) {
        return in_words(side) + " (= " + printed(value, decimals, against) + ")";
    }
    return view_.label(side.symbol) + " " +
           printed(value, view_.digits(side.symbol, value), against);
}

/// "upper limit" beside the quantity that the limit is shown against, else with its name.
std::string Explainer::limit_text(const rule::Symbol& limit, const rule::Expression& other) const {
    const std::string full = view_.label(limit);
    const std::string& name = view_.rules().interval_names[limit.index];
    const bool of_quantity =
        other.kind == NodeKind::name && other.symbol.kind == rule::SymbolKind::quantity;
    const bool own = of_quantity && view_.rules().quantities[other.symbol.index].interval == name;
    return own ? full.substr(0, full.find(" of ")) : full;
}

void Explainer::tell_code(const rule::Expression& expression, int depth) {
    const std::size_t item = expression.children[0]->kind == NodeKind::name ? 0 : 1;
    const rule::Expression& code = *expression.children[1 - item];
    const bool holds = view_.truth(expression) == Truth::yes;
    const bool is = (expression.kind == NodeKind::equal) == holds;
    add(view_.label(expression.children[item]->symbol) + (is ? " is " : " is not ") + code.text,
        depth);
}

void Explainer::tell_presence(const rule::Expression& expression, int depth) {
    const bool holds = view_.truth(expression) == Truth::yes;
    const bool given = (expression.kind == NodeKind::call_exists) == holds;
    add(in_words(*expression.children[0]) + (given ? " is given" : " is missing"), depth);
}

void Explainer::tell_condition(std::uint32_t index, int depth) {
    const rule::Condition& condition = view_.rules().conditions[index];
    const std::size_t first = lines_.size();
    tell(*condition.when, depth);
    if (first < lines_.size()) {
        std::vector<rule::Citation>& sources = lines_[first].sources;
        sources.insert(sources.end(), condition.head.sources.begin(), condition.head.sources.end());
    }
}

/// A finding that another expression names: its state, then why.
void Explainer::tell_finding(std::uint32_t index, int depth) {
    if (!told_findings_.insert(index).second) {
        return;
    }
    const rule::Symbol name{rule::SymbolKind::finding, index, {}};
    const rule::Finding& finding = view_.rules().findings[index];
    add(view_.label(name) + ": " + std::string(truth_text(view_.truth(name))),
        depth,
        finding.head.sources);
    tell_reasons(index, depth + 1);
}

/// Why a finding has its state: its own condition, and the findings that take precedence where they decide.
void Explainer::tell_reasons(std::uint32_t index, int depth) {
    const rule::Finding& finding = view_.rules().findings[index];
    const Truth state = view_.truth(rule::Symbol{rule::SymbolKind::finding, index, {}});
    const Truth own = view_.truth(*finding.when);
    if (own == state) {
        tell(*finding.when, depth);
    }
    if (own == Truth::no || state == Truth::yes) {
        return;
    }
    // The findings that take precedence make a yes or unknown condition no, or a yes one unknown.
    const Truth deciding = not_of(state);
    for (const std::uint32_t exception : finding.unless) {
        if (view_.truth(rule::Symbol{rule::SymbolKind::finding, exception, {}}) == deciding) {
            tell_exception(exception, deciding, depth);
        }
    }
}

void Explainer::tell_exception(std::uint32_t index, Truth state, int depth) {
    const std::string label = view_.label(rule::Symbol{rule::SymbolKind::finding, index, {}});
    add(state == Truth::yes ? label + " takes precedence"
                            : "unknown whether " + label + " takes precedence",
        depth,
        view_.rules().findings[index].head.sources);
    if (told_findings_.insert(index).second) {
        tell_reasons(index, depth + 1);
    }
}

void Explainer::add(std::string text, int depth, std::vector<rule::Citation> sources) {
    if (told_.insert(text).second) {
        lines_.push_back({std::move(text), depth, std::move(sources)});
    }
}

std::vector<rule::Citation> Explainer::limit_sources(const rule::Expression& expression) const {
    std::vector<rule::Citation> sources;
    for (const rule::Symbol& name : rule::names_of(expression)) {
        const rule::Interval* interval =
            name.kind == rule::SymbolKind::limit ? view_.interval(name.index) : nullptr;
        if (interval != nullptr) {
            sources.insert(
                sources.end(), interval->head.sources.begin(), interval->head.sources.end());
        }
    }
    return sources;
}

std::vector<Reason> explain(const Program& program,
                            const Scratch& scratch,
                            std::size_t row,
                            const rule::Expression& expression) {
    const RowView view(program, scratch, row);
    Explainer explainer(view);
    if (expression.type == rule::Type::number) {
        explainer.tell_number(expression, 0);
    } else {
        explainer.tell(expression, 0);
    }
    return explainer.take();
}

std::vector<Reason>
explain(const Program& program, const Scratch& scratch, std::size_t row, const rule::Symbol& name) {
    const RowView view(program, scratch, row);
    Explainer explainer(view);
    if (name.kind == rule::SymbolKind::finding) {
        explainer.tell_reasons(name.index, 0);
    } else {
        explainer.tell(name, 0);
    }
    return explainer.take();
}

}  // namespace isohydric::engine
