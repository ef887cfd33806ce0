#include "isohydric/num/exp_log.hpp"

#include <doctest/doctest.h>

#include <array>
#include <bit>
#include <cstdint>
#include <limits>
#include <random>
#include <span>
#include <vector>

namespace {

namespace num = isohydric::num;

constexpr double k_infinity = std::numeric_limits<double>::infinity();
constexpr double k_nan = std::numeric_limits<double>::quiet_NaN();
constexpr double k_smallest = std::numeric_limits<double>::denorm_min();

bool is_nan(double x) {
    return x != x;
}

/// The same double, zeros told apart; one NaN is as good as another.
bool same_bits(double a, double b) {
    return (is_nan(a) && is_nan(b)) ||
           std::bit_cast<std::uint64_t>(a) == std::bit_cast<std::uint64_t>(b);
}

/// Doubles of every kind: random bit patterns (NaN and infinity among them), usual sizes, edges.
std::vector<double> all_kinds(std::size_t count) {
    // NOLINTNEXTLINE(cert-msc51-cpp): a failure must be repeatable.
    std::mt19937_64 random(20261201);
    std::vector<double> numbers = {
        0.0, -0.0, 1.0, -1.0, 10.0, 1000.0, 0.001, k_smallest, -k_smallest};
    for (const double edge : {k_infinity, k_nan, 709.782712893384, -745.1332191019411, 308.2547}) {
        numbers.push_back(edge);
        numbers.push_back(-edge);
    }
    std::uniform_real_distribution<double> usual(-20.0, 200.0);
    while (numbers.size() < count) {
        numbers.push_back(std::bit_cast<double>(random()));
        numbers.push_back(usual(random));
    }
    return numbers;
}

template <class One, class Many>
void same_for_arrays(One one, Many many) {
    // Odd sizes leave a remainder beside the vectors; an offset leaves them unaligned.
    for (const std::size_t size : {0U, 1U, 2U, 3U, 7U, 4001U}) {
        const std::vector<double> x = all_kinds(4002);
        std::vector<double> out(size + 1, 42.0);
        many(std::span(x).subspan(1, size), std::span(out).first(size));
        for (std::size_t i = 0; i < size; ++i) {
            REQUIRE_MESSAGE(same_bits(out[i], one(x[i + 1])), "x = ", x[i + 1]);
        }
        CHECK(out[size] == 42.0);
    }
}

}  // namespace

TEST_CASE("exp: special values [@ieee754-2019, clause 9.2.1]") {
    CHECK(num::exp(0.0) == 1.0);
    CHECK(num::exp(-0.0) == 1.0);
    CHECK(num::exp(k_infinity) == k_infinity);
    CHECK(same_bits(num::exp(-k_infinity), 0.0));
    CHECK(is_nan(num::exp(k_nan)));
    CHECK(is_nan(num::exp(-k_nan)));
    CHECK(num::exp(k_smallest) == 1.0);
}

TEST_CASE("exp: overflows and underflows at the ends of the doubles") {
    // ln of the largest double is 709.782712893383973..., of half the smallest -745.133219101941108...
    CHECK(num::exp(709.782712893383973096) < k_infinity);
    CHECK(num::exp(709.78271289338409) == k_infinity);
    CHECK(num::exp(-745.13321910194110) == k_smallest);
    CHECK(num::exp(-745.13321910194122) == 0.0);
    CHECK(num::exp(1e308) == k_infinity);
    CHECK(num::exp(-1e308) == 0.0);
}

TEST_CASE("log and log10: special values [@ieee754-2019, clause 9.2.1]") {
    for (double (*function)(double) : {+[](double x) { return num::log(x); },
                                       +[](double x) {
                                           return num::log10(x);
                                       }}) {
        CHECK(same_bits(function(1.0), 0.0));
        CHECK(function(0.0) == -k_infinity);
        CHECK(function(-0.0) == -k_infinity);
        CHECK(function(k_infinity) == k_infinity);
        CHECK(is_nan(function(-k_infinity)));
        CHECK(is_nan(function(-1.0)));
        CHECK(is_nan(function(-k_smallest)));
        CHECK(is_nan(function(k_nan)));
        CHECK(is_nan(function(-k_nan)));
    }
}

TEST_CASE("log10 and pow10: exact at every power of ten that a double holds") {
    double power = 1.0;
    for (int n = 0; n <= 22; ++n) {
        CHECK(num::pow10(n) == power);
        CHECK(num::log10(power) == n);
        power *= 10.0;
    }
}

