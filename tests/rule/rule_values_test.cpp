// Quantities, models, intervals, tables, explanations and groups.
#include "isohydric/diag/render.hpp"

#include <doctest/doctest.h>

#include "rule/rule_tree.hpp"

using namespace isohydric;
using test::check_complaint_in_rules;

namespace {

std::string quantity(const std::string& members) {
    return R"({"quantities": [{"id": "q", "label": "q", "decimals": 1, $H, )" + members + "}]}";
}

std::string interval(const std::string& members) {
    return R"({"intervals": [{"id": "other-gap", "of": "gap", "unit": "mmol/L", $H, )" + members +
           "}]}";
}

std::string table(const std::string& rows) {
    return R"({"tables": [{"id": "t", "approach": "bicarbonate", $H,
  "axes": [
    {"id": "sodium", "cases": [{"id": "low", "when": "Na < 135 'mmol/L'"}, {"id": "high", "when": "Na > 145 'mmol/L'"}]},
    {"id": "gap", "cases": [{"id": "wide", "when": "gap > 12 'mmol/L'"}]}
  ],
  "rows": [)" +
           rows + "]}]}";
}

}  // namespace

TEST_CASE("quantity: exactly one way to its value") {
    constexpr std::string_view id =
        R"({"quantities": [{"id": @@"q", "label": "q", "decimals": 1, "unit": "1", $H)";
    const auto with = [&](std::string_view members) {
        return std::string(id) + std::string(members) + "}]}";
    };
    check_complaint_in_rules(with(""), "rule-quantity-value");
    check_complaint_in_rules(
        with(R"(, "formula": "1", "firstOf": [{"from": "x", "formula": "1"}])"),
        "rule-quantity-value");
    check_complaint_in_rules(with(R"(, "model": "double.it")"), "rule-quantity-value");
    check_complaint_in_rules(with(R"(, "formula": "1", "inputs": {})"), "rule-quantity-value");
}

TEST_CASE("quantity: units are read, and formulas agree with them") {
    check_complaint_in_rules(quantity(R"("unit": @@"mmool/L", "formula": "Na")"), "rule-unit");
    check_complaint_in_rules(quantity(R"("unit": "mm[Hg]", "formula": "Na", "interval": @@"gap")"),
                             "rule-unit-differs");
    check_complaint_in_rules(quantity(R"("unit": "mmol/L", "formula": "Na", "interval": @@"gip")"),
                             "rule-interval-name");
    const test::Reading wrong =
        test::read(test::tree_with(quantity(R"("unit": "mm[Hg]", "formula": "Na")")));
    CHECK(wrong.rules == nullptr);
    const test::Reading good =
        test::read(test::tree_with(quantity(R"("unit": "umol/L", "formula": "Na")")));
    INFO(diag::render(good.report));
    CHECK(good.rules != nullptr);
}

TEST_CASE("quantity: decimals are a small whole number, and needed unless it is internal") {
    constexpr std::string_view before =
        R"({"quantities": [{"id": "q", "label": "q", "unit": "1", "formula": "1", $H, "decimals": @@)";
    for (const char* wrong : {"1.5", "-1", "10", "1e9"}) {
        check_complaint_in_rules(std::string(before) + wrong + "}]}", "rule-decimals");
    }
    check_complaint_in_rules(
        R"({"quantities": [@@{"id": "q", "label": "q", "unit": "1", "formula": "1", $H}]})",
        "json-missing-key");
    CHECK(
        test::read(
            test::tree_with(
                R"({"quantities": [{"id": "q", "internal": true, "unit": "1", "formula": "1", $H}]})"))
            .rules != nullptr);
}

TEST_CASE("quantity: a model is known, its inputs are all given in commensurable units, its unit "
          "is kept") {
    check_complaint_in_rules(
        quantity(R"("unit": "mm[Hg]", "model": @@"double.its", "inputs": {"x": "pressure38"})"),
        "rule-model-unknown");
    check_complaint_in_rules(
        quantity(R"("unit": "kPa", "model": @@"double.it", "inputs": {"x": "pressure38"})"),
        "rule-unit-differs");
    check_complaint_in_rules(quantity(R"("unit": "mm[Hg]", "model": "double.it", "inputs": @@{})"),
                             "json-missing-key");
    check_complaint_in_rules(
        quantity(
            R"("unit": "mm[Hg]", "model": "double.it", "inputs": {"x": "pressure38", @@"y": "1"})"),
        "json-unknown-key");
    CHECK(test::read(test::tree_with(quantity(
                         R"("unit": "mm[Hg]", "model": "double.it", "inputs": {"x": "Na"})")))
              .rules == nullptr);
    const test::Reading good = test::read(test::tree_with(
        quantity(R"("unit": "mm[Hg]", "model": "double.it", "inputs": {"x": "pressure38"})")));
    INFO(diag::render(good.report));
    REQUIRE(good.rules != nullptr);
    const auto& model = good.rules->quantities.at(2).model;
    REQUIRE(model.has_value());
    CHECK(model->model == 0);
    CHECK(model->inputs.at(0)->unit.code() == "kPa");
}

