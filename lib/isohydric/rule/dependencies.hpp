// What hangs on what among the entries that have a value of their own.
#pragma once

#include "isohydric/rule/rule_set.hpp"

#include <vector>

namespace isohydric::rule {

/// The names on which a quantity, condition or finding hangs directly, each once; findings that take precedence count.
/// Other symbols hang on nothing.
[[nodiscard]] std::vector<Symbol> dependencies_of(const RuleSet& rules, const Symbol& symbol);

}  // namespace isohydric::rule
