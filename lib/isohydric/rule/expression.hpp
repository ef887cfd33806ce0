// The expression tree of the rule language: a checked subset of HL7 FHIRPath. A tree is immutable once checked; it carries
// the place of every node in its rule file, its type, and literals already converted to canonical units.
#pragma once

#include "isohydric/diag/source.hpp"
#include "isohydric/units/unit.hpp"

#include <cstdint>
#include <memory>
#include <string>
#include <vector>

namespace isohydric::rule {

/// What an expression yields. A `code` is an enumeration of the context (specimen, population, onset).
enum class Type : std::uint8_t { number, truth, code };

/// Every kind of node. `name` refers to a symbol; the rest are literals, operators and functions of the subset.
enum class NodeKind : std::uint8_t {
    number_literal,
    truth_literal,
    code_literal,
    name,
    negate,
    add,
    subtract,
    multiply,
    divide,
    equal,
    not_equal,
    less,
    less_equal,
    greater,
    greater_equal,
    logical_and,
    logical_or,
    logical_xor,
    logical_implies,
    call_not,
    call_abs,
    call_ln,
    call_log,
    call_exp,
    call_power,
    call_sqrt,
    call_exists,
    call_empty,
    iif,
};

/// What a name refers to. The index is into the table named beside each.
enum class SymbolKind : std::uint8_t {
    analyte,  ///< entered value; index of panel::Analyte
    rounding,  ///< half a unit of the last digit entered, `rounding.<analyte>`; index of panel::Analyte
    quantity,   ///< RuleSet::quantities
    condition,  ///< RuleSet::conditions
    finding,    ///< RuleSet::findings, written in backticks
    limit,  ///< `limits.<name>.low|mid|high`; index of RuleSet::interval_names, part in `limit_part`
    context,  ///< `context.<item>`; index of panel::ContextItem
};
enum class LimitPart : std::uint8_t { low, mid, high };

/// A resolved name.
struct Symbol {
    SymbolKind kind{};
    std::uint32_t index{};
    LimitPart limit_part{};
    friend bool operator==(const Symbol&, const Symbol&) = default;
};

/// One node. Leaves use `number`, `text` or `symbol`; operators use `children` in reading order (a call's receiver first).
struct Expression {
    NodeKind kind{};
    Type type{};
    diag::Place place;
    units::Unit unit = units::one();          ///< of a number: its canonical unit
    double number{};                          ///< number literal, in `unit`
    bool truth{};                             ///< truth literal
    std::string text;                         ///< as written: a name, a literal's digits, a code
    units::Unit written_unit = units::one();  ///< the unit a quantity literal was written in
    std::uint32_t code{};                     ///< code literal: its number within its enumeration
    Symbol symbol;
    bool never_empty{};  ///< of a name: it always has a value (context codes, `context.near`)
    std::vector<std::shared_ptr<const Expression>> children;
};

using ExpressionPtr = std::shared_ptr<const Expression>;

}  // namespace isohydric::rule