TEST_CASE("quantity: alternatives keep their order and their words") {
    const test::Reading reading = test::read(test::tree_with(quantity(
        R"("unit": "mmol/L", "firstOf": [{"from": "entered", "formula": "TCO2"}, {"from": "guessed", "formula": "24 'mmol/L'"}])")));
    REQUIRE(reading.rules != nullptr);
    const auto& alternatives = reading.rules->quantities.at(2).alternatives;
    REQUIRE(alternatives.size() == 2);
    CHECK(alternatives[0].from == "entered");
    CHECK(alternatives[1].formula->number == 24);
    check_complaint_in_rules(quantity(R"("unit": "mmol/L", "firstOf": [@@{"formula": "TCO2"}])"),
                             "json-missing-key");
    check_complaint_in_rules(quantity(R"("unit": "mmol/L", "firstOf": @@[])"),
                             "rule-quantity-value");
}

TEST_CASE("interval: limits rise, and there is one at least") {
    constexpr std::string_view before =
        R"({"intervals": [{"id": @@"i", "of": "x", "unit": "mmol/L", $H)";
    for (const char* wrong : {R"(, "low": 5, "high": 5)",
                              R"(, "low": 5, "mid": 4)",
                              R"(, "mid": 5, "high": 4)",
                              R"(, "low": 5, "high": 4)"}) {
        check_complaint_in_rules(std::string(before) + wrong + "}]}", "rule-interval-order");
    }
    check_complaint_in_rules(std::string(before) + "}]}", "rule-interval-empty");
    CHECK(test::read(
              test::tree_with(
                  R"({"intervals": [{"id": "i", "of": "x", "unit": "mmol/L", "mid": 24, $H}]})"))
              .rules != nullptr);
}

TEST_CASE("interval: all of a name are in one unit") {
    check_complaint_in_rules(
        R"({"intervals": [{"id": "i", "of": "gap", "unit": @@"mm[Hg]", "low": 4, "for": {"population": ["child"]}, $H}]})",
        "rule-unit-differs");
    check_complaint_in_rules(
        R"({"intervals": [{"id": "i", "of": "x", "unit": @@"mmol/", "low": 4, $H}]})", "rule-unit");
}

TEST_CASE("interval: ages become years of 365.25 days, altitudes metres [@ucum, table 3]") {
    const test::Reading reading = test::read(test::tree_with(R"({"intervals": [
      {"id": "i", "of": "x", "unit": "mmol/L", "low": 4, "shippedLimit": true, "shownAs": "of a child",
       "for": {"specimen": ["venous", "arterial"], "population": ["child"], "age": {"from": "28 d", "below": "18 a"},
               "altitude": {"from": "1.5 km"}}, $H}]})"));
    INFO(diag::render(reading.report));
    REQUIRE(reading.rules != nullptr);
    const rule::Interval& interval = reading.rules->intervals.at(1);
    CHECK(reading.rules->interval_names.at(interval.name) == "x");
    CHECK(*interval.age_a.from == doctest::Approx(28 / 365.25).epsilon(1e-12));
    CHECK(interval.age_a.below == 18.0);
    CHECK(interval.needs_age);
    CHECK(interval.altitude_m.from == 1500.0);
    CHECK_FALSE(interval.altitude_m.below.has_value());
    CHECK(interval.specimens == std::vector{panel::Specimen::venous, panel::Specimen::arterial});
    CHECK(interval.populations == std::vector{panel::Population::child});
    CHECK(interval.shipped_default);
    CHECK(interval.shown_as == "of a child");
}

TEST_CASE("interval: contexts are words and amounts of the right kind") {
    check_complaint_in_rules(interval(R"("low": 1, "for": {"specimen": [@@"artery"]})"),
                             "rule-word");
    check_complaint_in_rules(interval(R"("low": 1, "for": {"population": [@@"child "]})"),
                             "rule-word");
    check_complaint_in_rules(interval(R"("low": 1, "for": {"age": {"from": @@"28 mmol"}})"),
                             "rule-unit");
    check_complaint_in_rules(interval(R"("low": 1, "for": {"age": {"from": @@"28"}})"),
                             "rule-unit");
    check_complaint_in_rules(interval(R"("low": 1, "for": {"age": {"from": @@"<28 d"}})"),
                             "rule-unit");
    check_complaint_in_rules(
        interval(R"("low": 1, "for": {"age": @@{"from": "2 a", "below": "2 a"}})"),
        "rule-interval-order");
    check_complaint_in_rules(interval(R"("low": 1, "for": {@@"method": "x"})"), "json-unknown-key");
}

