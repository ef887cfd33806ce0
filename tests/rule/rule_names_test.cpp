// Ids, references and names of a rule set: each fault is told of at its place.
#include "isohydric/diag/render.hpp"
#include "isohydric/rule/dependencies.hpp"
#include "isohydric/rule/rule_names.hpp"
#include "isohydric/rule/sentence.hpp"

#include <doctest/doctest.h>

#include "rule/rule_tree.hpp"
#include <fmt/format.h>

using namespace isohydric;
using test::check_complaint_in_rules;

TEST_CASE("rule set: the tree that the tests start from has no fault") {
    const test::Reading reading = test::read(test::base_tree());
    INFO(diag::render(reading.report));
    REQUIRE(reading.rules != nullptr);
    CHECK(reading.report.diagnostics().empty());
    CHECK(reading.rules->find_quantity("gap") == 0U);
    CHECK(reading.rules->find_condition("hasNa") == 0U);
    CHECK(reading.rules->find_finding("raised-gap") == 0U);
    CHECK(reading.rules->find_disorder("lactic-acidosis") == 2U);
    CHECK(reading.rules->find_interval_name("gap") == 0U);
    CHECK_FALSE(reading.rules->find_quantity("raised-gap").has_value());
    CHECK(reading.rules->disorders[2].kind_of == 0U);
    CHECK(reading.rules->findings[0].asserts == std::vector<std::uint32_t>{2});
}

TEST_CASE("rule set: an id must have the form of its kind") {
    check_complaint_in_rules(
        R"({"quantities": [{"id": @@"anion-gap", "unit": "1", "formula": "1"}]})", "rule-id-form");
    check_complaint_in_rules(R"({"quantities": [{"id": @@"1gap", "unit": "1", "formula": "1"}]})",
                             "rule-id-form");
    check_complaint_in_rules(R"({"findings": [{"id": @@"raisedGap"}]})", "rule-id-form");
    check_complaint_in_rules(R"({"findings": [{"id": @@"-gap"}]})", "rule-id-form");
    check_complaint_in_rules(R"({"findings": [{"id": @@"gap-"}]})", "rule-id-form");
    check_complaint_in_rules(R"({"findings": [{"id": @@"gap--x"}]})", "rule-id-form");
    check_complaint_in_rules(R"({"findings": [{"id": @@"gap.x"}]})", "rule-id-form");
    check_complaint_in_rules(R"({"findings": [{"id": @@""}]})", "rule-id-form");
    check_complaint_in_rules(R"({"conditions": [{"id": @@"limits", "when": "true"}]})",
                             "rule-id-form");
    check_complaint_in_rules(R"({"conditions": [@@{"when": "true"}]})", "json-missing-key");
    check_complaint_in_rules(R"({"conditions": [{"id": @@3, "when": "true"}]})", "json-wrong-kind");
}

TEST_CASE("rule set: an id is used once over all kinds") {
    check_complaint_in_rules(R"({
  "checks": [
    {"id": @@"raised-gap", "when": "true", "then": "warns", "states": "x", $H}
  ]
})",
                             "rule-id-twice");
    check_complaint_in_rules(
        R"({"quantities": [{"id": @@"Na", "unit": "mmol/L", "formula": "Cl", $H}]})",
        "rule-id-twice");
    const test::Reading reading =
        test::read(test::tree_with(R"({"disorders": [{"id": "raised-gap", "label": "x", $H}]})"));
    REQUIRE(reading.report.diagnostics().size() == 1);
    const diag::Note& first = reading.report.diagnostics()[0].notes.at(0);
    CHECK(diag::render(first.place).starts_with("base.json:"));
}

TEST_CASE("rule set: unknown members and wrong kinds of values are told of") {
    check_complaint_in_rules(R"({@@"quantity": []})", "json-unknown-key");
    check_complaint_in_rules(R"({"conditions": [{"id": "a", "when": "true", @@"wehn": "x", $H}]})",
                             "json-unknown-key");
    check_complaint_in_rules(R"({"conditions": [{"id": "a", "when": @@5, $H}]})",
                             "json-wrong-kind");
    check_complaint_in_rules(R"({"conditions": @@{}})", "json-wrong-kind");
    check_complaint_in_rules(R"({"conditions": [@@"a"]})", "json-wrong-kind");
}

