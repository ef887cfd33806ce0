// What to tell somebody whose expression cannot be parsed: what was found, and what to write instead.
#pragma once

#include "isohydric/diag/report.hpp"
#include "isohydric/rule/detail/token_cursor.hpp"

#include <string>

namespace isohydric::rule {

/// The message about a token that stands where a value belongs.
[[nodiscard]] std::string no_value_message(const TokenCursor& cursor);

/// Reports the token that stands behind a complete value, where an operator or the end belongs.
diag::Diagnostic& report_after_value(const TokenCursor& cursor, diag::Report& report);

/// Reports the name of a function that is not in the rule language.
void report_unknown_function(const Token& name, const TokenCursor& cursor, diag::Report& report);

}  // namespace isohydric::rule
