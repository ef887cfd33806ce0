// Comparisons of numbers, decided on values rounded to 8 decimals.
#include "isohydric/engine/operations.hpp"
#include "isohydric/num/rounding.hpp"

namespace isohydric::engine {

namespace {

/// 1 where `a` is below `b`, by the sign of their difference, which is exact; not for NaN, the difference of two infinities.
[[nodiscard]] inline Flag below(double a, double b) {
    constexpr Flag k_infinity = 0x7ff0000000000000;
    constexpr Flag k_sign = 0x8000000000000000;
    const auto difference = std::bit_cast<Flag>((a - b) + 0.0);  // + 0.0 makes of -0 a 0
    const Flag is_nan = (k_infinity - (difference & ~k_sign)) >> 63;
    return (difference >> 63) & (1 - is_nan);
}

[[nodiscard]] inline Flag apart(double a, double b) {
    return below(a, b) | below(b, a);
}

/// out[i] = relation(a[i], b[i]) of the rounded values; unknown where one is missing.
template <typename Relation>
void compare(const Operation& operation, const Columns& columns, Relation relation) {
    const Numbers a = columns.numbers(operation.operands[0]);
    const Numbers b = columns.numbers(operation.operands[1]);
    const double* __restrict a_values = a.values;
    const double* __restrict b_values = b.values;
    const std::uint8_t* __restrict a_missing = a.missing;
    const std::uint8_t* __restrict b_missing = b.missing;
    Truth* __restrict out = columns.truths_out(operation.result);
    const std::size_t rows = columns.rows();
    for (std::size_t row = 0; row < rows; ++row) {
        const Flag holds = relation(num::round_to_8_decimals(a_values[row]),
                                    num::round_to_8_decimals(b_values[row]));
        const Flag unknown = a_missing[row] | b_missing[row];
        out[row] = static_cast<Truth>((holds & (unknown - 1)) | (unknown << 1));
    }
}

}  // namespace

void op::less(const Operation& operation, const Columns& columns) {
    compare(operation, columns, [](double a, double b) { return below(a, b); });
}

void op::less_equal(const Operation& operation, const Columns& columns) {
    compare(operation, columns, [](double a, double b) { return 1 - below(b, a); });
}

void op::greater(const Operation& operation, const Columns& columns) {
    compare(operation, columns, [](double a, double b) { return below(b, a); });
}

void op::greater_equal(const Operation& operation, const Columns& columns) {
    compare(operation, columns, [](double a, double b) { return 1 - below(a, b); });
}

void op::equal(const Operation& operation, const Columns& columns) {
    compare(operation, columns, [](double a, double b) { return 1 - apart(a, b); });
}

void op::not_equal(const Operation& operation, const Columns& columns) {
    compare(operation, columns, [](double a, double b) { return apart(a, b); });
}

}  // namespace isohydric::engine
