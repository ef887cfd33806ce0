// Turns a syntax tree into a checked expression: names resolved, types and dimensions agreed, literals in the units in
// which evaluation happens, conditions of `iif` never empty.
#pragma once

#include "isohydric/diag/report.hpp"
#include "isohydric/rule/expression.hpp"
#include "isohydric/rule/names.hpp"
#include "isohydric/rule/parser.hpp"

#include <optional>

namespace isohydric::rule {

/// What the owner of an expression needs it to yield.
struct Wanted {
    Type type{};
    std::optional<units::Unit> unit;  ///< of a number: the result is converted to it; absent: any
};

/// Checks `syntax`. Errors go to the report, many a run, and the result is then null.
///
/// In the result every node's `unit` is the one its number is in. Operands of different but commensurable units are
/// brought to one: literals are converted, other operands are multiplied by a literal without text, the factor.
[[nodiscard]] ExpressionPtr
check(const Syntax& syntax, const NameTable& names, const Wanted& wanted, diag::Report& report);

/// Parses and checks the content of a JSON string.
[[nodiscard]] ExpressionPtr read_expression(const diag::Json& string_value,
                                            const NameTable& names,
                                            const Wanted& wanted,
                                            diag::Report& report);

}  // namespace isohydric::rule
