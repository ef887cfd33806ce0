// The columns that one operation works on: raw arrays into a Scratch, and the loops that all operations share.
#pragma once

#include "isohydric/engine/program.hpp"

#include <bit>
#include <cstddef>
#include <cstdint>

namespace isohydric::engine {

/// A number column to read.
struct Numbers {
    const double* values;
    const std::uint8_t* missing;
};

/// A number column to write. Never one of the columns that the same operation reads.
struct NumbersOut {
    double* values;
    std::uint8_t* missing;
};

/// Access of the operations to one evaluation: the rule set, the block and the columns.
class Columns {
  public:
    /// Ready for blocks; `block` may be null while only constants are evaluated.
    Columns(Scratch& scratch,
            const rule::RuleSet& rules,
            const panel::PanelBlock* block,
            std::size_t rows)
        : scratch_(scratch), rules_(rules), block_(block), rows_(rows) {
        scratch.size_ = rows;
    }

    /// A scratch without a program, for folding constants.
    [[nodiscard]] static Scratch make_scratch(const SlotCounts& slots, std::size_t capacity) {
        return {slots, capacity};
    }

    [[nodiscard]] std::size_t rows() const { return rows_; }

    [[nodiscard]] const rule::RuleSet& rules() const { return rules_; }

    [[nodiscard]] const panel::PanelBlock& block() const { return *block_; }

    [[nodiscard]] Numbers numbers(Slot slot) const {
        return {&scratch_.values_[at(slot)], &scratch_.missing_[at(slot)]};
    }

    [[nodiscard]] NumbersOut numbers_out(Slot slot) const {
        return {&scratch_.values_[at(slot)], &scratch_.missing_[at(slot)]};
    }

    [[nodiscard]] const Truth* truths(Slot slot) const { return &scratch_.truths_[at(slot)]; }

    [[nodiscard]] Truth* truths_out(Slot slot) const { return &scratch_.truths_[at(slot)]; }

    [[nodiscard]] const std::int32_t* indices(Slot slot) const {
        return &scratch_.indices_[at(slot)];
    }

    [[nodiscard]] std::int32_t* indices_out(Slot slot) const {
        return &scratch_.indices_[at(slot)];
    }

  private:
    [[nodiscard]] std::size_t at(Slot slot) const { return slot.index * scratch_.stride_; }

    Scratch& scratch_;
    const rule::RuleSet& rules_;
    const panel::PanelBlock* block_;
    std::size_t rows_;
};

// In the loops over rows the bounds and pointers are locals, since a byte that is written might be part of anything else.
// Flags are the numbers 0 and 1, and choices are made by masks: a comparison of bytes beside one of
// doubles becomes a branch, and the loop is no longer made of vectors.
using Flag = std::uint64_t;

/// 1 for NaN and infinities, whose exponent bits are all ones; they may not leave an operation.
[[nodiscard]] inline Flag not_finite(double value) {
    constexpr std::uint64_t k_exponent = 0x7ff0000000000000;
    constexpr std::uint64_t k_lowest_exponent_bit = 0x0010000000000000;
    return ((std::bit_cast<std::uint64_t>(value) & k_exponent) + k_lowest_exponent_bit) >> 63;
}

/// `value`, or 0 where `absent` is 1.
[[nodiscard]] inline double zero_if(Flag absent, double value) {
    return std::bit_cast<double>(std::bit_cast<std::uint64_t>(value) & (absent - 1));
}

/// out[i] = function(a[i]), missing where a is or where the result is not finite.
template <typename Function>
void map_number(const Operation& operation, const Columns& columns, Function function) {
    const Numbers a = columns.numbers(operation.operands[0]);
    const NumbersOut out = columns.numbers_out(operation.result);
    const double* __restrict a_values = a.values;
    const std::uint8_t* __restrict a_missing = a.missing;
    double* __restrict values = out.values;
    std::uint8_t* __restrict missing = out.missing;
    const std::size_t rows = columns.rows();
    for (std::size_t row = 0; row < rows; ++row) {
        const double value = function(a_values[row]);
        const Flag absent = a_missing[row] | not_finite(value);
        values[row] = zero_if(absent, value);
        missing[row] = static_cast<std::uint8_t>(absent);
    }
}

/// out[i] = function(a[i], b[i]), missing where an operand is or where the result is not finite.
template <typename Function>
void map_numbers(const Operation& operation, const Columns& columns, Function function) {
    const Numbers a = columns.numbers(operation.operands[0]);
    const Numbers b = columns.numbers(operation.operands[1]);
    const NumbersOut out = columns.numbers_out(operation.result);
    const double* __restrict a_values = a.values;
    const double* __restrict b_values = b.values;
    const std::uint8_t* __restrict a_missing = a.missing;
    const std::uint8_t* __restrict b_missing = b.missing;
    double* __restrict values = out.values;
    std::uint8_t* __restrict missing = out.missing;
    const std::size_t rows = columns.rows();
    for (std::size_t row = 0; row < rows; ++row) {
        const double value = function(a_values[row], b_values[row]);
        const Flag absent = a_missing[row] | b_missing[row] | not_finite(value);
        values[row] = zero_if(absent, value);
        missing[row] = static_cast<std::uint8_t>(absent);
    }
}

}  // namespace isohydric::engine
