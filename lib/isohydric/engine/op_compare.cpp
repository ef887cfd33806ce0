// Comparisons of numbers, decided on values rounded to 8 decimals.
#include "isohydric/engine/operations.hpp"
#include "isohydric/num/rounding.hpp"

namespace isohydric::engine {

namespace {

/// out[i] = relation(a[i], b[i]) of the rounded values; unknown where one is missing.
template <typename Relation>
void compare(const Operation& operation, const Columns& columns, Relation relation) {
    const Numbers a = columns.numbers(operation.operands[0]);
    const Numbers b = columns.numbers(operation.operands[1]);
    Truth* __restrict out = columns.truths_out(operation.result);
    for (std::size_t row = 0; row < columns.rows(); ++row) {
        const bool holds = relation(num::round_to_8_decimals(a.values[row]),
                                    num::round_to_8_decimals(b.values[row]));
        const bool unknown = (a.missing[row] | b.missing[row]) != 0;
        out[row] = unknown ? Truth::unknown : truth_of(holds);
    }
}

}  // namespace

void op::less(const Operation& operation, const Columns& columns) {
    compare(operation, columns, [](double a, double b) { return a < b; });
}

void op::less_equal(const Operation& operation, const Columns& columns) {
    compare(operation, columns, [](double a, double b) { return a <= b; });
}

void op::greater(const Operation& operation, const Columns& columns) {
    compare(operation, columns, [](double a, double b) { return a > b; });
}

void op::greater_equal(const Operation& operation, const Columns& columns) {
    compare(operation, columns, [](double a, double b) { return a >= b; });
}

void op::equal(const Operation& operation, const Columns& columns) {
    compare(operation, columns, [](double a, double b) { return a == b; });
}

void op::not_equal(const Operation& operation, const Columns& columns) {
    compare(operation, columns, [](double a, double b) { return a != b; });
}

}  // namespace isohydric::engine