TEST_CASE("interval: two of a name that can hold at once are told of, with both named") {
    check_complaint_in_rules(
        R"({"intervals": [{"id": @@"i", "of": "gap", "unit": "mmol/L", "low": 3, $H}]})",
        "rule-interval-overlap");
    const auto pair = [](const std::string& first, const std::string& second) {
        return R"({"intervals": [{"id": "a", "of": "x", "unit": "1", "low": 1, $H, "for": )" +
               first + R"(}, {"id": @@"b", "of": "x", "unit": "1", "low": 1, $H, "for": )" +
               second + "}]}";
    };
    const auto apart = [&](const std::string& first, const std::string& second) {
        std::string rules = pair(first, second);
        rules.erase(rules.find("@@"), 2);
        return test::read(test::tree_with(rules)).rules != nullptr;
    };
    const std::string young = R"({"age": {"below": "18 a"}})";
    const std::string old = R"({"age": {"from": "18 a"}})";
    check_complaint_in_rules(pair(young, R"({"age": {"from": "17.9 a"}})"),
                             "rule-interval-overlap");
    check_complaint_in_rules(pair(young, R"({"specimen": ["venous"]})"), "rule-interval-overlap");
    check_complaint_in_rules(
        pair(R"({"specimen": ["venous", "arterial"]})", R"({"specimen": ["arterial"]})"),
        "rule-interval-overlap");
    CHECK(apart(young, old));
    CHECK(apart(R"({"specimen": ["venous"]})", R"({"specimen": ["arterial"]})"));
    CHECK(apart(R"({"population": ["adult"]})",
                R"({"population": ["child", "neonate"], "specimen": ["arterial"]})"));
    CHECK(apart(R"({"altitude": {"below": "1500 m"}})",
                R"({"altitude": {"from": "1.5 km", "below": "3000 m"}})"));
}

TEST_CASE("table: a row becomes the conjunction of its cells") {
    const test::Reading reading = test::read(test::tree_with(table(R"(
    {"id": "both", "cells": ["low", "wide"], "states": "low {Na}", "asserts": ["lactic-acidosis"], "label": "B", "consider": ["x"]},
    {"id": "one", "cells": ["*", "wide"], "states": "s", "unless": ["t.both"]},
    {"id": "any", "cells": ["*", "*"], "stops": "no {gap}"}
  )")));
    INFO(diag::render(reading.report));
    REQUIRE(reading.rules != nullptr);
    const rule::RuleSet& rules = *reading.rules;
    const auto& both = rules.findings.at(rules.find_finding("t.both").value());
    CHECK(both.when->kind == rule::NodeKind::logical_and);
    CHECK(both.when->children.at(0)->kind == rule::NodeKind::less);
    CHECK(both.when->children.at(1)->kind == rule::NodeKind::greater);
    CHECK(both.table == "t");
    CHECK(both.label == "B");
    CHECK(both.head.reviewed == "2026-12-01");
    const auto& one = rules.findings.at(rules.find_finding("t.one").value());
    CHECK(one.when == both.when->children.at(1));
    CHECK(one.unless == std::vector{rules.find_finding("t.both").value()});
    const auto& any = rules.checks.at(rules.find("t.any", rule::EntryKind::check).value());
    CHECK(any.stops);
    CHECK(any.when->kind == rule::NodeKind::truth_literal);
    CHECK(any.when->truth);
    CHECK(rules.tables.at(0).rows == std::vector<std::string>{"t.both", "t.one", "t.any"});
}

TEST_CASE("table: rows that do not fit their axes are told of") {
    check_complaint_in_rules(table(R"({"id": "r", "cells": @@["low"], "states": "s"})"),
                             "rule-table-cells");
    check_complaint_in_rules(table(R"({"id": "r", "cells": ["low", @@"narrow"], "states": "s"})"),
                             "rule-table-cells");
    check_complaint_in_rules(table(R"({"id": "r", "cells": ["low", @@1], "states": "s"})"),
                             "json-wrong-kind");
    check_complaint_in_rules(table(R"(@@{"id": "r", "cells": ["low", "*"]})"), "json-missing-key");
    check_complaint_in_rules(
        table(R"({"id": "r", "cells": ["low", "*"], "stops": "x", @@"states": "s"})"),
        "json-unknown-key");
    check_complaint_in_rules(table(R"({"id": "r", "cells": ["low", "*"], "states": "s"},
                                      {"id": @@"r", "cells": ["high", "*"], "states": "s"})"),
                             "rule-id-twice");
    check_complaint_in_rules(table(R"({"id": @@"R", "cells": ["low", "*"], "states": "s"})"),
                             "rule-id-form");
    check_complaint_in_rules(R"({"tables": [{"id": "t", "approach": "general", $H, "rows": [],
      "axes": [{"id": "a", "cases": [{"id": "x", "when": "true"}, {"id": @@"x", "when": "true"}]}]}]})",
                             "rule-repeated");
    check_complaint_in_rules(R"({"tables": [{"id": "t", "approach": "general", $H, "rows": [],
      "axes": [{"id": "a", "cases": []}, {"id": @@"a", "cases": []}]}]})",
                             "rule-repeated");
}

