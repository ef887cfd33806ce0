// The operators and functions of the rule language: one table that the parser reads with and the printers write with.
// The levels are those of the FHIRPath grammar [@hl7-fhirpath, grammar]; a higher level binds tighter.
#pragma once

#include "isohydric/rule/expression.hpp"

#include <array>
#include <cstddef>
#include <span>
#include <string_view>

namespace isohydric::rule {

/// How tightly an expression holds together.
enum class Level : std::uint8_t {
    implies,
    disjunction,
    conjunction,
    equality,
    inequality,
    sum,
    product,
    sign,
    call,
};

/// A binary operator; all of them group to the left.
struct OperatorInfo {
    std::string_view spelling;
    NodeKind kind;
    Level level;
};

inline constexpr std::array<OperatorInfo, 14> k_operators{{
    {"implies", NodeKind::logical_implies, Level::implies},
    {"or", NodeKind::logical_or, Level::disjunction},
    {"xor", NodeKind::logical_xor, Level::disjunction},
    {"and", NodeKind::logical_and, Level::conjunction},
    {"=", NodeKind::equal, Level::equality},
    {"!=", NodeKind::not_equal, Level::equality},
    {"<", NodeKind::less, Level::inequality},
    {"<=", NodeKind::less_equal, Level::inequality},
    {">", NodeKind::greater, Level::inequality},
    {">=", NodeKind::greater_equal, Level::inequality},
    {"+", NodeKind::add, Level::sum},
    {"-", NodeKind::subtract, Level::sum},
    {"*", NodeKind::multiply, Level::product},
    {"/", NodeKind::divide, Level::product},
}};

/// A function that is called on a value: `x.power(2)`.
struct FunctionInfo {
    std::string_view name;
    NodeKind kind;
    std::size_t arguments;
};

inline constexpr std::array<FunctionInfo, 9> k_functions{{
    {"not", NodeKind::call_not, 0},
    {"abs", NodeKind::call_abs, 0},
    {"ln", NodeKind::call_ln, 0},
    {"log", NodeKind::call_log, 1},
    {"exp", NodeKind::call_exp, 0},
    {"power", NodeKind::call_power, 1},
    {"sqrt", NodeKind::call_sqrt, 0},
    {"exists", NodeKind::call_exists, 0},
    {"empty", NodeKind::call_empty, 0},
}};

/// The operator of that kind, or null.
[[nodiscard]] const OperatorInfo* find_operator(NodeKind kind);
[[nodiscard]] const OperatorInfo* find_operator(std::string_view spelling);

/// The function of that kind or name, or null.
[[nodiscard]] const FunctionInfo* find_function(NodeKind kind);
[[nodiscard]] const FunctionInfo* find_function(std::string_view name);

/// Kinds of nodes that are checked alike.
enum class Family : std::uint8_t {
    number_literal,
    truth_literal,
    code_literal,
    name,
    sum,             ///< `+`, `-`: operands in one unit
    product,         ///< `*`, `/`
    unary,           ///< `-`, abs: the operand's unit
    plain_function,  ///< ln, log, exp: numbers without a unit
    power,
    root,
    order,     ///< `<`, `<=`, `>`, `>=`
    equality,  ///< `=`, `!=`
    logic,     ///< truths in, a truth out
    presence,  ///< exists, empty
    choice,    ///< iif
};

[[nodiscard]] Family family_of(NodeKind kind);

/// Whether `word` has a meaning of its own in FHIRPath, so that it can be no name unless in backticks.
[[nodiscard]] bool is_keyword(std::string_view word);

/// Whether `text` is an identifier that needs no backticks.
[[nodiscard]] bool is_plain_identifier(std::string_view text);

}  // namespace isohydric::rule
