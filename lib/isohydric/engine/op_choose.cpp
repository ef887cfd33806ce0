// Choices between number columns.
#include "isohydric/engine/operations.hpp"

#include <algorithm>

namespace isohydric::engine {

void op::choose_number(const Operation& operation, const Columns& columns) {
    const Numbers if_yes = columns.numbers(operation.operands[1]);
    const Numbers if_no = columns.numbers(operation.operands[2]);
    const NumbersOut out = columns.numbers_out(operation.result);
    const Truth* __restrict condition = columns.truths(operation.operands[0]);
    const double* __restrict yes_values = if_yes.values;
    const double* __restrict no_values = if_no.values;
    const std::uint8_t* __restrict yes_missing = if_yes.missing;
    const std::uint8_t* __restrict no_missing = if_no.missing;
    double* __restrict values = out.values;
    std::uint8_t* __restrict missing = out.missing;
    const std::size_t rows = columns.rows();
    for (std::size_t row = 0; row < rows; ++row) {
        const auto truth = static_cast<Flag>(condition[row]);
        const Flag yes = truth & 1;
        const Flag unknown = truth >> 1;
        const Flag absent = unknown | (yes_missing[row] & yes) | (no_missing[row] & (1 - yes));
        const double value = zero_if(1 - yes, yes_values[row]) + zero_if(yes, no_values[row]);
        values[row] = zero_if(absent, value);
        missing[row] = static_cast<std::uint8_t>(absent);
    }
}

void op::first_number(const Operation& operation, const Columns& columns) {
    const NumbersOut out = columns.numbers_out(operation.result);
    double* __restrict values = out.values;
    std::uint8_t* __restrict missing = out.missing;
    const std::size_t rows = columns.rows();
    std::fill_n(values, rows, 0.0);
    std::fill_n(missing, rows, std::uint8_t{1});
    for (const Slot operand : operation.operands) {
        const Numbers candidate = columns.numbers(operand);
        const double* __restrict new_values = candidate.values;
        const std::uint8_t* __restrict new_missing = candidate.missing;
        for (std::size_t row = 0; row < rows; ++row) {
            const Flag still_missing = missing[row];
            values[row] += zero_if(1 - still_missing, new_values[row]);
            missing[row] = static_cast<std::uint8_t>(still_missing & new_missing[row]);
        }
    }
}

}  // namespace isohydric::engine
