#include "isohydric/num/interval.hpp"
#include "isohydric/num/number.hpp"

#include <doctest/doctest.h>

#include <limits>
#include <random>
#include <string>

namespace {

namespace num = isohydric::num;
using num::Certainty;
using num::Interval;

constexpr double k_infinity = std::numeric_limits<double>::infinity();
constexpr double k_largest = std::numeric_limits<double>::max();
constexpr double k_nan = std::numeric_limits<double>::quiet_NaN();

static_assert(num::Number<double>);
static_assert(num::Number<Interval>);
static_assert(!num::Number<int>);
static_assert(!num::Number<std::string>);

bool is_whole_line(const Interval& x) {
    return x.lower() == -k_infinity && x.upper() == k_infinity;
}

/// Within two neighbours of the bounds expected: enclosing is tested against exact numbers elsewhere.
bool is_about(const Interval& x, double lower, double upper) {
    const double slack = 4.0 * std::numeric_limits<double>::epsilon();
    return x.lower() <= lower && x.lower() >= lower - slack * num::abs(lower) &&
           x.upper() >= upper && x.upper() <= upper + slack * num::abs(upper);
}

/// A formula of every operation, in any number type.
template <num::Number T>
T formula(const T& ph, const T& pco2) {
    const T bicarbonate = 0.0307 * pco2 * num::pow10(ph - 6.095);
    const T part = num::sqrt(bicarbonate) / (1.0 + num::exp(-num::log(pco2)));
    return part - num::pow(pco2, 0.5) + num::log10(num::abs(ph - 7.4) + 1.0);
}

}  // namespace

TEST_CASE("interval: made from numbers, never with NaN, never empty") {
    CHECK(Interval(7.4).lower() == 7.4);
    CHECK(Interval(7.4).upper() == 7.4);
    CHECK(is_whole_line(Interval(k_nan)));
    CHECK(is_whole_line(Interval(1.0, k_nan)));
    CHECK(is_whole_line(Interval(2.0, 1.0)));
    CHECK(Interval(k_infinity).lower() == k_largest);
    CHECK(Interval(-k_infinity).upper() == -k_largest);
}

TEST_CASE("interval: arithmetic of signs") {
    CHECK(is_about(Interval(1.0, 2.0) + Interval(10.0, 20.0), 11.0, 22.0));
    CHECK(is_about(Interval(1.0, 2.0) - Interval(10.0, 20.0), -19.0, -8.0));
    CHECK(is_about(Interval(-1.0, 2.0) * Interval(-10.0, 20.0), -20.0, 40.0));
    CHECK(is_about(Interval(-2.0, -1.0) * Interval(10.0, 20.0), -40.0, -10.0));
    CHECK(is_about(Interval(1.0, 2.0) / Interval(-4.0, -2.0), -1.0, -0.25));
    CHECK(is_about(2.0 * Interval(1.0, 2.0), 2.0, 4.0));
    CHECK((-Interval(1.0, 2.0)).lower() == -2.0);
    CHECK((-Interval(1.0, 2.0)).upper() == -1.0);
}

TEST_CASE("interval: bounds are widened, so a rounded result is enclosed with its true value") {
    const Interval tenth = Interval(1.0) / Interval(10.0);
    CHECK(tenth.lower() < 0.1);
    CHECK(tenth.upper() > 0.1);
    const Interval three = Interval(0.1) + Interval(0.2);
    CHECK(three.contains(0.3));
    CHECK(three.contains(0.1 + 0.2));
}

TEST_CASE("interval: division by zero is the whole line, zero and infinity stay numbers") {
    CHECK(is_whole_line(Interval(1.0, 2.0) / Interval(-1.0, 1.0)));
    CHECK(is_whole_line(Interval(1.0) / Interval(0.0)));
    CHECK(is_whole_line(Interval(0.0) / Interval(0.0, 1.0)));
    const Interval all = Interval::whole_line();
    const Interval same = all;
    for (const Interval& x : {all + all, all - same, all * all, Interval(-1.0, 1.0) * all}) {
        CHECK(is_whole_line(x));
    }
    CHECK((Interval(0.0) * all).lower() == 0.0);
    CHECK((Interval(0.0) * all).upper() == 0.0);
    CHECK((Interval(k_largest) * 2.0).lower() == k_largest);
    CHECK((Interval(k_largest) * 2.0).upper() == k_infinity);
    const Interval quotient = Interval(1.0, k_infinity) / Interval(1.0, k_infinity);
    CHECK(quotient.lower() <= 0.0);
    CHECK(quotient.upper() == k_infinity);
}

