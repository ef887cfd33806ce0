// Prints an expression in its number form: plain FHIRPath on numbers in canonical units, which any FHIRPath engine can
// evaluate and so compare with this one.
#pragma once

#include "isohydric/rule/expression.hpp"

#include <string>

namespace isohydric::rule {

/// The number form: literals as plain numbers in the unit of their node, codes as texts, names as `number_form_name`.
/// A minus before anything but a literal becomes a difference from 0, because engines disagree on the minus of empty.
[[nodiscard]] std::string number_form(const Expression& expression);

/// The identifier that stands for a name in the number form: `v_` and the name, `_` for a point, `__` for a hyphen
/// (`v_limits_pH_low`, `v_raised__gap`). The prefix keeps engines from reading a capital as the name of a type.
[[nodiscard]] std::string number_form_name(const Expression& name);

}  // namespace isohydric::rule
