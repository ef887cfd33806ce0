// Choices between number columns.
#include "isohydric/engine/operations.hpp"

#include <algorithm>

namespace isohydric::engine {

void op::choose_number(const Operation& operation, const Columns& columns) {
    const Truth* __restrict condition = columns.truths(operation.operands[0]);
    const Numbers if_yes = columns.numbers(operation.operands[1]);
    const Numbers if_no = columns.numbers(operation.operands[2]);
    const NumbersOut out = columns.numbers_out(operation.result);
    for (std::size_t row = 0; row < columns.rows(); ++row) {
        const bool yes = condition[row] == Truth::yes;
        const bool unknown = condition[row] == Truth::unknown;
        const double value = yes ? if_yes.values[row] : if_no.values[row];
        const std::uint8_t missing = yes ? if_yes.missing[row] : if_no.missing[row];
        out.values[row] = unknown ? 0.0 : value;
        out.missing[row] = unknown ? 1 : missing;
    }
}

void op::first_number(const Operation& operation, const Columns& columns) {
    const NumbersOut out = columns.numbers_out(operation.result);
    double* __restrict values = out.values;
    std::uint8_t* __restrict missing = out.missing;
    std::fill_n(values, columns.rows(), 0.0);
    std::fill_n(missing, columns.rows(), std::uint8_t{1});
    for (const Slot operand : operation.operands) {
        const Numbers candidate = columns.numbers(operand);
        for (std::size_t row = 0; row < columns.rows(); ++row) {
            values[row] = missing[row] != 0 ? candidate.values[row] : values[row];
            missing[row] = missing[row] & candidate.missing[row];
        }
    }
}

}  // namespace isohydric::engine