TEST_CASE("explanation: disorders, onset and band are read") {
    const test::Reading reading = test::read(test::tree_with(R"({"explanations": [
      {"id": "e", "approach": "bicarbonate", "disorders": ["metabolic-alkalosis", "metabolic-acidosis"],
       "onset": "acute-on-chronic", "when": "hasNa", "states": "x",
       "compensation": {"quantity": "gap", "low": "gap - 2000 'umol/L'", "high": null, "from": "words"},
       "early": {"beside": ["metabolic-acidosis"], "states": "early"}, $H},
      {"id": "none", "approach": "bicarbonate", "disorders": [], "onset": null, "when": "true", "compensation": null,
       "states": "x", $H}]})"));
    INFO(diag::render(reading.report));
    REQUIRE(reading.rules != nullptr);
    const rule::Explanation& e = reading.rules->explanations.at(0);
    CHECK(e.disorders == std::vector<std::uint32_t>{0, 1});
    CHECK(e.onset == rule::Onset::acute_on_chronic);
    REQUIRE(e.compensation.has_value());
    CHECK(e.compensation->low->unit.code() == "mmol/L");
    CHECK(e.compensation->high == nullptr);
    CHECK(e.early_beside == std::vector<std::uint32_t>{0});
    CHECK(e.early_states == "early");
    CHECK(reading.rules->explanations.at(1).onset == rule::Onset::none);
    CHECK(reading.rules->find_explanation("none") == 1U);

    const std::string before =
        R"({"explanations": [{"id": "e", "approach": "bicarbonate", "disorders": [], "when": "true", "states": "x", $H, )";
    check_complaint_in_rules(before + R"("onset": @@"sudden"}]})", "rule-word");
    check_complaint_in_rules(before + R"("compensation": @@{"quantity": "gap", "from": "x"}}]})",
                             "rule-interval-empty");
    check_complaint_in_rules(
        before + R"("compensation": {"quantity": @@"hasNa", "low": "gap", "from": "x"}}]})",
        "rule-id-unknown");
    check_complaint_in_rules(before +
                                 R"("early": {"beside": [@@"lactic-acidosis"], "states": "x"}}]})",
                             "rule-disorder-kind");
}

TEST_CASE("group: members are unfolded, and something is declared") {
    const std::string rules = R"({
      "tables": [{"id": "t", "approach": "general", "axes": [], $H,
                  "rows": [{"id": "a", "cells": [], "states": "s"}, {"id": "b", "cells": [], "stops": "s"}]}],
      "explanations": [{"id": "e", "approach": "bicarbonate", "disorders": [], "when": "true", "states": "x", $H}],
      "groups": [{"id": "g", "members": ["t", "explanations:bicarbonate", "raised-gap"], "exclusive": true, "domain": "true", $H}]})";
    const test::Reading reading = test::read(test::tree_with(rules));
    INFO(diag::render(reading.report));
    REQUIRE(reading.rules != nullptr);
    CHECK(reading.rules->groups.at(0).members ==
          std::vector<std::string>{"t.a", "t.b", "e", "raised-gap"});
    const std::string before =
        R"({"groups": [{"id": "g", $H, "domain": "true", "exclusive": true, "members": )";
    check_complaint_in_rules(before + R"([@@"nobody"]}]})", "rule-id-unknown");
    check_complaint_in_rules(before + R"([@@"gap"]}]})", "rule-id-unknown");
    check_complaint_in_rules(before + R"([@@"explanations:bicarb"]}]})", "rule-word");
    check_complaint_in_rules(before + R"([@@"explanations:strong-ion"]}]})", "rule-id-unknown");
    check_complaint_in_rules(
        R"({"groups": [{"id": @@"g", $H, "domain": "true", "members": ["raised-gap"]}]})",
        "rule-group-empty");
}