TEST_CASE("log10 and pow10: negative powers of ten as a decimal literal reads") {
    const std::array<double, 9> powers = {1e-1, 1e-2, 1e-3, 1e-4, 1e-5, 1e-6, 1e-7, 1e-8, 1e-9};
    for (std::size_t i = 0; i < powers.size(); ++i) {
        const double n = -static_cast<double>(i + 1);
        CHECK(num::pow10(n) == powers.at(i));
        CHECK(num::log10(powers.at(i)) == n);
    }
    CHECK(num::pow10(-323.0) == 1e-323);
    CHECK(num::pow10(-324.0) == 0.0);
    CHECK(num::pow10(308.0) == 1e308);
    CHECK(num::pow10(309.0) == k_infinity);
    CHECK(num::pow10(k_infinity) == k_infinity);
    CHECK(same_bits(num::pow10(-k_infinity), 0.0));
    CHECK(is_nan(num::pow10(k_nan)));
}

TEST_CASE("pow: special values of a base that is not negative [@ieee754-2019, clause 9.2.1]") {
    CHECK(num::pow(0.0, 2.0) == 0.0);
    CHECK(num::pow(0.0, k_smallest) == 0.0);
    CHECK(num::pow(0.0, -2.0) == k_infinity);
    CHECK(num::pow(k_infinity, 0.5) == k_infinity);
    CHECK(num::pow(k_infinity, -0.5) == 0.0);
    CHECK(num::pow(2.0, k_infinity) == k_infinity);
    CHECK(num::pow(2.0, -k_infinity) == 0.0);
    CHECK(num::pow(0.5, k_infinity) == 0.0);
    CHECK(num::pow(0.0, k_infinity) == 0.0);
    CHECK(num::pow(0.0, -k_infinity) == k_infinity);
    CHECK(num::pow(1.0, k_infinity) == 1.0);
    CHECK(num::pow(1.0, 1e300) == 1.0);
    for (const double x : {0.0, 1.0, 7.4, k_infinity, k_nan, -3.0}) {
        CHECK(num::pow(x, 0.0) == 1.0);
        CHECK(num::pow(x, -0.0) == 1.0);
    }
    CHECK(is_nan(num::pow(-2.0, 2.0)));
    CHECK(is_nan(num::pow(k_nan, 2.0)));
    CHECK(is_nan(num::pow(2.0, k_nan)));
    CHECK(is_nan(num::pow(k_infinity, k_nan)));
}

TEST_CASE("pow: exact powers of whole numbers") {
    CHECK(num::pow(2.0, 10.0) == 1024.0);
    CHECK(num::pow(2.0, -1074.0) == k_smallest);
    CHECK(num::pow(2.0, 1023.0) == 0x1p1023);
    CHECK(num::pow(3.0, 33.0) == 5559060566555523.0);
    CHECK(num::pow(0.25, 0.5) == 0.5);
    CHECK(num::pow(10.0, 22.0) == 1e22);
}

TEST_CASE("sqrt and abs: values and edges") {
    CHECK(num::sqrt(2.25) == 1.5);
    CHECK(num::sqrt(2.0) == 0x1.6a09e667f3bcdp+0);
    CHECK(same_bits(num::sqrt(-0.0), -0.0));
    CHECK(num::sqrt(k_infinity) == k_infinity);
    CHECK(is_nan(num::sqrt(-1.0)));
    CHECK(num::abs(-3.5) == 3.5);
    CHECK(same_bits(num::abs(-0.0), 0.0));
    CHECK(num::abs(-k_infinity) == k_infinity);
}

TEST_CASE("arrays: bit for bit what the calls one by one give") {
    using Out = std::span<double>;
    using In = std::span<const double>;
    same_for_arrays([](double x) { return num::exp(x); }, [](In x, Out y) { num::exp(x, y); });
    same_for_arrays([](double x) { return num::log(x); }, [](In x, Out y) { num::log(x, y); });
    same_for_arrays([](double x) { return num::log10(x); }, [](In x, Out y) { num::log10(x, y); });
    same_for_arrays([](double x) { return num::pow10(x); }, [](In x, Out y) { num::pow10(x, y); });
    same_for_arrays([](double x) { return num::sqrt(x); }, [](In x, Out y) { num::sqrt(x, y); });
    same_for_arrays([](double x) { return num::pow(7.4, x); },
                    [](In x, Out y) { num::pow(std::vector<double>(x.size(), 7.4), x, y); });
    same_for_arrays([](double x) { return num::pow(x, -1.5); },
                    [](In x, Out y) { num::pow(x, std::vector<double>(x.size(), -1.5), y); });
}

TEST_CASE("arrays: input and output may be the same, and the shortest decides") {
    std::vector<double> x = {0.0, 1.0, 2.0, 3.0, 4.0};
    num::pow10(x, x);
    CHECK(x == std::vector<double>{1.0, 10.0, 100.0, 1000.0, 10000.0});
    num::log10(std::span(x).first(3), x);
    CHECK(x == std::vector<double>{0.0, 1.0, 2.0, 1000.0, 10000.0});
}
