// The instruction set of a compiled rule set: each operation writes one column from others.
#pragma once

#include <array>
#include <cstdint>
#include <vector>

namespace isohydric::engine {

/// Three-valued logic, as FHIRPath has it: empty is `unknown`.
enum class Truth : std::uint8_t { no, yes, unknown };

/// What a column holds.
enum class SlotKind : std::uint8_t { number, truth, index };

/// One column of the scratch space.
struct Slot {
    SlotKind kind{};
    std::uint32_t index{};
    friend bool operator==(const Slot&, const Slot&) = default;
};

enum class OpCode : std::uint8_t {
    constant_number,
    constant_truth,
    load_analyte,
    load_rounding,
    load_context_number,
    load_near,
    code_equals,
    select_interval,
    load_limit,
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
    choose_number,
    choose_truth,  // condition, if yes, if no
    first_number,  // first operand that is present
    state,         // when, then the findings that take precedence
    model,
};

/// One instruction. Operands are slots; `argument` is an immediate index (analyte, context item, model, interval name,
/// code), `part` which limit, `number` an immediate number.
struct Operation {
    OpCode code{};
    Slot result;
    std::vector<Slot> operands;
    std::uint32_t argument{};
    std::uint32_t part{};
    double number{};
};

}  // namespace isohydric::engine
