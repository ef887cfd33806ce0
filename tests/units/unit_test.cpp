// Units by themselves: what codes are read, what they are worth, how values are converted.
#include "isohydric/diag/assert.hpp"
#include "isohydric/units/unit.hpp"

#include <doctest/doctest.h>

#include <array>
#include <cmath>
#include <limits>
#include <string>
#include <string_view>
#include <utility>

namespace diag = isohydric::diag;
namespace units = isohydric::units;
using units::Unit;

namespace {

Unit unit(std::string_view code) {
    auto parsed = units::parse_unit(code);
    REQUIRE_MESSAGE(parsed.has_value(), (parsed ? "" : parsed.error()));
    return *parsed;
}

double converted(double value, std::string_view from, std::string_view to) {
    return units::convert(value, unit(from), unit(to));
}

double ratio(std::string_view from, std::string_view to) {
    return units::factor_between(unit(from), unit(to));
}

std::string fault(std::string_view code) {
    const auto parsed = units::parse_unit(code);
    REQUIRE_FALSE(parsed.has_value());
    return parsed.error();
}

bool mentions(const std::string& text, std::string_view part) {
    return text.find(part) != std::string::npos;
}

/// Half a unit of the last printed digit.
bool prints_as(double value, double printed, double half_digit) {
    return std::abs(value - printed) <= half_digit;
}

}  // namespace

TEST_CASE("unit: a pressure of 1 mmHg is 133.3224 Pa [@nist-sp811, appendix B.8 and footnote 12]") {
    CHECK(prints_as(ratio("mm[Hg]", "Pa"), 133.3224, 0.00005));
    CHECK(ratio("mm[Hg]", "Pa") == 133.322387415);
}

TEST_CASE("unit: 1 psi is 6894.757 Pa, 1 mmH2O is 9.80665 Pa [@nist-sp811, appendix B.8]") {
    CHECK(prints_as(ratio("[psi]", "Pa"), 6894.757, 0.0005));
    CHECK(ratio("mm[H2O]", "Pa") == 9.80665);
}

TEST_CASE("unit: 40 mmHg is 5.33 kPa and a kPa is 7.50062 mmHg, common practice") {
    CHECK(prints_as(converted(40, "mm[Hg]", "kPa"), 5.33, 0.005));
    CHECK(prints_as(ratio("kPa", "mm[Hg]"), 7.50062, 0.000005));
}

TEST_CASE("unit: ratios by prefixes are exact [@ucum, section 4.1]") {
    CHECK(ratio("g/dL", "g/L") == 10);
    CHECK(ratio("mmol/L", "umol/L") == 1000);
    CHECK(ratio("umol/L", "mmol/L") == 0.001);
    CHECK(ratio("mg/dL", "g/L") == 0.01);
    CHECK(ratio("g%", "g/L") == 10);
    CHECK(ratio("%", "1") == 0.01);
    CHECK(ratio("1", "%") == 100);
    CHECK(ratio("[ppth]", "%") == 0.1);
    CHECK(ratio("hPa", "mbar") == 1);
    CHECK(ratio("kPa", "mbar") == 10);
    CHECK(ratio("10*3", "1") == 1000);
    CHECK(ratio("Ym", "ym") == 1e48);
}

TEST_CASE("unit: converted decimal values are the nearest doubles of the exact ones") {
    for (const double value : {0.1, 0.3, 2.1, 3.9, 7.21, 88.4, 104.7, 138.0}) {
        CHECK(converted(value, "umol/L", "mmol/L") == value / 1000);
        CHECK(converted(value, "g/dL", "g/L") == value * 10);
        CHECK(converted(value, "%", "1") == value / 100);
    }
}

TEST_CASE("unit: 98.6 degF is 37 degC, 32 degF is 0 degC, -40 is both [@ucum, section 4.4]") {
    CHECK(converted(98.6, "[degF]", "Cel") == doctest::Approx(37).epsilon(1e-14));
    CHECK(std::abs(converted(32, "[degF]", "Cel")) < 1e-12);
    CHECK(converted(-40, "Cel", "[degF]") == doctest::Approx(-40).epsilon(1e-13));
    CHECK(converted(37, "Cel", "K") == 37 + 273.15);
    CHECK(unit("Cel").has_offset());
    CHECK(unit("[degF]").has_offset());
    CHECK_FALSE(unit("K").has_offset());
}

TEST_CASE("unit: times of the calendar [@ucum, section 4.3]") {
    CHECK(ratio("h", "min") == 60);
    CHECK(ratio("d", "h") == 24);
    CHECK(ratio("wk", "d") == 7);
    CHECK(ratio("a", "d") == 365.25);
    CHECK(ratio("a", "mo") == 12);
}

