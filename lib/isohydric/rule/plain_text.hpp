// Prints an expression for people: `1.5 x HCO3 + 8`, `pH < lower limit of pH and pCO2 is given`.
#pragma once

#include "isohydric/rule/expression.hpp"

#include <functional>
#include <string>

namespace isohydric::rule {

/// What people call a name node; `plain_name` unless the caller knows labels.
using NameText = std::function<std::string(const Expression& name)>;

/// A name in words, from its spelling alone: `lower limit of pH`, `rounding of Na`, `age`, `raised-gap`.
[[nodiscard]] std::string plain_name(const Expression& name);

/// The expression in words and signs. A unit is left out where the number is in the unit of evaluation, and kept where a
/// literal was converted; factors that the checker put in are not shown.
[[nodiscard]] std::string plain_text(const Expression& expression,
                                     const NameText& name_text = plain_name);

}  // namespace isohydric::rule
