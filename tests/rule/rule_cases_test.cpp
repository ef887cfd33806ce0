// Worked cases beside the rule files.
#include "isohydric/diag/render.hpp"
#include "isohydric/rule/cases.hpp"

#include <doctest/doctest.h>

#include "rule/rule_tree.hpp"

using namespace isohydric;

namespace {

constexpr rule::ReadOptions k_with_cases{.with_cases = true};

test::RuleTree with_cases(const std::string& cases) {
    test::RuleTree tree = test::base_tree();
    tree["base.cases.json"] = cases;
    return tree;
}

void check_complaint(const std::string& cases, std::string_view id) {
    test::check_complaint(with_cases(cases), id, k_with_cases);
}

}  // namespace

TEST_CASE("cases: they are read when asked for") {
    const test::RuleTree tree = with_cases(R"([
      {"id": "a", "panel": {"pH": "7.21", "chloride": "98 mmol/L"}, "context": {"specimen": "arterial", "age": "4 y"},
       "expect": {"raised-gap": "yes", "gap": 27.0, "hasNa": "unknown", "pressure38": "unknown"},
       "source": {"ref": "known2001", "at": "case 3"}}])");
    CHECK(test::read(tree).rules->cases.empty());
    const test::Reading reading = test::read(tree, "set.json", k_with_cases);
    INFO(diag::render(reading.report));
    REQUIRE(reading.rules != nullptr);
    REQUIRE(reading.rules->cases.size() == 1);
    const rule::Case& a = reading.rules->cases[0];
    CHECK(a.id == "a");
    CHECK(a.panel.at(1) == std::pair<std::string, std::string>("chloride", "98 mmol/L"));
    CHECK(a.context.at(1) == std::pair<std::string, std::string>("age", "4 y"));
    REQUIRE(a.expect.size() == 4);
    CHECK(a.expect[1].value == "27.0");
    CHECK(a.sources.at(0).at == "case 3");
}

TEST_CASE("cases: faults are told of at their place") {
    check_complaint(R"([{"id": "a", "panel": {@@"sodum": "1"}, "expect": {}}])",
                    "rule-case-analyte");
    check_complaint(R"([{"id": "a", "panel": {"Na": @@140}, "expect": {}}])", "json-wrong-kind");
    check_complaint(R"([{"id": "a", "panel": {}, "context": {@@"sample": "x"}, "expect": {}}])",
                    "rule-word");
    check_complaint(R"([{"id": "a", "panel": {}, "expect": {@@"raised-gip": "yes"}}])",
                    "rule-case-entry");
    check_complaint(R"([{"id": "a", "panel": {}, "expect": {@@"gap-limits": "yes"}}])",
                    "rule-case-entry");
    check_complaint(R"([{"id": "a", "panel": {}, "expect": {"raised-gap": @@"maybe"}}])",
                    "rule-case-value");
    check_complaint(R"([{"id": "a", "panel": {}, "expect": {"raised-gap": @@1}}])",
                    "rule-case-value");
    check_complaint(R"([{"id": "a", "panel": {}, "expect": {"gap": @@"yes"}}])", "rule-case-value");
    check_complaint(R"([{"id": "a", "panel": {}, "expect": {"gap": @@null}}])", "rule-case-value");
    check_complaint(R"([@@{"id": "a", "panel": {}}])", "json-missing-key");
    check_complaint(
        R"([{"id": "a", "panel": {}, "expect": {}}, {"id": @@"a", "panel": {}, "expect": {}}])",
        "rule-id-twice");
    check_complaint(
        R"([{"id": "a", "panel": {}, "expect": {}, "source": {"ref": @@"none", "at": "x"}}])",
        "rule-source-unknown");
    check_complaint("@@{}", "json-wrong-kind");
}

TEST_CASE(
    "cases: what a later set replaced or removed is no longer expected by the parent's cases") {
    test::RuleTree tree = with_cases(
        R"([{"id": "a", "panel": {"Na": "140"}, "expect": {"hasNa": "yes", "pressure38": 38}}])");
    tree["lab.json"] = R"({"id": "lab", "version": "1", "title": "t", "extends": "set.json",
      "remove": ["hasNa"], "replace": ["ours.json"]})";
    tree["ours.json"] = test::with_heads(
        R"({"quantities": [{"id": "pressure38", "label": "p", "unit": "mm[Hg]", "decimals": 0, "formula": "39 'mm[Hg]'", $H}]})");
    tree["ours.cases.json"] = R"([{"id": "a", "panel": {}, "expect": {"pressure38": 39}}])";
    const test::Reading reading = test::read(tree, "lab.json", k_with_cases);
    INFO(diag::render(reading.report));
    REQUIRE(reading.rules != nullptr);
    REQUIRE(reading.rules->cases.size() == 2);
    CHECK(reading.rules->cases[0].expect.empty());
    CHECK(reading.rules->cases[1].expect.size() == 1);
}

TEST_CASE("cases: the path beside a rule file") {
    CHECK(rule::cases_path_of("gap/anion-gap.json") == "gap/anion-gap.cases.json");
}
