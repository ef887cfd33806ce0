// Number operations: values, and what makes a number missing.
#include <doctest/doctest.h>

#include <cmath>

#include "engine/evaluated.hpp"

using isohydric::panel::Analyte;
using isohydric::test::Evaluated;
using isohydric::test::panel_of;
using isohydric::test::RulesByHand;

namespace {

/// The value of a unitless formula over `pHmeasured` and `sO2` (both bare numbers).
std::optional<double> value_of(const std::string& formula,
                               std::initializer_list<std::pair<Analyte, double>> values) {
    RulesByHand rules;
    const auto wanted = rules.quantity("wanted", formula, "1");
    return Evaluated(rules, {panel_of(values)}).quantity(wanted);
}

std::optional<double> value_of(const std::string& formula, double x) {
    return value_of(formula, {{Analyte::ph, x}});
}

}  // namespace

TEST_CASE("numbers: operators and functions give their value") {
    CHECK(value_of("pHmeasured + 1", 7.0) == 8.0);
    CHECK(value_of("pHmeasured - 1", 7.0) == 6.0);
    CHECK(value_of("pHmeasured * 3", 7.0) == 21.0);
    CHECK(value_of("pHmeasured / 2", 7.0) == 3.5);
    CHECK(value_of("-pHmeasured", 7.0) == -7.0);
    CHECK(value_of("(pHmeasured - 9).abs()", 7.0) == 2.0);
    CHECK(value_of("pHmeasured.sqrt()", 9.0) == 3.0);
    CHECK(value_of("(pHmeasured - 7).exp()", 7.0) == 1.0);
    CHECK(value_of("(pHmeasured - 6).ln()", 7.0) == 0.0);
    CHECK(value_of("pHmeasured.power(2)", 7.0) == 49.0);
    CHECK(std::abs(value_of("pHmeasured.log(2)", 8.0).value() - 3.0) < 1e-15);
}

TEST_CASE("numbers: power of a negative base needs a whole exponent") {
    CHECK(value_of("(pHmeasured - 9).power(3)", 7.0) == -8.0);
    CHECK(value_of("(pHmeasured - 9).power(2)", 7.0) == 4.0);
    CHECK(value_of("(pHmeasured - 9).power(-2)", 7.0) == 0.25);
    CHECK(value_of("(pHmeasured - 9).power(0)", 7.0) == 1.0);
    CHECK_FALSE(value_of("(pHmeasured - 9).power(0.5)", 7.0));
    CHECK_FALSE(value_of("(pHmeasured - 7).power(-1)", 7.0));
}

TEST_CASE("numbers: outside a function's domain the result is missing") {
    CHECK_FALSE(value_of("pHmeasured / (pHmeasured - 7)", 7.0));
    CHECK_FALSE(value_of("(pHmeasured - 7) / (pHmeasured - 7)", 7.0));
    CHECK_FALSE(value_of("(pHmeasured - 7).ln()", 7.0));
    CHECK_FALSE(value_of("(pHmeasured - 8).ln()", 7.0));
    CHECK_FALSE(value_of("pHmeasured.log(1)", 7.0));
    CHECK_FALSE(value_of("pHmeasured.log(pHmeasured - 9)", 7.0));
    CHECK_FALSE(value_of("(pHmeasured - 8).sqrt()", 7.0));
}

TEST_CASE("numbers: an overflow is missing") {
    CHECK_FALSE(value_of("pHmeasured.exp()", 1000.0));
    CHECK_FALSE(value_of("pHmeasured * pHmeasured", 1e200));
    CHECK_FALSE(value_of("pHmeasured.power(200)", 1e10));
}

TEST_CASE("numbers: an operation on a missing value is missing") {
    for (const char* const formula : {"pHmeasured + sO2",
                                      "sO2 + pHmeasured",
                                      "-pHmeasured",
                                      "pHmeasured.ln()",
                                      "pHmeasured.power(0)",
                                      "0 * pHmeasured"}) {
        CHECK_FALSE(value_of(formula, {{Analyte::so2, 0.9}}));
    }
}

TEST_CASE("numbers: the value under a mask is 0") {
    RulesByHand rules;
    const auto sum = rules.quantity("sum", "pHmeasured + 1", "1");
    const auto quotient = rules.quantity("quotient", "sO2 / 0", "1");
    const Evaluated evaluated(rules, {panel_of({{Analyte::so2, 0.5}})});
    for (const auto index : {sum, quotient}) {
        const auto slot = evaluated.program().quantity(index).value();
        CHECK(evaluated.scratch().missing(slot, 0));
        CHECK(evaluated.scratch().number(slot, 0) == 0.0);
    }
}

TEST_CASE("numbers: iif takes one side only") {
    const char* const formula = "iif(sO2.exists(), sO2, pHmeasured)";
    CHECK(value_of(formula, {{Analyte::so2, 0.9}}) == 0.9);
    CHECK(value_of(formula, {{Analyte::ph, 7.4}}) == 7.4);
    CHECK_FALSE(value_of(formula, {}));
}

TEST_CASE("numbers: of several alternatives the first present one counts") {
    RulesByHand rules;
    const auto ph =
        rules.first_of("pH", {{"measured", "pHmeasured"}, {"from saturation", "sO2 + 6"}}, "1");
    const Evaluated evaluated(rules,
                              {panel_of({{Analyte::ph, 7.4}, {Analyte::so2, 0.5}}),
                               panel_of({{Analyte::so2, 0.5}}),
                               panel_of({})});
    CHECK(evaluated.quantity(ph, 0) == 7.4);
    CHECK(evaluated.quantity(ph, 1) == 6.5);
    CHECK_FALSE(evaluated.quantity(ph, 2));
    const auto alternatives = evaluated.program().alternatives(ph);
    REQUIRE(alternatives.size() == 2);
    CHECK(evaluated.scratch().value(alternatives[1], 0) == 6.5);
    CHECK_FALSE(evaluated.scratch().value(alternatives[0], 1));
}

TEST_CASE("numbers: a censored value is missing") {
    RulesByHand rules;
    const auto ph = rules.quantity("pH", "pHmeasured", "1");
    auto panel = panel_of({{Analyte::ph, 7.4}});
    panel[Analyte::ph]->censoring = isohydric::panel::Censoring::below;
    CHECK_FALSE(Evaluated(rules, {panel}).quantity(ph));
}

TEST_CASE("numbers: rounding is half a unit of the last digit entered") {
    RulesByHand rules;
    const auto rounding = rules.quantity("r", "rounding.pH", "1");
    CHECK(Evaluated(rules, {panel_of({{Analyte::ph, 7.4}})}).quantity(rounding) == 0.05);
    CHECK_FALSE(Evaluated(rules, {panel_of({})}).quantity(rounding));
}