TEST_CASE("unit: between equal units a value comes back bit for bit") {
    const std::array<std::pair<const char*, const char*>, 5> equal{{{"mmol/L", "meq/l"},
                                                                    {"mosm/kg{H2O}", "mmol/kg"},
                                                                    {"hPa", "mbar"},
                                                                    {"mm[Hg]", "mm[Hg]"},
                                                                    {"[degF]", "[degF]"}}};
    for (const auto& [from, to] : equal) {
        CHECK(unit(from) == unit(to));
        for (const double value : {0.1, 7.4, -3.3, 1e-300, 1.7e308, 5e-324}) {
            CHECK(converted(value, from, to) == value);
        }
    }
    CHECK(std::isnan(converted(std::numeric_limits<double>::quiet_NaN(), "kPa", "mm[Hg]")));
}

TEST_CASE("unit: mol, eq and osm are one dimension [@ucum, section 4.4]") {
    CHECK(units::commensurable(unit("mmol/L"), unit("meq/L")));
    CHECK(units::commensurable(unit("mosm/kg"), unit("mmol/kg")));
    CHECK_FALSE(units::commensurable(unit("mosm/kg"), unit("mosm/L")));
    CHECK_FALSE(units::commensurable(unit("mg/dL"), unit("mmol/L")));
    CHECK_FALSE(units::commensurable(unit("1"), unit("mmol/L")));
}

TEST_CASE("unit: a bare number, [pH], % and annotations alone are dimensionless") {
    for (const std::string_view code : {"1", "[pH]", "%", "[ppth]", "10*-3", "{ratio}", "mL/dL"}) {
        CHECK(units::commensurable(unit(code), units::one()));
    }
    CHECK(unit("[pH]") == units::one());
}

TEST_CASE("unit: operators work from left to right, a leading / divides [@ucum, section 2.2]") {
    CHECK(unit("mol/L.s").dimension() == units::Dimension{.length = -3, .time = 1, .amount = 1});
    CHECK(unit("/L").dimension() == units::Dimension{.length = -3});
    CHECK(unit("mm[Hg].L/mmol").dimension() ==
          units::Dimension{.length = 2, .mass = 1, .time = -2, .amount = -1});
    CHECK(unit("kg.m-1.s-2") == unit("Pa"));
    CHECK(unit("g/m/s2").factor() == unit("mPa").factor());
}

TEST_CASE("unit: the code comes back as it was given") {
    for (const std::string_view code : {"mosm/kg{H2O}", "mmol/l", "/L", "10*-3", "{ratio}"}) {
        CHECK(unit(code).code() == code);
    }
}

TEST_CASE("unit: an unknown atom is named, and what to write instead") {
    CHECK(fault("mEq/L") == "unit \"mEq/L\" cannot be read: \"mEq\" is not known; write \"meq/L\"");
    CHECK(mentions(fault("mmHg"), "write \"mm[Hg]\""));
    CHECK(mentions(fault("MMOL/L"), "did you mean \"mmol/L\"?"));
    CHECK(mentions(fault("mmol/LL"), "\"LL\" is not known"));
    CHECK(mentions(fault("Cel.m"), "write \"K\""));
    CHECK_FALSE(mentions(fault("furlong"), "did you mean"));
}

TEST_CASE("unit: what is no code, or outside the subset, is refused") {
    for (const std::string_view code :
         {"",       " ",       "mmol//L", "mmol/",  ".m",   "m0",    "m-",     "m10",
          "kmin",   "da",      "k",       "12",     "2.m",  "m{a}2", "m{a",    "ma}",
          "{a}mol", "m{{a}}",  "(m)",     "[pH]/L", "/Cel", "Cel2",  "/Cel-1", "mCel",
          "10*31",  "mmol L",  "M",       "C",      "PA",   "m+",    "m--2",   "m99999999999",
          "10*-",   "mmol/L\n"}) {
        CAPTURE(code);
        CHECK_FALSE(units::parse_unit(code).has_value());
    }
    CHECK(mentions(fault("m[Hg]9.m[Hg]9.m[Hg]9"), "out of range"));
    CHECK(mentions(fault(std::string(500, 'm')), "longer than 100 characters"));
}

TEST_CASE("unit: values there and back again differ by rounding only") {
    constexpr std::array k_codes{"mm[Hg]", "kPa", "[psi]", "cm[H2O]", "bar", "Pa", "mbar"};
    for (const char* from : k_codes) {
        for (const char* to : k_codes) {
            for (const double value : {0.7, 5.3, 40.0, 760.0}) {
                const double back = converted(converted(value, from, to), to, from);
                CHECK(std::abs(back - value) <= 1e-15 * value);
            }
        }
    }
}

TEST_CASE("unit: converting between dimensions is our own mistake") {
    CHECK_THROWS_AS(converted(1, "mg/dL", "mmol/L"), diag::InternalError);
    CHECK_THROWS_AS(ratio("m", "s"), diag::InternalError);
}
