// The root of an increasing function of one variable, for doubles and for intervals. The function
// is called with a point and answers with its value and slope there.
#pragma once

#include "isohydric/chem/domain.hpp"
#include "isohydric/num/interval.hpp"
#include "isohydric/num/number.hpp"

#include <limits>

namespace isohydric::chem::detail {

template <num::Number T>
struct ValueAndSlope {
    T value;
    T slope;
};

/// Root of `function` in `bracket`: Newton's step where it stays in the shrinking bracket, else its
/// middle. An end of the bracket if no root lies in it. Good to a few roundings of the function.
template <class Function>
[[nodiscard]] double increasing_root(const Function& function, Domain bracket) {
    constexpr int k_most_steps = 100;
    constexpr double k_close = 4.0 * std::numeric_limits<double>::epsilon();
    double x = bracket.low + (bracket.high - bracket.low) / 2.0;
    for (int step = 0; step < k_most_steps; ++step) {
        const ValueAndSlope<double> at_x = function(x);
        (at_x.value < 0.0 ? bracket.low : bracket.high) = x;
        const double change = at_x.value / at_x.slope;
        if (num::abs(change) <= k_close * (1.0 + num::abs(x))) {
            return x - change;
        }
        const double newton = x - change;
        x = bracket.low < newton && newton < bracket.high
                ? newton
                : bracket.low + (bracket.high - bracket.low) / 2.0;
    }
    return x;
}

/// Narrows `bracket` to the place where `is_left_of` turns from true to false.
template <class Predicate>
[[nodiscard]] Domain bisect(const Predicate& is_left_of, Domain bracket) {
    constexpr int k_steps = 60;
    for (int step = 0; step < k_steps; ++step) {
        const double middle = bracket.low + (bracket.high - bracket.low) / 2.0;
        (is_left_of(middle) ? bracket.low : bracket.high) = middle;
    }
    return bracket;
}

/// Encloses the roots of a family of increasing functions: below its lower bound every one is
/// negative, above its upper bound every one is positive. Unbounded on a side where the bracket
/// does not show that.
template <class Function>
[[nodiscard]] num::Interval increasing_root_enclosure(const Function& function, Domain bracket) {
    constexpr double k_unbounded = std::numeric_limits<double>::infinity();
    const auto all_negative = [&](double x) {
        return function(num::Interval(x)).value.upper() < 0.0;
    };
    const auto not_all_positive = [&](double x) {
        return function(num::Interval(x)).value.lower() <= 0.0;
    };
    const double lower =
        all_negative(bracket.low) ? bisect(all_negative, bracket).low : -k_unbounded;
    const double upper =
        not_all_positive(bracket.high) ? k_unbounded : bisect(not_all_positive, bracket).high;
    return {lower, upper};
}

}  // namespace isohydric::chem::detail
