// The two printed forms: numbers for another engine, words for people.
#include "rule/expression_fixture.hpp"

namespace isohydric::rule::testing {
namespace {

std::string plain(const std::string& expression, const Wanted& wanted) {
    Text text(expression);
    const ExpressionPtr read = text.read(wanted);
    REQUIRE_MESSAGE(read != nullptr, ids(text.report));
    return plain_text(*read);
}

}  // namespace

TEST_CASE("number form: every name becomes one plain identifier, and no two names the same") {
    CHECK(form("limits.pH.low > pH", truth()) == "(v_limits_pH_low > v_pH)");
    CHECK(form("`raised-gap` or `gas.low`", truth()) == "(v_raised__gap or v_gas_low)");
    CHECK(form("rounding.Na + Na", number()) == "(v_rounding_Na + v_Na)");
    CHECK(form("context.age", number()) == "v_context_age");
}

TEST_CASE("number form: numbers have no exponent, and no sign without parentheses") {
    CHECK(form("0.0000001", number("1")) == "0.0000001");
    CHECK(form("1000000000000000", number("1")) == "1000000000000000");
    CHECK(form("-7.10", number("1")) == "(-7.1)");
    CHECK(form("-pH", number("1")) == "(0 - v_pH)");
    CHECK(
        form("temperature > 0 '[degF]'", truth()).starts_with("(v_temperature > (-17.7777777777"));
}

TEST_CASE("number form: it reads back as the same tree [@hl7-fhirpath, grammar]") {
    // With every name unitless, the number form is an expression of the language itself.
    for (const std::string expression :
         {"pH + 1 < 7 - pH * 2 / 3 and (pH = 7) = true",
          "(pH > 7).not() implies pH.exists() or pH.empty() xor true",
          "(-pH).abs().ln().exp() != 10.power(-2).log(2)"}) {
        const std::string once = form(expression, truth());
        std::string again = once;
        for (std::size_t at = again.find("v_"); at != std::string::npos; at = again.find("v_")) {
            again.erase(at, 2);
        }
        CHECK(form(again, truth()) == once);
    }
}

TEST_CASE("plain text: units are dropped where the number is in the unit of evaluation") {
    CHECK(plain("1.5 'mm[Hg].L/mmol' * HCO3 + 8 'mm[Hg]'", number("mm[Hg]")) == "1.5 x HCO3 + 8");
    CHECK(plain("pCO2 > 45 'mm[Hg]'", truth()) == "pCO2 > 45");
    CHECK(plain("pCO2 > 6 'kPa'", truth()) == "pCO2 > 6 kPa");
    CHECK(plain("0.230 'mmol/L/kPa' * pCO2", number("mmol/L")) == "0.230 mmol/L/kPa x pCO2");
    CHECK(plain("pCO2kPa + pCO2", number("kPa")) == "pCO2kPa + pCO2");
}

TEST_CASE("plain text: parentheses stand only where they are needed") {
    CHECK(plain("(Na + Cl) + HCO3", number()) == "Na + Cl + HCO3");
    CHECK(plain("Na - (Cl + HCO3)", number()) == "Na - (Cl + HCO3)");
    CHECK(plain("Na - (Cl - HCO3)", number()) == "Na - (Cl - HCO3)");
    CHECK(plain("(Na + Cl) * 2", number()) == "(Na + Cl) x 2");
    CHECK(plain("-(Na + Cl)", number()) == "-(Na + Cl)");
    CHECK(plain("pH / (2 * 3)", number()) == "pH / (2 x 3)");
    CHECK(plain("pH / (2 / 3)", number()) == "pH / (2 / 3)");
    CHECK(plain("(lowGas or context.near) and pH < 7", truth()) == "(lowGas or near) and pH < 7");
    CHECK(plain("lowGas or context.near and pH < 7", truth()) == "lowGas or near and pH < 7");
    CHECK(plain("(pH < 7) = (pH > 6)", truth()) == "pH < 7 = pH > 6");
    CHECK(plain("(lowGas = true) = true", truth()) == "(lowGas = yes) = yes");
    CHECK(plain("lowGas implies (lowGas implies lowGas)", truth()) ==
          "lowGas implies (lowGas implies lowGas)");
}

TEST_CASE("plain text: names and functions in words") {
    CHECK(plain("pH < limits.pH.low or pH > limits.pH.high", truth()) ==
          "pH < lower limit of pH or pH > upper limit of pH");
    CHECK(plain("rounding.Na > 1 'mmol/L'", truth()) == "rounding of Na > 1");
    CHECK(plain("context.onset = 'chronic' and context.specimen != 'venous'", truth()) ==
          "onset is chronic and specimen is not venous");
    CHECK(plain("`raised-gap` and Na.exists() and Cl.empty()", truth()) ==
          "raised-gap and Na is given and Cl is missing");
    CHECK(plain("lowGas.not()", truth()) == "not (lowGas)");
    CHECK(plain("10.power(pH - 6.1)", number()) == "10^(pH - 6.1)");
    CHECK(plain("(pH - 7.4).abs()", number()) == "|pH - 7.4|");
    CHECK(plain("pH.ln() + pH.log(10) + pH.sqrt()", number()) ==
          "ln(pH) + log(pH, base 10) + sqrt(pH)");
    CHECK(plain("iif(context.near, pH, 7)", number()) == "(if near then pH, else 7)");
}

TEST_CASE("plain text: a caller's names take the place of the plain ones") {
    Text text("anionGap > 12 'mmol/L'");
    const ExpressionPtr read = text.read(truth());
    REQUIRE(read != nullptr);
    CHECK(plain_text(*read, [](const Expression&) { return std::string("anion gap"); }) ==
          "anion gap > 12");
}

}  // namespace isohydric::rule::testing
