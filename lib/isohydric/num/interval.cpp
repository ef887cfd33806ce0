#include "isohydric/num/interval.hpp"

#include "isohydric/num/exp_log.hpp"
#include "isohydric/num/rounding.hpp"

#include <algorithm>
#include <array>
#include <bit>
#include <cstdint>
#include <limits>

namespace isohydric::num {

namespace {

using detail::k_infinity;

constexpr double k_largest = std::numeric_limits<double>::max();
constexpr double k_smallest = std::numeric_limits<double>::denorm_min();

/// The next double above; infinity stays.
double up(double x) {
    if (x == 0.0) {
        return k_smallest;
    }
    if (x == k_infinity) {
        return x;
    }
    const auto bits = std::bit_cast<std::uint64_t>(x);
    return std::bit_cast<double>(x > 0.0 ? bits + 1 : bits - 1);
}

double down(double x) {
    return -up(-x);
}

Interval widened(double lower, double upper) {
    return {down(lower), up(upper)};
}

/// Zero times an unbounded end is zero: the end is never reached.
double product(double a, double b) {
    return a == 0.0 || b == 0.0 ? 0.0 : a * b;
}

/// A bounded or unbounded number over an unbounded end comes as near zero as one likes.
double quotient(double a, double b) {
    return abs(b) == k_infinity ? 0.0 : a / b;
}

Interval hull(const std::array<double, 4>& corners) {
    const auto [lower, upper] = std::minmax_element(corners.begin(), corners.end());
    return widened(*lower, *upper);
}

bool is_zero(const Interval& x) {
    return x.lower() == 0.0 && x.upper() == 0.0;
}

Interval not_below_zero(const Interval& x) {
    return {std::max(x.lower(), 0.0), std::max(x.upper(), 0.0)};
}

/// Bounds known to be not negative, whatever the widening did.
Interval positive_widened(double lower, double upper) {
    return not_below_zero(widened(lower, upper));
}

Certainty certainty(bool always, bool never) {
    if (always) {
        return Certainty::yes;
    }
    return never ? Certainty::no : Certainty::maybe;
}

}  // namespace

Interval::Interval(double lower, double upper) : lower_(-k_infinity), upper_(k_infinity) {
    if (lower <= upper) {
        lower_ = std::min(lower, k_largest);
        upper_ = std::max(upper, -k_largest);
    }
}

Interval Interval::whole_line() {
    return {-k_infinity, k_infinity};
}

Interval operator+(const Interval& a, const Interval& b) {
    return widened(a.lower_ + b.lower_, a.upper_ + b.upper_);
}

Interval operator-(const Interval& a, const Interval& b) {
    return widened(a.lower_ - b.upper_, a.upper_ - b.lower_);
}

Interval operator*(const Interval& a, const Interval& b) {
    if (is_zero(a) || is_zero(b)) {
        return 0.0;
    }
    return hull({product(a.lower_, b.lower_),
                 product(a.lower_, b.upper_),
                 product(a.upper_, b.lower_),
                 product(a.upper_, b.upper_)});
}

Interval operator/(const Interval& a, const Interval& b) {
    if (b.contains(0.0)) {
        return Interval::whole_line();
    }
    if (is_zero(a)) {
        return 0.0;
    }
    return hull({quotient(a.lower_, b.lower_),
                 quotient(a.lower_, b.upper_),
                 quotient(a.upper_, b.lower_),
                 quotient(a.upper_, b.upper_)});
}

Interval operator-(const Interval& a) {
    return {-a.upper_, -a.lower_};
}

Interval abs(const Interval& x) {
    const double a = abs(x.lower());
    const double b = abs(x.upper());
    return {x.contains(0.0) ? 0.0 : std::min(a, b), std::max(a, b)};
}

Interval sqrt(const Interval& x) {
    if (x.upper() < 0.0) {
        return Interval::whole_line();
    }
    const Interval inside = not_below_zero(x);
    return positive_widened(sqrt(inside.lower()), sqrt(inside.upper()));
}

Interval exp(const Interval& x) {
    return positive_widened(exp(x.lower()), exp(x.upper()));
}

Interval pow10(const Interval& x) {
    return positive_widened(pow10(x.lower()), pow10(x.upper()));
}

Interval log(const Interval& x) {
    if (x.upper() <= 0.0) {
        return Interval::whole_line();
    }
    const Interval inside = not_below_zero(x);
    return widened(log(inside.lower()), log(inside.upper()));
}

Interval log10(const Interval& x) {
    if (x.upper() <= 0.0) {
        return Interval::whole_line();
    }
    const Interval inside = not_below_zero(x);
    return widened(log10(inside.lower()), log10(inside.upper()));
}

Interval pow(const Interval& x, const Interval& y) {
    if (x.upper() < 0.0) {
        return Interval::whole_line();
    }
    // y ln x has its extremes at the corners, and e^ is monotone.
    const Interval base = not_below_zero(x);
    const Interval corners = hull({pow(base.lower(), y.lower()),
                                   pow(base.lower(), y.upper()),
                                   pow(base.upper(), y.lower()),
                                   pow(base.upper(), y.upper())});
    return positive_widened(corners.lower(), corners.upper());
}

Interval round_to_8_decimals(const Interval& x) {
    return {round_to_8_decimals(x.lower()), round_to_8_decimals(x.upper())};
}

Certainty is_less(const Interval& a, const Interval& b) {
    return certainty(a.upper() < b.lower(), a.lower() >= b.upper());
}

Certainty is_at_most(const Interval& a, const Interval& b) {
    return certainty(a.upper() <= b.lower(), a.lower() > b.upper());
}

Certainty is_equal(const Interval& a, const Interval& b) {
    const bool one_value = a.lower() == a.upper() && b.lower() == b.upper();
    const bool apart = a.upper() < b.lower() || b.upper() < a.lower();
    return certainty(one_value && a.lower() == b.lower(), apart);
}

}  // namespace isohydric::num
