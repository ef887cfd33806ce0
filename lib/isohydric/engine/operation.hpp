// The instruction set of a compiled rule set: each operation writes one column from others.
#pragma once

#include "isohydric/engine/truth.hpp"

#include <compare>
#include <cstdint>
#include <vector>

namespace isohydric::engine {

/// What a column holds.
enum class SlotKind : std::uint8_t { number, truth, index };

/// One column of the scratch space.
struct Slot {
    SlotKind kind{};
    std::uint32_t index{};
    friend auto operator<=>(const Slot&,
                            const Slot&) = default;  // NOLINT(modernize-use-nullptr): a false alarm
};

/// What an operation does. Numbers are missing where an operand is, where a function is outside its domain, after a
/// division by zero and where a result is not finite; truths follow the three-valued logic of FHIRPath.
enum class OpCode : std::uint8_t {
    constant_number,  // number
    constant_missing,
    constant_truth,  // argument: Truth
    load_analyte,    // argument: panel::Analyte
    load_rounding,   // argument: panel::Analyte
    load_context,    // argument: panel::ContextItem, a number
    load_near,
    code_equals,      // argument: panel::ContextItem, part: its code
    select_interval,  // argument: interval name; an index column
    load_limit,       // part: rule::LimitPart, operand: an index column
    add,
    subtract,
    multiply,
    divide,
    negate,
    absolute,
    ln,
    log,
    exponential,
    power,
    square_root,
    less,
    less_equal,
    greater,
    greater_equal,
    equal,
    not_equal,
    truth_equal,
    truth_not_equal,
    logical_and,
    logical_or,
    logical_xor,
    logical_implies,
    logical_not,
    number_exists,
    truth_exists,
    choose_number,  // condition, if yes, if no; missing where the condition is unknown
    first_number,   // first operand that is present
    model,          // argument: index of the model
};

/// One instruction. Operands are slots; `argument` and `part` are immediate indices, `number` an immediate number.
struct Operation {
    OpCode code{};
    Slot result{};
    std::vector<Slot> operands{};
    std::uint32_t argument{};
    std::uint32_t part{};
    double number{};
    friend auto operator<=>(const Operation&,
                            const Operation&) = default;  // NOLINT(modernize-use-nullptr): likewise
};

}  // namespace isohydric::engine
