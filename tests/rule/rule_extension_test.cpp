// Sets that extend others, their paths, and the choice of conventions.
#include "isohydric/diag/render.hpp"

#include <doctest/doctest.h>

#include "rule/rule_tree.hpp"

using namespace isohydric;

namespace {

/// The base tree with a set `lab.json` that extends `set.json` and has these further members.
test::RuleTree laboratory(const std::string& members) {
    test::RuleTree tree = test::base_tree();
    tree["lab.json"] = R"({"id": "lab", "version": "7", "title": "ours", "extends": "set.json")" +
                       (members.empty() ? "" : ", " + members) + "}";
    return tree;
}

constexpr std::string_view k_two_constants = R"({"conventions": [
  {"id": "k-1.5", "choice": "constant", "title": "1.5", "why": "w", $H,
   "quantities": [{"id": "k", "internal": true, "unit": "mmol/L", "formula": "1.5 'mmol/L'", $H}],
   "conditions": [{"id": "kOn", "when": "k > 1 'mmol/L'", $H}]},
  {"id": "k-2", "choice": "constant", "title": "2", "why": "w", $H,
   "quantities": [{"id": "k", "internal": true, "unit": "mmol/L", "formula": "2 'mmol/L'", $H}],
   "conditions": [{"id": "kOn", "when": "true", $H}]}
]})";

test::RuleTree with_choice(std::string conventions,
                           std::string rules = std::string(k_two_constants)) {
    test::RuleTree tree = test::tree_with(rules);
    std::string& set = tree["set.json"];
    set.replace(set.find("\"conventions\": {}"), 17, "\"conventions\": " + conventions);
    return tree;
}

}  // namespace

TEST_CASE("set: one that extends another adds, replaces and removes") {
    test::RuleTree tree = laboratory(
        R"("files": ["more.json"], "replace": ["ours.json"], "remove": ["hasNa"], "approved": {"role": "head", "date": "2026-11-30"})");
    tree["more.json"] =
        test::with_heads(R"json({"conditions": [{"id": "hasK", "when": "K.exists()", $H}]})json");
    tree["ours.json"] = test::with_heads(
        R"({"intervals": [{"id": "gap-limits", "of": "gap", "unit": "mmol/L", "low": 3, "high": 11, $H}]})");
    const test::Reading reading = test::read(tree, "lab.json");
    INFO(diag::render(reading.report));
    REQUIRE(reading.rules != nullptr);
    CHECK(reading.rules->id == "lab");
    CHECK(reading.rules->version == "7");
    CHECK(reading.rules->approved_role == "head");
    CHECK(reading.rules->approved_date == "2026-11-30");
    CHECK_FALSE(reading.rules->find_condition("hasNa").has_value());
    CHECK(reading.rules->find_condition("hasK").has_value());
    REQUIRE(reading.rules->intervals.size() == 1);
    CHECK(reading.rules->intervals[0].high == 11.0);
    CHECK(test::read(tree).rules->intervals[0].high == 12.0);
}

TEST_CASE("set: what is replaced or removed must be in the parent") {
    test::RuleTree tree = laboratory(R"("remove": ["hasNa", "hasSodium"])");
    test::Reading reading = test::read(tree, "lab.json");
    REQUIRE(reading.report.diagnostics().size() == 1);
    CHECK(reading.summary() == "lab.json:1:91 rule-id-unknown\n");
    tree = laboratory(R"("replace": ["ours.json"])");
    tree["ours.json"] =
        test::with_heads("{\n \"conditions\": [{\"id\": \"hasNaa\", \"when\": \"true\", $H}]}");
    reading = test::read(tree, "lab.json");
    CHECK(reading.summary() == "ours.json:2:24 rule-id-unknown\n");
    CHECK(reading.report.diagnostics()[0].message.find("hasNa\"") != std::string::npos);
    tree["ours.json"] = test::with_heads(
        R"({"quantities": [{"id": "hasNa", "internal": true, "unit": "1", "formula": "1", $H}]})");
    CHECK(test::read(tree, "lab.json").has("rule-kind"));
    tree["ours.json"] =
        test::with_heads("{\n \"conditions\": [{\"id\": \"hasNa\", \"when\": \"true\", $H},\n"
                         " {\"id\": \"hasNa\", \"when\": \"false\", $H}]}");
    CHECK(test::read(tree, "lab.json").summary() == "ours.json:3:9 rule-id-twice\n");
    tree = test::base_tree();
    tree["set.json"].replace(
        tree["set.json"].find("\"remove\": []"), 12, "\"remove\": [@@\"gap\"]");
    test::check_complaint(tree, "rule-set-parent");
}

