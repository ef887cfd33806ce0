// Reads an expression into an unchecked syntax tree, with the precedence of FHIRPath. Names, types and units are looked
// at later, by the checker.
#pragma once

#include "isohydric/rule/expression.hpp"
#include "isohydric/rule/lexer.hpp"

#include <cstddef>
#include <optional>
#include <string>
#include <string_view>
#include <vector>

namespace isohydric::rule {

/// A unit behind a number, as written.
struct WrittenUnit {
    std::string code;
    diag::Place place;
};

/// One node of the syntax tree. A text literal has the kind `code_literal`, since codes are all that a text can be.
struct Syntax {
    NodeKind kind{};
    diag::Place place;  ///< the whole node
    diag::Place mark;   ///< what names it: the operator, the function's name, the leaf itself
    std::string text;   ///< digits, text, `true` or `false`, the operator or function as written
    std::vector<std::string> path;  ///< of a name: its parts, without backticks
    std::optional<WrittenUnit> unit;
    std::vector<Syntax> children;  ///< in reading order, a call's receiver first
    std::size_t depth = 1;         ///< of the tree below, itself included
};

/// Deepest tree that is accepted; deeper ones should be split into named quantities.
inline constexpr std::size_t k_depth_limit = 128;

/// Longest text that is read, in bytes.
inline constexpr std::size_t k_length_limit = 4000;

/// Parses `text`. Errors go to the report, and the result is then empty.
[[nodiscard]] std::optional<Syntax>
parse_expression(std::string_view text, const Locator& locate, diag::Report& report);

/// Parses the content of a JSON string.
[[nodiscard]] std::optional<Syntax> parse_expression(const diag::Json& string_value,
                                                     diag::Report& report);

}  // namespace isohydric::rule