TEST_CASE("interval: functions clip to their domain") {
    CHECK(is_about(sqrt(Interval(-1.0, 4.0)), 0.0, 2.0));
    CHECK(is_whole_line(sqrt(Interval(-2.0, -1.0))));
    CHECK(log(Interval(-1.0, 1.0)).lower() == -k_infinity);
    CHECK(log(Interval(-1.0, 1.0)).upper() >= 0.0);
    CHECK(is_whole_line(log(Interval(-2.0, 0.0))));
    CHECK(is_whole_line(log10(Interval(-2.0, -1.0))));
    CHECK(is_about(log10(Interval(10.0, 1000.0)), 1.0, 3.0));
    CHECK(is_about(pow10(Interval(-1.0, 2.0)), 0.1, 100.0));
    CHECK(exp(Interval(-1e6, 0.0)).lower() == 0.0);
    CHECK(exp(Interval(0.0, 1e6)).upper() == k_infinity);
    CHECK(exp(Interval(1e6)).lower() == k_largest);
    CHECK(exp(Interval::whole_line()).lower() == 0.0);
}

TEST_CASE("interval: abs and pow turn where they must") {
    CHECK(abs(Interval(-3.0, 2.0)).lower() == 0.0);
    CHECK(abs(Interval(-3.0, 2.0)).upper() == 3.0);
    CHECK(abs(Interval(-3.0, -2.0)).lower() == 2.0);
    CHECK(is_about(pow(Interval(0.5, 2.0), Interval(-1.0, 2.0)), 0.25, 4.0));
    CHECK(is_about(pow(Interval(-1.0, 0.5), Interval(0.0, 1.0)), 0.0, 1.0));
    CHECK(pow(Interval(0.0, 1.0), Interval(-1.0, 1.0)).upper() == k_infinity);
    CHECK(pow(Interval(0.0), 2.0).contains(0.0));
    CHECK(is_whole_line(pow(Interval(-2.0, -1.0), 2.0)));
}

TEST_CASE("interval: a comparison is yes, no, or maybe") {
    const Interval low(1.0, 2.0);
    const Interval touching(2.0, 3.0);
    const Interval high(4.0, 5.0);
    CHECK(is_less(low, high) == Certainty::yes);
    CHECK(is_less(high, low) == Certainty::no);
    CHECK(is_less(low, touching) == Certainty::maybe);
    CHECK(is_less(touching, low) == Certainty::no);
    CHECK(is_at_most(low, touching) == Certainty::yes);
    CHECK(is_at_most(touching, low) == Certainty::maybe);
    CHECK(is_at_most(high, low) == Certainty::no);
    CHECK(is_equal(Interval(2.0), Interval(2.0)) == Certainty::yes);
    CHECK(is_equal(low, low) == Certainty::maybe);
    CHECK(is_equal(low, touching) == Certainty::maybe);
    CHECK(is_equal(low, high) == Certainty::no);
    CHECK(is_equal(high, low) == Certainty::no);
}

TEST_CASE("interval: rounded to 8 decimals, a widened sum decides as its doubles do") {
    const Interval gap = Interval(140.3) - Interval(104.1) - Interval(24.2);
    CHECK(is_equal(gap, Interval(12.0)) == Certainty::no);
    CHECK(is_equal(round_to_8_decimals(gap), round_to_8_decimals(Interval(12.0))) ==
          Certainty::yes);
}

TEST_CASE("interval: a formula over intervals encloses it in doubles for every member") {
    // NOLINTNEXTLINE(cert-msc51-cpp): a failure must be repeatable.
    std::mt19937_64 random(20261201);
    std::uniform_real_distribution<double> unit(0.0, 1.0);
    for (int i = 0; i < 20000; ++i) {
        const double ph = 6.8 + unit(random);
        const double pco2 = 10.0 + 100.0 * unit(random);
        const double ph_width = unit(random) * num::pow10(-12.0 * unit(random));
        const double pco2_width = 10.0 * unit(random) * num::pow10(-12.0 * unit(random));
        const Interval result =
            formula(Interval(ph, ph + ph_width), Interval(pco2, pco2 + pco2_width));
        const double member = formula(ph + ph_width * 0.375, pco2 + pco2_width * 0.625);
        REQUIRE(result.contains(formula(ph, pco2)));
        REQUIRE(result.contains(formula(ph + ph_width, pco2)));
        REQUIRE(result.contains(member));
    }
}
