// Finds out whether an expression can be empty, for the conditions of `iif`, which FHIRPath treats as false when empty.
#pragma once

#include "isohydric/diag/report.hpp"
#include "isohydric/rule/expression.hpp"

#include <functional>

namespace isohydric::rule {

/// Whether a name that the checker could not tell about is never empty: a condition whose own expression is known.
using NeverEmptyName = std::function<bool(const Symbol&)>;

/// Whether `expression` can be empty.
[[nodiscard]] bool can_be_empty(const Expression& expression, const NeverEmptyName& never_empty);

/// Reports every `iif` in `expression` whose condition can be empty. What stands to the left counts: in
/// `a.exists() and a > 5`, and in the first result of `iif(a.exists(), ..., ...)`, `a` is there.
void check_choices(const Expression& expression, diag::Report& report);

}  // namespace isohydric::rule