TEST_CASE("rule set: references lead to entries of the right kind") {
    const std::string finding =
        R"({"findings": [{"id": "f", "approach": "general", "when": "true", "states": "x", )";
    check_complaint_in_rules(finding + R"("asserts": [@@"lactic"], $H}]})", "rule-id-unknown");
    check_complaint_in_rules(finding + R"("asserts": [@@"raised-gap"], $H}]})", "rule-id-unknown");
    check_complaint_in_rules(finding + R"("unless": [@@"gap"], $H}]})", "rule-id-unknown");
    check_complaint_in_rules(finding + R"("unless": ["raised-gap", @@"raised-gap"], $H}]})",
                             "rule-repeated");
    check_complaint_in_rules(
        R"({"checks": [{"id": "c", "when": "true", "then": "stops", "states": "x", "contradicts": [@@"HCO3reported"], $H}]})",
        "rule-word");
    check_complaint_in_rules(
        R"({"checks": [{"id": "c", "when": "true", "then": @@"halts", "states": "x", $H}]})",
        "rule-word");
    check_complaint_in_rules(
        R"({"criticals": [{"id": "c", "when": "true", "states": "x", "value": @@"hasNa", $H}]})",
        "rule-value-name");
    check_complaint_in_rules(
        R"({"findings": [{"id": "f", "approach": @@"stewart", "when": "true", "states": "x", $H}]})",
        "rule-word");
}

TEST_CASE("rule set: kinds of disorders hang on main ones") {
    check_complaint_in_rules(
        R"({"disorders": [{"id": "d", "label": "d", "kindOf": @@"lactic-acidosis", "approaches": [], $H}]})",
        "rule-disorder-kind");
    check_complaint_in_rules(
        R"({"disorders": [{"id": "d", "label": "d", "main": true, "kindOf": @@"metabolic-acidosis", $H}]})",
        "rule-disorder-kind");
    check_complaint_in_rules(
        R"({"explanations": [{"id": "e", "approach": "bicarbonate", "disorders": [@@"lactic-acidosis"], "onset": null,
             "when": "true", "states": "x", $H}]})",
        "rule-disorder-kind");
}

TEST_CASE("rule set: sentences name numbers in whole braces") {
    const std::string finding =
        R"({"findings": [{"id": "f", "approach": "general", "when": "true", $H, "states": )";
    check_complaint_in_rules(finding + R"("gap @@{gaap}"}]})", "rule-sentence");
    check_complaint_in_rules(finding + R"("gap @@{hasNa}"}]})", "rule-sentence");
    check_complaint_in_rules(finding + R"("gap @@{gap"}]})", "rule-sentence");
    check_complaint_in_rules(finding + R"("gap @@}"}]})", "rule-sentence");
    check_complaint_in_rules(finding + R"("gap @@{{gap}}"}]})", "rule-sentence");
    const test::Reading good = test::read(test::tree_with(
        finding + R"("{gap} {gap:bare} {Na} {limits.gap.high} {context.altitude}"}]})"));
    INFO(diag::render(good.report));
    CHECK(good.rules != nullptr);
}

TEST_CASE("sentence: places are found with their bounds") {
    constexpr std::string_view sentence = "a {x} and {limits.y.low:bare}";
    const auto [places, stray] = rule::find_places(sentence);
    REQUIRE(places.size() == 2);
    CHECK(stray == std::string_view::npos);
    CHECK(sentence.substr(places[0].begin, places[0].end - places[0].begin) == "{x}");
    CHECK(places[0].name == "x");
    CHECK_FALSE(places[0].bare);
    CHECK(places[1].name == "limits.y.low");
    CHECK(places[1].bare);
}

