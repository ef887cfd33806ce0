// Functions of number columns. A value outside a function's domain gives NaN or an infinity, and so a missing result.
#include "isohydric/engine/operations.hpp"
#include "isohydric/num/number.hpp"

namespace isohydric::engine {

namespace {

[[nodiscard]] bool is_whole(double x) {
    constexpr double k_all_whole_from = 0x1p52;
    return num::abs(x) >= k_all_whole_from ||
           static_cast<double>(static_cast<std::int64_t>(x)) == x;
}

/// x^y, also for a negative x where y is a whole number.
[[nodiscard]] double power_of(double x, double y) {
    const double magnitude = num::pow(num::abs(x), y);
    if (x >= 0.0) {
        return magnitude;
    }
    if (!is_whole(y)) {
        return std::numeric_limits<double>::quiet_NaN();
    }
    return is_whole(0.5 * y) ? magnitude : -magnitude;
}

}  // namespace

void op::ln(const Operation& operation, const Columns& columns) {
    map_number(operation, columns, [](double a) { return num::log(a); });
}

void op::log(const Operation& operation, const Columns& columns) {
    map_numbers(
        operation, columns, [](double a, double base) { return num::log(a) / num::log(base); });
}

void op::exponential(const Operation& operation, const Columns& columns) {
    map_number(operation, columns, [](double a) { return num::exp(a); });
}

void op::power(const Operation& operation, const Columns& columns) {
    map_numbers(operation, columns, power_of);
}

void op::square_root(const Operation& operation, const Columns& columns) {
    map_number(operation, columns, [](double a) { return num::sqrt(a); });
}

}  // namespace isohydric::engine
