// Names, types, units and codes: what the checker accepts, what it makes of it, and where it points when it refuses.
#include "isohydric/panel/context.hpp"
#include "isohydric/rule/walk.hpp"

#include <cmath>
#include <functional>
#include <string_view>

#include "rule/expression_fixture.hpp"

namespace isohydric::rule::testing {
namespace {

/// Every number literal of a correct expression, in reading order.
std::vector<double> literals(const std::string& expression, const Wanted& wanted) {
    Text text(expression);
    const ExpressionPtr read = text.read(wanted);
    REQUIRE_MESSAGE(read != nullptr, ids(text.report));
    std::vector<double> numbers;
    for_each_node(*read, [&numbers](const Expression& node) {
        if (node.kind == NodeKind::number_literal) {
            numbers.push_back(node.number);
        }
    });
    return numbers;
}

/// A formula's value with the given values for names: a small evaluator of sums, products and literals of its own.
double value(const Expression& node, const std::function<double(const std::string&)>& of) {
    const auto child = [&](std::size_t i) {
        return value(*node.children[i], of);
    };
    if (node.kind == NodeKind::name) {
        return of(node.text);
    }
    if (node.kind == NodeKind::number_literal) {
        return node.number;
    }
    if (node.kind == NodeKind::negate) {
        return -child(0);
    }
    REQUIRE(node.children.size() == 2);
    if (node.kind == NodeKind::add || node.kind == NodeKind::subtract) {
        return child(0) + (node.kind == NodeKind::add ? child(1) : -child(1));
    }
    REQUIRE((node.kind == NodeKind::multiply || node.kind == NodeKind::divide));
    return node.kind == NodeKind::multiply ? child(0) * child(1) : child(0) / child(1);
}

double value(const std::string& formula,
             std::string_view unit,
             const std::function<double(const std::string&)>& of) {
    Text text(formula);
    const ExpressionPtr read = text.read(number(unit));
    REQUIRE_MESSAGE(read != nullptr, ids(text.report));
    CHECK(read->unit == units::parse_unit(unit).value());
    return value(*read, of);
}

// 1 mmHg is 133.322387415 Pa, the conventional millimetre of mercury [@ucum, table 4, with more digits].
constexpr double k_mmHg_per_kPa = 1000 / 133.322387415;

}  // namespace

TEST_CASE("checker: a literal is converted to the unit of the name beside it") {
    CHECK(literals("45 'mm[Hg]' < pCO2", truth()) == std::vector{45.0});
    CHECK(literals("6 'kPa' < pCO2", truth())[0] == doctest::Approx(45.003695).epsilon(1e-7));
    CHECK(literals("pCO2 >= 6 'kPa'", truth())[0] ==
          doctest::Approx(6 * k_mmHg_per_kPa).epsilon(1e-14));
    // Decimal steps are exact.
    CHECK(literals("albumin < 3.5 'g/dL'", truth()) == std::vector{35.0});
    CHECK(literals("Na > 0.14 'mol/L'", truth()) == std::vector{140.0});
    CHECK(literals("Na > 140 'meq/L'", truth()) == std::vector{140.0});
}

TEST_CASE("checker: the result is converted to the unit of its owner") {
    CHECK(literals("45 'mm[Hg]'", number("kPa"))[0] ==
          doctest::Approx(45 / k_mmHg_per_kPa).epsilon(1e-14));
    CHECK(form("Na", number("mol/L")) == "(v_Na * 0.001)");
    CHECK(form("Na", number("mmol/L")) == "v_Na");
    CHECK(form("Na", number()) == "v_Na");
}

TEST_CASE("checker: a coefficient takes over the factor of its product") {
    // Solubility of CO2 0.230 mmol/L/kPa is 0.0307 mmol/L/mmHg to the digits printed.
    const std::vector<double> kPa = literals("0.230 'mmol/L/kPa' * pCO2", number("mmol/L"));
    REQUIRE(kPa.size() == 1);
    CHECK(kPa[0] == doctest::Approx(0.230 / k_mmHg_per_kPa).epsilon(1e-14));
    CHECK(literals("0.0307 'mmol/L/mm[Hg]' * pCO2", number("mmol/L")) == std::vector{0.0307});
    CHECK(literals("pCO2 * 0.0307 'mmol/L/mm[Hg]'", number("mmol/L")) == std::vector{0.0307});
}

TEST_CASE("checker: Winters' formula is the same in mmHg and kPa [@winters1967, abstract]") {
    const auto of = [](const std::string& name) {
        return name == "HCO3" ? 12.0 : 0.0;
    };
    const std::string mmHg = "1.5 'mm[Hg].L/mmol' * HCO3 + 8 'mm[Hg]'";
    CHECK(value(mmHg, "mm[Hg]", of) == 26.0);
    CHECK(value(mmHg, "kPa", of) == doctest::Approx(26 / k_mmHg_per_kPa).epsilon(1e-14));
    CHECK(form(mmHg, number("mm[Hg]")) == "((1.5 * v_HCO3) + 8)");
}

TEST_CASE("checker: operands of different units are brought to one, wherever the literal stands") {
    const auto of = [](const std::string& name) {
        return name == "pCO2" ? 40.0 : 5.0;
    };
    const double sum_mmHg = 40 + 5 * k_mmHg_per_kPa;
    CHECK(value("pCO2 + pCO2kPa", "mm[Hg]", of) == doctest::Approx(sum_mmHg).epsilon(1e-14));
    CHECK(value("pCO2kPa + pCO2", "mm[Hg]", of) == doctest::Approx(sum_mmHg).epsilon(1e-14));
    CHECK(value("pCO2kPa - (-pCO2)", "mm[Hg]", of) == doctest::Approx(sum_mmHg).epsilon(1e-14));
    CHECK(value("pCO2kPa + 0.5 * pCO2 + pCO2 / 2", "mm[Hg]", of) ==
          doctest::Approx(sum_mmHg).epsilon(1e-14));
    CHECK(value("(pCO2kPa + 1 'kPa') * 2 - 2 'kPa' ", "kPa", of) ==
          doctest::Approx(10.0).epsilon(1e-14));
    CHECK(value("HCO3 * pCO2 / HCO3", "kPa", of) ==
          doctest::Approx(40 / k_mmHg_per_kPa).epsilon(1e-14));
}

TEST_CASE("checker: a comparison is evaluated in the unit of a name, not of a product") {
    CHECK(form("1.5 'kPa.L/mmol' * HCO3 > pCO2kPa", truth()) == "((1.5 * v_HCO3) > v_pCO2kPa)");
    CHECK(form("0.5 * pCO2kPa > 20 'kPa'", truth()) == "((0.5 * v_pCO2kPa) > 20)");
}

TEST_CASE("checker: a bare number beside a quantity is refused at its place") {
    CHECK(faults("pCO2 > 45", truth()) == "1:9-11 expression-bare-number");
    CHECK(message("anionGap > 12", truth()) ==
          "12 has no unit, but anionGap is in mmol/L; write 12 'mmol/L'");
    CHECK(faults("HCO3 + 24", number()) == "1:9-11 expression-bare-number");
    CHECK(faults("24", number("mmol/L")) == "1:2-4 expression-bare-number");
    CHECK(faults("sO2 < 0.9", truth()) == "1:8-11 expression-bare-number");
    CHECK(message("sO2 < 0.9", truth()) ==
          "0.9 has no unit, but sO2 is in %; write 0.9 '%', or 90 '%' if it is a fraction");
    CHECK(faults("pH < 7.35", truth()).empty());
    CHECK(faults("2 * HCO3 > 24 'mmol/L'", truth()).empty());
}

TEST_CASE("checker: dimensions that do not agree are refused at the operator") {
    CHECK(faults("pCO2 < HCO3", truth()) == "1:7-8 expression-dimension");
    CHECK(message("pCO2 < HCO3", truth()) ==
          "pCO2 is in mm[Hg], but HCO3 is in mmol/L; no factor brings one to the other");
    CHECK(faults("Na - Cl + pCO2", number()) == "1:10-11 expression-dimension");
    CHECK(faults("albumin < 40 'mmol/L'", truth()) == "1:10-11 expression-dimension");
    CHECK(faults("pH < Na", truth()) == "1:5-6 expression-dimension");
    CHECK(faults("pCO2", number("mmol/L")) == "1:2-6 expression-dimension");
    CHECK(faults("iif(lowGas.exists(), Na, pCO2)", number()) == "1:2-5 expression-dimension");
}

TEST_CASE("checker: every fault of an expression is reported in one run") {
    CHECK(faults("pCO2 > 45 and HCO3 < Natrium and `raised-gap` > 1", truth()) ==
          "1:9-11 expression-bare-number; 1:23-30 expression-unknown-name; "
          "1:35-47 expression-type");
}

TEST_CASE("checker: units are UCUM codes, and a wrong one is pointed at") {
    CHECK(faults("pCO2 > 45 'mmHg'", truth()) == "1:12-18 expression-unit");
    CHECK(faults("Na > 140 'mEq/L'", truth()) == "1:11-18 expression-unit");
    CHECK(faults("Na > 140 ''", truth()) == "1:11-13 expression-unit");
}

TEST_CASE("checker: unknown names come with the nearest one") {
    CHECK(message("pCO > 45 'mm[Hg]'", truth()) == "there is no name pCO; did you mean \"pCO2\"?");
    CHECK(message("limits.pH.lo > pH", truth()) ==
          "there is no name limits.pH.lo; did you mean \"limits.pH.low\"?");
    CHECK(message("`raised-gop`", truth()) ==
          "there is no name `raised-gop`; did you mean \"`raised-gap`\"?");
    CHECK(message("context.specimn = 'arterial'", truth()) ==
          "there is no name context.specimn; did you mean \"context.specimen\"?");
    CHECK(message("raised-gap", truth()) ==
          "there is no name raised; a finding stands in backticks: `raised-gap`");
}

TEST_CASE("checker: types") {
    CHECK(faults("pCO2 and lowGas", truth()) == "1:2-6 expression-type");
    CHECK(message("pCO2 and lowGas", truth()) ==
          "\"and\" takes a truth; found pCO2, a number; compare it: x > 12 'mmol/L', or ask "
          "x.exists()");
    CHECK(faults("lowGas + 1", number()) == "1:2-8 expression-type");
    CHECK(faults("lowGas > 1", truth()) == "1:2-8 expression-type");
    CHECK(faults("pCO2.not()", truth()) == "1:2-6 expression-type");
    CHECK(faults("(pH < 7).abs()", number()) == "1:2-10 expression-type");
    CHECK(faults("pH", truth()) == "1:2-4 expression-type");
    CHECK(faults("pH < 7", number()) == "1:2-8 expression-type");
    CHECK(faults("lowGas = pH", truth()) == "1:11-13 expression-type");
    CHECK(faults("pH = lowGas", truth()) == "1:7-13 expression-type");
    CHECK(form("lowGas = `raised-gap`", truth()) == "(v_lowGas = v_raised__gap)");
    CHECK(form("lowGas != true", truth()) == "(v_lowGas != true)");
    CHECK(form("(lowGas xor `gas.low`) implies context.near", truth()) ==
          "((v_lowGas xor v_gas_low) implies v_context_near)");
}

TEST_CASE("checker: codes are compared for equality with a text of their enumeration only") {
    CHECK(form("context.onset = 'chronic'", truth()) == "(v_context_onset = 'chronic')");
    CHECK(form("'chronic' != context.onset", truth()) == "(v_context_onset != 'chronic')");
    Text text("context.onset = 'chronic'");
    const ExpressionPtr read = text.read(truth());
    REQUIRE(read != nullptr);
    CHECK(panel::k_onset_names.at(read->children[1]->code) == "chronic");
    CHECK(faults("context.onset = 'chronical'", truth()) == "1:18-29 expression-code");
    CHECK(message("context.specimen = 'venus'", truth())
              .starts_with("context.specimen is never 'venus'; did you mean \"venous\"?; its codes "
                           "are arterial, "));
    CHECK(faults("context.onset < 'chronic'", truth()) ==
          "1:2-15 expression-type; 1:18-27 expression-code");
    CHECK(faults("context.onset = context.specimen", truth()) == "1:18-34 expression-code");
    CHECK(faults("context.onset", truth()) == "1:2-15 expression-type");
    CHECK(faults("pH = 'low'", truth()) == "1:7-12 expression-code");
    CHECK(faults("'low' = 'low'", truth()).starts_with("1:2-7 expression-code"));
    CHECK(faults("'low'", truth()) == "1:2-7 expression-code");
    CHECK(faults("context.onset.exists()", truth()) == "1:2-24 expression-code");
}

TEST_CASE("checker: functions without a unit, and those that change the unit") {
    CHECK(form("(HCO3 / (0.0307 'mmol/L/mm[Hg]' * pCO2)).log(10)", number("1")) ==
          "(v_HCO3 / (0.0307 * v_pCO2)).log(10)");
    CHECK(faults("HCO3.ln()", number()) == "1:2-6 expression-dimension");
    CHECK(faults("2.exp()", number("1")).empty());
    CHECK(faults("pH.log(Na)", number()) == "1:9-11 expression-dimension");
    CHECK(form("10.power(pH - 6.1)", number("1")) == "10.power((v_pH - 6.1))");
    CHECK(form("Na.power(2)", number("mmol2/L2")) == "v_Na.power(2)");
    CHECK(form("Na.power(-1)", number("L/mmol")) == "v_Na.power((-1))");
    CHECK(faults("Na.power(0.5)", number()) == "1:11-14 expression-exponent");
    CHECK(faults("Na.power(pH)", number()) == "1:11-13 expression-exponent");
    CHECK(faults("Na.power(10)", number()) == "1:11-13 expression-exponent");
    CHECK(faults("2.power(Na)", number()) == "1:10-12 expression-dimension");
    CHECK(faults("Na.abs()", number("mmol/L")).empty());
    CHECK(faults("Na.sqrt()", number()) == "1:5-9 expression-exponent");
    CHECK(form("area.sqrt()", number("m")) == "v_area.sqrt()");
    CHECK(form("pH.sqrt()", number("1")) == "v_pH.sqrt()");
}

TEST_CASE("checker: the root of a product is brought to the unit wanted, inside and outside") {
    // sqrt(x mmHg kPa) is sqrt(x) sqrt(0.133...) kPa.
    const std::vector<double> factors = literals("(pCO2 * pCO2kPa).sqrt()", number("kPa"));
    REQUIRE(factors.size() == 2);
    CHECK(factors[1] * std::sqrt(factors[0]) ==
          doctest::Approx(std::sqrt(1 / k_mmHg_per_kPa)).epsilon(1e-14));
    CHECK(form("(Na * Cl).sqrt()", number("mmol/L")) == "(v_Na * v_Cl).sqrt()");
}

TEST_CASE("checker: units beyond any use are refused, not computed with") {
    CHECK(faults("Na.power(9)", number()).empty());
    CHECK(faults("Na.power(9).power(9).power(9)", number()).empty());
    CHECK(faults("Na.power(9).power(9).power(9).power(9)", number()) ==
          "1:2-40 expression-dimension");
    CHECK(
        faults("Na > 1 'Ymol/L' * 1 '10*30' * 1 '10*30' * 1 '10*30' * 1 '10*30'", truth()).empty());
    CHECK(faults("Na > 1 '10*30' * 1 '10*30' * 1 '10*30' * 1 '10*30' * 1 '10*30' * 1 'Ymol/L'",
                 truth())
              .ends_with("expression-dimension"));
}

TEST_CASE("checker: temperatures are compared in one unit, and differ in kelvins") {
    CHECK(form("temperature > 38 'Cel'", truth()) == "(v_temperature > 38)");
    CHECK(literals("temperature > 100.4 '[degF]'", truth())[0] ==
          doctest::Approx(38.0).epsilon(1e-14));
    CHECK(form("(temperature - 37 'Cel') * 0.0147 '/K'", number("1")) ==
          "((v_temperature - 37) * 0.0147)");
    CHECK(faults("temperature * 2", number()) == "1:14-15 expression-temperature");
    CHECK(faults("temperature + 1 'Cel'", number()) == "1:14-15 expression-temperature");
    CHECK(faults("-temperature", number()) == "1:2-3 expression-temperature");
    CHECK(faults("temperature.power(2)", number()) == "1:14-19 expression-temperature");
    CHECK(faults("temperature > 310 'K'", truth()) == "1:14-15 expression-temperature");
    CHECK(faults("temperature - 37 'Cel' > 1 'Cel'", truth()) == "1:25-26 expression-temperature");
}

TEST_CASE("checker: iif belongs in formulas") {
    CHECK(form("iif(context.near, pH, 7)", number("1")) == "iif(v_context_near, v_pH, 7)");
    CHECK(faults("iif(context.near, pH, 7) > 7", truth()) == "1:2-5 expression-iif");
    CHECK(faults("iif(pH, 1, 2)", number("1")) == "1:6-8 expression-type");
    CHECK(faults("iif(context.near, lowGas, 7)", number("1")) == "1:20-26 expression-type");
    CHECK(literals("iif(context.near, 6 'kPa', pCO2)", number("mm[Hg]"))[0] ==
          doctest::Approx(45.003695).epsilon(1e-7));
}

TEST_CASE("checker: places of nodes are places in the file") {
    Text text("(pCO2 + 1 'kPa') > 45 'mm[Hg]'");
    const ExpressionPtr read = text.read(truth());
    REQUIRE(read != nullptr);
    CHECK(read->place.span == diag::Span{1, 31});
    CHECK(read->children[0]->place.span == diag::Span{1, 17});
    CHECK(read->children[0]->children[1]->place.span == diag::Span{9, 16});
}

TEST_CASE("checker: names_of lists each name once, in reading order") {
    Text text("Na - Cl - HCO3 > Na + 0 'mmol/L'");
    const ExpressionPtr read = text.read(truth());
    REQUIRE(read != nullptr);
    const SmallTable table;
    std::vector<Symbol> expected;
    for (const std::string name : {"Na", "Cl", "HCO3"}) {
        expected.push_back(table.find(std::vector{name})->symbol);
    }
    CHECK(names_of(*read) == expected);
}

}  // namespace isohydric::rule::testing
