// What only a whole rule set can get wrong: circles, overlapping intervals, alternatives that do not match.
#pragma once

#include "isohydric/diag/report.hpp"
#include "isohydric/rule/detail/declarations.hpp"
#include "isohydric/rule/rule_set.hpp"

#include <vector>

namespace isohydric::rule::detail {

/// Reports quantities, conditions and findings that hang on themselves. Requires a set read without errors.
void check_cycles(const RuleSet& rules, diag::Report& report);

/// Reports intervals of one name that could both hold for one context.
void check_overlaps(const RuleSet& rules, diag::Report& report);

/// Reports alternatives that do not define what the chosen one of their choice defines, in the same units.
void check_alternatives(const RuleSet& rules,
                        const std::vector<Declared>& declared,
                        diag::Report& report);

}  // namespace isohydric::rule::detail
