// Numbers and quantities as people write them.
#include "isohydric/units/quantity_text.hpp"

#include <doctest/doctest.h>

#include <array>
#include <string>
#include <string_view>

namespace units = isohydric::units;
using units::Censoring;
using units::DecimalMark;
using units::parse_number;
using units::split_quantity;

namespace {

struct Reading {
    std::string_view text;
    double value;
    int decimals;
    std::string_view digits;
};

bool mentions(const std::string& text, std::string_view part) {
    return text.find(part) != std::string::npos;
}

}  // namespace

TEST_CASE("number: what people write is read with its last digit") {
    constexpr std::array<Reading, 21> k_readings{{
        {"7.21", 7.21, 2, "7.21"},
        {"7,21", 7.21, 2, "7.21"},
        {"140", 140, 0, "140"},
        {"+3", 3, 0, "3"},
        {"-4.5", -4.5, 1, "-4.5"},
        {"\u22124.5", -4.5, 1, "-4.5"},
        {"7.40", 7.4, 2, "7.40"},
        {".5", 0.5, 1, "0.5"},
        {"-,5", -0.5, 1, "-0.5"},
        {"1e3", 1000, -3, "1e3"},
        {"1.5E-3", 0.0015, 4, "1.5e-3"},
        {"2e+1", 20, -1, "2e1"},
        {" 7.4\t", 7.4, 1, "7.4"},
        {"\u00a07.4", 7.4, 1, "7.4"},
        {"0,123", 0.123, 3, "0.123"},
        {"1234,567", 1234.567, 3, "1234.567"},
        {"1.234", 1.234, 3, "1.234"},
        {"1,23", 1.23, 2, "1.23"},
        {"7.4\u2009", 7.4, 1, "7.4"},
        {"1,2345", 1.2345, 4, "1.2345"},
        {"007", 7, 0, "007"},
    }};
    for (const Reading& reading : k_readings) {
        CAPTURE(reading.text);
        const auto number = parse_number(reading.text);
        REQUIRE(number.has_value());
        CHECK(number->value == reading.value);
        CHECK(number->decimals == reading.decimals);
        CHECK(number->digits == reading.digits);
    }
}

TEST_CASE("number: anything else is refused") {
    for (const std::string_view text :
         {"",      " ",     "1,234.5", "1.234,5",       "7..2",  "7.",         "7,",
          ".",     "-",     "+",       "--5",           "+-5",   "0x10",       "nan",
          "inf",   "-inf",  "NaN",     "abc",           "7.2.1", "7 .2",       "1e",
          "e5",    "1e400", "1e-400",  "1e99999999999", "1 234", "1\u2009234", "5-",
          "1'234", "<0.5",  "5%"}) {
        CAPTURE(text);
        CHECK_FALSE(parse_number(text).has_value());
    }
}

TEST_CASE("number: a comma before three digits is ambiguous, and both readings are said") {
    for (const std::string_view text : {"1,234", "12,345", "-7,210", "140,000", "1,234e2"}) {
        CAPTURE(text);
        CHECK_FALSE(parse_number(text).has_value());
    }
    CHECK(mentions(parse_number("1,234").error(), "1.234 or 1234"));
}

TEST_CASE("number: where commas are known to be decimal, they are, and a point is refused") {
    CHECK(parse_number("1,234", DecimalMark::comma)->value == 1.234);
    CHECK(parse_number("7,21", DecimalMark::comma)->value == 7.21);
    CHECK(parse_number("140", DecimalMark::comma)->value == 140);
    CHECK_FALSE(parse_number("7.21", DecimalMark::comma).has_value());
}

TEST_CASE("number: long text is refused before it is read") {
    CHECK(mentions(parse_number(std::string(400, '9')).error(), "longer than 40 characters"));
    CHECK(parse_number(std::string(400, '9')).error().size() < 120);
    CHECK_FALSE(parse_number("0." + std::string(400, '0') + "1").has_value());
    CHECK(parse_number(std::string(39, '9')).has_value());
}

TEST_CASE("quantity: number and unit are separated, however they stand together") {
    struct Split {
        std::string_view text;
        double value;
        std::string_view unit;
    };

    constexpr std::array<Split, 19> k_splits{{
        {"3.9kPa", 3.9, "kPa"},
        {"3.9 kPa", 3.9, "kPa"},
        {"2.1g/dL", 2.1, "g/dL"},
        {"7.21", 7.21, ""},
        {"140 mmol/L", 140, "mmol/L"},
        {"5.3 'kPa'", 5.3, "kPa"},
        {"5.3'kPa'", 5.3, "kPa"},
        {"5.3 \"mm Hg\"", 5.3, "mm Hg"},
        {"40mm Hg", 40, "mm Hg"},
        {"97%", 97, "%"},
        {"97 %", 97, "%"},
        {"37\u00b0C", 37, "\u00b0C"},
        {"2eq/L", 2, "eq/L"},
        {"1e2eq/L", 100, "eq/L"},
        {"5.3\u2009kPa", 5.3, "kPa"},
        {"-3 mmol/L", -3, "mmol/L"},
        {"5,3\u00a0kPa", 5.3, "kPa"},
        {"4 10*-3", 4, "10*-3"},
        {"5.3 ''", 5.3, ""},
    }};
    for (const Split& split : k_splits) {
        CAPTURE(split.text);
        const auto quantity = split_quantity(split.text);
        REQUIRE(quantity.has_value());
        CHECK(quantity->number.value == split.value);
        CHECK(quantity->unit == split.unit);
        CHECK(quantity->censoring == Censoring::none);
    }
}

TEST_CASE("quantity: bounds are kept as bounds") {
    for (const std::string_view text : {"<0.5", "<=0.5", "\u22640.5", "< 0.5 mmol/L"}) {
        CHECK(split_quantity(text)->censoring == Censoring::below);
        CHECK(split_quantity(text)->number.value == 0.5);
    }
    for (const std::string_view text : {">20", ">= 20", "\u226520", " >20mmol/L"}) {
        CHECK(split_quantity(text)->censoring == Censoring::above);
        CHECK(split_quantity(text)->number.value == 20);
    }
}

TEST_CASE("quantity: what goes on like a number, or has no number, is refused") {
    for (const std::string_view text : {"",
                                        "kPa",
                                        "<",
                                        "1,234 mmol/L",
                                        "1,234.5 mmol/L",
                                        "12 345 mmol/L",
                                        "1\u2009234",
                                        "4-5 kPa",
                                        "4 -5",
                                        "4\u22125",
                                        "5.3 'kPa",
                                        "5.3 kPa'",
                                        "5.3 'kPa\"",
                                        "5.3 'k'Pa'",
                                        "nan kPa",
                                        "<>5",
                                        "<<5",
                                        "7.4.1",
                                        "7.4 .1"}) {
        CAPTURE(text);
        CHECK_FALSE(split_quantity(text).has_value());
    }
}

TEST_CASE("quantity: the message shows what was found") {
    CHECK(split_quantity("12 345 mmol/L").error() ==
          "\"12 345 mmol/L\" cannot be read: \"345 mmol/L\" follows the number");
    CHECK(mentions(split_quantity("kPa").error(), "there is no number"));
    CHECK(mentions(split_quantity("5.3 'kPa").error(), "no partner"));
    const std::string cut =
        parse_number("abc" + std::string(36, 'x') + "\u00b5\u00b5\u00b5\u00b5").error();
    CHECK(mentions(cut, "x\u00b5...\""));
}
