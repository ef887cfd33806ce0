// Three-valued logic, and the question whether a value is there.
#include "isohydric/engine/operations.hpp"

namespace isohydric::engine {

namespace {

/// out[i] = function(a[i]) for truths.
template <typename Function>
void map_truth(const Operation& operation, const Columns& columns, Function function) {
    const Truth* __restrict a = columns.truths(operation.operands[0]);
    Truth* __restrict out = columns.truths_out(operation.result);
    const std::size_t rows = columns.rows();
    for (std::size_t row = 0; row < rows; ++row) {
        out[row] = function(a[row]);
    }
}

/// out[i] = function(a[i], b[i]) for truths.
template <typename Function>
void map_truths(const Operation& operation, const Columns& columns, Function function) {
    const Truth* __restrict a = columns.truths(operation.operands[0]);
    const Truth* __restrict b = columns.truths(operation.operands[1]);
    Truth* __restrict out = columns.truths_out(operation.result);
    const std::size_t rows = columns.rows();
    for (std::size_t row = 0; row < rows; ++row) {
        out[row] = function(a[row], b[row]);
    }
}

}  // namespace

void op::truth_equal(const Operation& operation, const Columns& columns) {
    map_truths(operation, columns, [](Truth a, Truth b) { return not_of(xor_of(a, b)); });
}

void op::truth_not_equal(const Operation& operation, const Columns& columns) {
    map_truths(operation, columns, xor_of);
}

void op::logical_and(const Operation& operation, const Columns& columns) {
    map_truths(operation, columns, and_of);
}

void op::logical_or(const Operation& operation, const Columns& columns) {
    map_truths(operation, columns, or_of);
}

void op::logical_xor(const Operation& operation, const Columns& columns) {
    map_truths(operation, columns, xor_of);
}

void op::logical_implies(const Operation& operation, const Columns& columns) {
    map_truths(operation, columns, [](Truth a, Truth b) { return or_of(not_of(a), b); });
}

void op::logical_not(const Operation& operation, const Columns& columns) {
    map_truth(operation, columns, not_of);
}

void op::number_exists(const Operation& operation, const Columns& columns) {
    const std::uint8_t* __restrict missing = columns.numbers(operation.operands[0]).missing;
    Truth* __restrict out = columns.truths_out(operation.result);
    const std::size_t rows = columns.rows();
    for (std::size_t row = 0; row < rows; ++row) {
        out[row] = truth_of(missing[row] == 0);
    }
}

void op::truth_exists(const Operation& operation, const Columns& columns) {
    map_truth(operation, columns, [](Truth a) { return truth_of(a != Truth::unknown); });
}

}  // namespace isohydric::engine
