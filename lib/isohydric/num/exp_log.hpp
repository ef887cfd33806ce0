// Exponential, logarithm and power for double: one code for every machine, without libm.
// Each is straight-line arithmetic, so that a loop over an array vectorises and gives the same bits
// as one call. Errors are in units of the last place, the largest measured against 50 digits on
// 200,000 points each, edges included (tests/reference/num_mpmath.py, which also holds them to it).
#pragma once

#include "isohydric/num/wide.hpp"

#include <array>
#include <bit>
#include <cstddef>
#include <cstdint>
#include <limits>
#include <span>
#include <utility>

namespace isohydric::num {

namespace detail {

inline constexpr double k_infinity = std::numeric_limits<double>::infinity();
inline constexpr double k_not_a_number = std::numeric_limits<double>::quiet_NaN();

inline constexpr double k_log2_e = 0x1.71547652b82fep+0;
/// ln 2 in two parts; the first is a multiple of 2^-42, so any exponent times it is exact.
inline constexpr double k_ln2_hi = 0x1.62e42fefa3800p-1;
inline constexpr double k_ln2_lo = 0x1.ef35793c76730p-45;
inline constexpr Wide k_ln10 = {0x1.26bb1b8p+1, 0x1.daaa8ac16ea57p-26};
inline constexpr Wide k_log10_e = {0x1.bcb7b1p-2, 0x1.49b9438ca9aaep-28};
inline constexpr Wide k_two_thirds = {0x1.555555p-1, 0x1.5555555555555p-27};

/// The polynomial with these coefficients, highest power first.
template <std::size_t Size>
[[nodiscard, gnu::always_inline]] inline double
polynomial(double x, const std::array<double, Size>& coefficients) {
    double sum = 0.0;
    [&]<std::size_t... Index>(std::index_sequence<Index...>) __attribute__((always_inline)) {
        ((sum = sum * x + coefficients[Index]), ...);
    }
    (std::make_index_sequence<Size>{});
    return sum;
}

// Conditions are masks made from sign bits: the compiler may turn a comparison into a branch, and a
// loop with a branch does not vectorise.
using Bits = std::uint64_t;

[[nodiscard, gnu::always_inline]] inline Bits bits_of(double x) {
    return std::bit_cast<Bits>(x);
}

inline constexpr Bits k_sign_bit = Bits{1} << 63;
inline constexpr Bits k_infinity_bits = std::bit_cast<Bits>(k_infinity);

/// All ones if the highest bit is set, else 0.
[[nodiscard, gnu::always_inline]] inline Bits spread_highest(Bits bits) {
    return Bits{0} - (bits >> 63);
}

[[nodiscard, gnu::always_inline]] inline Bits if_negative(double x) {
    return spread_highest(bits_of(x));
}

[[nodiscard, gnu::always_inline]] inline Bits if_zero(double x) {
    return spread_highest((bits_of(x) & ~k_sign_bit) - 1);
}

[[nodiscard, gnu::always_inline]] inline Bits if_nan(double x) {
    return spread_highest(k_infinity_bits - (bits_of(x) & ~k_sign_bit));
}

[[nodiscard, gnu::always_inline]] inline Bits if_infinite_or_nan(double x) {
    return spread_highest((k_infinity_bits - 1) - (bits_of(x) & ~k_sign_bit));
}

[[nodiscard, gnu::always_inline]] inline double select(Bits mask, double yes, double no) {
    return std::bit_cast<double>((bits_of(yes) & mask) | (bits_of(no) & ~mask));
}

/// `x` brought into [low, high]; NaN stays NaN.
[[nodiscard, gnu::always_inline]] inline double clamp(double x, double low, double high) {
    const double raised = select(if_negative(x - low), low, x);
    const double clamped = select(if_negative(high - raised), high, raised);
    return select(if_nan(x), x, clamped);
}

/// The nearest whole number, halves to even; |x| < 2^51.
[[nodiscard, gnu::always_inline]] inline double nearest_whole(double x) {
    constexpr double k_drop_fraction = 0x1.8p52;
    return (x + k_drop_fraction) - k_drop_fraction;
}

/// 2^n for a whole n from -1022 to 1023: the sum leaves n + 1023 in the lowest bits.
[[nodiscard, gnu::always_inline]] inline double power_of_two(double n) {
    constexpr double k_show_exponent = 0x1.8p52 + 1023.0;
    return std::bit_cast<double>(bits_of(n + k_show_exponent) << 52);
}

/// e^x for |x| <= 746: x = k ln 2 + r with |r| <= 0.35, e^r by its series, whose first three terms
/// are added without loss, then two scalings of which only the second can round or overflow.
[[nodiscard, gnu::always_inline]] inline double exp_of(Wide x) {
    constexpr std::array<double, 12> k_reciprocal_factorials = {1.0 / 87178291200.0,
                                                                1.0 / 6227020800.0,
                                                                1.0 / 479001600.0,
                                                                1.0 / 39916800.0,
                                                                1.0 / 3628800.0,
                                                                1.0 / 362880.0,
                                                                1.0 / 40320.0,
                                                                1.0 / 5040.0,
                                                                1.0 / 720.0,
                                                                1.0 / 120.0,
                                                                1.0 / 24.0,
                                                                1.0 / 6.0};
    const double k = nearest_whole(x.rounded() * k_log2_e);
    const Wide r = join(x.hi - k * k_ln2_hi, x.lo - k * k_ln2_lo);
    const double whole_r = r.rounded();
    const double cubic_on =
        whole_r * whole_r * whole_r * polynomial(whole_r, k_reciprocal_factorials);
    const double half_square = 0.5 * r.hi * r.hi;
    const double left_of_square = 0.5 * r.lo * (r.hi + whole_r);

    const double two_terms = 1.0 + r.hi;
    const double two_terms_lost = (1.0 - two_terms) + r.hi;
    const double three_terms = two_terms + half_square;
    const double three_terms_lost = (two_terms - three_terms) + half_square;
    const double mantissa =
        three_terms + (cubic_on + (left_of_square + (r.lo + (two_terms_lost + three_terms_lost))));

    const double half_k = nearest_whole(0.5 * k);
    return mantissa * power_of_two(half_k) * power_of_two(k - half_k);
}

/// ln x for 0 < x < infinity, to about 2^-65 of its size: x = 2^k m with m from sqrt(1/2) to sqrt 2,
/// and ln m = 2 artanh(s), s = (m - 1) / (m + 1), |s| < 0.172. Anything for other x.
[[nodiscard, gnu::always_inline]] inline Wide log_of(double x) {
    constexpr Bits k_mantissa_bits = (Bits{1} << 52) - 1;
    constexpr auto k_root_half_bits = std::bit_cast<Bits>(0x1.6a09e667f3bcdp-1);
    constexpr auto k_one_bits = std::bit_cast<Bits>(1.0);
    constexpr auto k_2_52_bits = std::bit_cast<Bits>(0x1p52);
    constexpr std::array<double, 11> k_odd_reciprocals = {2.0 / 25.0,
                                                          2.0 / 23.0,
                                                          2.0 / 21.0,
                                                          2.0 / 19.0,
                                                          2.0 / 17.0,
                                                          2.0 / 15.0,
                                                          2.0 / 13.0,
                                                          2.0 / 11.0,
                                                          2.0 / 9.0,
                                                          2.0 / 7.0,
                                                          2.0 / 5.0};
    const Bits if_subnormal = if_negative(x - std::numeric_limits<double>::min());
    const double scale = select(if_subnormal, 0x1p54, 1.0);
    const double bias = select(if_subnormal, 0x1p52 + 1023.0 + 54.0, 0x1p52 + 1023.0);
    const Bits bits = bits_of(x * scale) + (k_one_bits - k_root_half_bits);
    const double k = std::bit_cast<double>((bits >> 52) | k_2_52_bits) - bias;
    const double m = std::bit_cast<double>((bits & k_mantissa_bits) + k_root_half_bits);

    const double f = m - 1.0;
    const double sum_hi = first_26_bits(m + 1.0);
    const double sum_lo = m - (sum_hi - 1.0);
    const double reciprocal = 1.0 / (m + 1.0);
    const double s_hi = first_26_bits(f * reciprocal);
    const Wide s = {s_hi, ((f - s_hi * sum_hi) - s_hi * sum_lo) * reciprocal};

    const Wide square = s * s;
    const double z = square.rounded();
    const double high_powers = z * polynomial(z, k_odd_reciprocals);
    const Wide from_cubic = s * square * add_smaller(k_two_thirds, {high_powers, 0.0});
    const Wide log_m = add_smaller({2.0 * s.hi, 2.0 * s.lo}, from_cubic);
    return add_smaller({k * k_ln2_hi, k * k_ln2_lo}, log_m);
}

/// What to add to `log_of(x)`, which is finite for every x: 0, or where there is no logarithm what
/// stands for it.
[[nodiscard, gnu::always_inline]] inline double log_edge(double x) {
    const double above = select(if_infinite_or_nan(x), x, 0.0);
    const double not_zero = select(if_negative(x), k_not_a_number, above);
    return select(if_zero(x), -k_infinity, not_zero);
}

}  // namespace detail

/// e^x; overflows to infinity, underflows through the subnormal numbers to 0.
/// Error below 0.53, among subnormal results 0.75.
[[nodiscard, gnu::always_inline]] inline double exp(double x) {
    return detail::exp_of(split(detail::clamp(x, -746.0, 710.0)));
}

/// 10^x; overflows and underflows as exp does.
/// Error below 0.53, among subnormal results 0.75. For a whole x from -323 to 308 the nearest double
/// (so exact where one is) but at 126 and 210, which are the next to nearest.
[[nodiscard, gnu::always_inline]] inline double pow10(double x) {
    return detail::exp_of(split(detail::clamp(x, -323.9, 308.3)) * detail::k_ln10);
}

/// Natural logarithm; -infinity at 0, NaN below. Error below 0.501.
[[nodiscard, gnu::always_inline]] inline double log(double x) {
    return detail::log_of(x).rounded() + detail::log_edge(x);
}

/// Logarithm to base 10, exact at powers of ten; -infinity at 0, NaN below. Error below 0.501.
[[nodiscard, gnu::always_inline]] inline double log10(double x) {
    return (detail::log_of(x) * detail::k_log10_e).rounded() + detail::log_edge(x);
}

/// x^y for x >= 0; NaN below, also with a whole y. x^0 is 1 for every x, as in [@ieee754-2019, clause 9.2.1].
/// Error below 0.53, among subnormal results 0.75.
[[nodiscard, gnu::always_inline]] inline double pow(double x, double y) {
    constexpr double k_beyond_any_use = 0x1p64;
    const Wide exponent =
        detail::log_of(x) * split(detail::clamp(y, -k_beyond_any_use, k_beyond_any_use));
    const double edge = detail::log_edge(x);
    const double raised_edge = detail::select(
        detail::if_zero(y), 0.0, detail::select(detail::if_negative(y), -edge, edge));
    return detail::exp_of({detail::clamp(exponent.hi + raised_edge, -746.0, 710.0),
                           detail::clamp(exponent.lo, -0x1p-15, 0x1p-15)});
}

/// Square root, correctly rounded; NaN below 0.
[[nodiscard]] double sqrt(double x);

/// Magnitude.
[[nodiscard, gnu::always_inline]] inline double abs(double x) {
    return std::bit_cast<double>(detail::bits_of(x) & ~detail::k_sign_bit);
}

// The same over arrays, to the same bits (of NaN, to NaN), vectorised. Each works on as many elements
// as the shortest span has; input and output may be the same array.

/// e^x of each element.
void exp(std::span<const double> x, std::span<double> out);
/// 10^x of each element.
void pow10(std::span<const double> x, std::span<double> out);
/// Natural logarithm of each element.
void log(std::span<const double> x, std::span<double> out);
/// Logarithm to base 10 of each element.
void log10(std::span<const double> x, std::span<double> out);
/// x^y of each pair of elements.
void pow(std::span<const double> x, std::span<const double> y, std::span<double> out);
/// Square root of each element.
void sqrt(std::span<const double> x, std::span<double> out);

}  // namespace isohydric::num
