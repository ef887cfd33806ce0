#include "isohydric/rule/detail/emptiness.hpp"

#include "isohydric/rule/detail/grammar.hpp"
#include "isohydric/rule/number_form.hpp"

#include <algorithm>
#include <set>
#include <string>

#include <fmt/format.h>

namespace isohydric::rule {
namespace {

/// What is known not to be empty.
struct Facts {
    std::set<std::string> present;                // number forms of expressions
    const NeverEmptyName* never_empty = nullptr;  // of names, if anybody knows

    [[nodiscard]] bool hold(const Expression& expression) const {
        return expression.never_empty || present.contains(number_form(expression)) ||
               (never_empty != nullptr && expression.kind == NodeKind::name &&
                (*never_empty)(expression.symbol));
    }
};

/// Whether the node's value is there whenever those of all its children are: not for a division by zero, a function
/// outside its domain, a power out of range.
bool is_total(NodeKind kind) {
    const Family family = family_of(kind);
    return kind != NodeKind::divide && family != Family::plain_function &&
           family != Family::power && family != Family::root;
}

bool is_lazy_logic(NodeKind kind) {
    return kind == NodeKind::logical_and || kind == NodeKind::logical_or ||
           kind == NodeKind::logical_implies;
}

/// Whether the node is empty as soon as one of its children is.
bool is_strict(NodeKind kind) {
    const Family family = family_of(kind);
    return !is_lazy_logic(kind) && family != Family::presence && family != Family::choice;
}

/// Adds what follows from `expression` not being empty.
void add_present(const Expression& expression, Facts& facts) {
    facts.present.insert(number_form(expression));
    if (is_strict(expression.kind)) {
        for (const ExpressionPtr& child : expression.children) {
            add_present(*child, facts);
        }
    }
}

/// Adds what follows from `condition` being `value`.
void add_outcome(const Expression& condition, bool value, Facts& facts) {
    const NodeKind kind = condition.kind;
    if (kind == NodeKind::call_not) {
        add_outcome(*condition.children[0], !value, facts);
    } else if (family_of(kind) == Family::presence) {
        if (value == (kind == NodeKind::call_exists)) {
            add_present(*condition.children[0], facts);
        }
    } else if (!is_lazy_logic(kind)) {
        add_present(condition, facts);
    } else if (value == (kind == NodeKind::logical_and)) {
        // Only this outcome settles both operands: `and` true, `or` false, `implies` false.
        add_outcome(*condition.children[0], kind != NodeKind::logical_or, facts);
        add_outcome(*condition.children[1], value, facts);
    }
}

bool can_be_empty(const Expression& expression, const Facts& facts);

/// The facts that hold where the second operand decides: the first was true, or false for `or`.
Facts facts_for_second(const Expression& logical, Facts facts) {
    add_outcome(*logical.children[0], logical.kind != NodeKind::logical_or, facts);
    return facts;
}

bool choice_can_be_empty(const Expression& choice, const Facts& facts) {
    for (const bool outcome : {true, false}) {
        Facts branch = facts;
        add_outcome(*choice.children[0], outcome, branch);
        if (can_be_empty(*choice.children[outcome ? 1 : 2], branch)) {
            return true;
        }
    }
    return false;
}

bool can_be_empty(const Expression& expression, const Facts& facts) {
    if (facts.hold(expression)) {
        return false;
    }
    if (is_lazy_logic(expression.kind)) {
        return can_be_empty(*expression.children[0], facts) ||
               can_be_empty(*expression.children[1], facts_for_second(expression, facts));
    }
    const Family family = family_of(expression.kind);
    if (family == Family::name || family == Family::presence) {
        return family == Family::name;
    }
    if (family == Family::choice) {
        return choice_can_be_empty(expression, facts);
    }
    return !is_total(expression.kind) || std::any_of(expression.children.begin(),
                                                     expression.children.end(),
                                                     [&facts](const ExpressionPtr& child) {
                                                         return can_be_empty(*child, facts);
                                                     });
}

void check_choices(const Expression& expression, const Facts& facts, diag::Report& report) {
    for (std::size_t i = 0; i < expression.children.size(); ++i) {
        Facts inner = facts;
        if (expression.kind == NodeKind::iif && i > 0) {
            add_outcome(*expression.children[0], i == 1, inner);
        }
        check_choices(*expression.children[i], inner, report);
    }
    if (expression.kind == NodeKind::iif && can_be_empty(*expression.children[0], facts)) {
        report.error("expression-empty-condition",
                     expression.children[0]->place,
                     "the condition of iif can be empty, and which result to take would be open; "
                     "ask first: a.exists() and a > b");
    }
}

}  // namespace

bool can_be_empty(const Expression& expression, const NeverEmptyName& never_empty) {
    return can_be_empty(expression, Facts{.present = {}, .never_empty = &never_empty});
}

void check_choices(const Expression& expression, diag::Report& report) {
    check_choices(expression, Facts{}, report);
}

}  // namespace isohydric::rule