TEST_CASE("set: what hangs on a removed entry is told of") {
    CHECK(test::read(laboratory(R"("remove": ["gap"])"), "lab.json").rules == nullptr);
}

TEST_CASE("set: circles of sets and files that are missing or named twice are told of") {
    test::RuleTree tree = laboratory("");
    std::string& set = tree["set.json"];
    set.replace(set.find("\"extends\": null"), 15, "\"extends\": \"lab.json\"");
    tree["lab.json"].insert(tree["lab.json"].find("\"set.json\""), "@@");
    test::check_complaint(tree, "rule-set-cycle");
    tree = test::base_tree();
    tree["set.json"].replace(tree["set.json"].find("null"), 4, "@@\"set.json\"");
    test::check_complaint(tree, "rule-set-cycle");
    tree["set.json"].replace(tree["set.json"].find("@@\"set.json\""), 12, "@@\"none.json\"");
    test::check_complaint(tree, "rule-file-missing");
    tree = test::base_tree();
    tree["set.json"].replace(tree["set.json"].find("\"rules.json\""), 12, "@@\"./base.json\"");
    test::check_complaint(tree, "rule-repeated");
    tree = test::base_tree();
    tree["set.json"].replace(tree["set.json"].find("\"rules.json\""), 12, "@@\"rulez.json\"");
    test::check_complaint(tree, "rule-file-missing");
    const test::Reading reading = test::read({}, "sets/none.json");
    REQUIRE(reading.report.diagnostics().size() == 1);
    CHECK(reading.has("rule-file-missing"));
}

TEST_CASE("set: JSON faults are told of once, and nothing is made of the rest") {
    test::RuleTree tree = test::tree_with(R"({"conditions": [{"id": "a", "when": "b", $H}]})");
    tree["base.json"] += "}";
    const test::Reading reading = test::read(tree);
    REQUIRE(reading.report.diagnostics().size() == 1);
    CHECK(reading.summary().starts_with("base.json:"));
    tree = test::base_tree();
    tree["set.json"] = "[]";
    CHECK(test::read(tree).has("json-wrong-kind"));
    tree["set.json"] = R"({"id": "x"})";
    CHECK(test::read(tree).has("json-missing-key"));
}

TEST_CASE("set: one outside of the rule tree finds its own files first") {
    test::RuleTree tree = laboratory(R"("files": ["rules.json"])");
    tree["/home/lab/ours.json"] =
        R"({"id": "lab", "version": "7", "title": "ours", "extends": "set.json",
      "replace": ["base.json"]})";
    tree["/home/lab/base.json"] =
        test::with_heads(R"({"conditions": [{"id": "hasNa", "when": "Na > 1 'mmol/L'", $H}]})");
    for (const char* path : {"/home/lab/ours.json", "./lab/ours.json", "../ours.json"}) {
        CAPTURE(path);
        const std::string folder = std::string(path).substr(0, std::string(path).rfind('/') + 1);
        tree[path] = tree["/home/lab/ours.json"];
        tree[folder + "base.json"] = tree["/home/lab/base.json"];
        const test::Reading reading = test::read(tree, path);
        INFO(diag::render(reading.report));
        REQUIRE(reading.rules != nullptr);
        CHECK(reading.rules->conditions.at(0).when->kind == rule::NodeKind::greater);
    }
}

TEST_CASE("set: an approval counts when it has a role and a date") {
    const auto approved = [](const std::string& approval) {
        test::RuleTree tree = test::base_tree();
        std::string& set = tree["set.json"];
        set.replace(set.find(R"({"role": "", "date": ""})"), 24, approval);
        return tree;
    };
    CHECK(test::read(approved(R"({"role": "head", "date": ""})")).rules->approved_role.empty());
    CHECK(
        test::read(approved(R"({"role": "", "date": "2026-01-01"})")).rules->approved_date.empty());
    CHECK(test::read(approved(R"({"role": "head", "date": "2026-01-01"})")).rules->approved_role ==
          "head");
    test::check_complaint(approved(R"({"role": "head", "date": @@"soon"})"), "rule-date");
    test::check_complaint(approved(R"(@@{"role": "head"})"), "json-missing-key");
}

