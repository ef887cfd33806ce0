#include "isohydric/num/rounding.hpp"

#include <doctest/doctest.h>

#include <bit>
#include <cstdint>
#include <limits>

namespace {

namespace num = isohydric::num;

constexpr double k_infinity = std::numeric_limits<double>::infinity();
constexpr double k_nan = std::numeric_limits<double>::quiet_NaN();

bool same_bits(double a, double b) {
    return std::bit_cast<std::uint64_t>(a) == std::bit_cast<std::uint64_t>(b);
}

}  // namespace

// The whole comparison with JavaScript, number by number, is tests/reference/num_text.mjs.

TEST_CASE("rounding: a gap of 12 is 12") {
    const double gap = 140.3 - 104.1 - 24.2;
    CHECK(gap != 12.0);
    CHECK(num::compare_at_8_decimals(gap, 12.0) == 0);
    CHECK(num::compare_at_8_decimals(0.1 + 0.2, 0.3) == 0);
}

TEST_CASE("rounding: the ninth decimal decides, halves upwards [@fhirpath-js, src/numbers.js]") {
    CHECK(num::compare_at_8_decimals(12.000000004, 12.0) == 0);
    CHECK(num::compare_at_8_decimals(12.000000006, 12.0) == 1);
    CHECK(num::compare_at_8_decimals(11.999999994, 12.0) == -1);
    CHECK(num::compare_at_8_decimals(-12.000000006, -12.0) == -1);
    CHECK(num::round_to_8_decimals(5e-9) == 1e-8);
    CHECK(same_bits(num::round_to_8_decimals(-5e-9), -0.0));
    CHECK(num::round_to_8_decimals(-1.5e-8) == -1e-8);
}

TEST_CASE("rounding: huge, tiny and no numbers") {
    CHECK(num::round_to_8_decimals(4.9e-324) == 0.0);
    CHECK(same_bits(num::round_to_8_decimals(-4.9e-324), -0.0));
    CHECK(num::compare_at_8_decimals(1e200, 1.0000000000000002e200) == -1);
    CHECK(num::round_to_8_decimals(1e301) == k_infinity);
    CHECK(num::round_to_8_decimals(-k_infinity) == -k_infinity);
    CHECK(num::compare_at_8_decimals(k_nan, 1.0) == 0);
    const double rounded = num::round_to_8_decimals(k_nan);
    CHECK(rounded != rounded);
}

TEST_CASE("format: half away from zero, of the decimal as written") {
    CHECK(num::format_decimals(2.675, 2) == "2.68");
    CHECK(num::format_decimals(1.005, 2) == "1.01");
    CHECK(num::format_decimals(-2.5, 0) == "-3");
    CHECK(num::format_decimals(7.345, 2) == "7.35");
    CHECK(num::format_decimals(7.3449999999999, 2) == "7.34");
    CHECK(num::format_decimals(9.96, 1) == "10.0");
    CHECK(num::format_decimals(0.96, 0) == "1");
    CHECK(num::format_decimals(99.5, 0) == "100");
    CHECK(num::format_decimals(40.0, 1) == "40.0");
    CHECK(num::format_decimals(1e21, 1) == "1000000000000000000000.0");
}

TEST_CASE("format: never minus zero") {
    CHECK(num::format_decimals(-0.0, 1) == "0.0");
    CHECK(num::format_decimals(-0.04, 1) == "0.0");
    CHECK(num::format_decimals(-0.4, 0) == "0");
    CHECK(num::format_decimals(-0.05, 1) == "-0.1");
    CHECK(num::format_decimals(-5e-324, 3) == "0.000");
    CHECK(num::format_decimals(3.7, -2) == "4");
}

TEST_CASE("shortest: the table of examples [@rfc8785, appendix B]") {
    CHECK(num::shortest(0.0) == "0");
    CHECK(num::shortest(-0.0) == "0");
    CHECK(num::shortest(std::bit_cast<double>(std::uint64_t{0x0000000000000001})) == "5e-324");
    CHECK(num::shortest(std::bit_cast<double>(std::uint64_t{0x8000000000000001})) == "-5e-324");
    CHECK(num::shortest(std::bit_cast<double>(std::uint64_t{0x7fefffffffffffff})) ==
          "1.7976931348623157e+308");
    CHECK(num::shortest(std::bit_cast<double>(std::uint64_t{0x4340000000000000})) ==
          "9007199254740992");
    CHECK(num::shortest(std::bit_cast<double>(std::uint64_t{0x4430000000000000})) ==
          "295147905179352830000");
    CHECK(num::shortest(std::bit_cast<double>(std::uint64_t{0x44b52d02c7e14af5})) ==
          "9.999999999999997e+22");
    CHECK(num::shortest(std::bit_cast<double>(std::uint64_t{0x44b52d02c7e14af6})) == "1e+23");
    CHECK(num::shortest(std::bit_cast<double>(std::uint64_t{0x444b1ae4d6e2ef50})) == "1e+21");
    CHECK(num::shortest(std::bit_cast<double>(std::uint64_t{0x3eb0c6f7a0b5ed8d})) == "0.000001");
    CHECK(num::shortest(std::bit_cast<double>(std::uint64_t{0x3eb0c6f7a0b5ed8c})) ==
          "9.999999999999997e-7");
    CHECK(num::shortest(std::bit_cast<double>(std::uint64_t{0x41b3de4355555553})) ==
          "333333333.3333332");
}

TEST_CASE("shortest: not a number of JSON, still text") {
    CHECK(num::shortest(k_nan) == "NaN");
    CHECK(num::shortest(k_infinity) == "Infinity");
    CHECK(num::shortest(-k_infinity) == "-Infinity");
    CHECK(num::format_decimals(k_nan, 2) == "NaN");
    CHECK(num::format_decimals(-k_infinity, 2) == "-Infinity");
}