TEST_CASE("rule set: what hangs on itself is told of with the way around") {
    check_complaint_in_rules(R"({"quantities": [
      {"id": @@"a", "label": "a", "unit": "1", "decimals": 0, "formula": "b + 1", $H},
      {"id": "b", "label": "b", "unit": "1", "decimals": 0, "formula": "a - 1", $H}
    ]})",
                             "rule-cycle");
    check_complaint_in_rules(R"({"findings": [
      {"id": @@"f", "approach": "general", "when": "true", "unless": ["g"], "states": "x", $H},
      {"id": "g", "approach": "general", "when": "true", "unless": ["f"], "states": "x", $H}
    ]})",
                             "rule-cycle");
    check_complaint_in_rules(R"({
      "findings": [{"id": "f", "approach": "general", "when": "c", "states": "x", $H}],
      "conditions": [{"id": @@"c", "when": "`f`", $H}]
    })",
                             "rule-cycle");
    const test::Reading reading = test::read(test::tree_with(R"({"conditions": [
      {"id": "a", "when": "b", $H}, {"id": "b", "when": "c", $H}, {"id": "c", "when": "b", $H}]})"));
    REQUIRE(reading.report.diagnostics().size() == 1);
    CHECK(reading.report.diagnostics()[0].message.find("b -> c -> b") != std::string::npos);
}

TEST_CASE("rule set: a line of a thousand references is too deep, and no more is followed") {
    // The search begins with the first entry, so the end of the line comes first.
    const auto line_of = [](int length) {
        std::string rules = R"({"conditions": [)";
        for (int i = length; i > 0; --i) {
            rules += fmt::format(R"({{"id": "c{}", "when": "c{}", $H}}, )", i, i - 1);
        }
        return test::read(test::tree_with(rules + R"({"id": "c0", "when": "true", $H}]})"));
    };
    CHECK(line_of(998).rules != nullptr);
    const test::Reading deep = line_of(1500);
    CHECK(deep.has("rule-too-deep"));
    CHECK_FALSE(deep.has("rule-cycle"));
}

TEST_CASE("rule set: dependencies are direct and counted once") {
    const test::Reading reading = test::read(test::tree_with(R"({
      "quantities": [{"id": "a", "label": "a", "unit": "mmol/L", "decimals": 0, "formula": "gap + gap + Na", $H}],
      "findings": [{"id": "f", "approach": "general", "when": "hasNa and a > 1 'mmol/L'", "unless": ["raised-gap"],
                    "states": "x", $H}]})"));
    REQUIRE(reading.rules != nullptr);
    const rule::RuleNames names(*reading.rules);
    const auto symbol = [&](std::string_view name) {
        return names.find(name).value().symbol;
    };
    CHECK(rule::dependencies_of(*reading.rules, symbol("a")) ==
          std::vector{symbol("gap"), symbol("Na")});
    CHECK(rule::dependencies_of(*reading.rules, symbol("f")) ==
          std::vector{symbol("hasNa"), symbol("a"), symbol("raised-gap")});
    CHECK(rule::dependencies_of(*reading.rules, symbol("Na")).empty());
}

TEST_CASE("rule set: names of every kind are found") {
    const test::Reading reading = test::read(test::base_tree());
    REQUIRE(reading.rules != nullptr);
    const rule::RuleNames names(*reading.rules);
    CHECK(names.find("pHmeasured")->symbol.kind == rule::SymbolKind::analyte);
    CHECK(names.find("rounding.pH")->symbol.kind == rule::SymbolKind::rounding);
    CHECK(names.find("gap")->unit.code() == "mmol/L");
    CHECK(names.find("limits.gap.mid")->symbol.limit_part == rule::LimitPart::mid);
    CHECK(names.find("context.specimen")->type == rule::Type::code);
    CHECK(names.find("raised-gap")->type == rule::Type::truth);
    for (const char* nothing : {"pH",
                                "limits.gap",
                                "limits.gap.top",
                                "limits.x.low",
                                "rounding.x",
                                "context.x",
                                "gap-limits",
                                "",
                                ".",
                                "metabolic-acidosis"}) {
        CAPTURE(nothing);
        CHECK_FALSE(names.find(nothing).has_value());
    }
}