TEST_CASE("conventions: exactly the chosen alternative of each choice is in force") {
    const test::Reading reading = test::read(with_choice(R"({"constant": "k-2"})"));
    INFO(diag::render(reading.report));
    REQUIRE(reading.rules != nullptr);
    const rule::RuleSet& rules = *reading.rules;
    const rule::Quantity& k = rules.quantities.at(rules.find_quantity("k").value());
    CHECK(k.alternatives.at(0).formula->number == 2);
    CHECK(k.convention == "k-2");
    REQUIRE(rules.conventions.size() == 2);
    CHECK_FALSE(rules.conventions[0].chosen);
    CHECK(rules.conventions[1].chosen);
    CHECK(rules.conventions[1].choice == "constant");
    CHECK(rules.conventions[1].defines == std::vector<std::string>{"k", "kOn"});
    CHECK(rules.conditions.size() == 2);
}

TEST_CASE("conventions: choices are made, once, of what is offered") {
    test::RuleTree tree = with_choice("{}");
    tree["set.json"].insert(0, "@@");
    test::check_complaint(tree, "rule-choice");
    test::check_complaint(with_choice(R"({"constant": @@"k-3"})"), "rule-choice");
    test::check_complaint(with_choice(R"({"constant": "k-2", @@"other": "k-2"})"), "rule-choice");
    test::check_complaint(with_choice(R"({"constant": "k-2", @@"constant": "k-1.5"})"),
                          "json-duplicate-key");
    test::check_complaint(with_choice(R"({"constant": @@2})"), "json-wrong-kind");
}

TEST_CASE("conventions: a set overrides the choice of its parent") {
    test::RuleTree tree = with_choice(R"({"constant": "k-2"})");
    tree["lab.json"] =
        R"({"id": "lab", "version": "7", "title": "ours", "extends": "set.json", "conventions": {"constant": "k-1.5"}})";
    const test::Reading reading = test::read(tree, "lab.json");
    REQUIRE(reading.rules != nullptr);
    CHECK(reading.rules->conventions.at(0).chosen);
    CHECK(reading.rules->sha256 != test::read(tree).rules->sha256);
}

TEST_CASE("conventions: alternatives define the same names in the same units") {
    const auto second = [](const std::string& members) {
        std::string rules(k_two_constants);
        const std::size_t begin = rules.find("\"quantities\"", rules.find("k-2"));
        rules.replace(begin, rules.rfind("}\n]}") - begin, members);
        return rules;
    };
    const std::string condition = R"("conditions": [{"id": "kOn", "when": "true", $H}])";
    const auto complaint = [&](const std::string& members, std::string_view id) {
        test::check_complaint(with_choice(R"({"constant": "k-1.5"})", second(members)), id);
    };
    complaint(
        R"("quantities": [{"id": @@"k", "internal": true, "unit": "umol/L", "formula": "2 'mmol/L'", $H}], )" +
            condition,
        "rule-alternative");
    complaint(
        R"("quantities": [{"id": "k", "internal": true, "unit": "mmol/L", "formula": "2 'mmol/L'", $H},
                                {"id": @@"kk", "internal": true, "unit": "1", "formula": "2", $H}], )" +
            condition,
        "rule-alternative");
    complaint(
        R"("quantities": [{"id": @@"gap", "internal": true, "unit": "1", "formula": "2", $H}], )" +
            condition,
        "rule-id-twice");
    complaint(
        R"("quantities": [{"id": "k", "internal": true, "unit": "mmol/L", "formula": "2 'mmol/L'", $H},
                                {"id": @@"k", "internal": true, "unit": "mmol/L", "formula": "2 'mmol/L'", $H}], )" +
            condition,
        "rule-id-twice");
    std::string missing = second(condition);
    missing.insert(missing.find("\"k-2\""), "@@");
    test::check_complaint(with_choice(R"({"constant": "k-1.5"})", missing), "rule-alternative");
}

TEST_CASE("conventions: an alternative that is not chosen is checked all the same") {
    std::string rules(k_two_constants);
    rules.replace(rules.find("2 'mmol/L'"), 10, "nothing");
    test::RuleTree tree = with_choice(R"({"constant": "k-1.5"})", rules);
    CHECK(test::read(tree).rules == nullptr);
}
