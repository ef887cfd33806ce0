// Walks over a checked expression.
#pragma once

#include "isohydric/rule/expression.hpp"

#include <vector>

namespace isohydric::rule {

/// Calls `visit(const Expression&)` for every node, parents first, children in reading order.
template <class Visit>
void for_each_node(const Expression& expression, Visit&& visit) {
    visit(expression);
    for (const ExpressionPtr& child : expression.children) {
        for_each_node(*child, visit);
    }
}

/// The names that occur in `expression`, each once, in reading order.
[[nodiscard]] std::vector<Symbol> names_of(const Expression& expression);

}  // namespace isohydric::rule
