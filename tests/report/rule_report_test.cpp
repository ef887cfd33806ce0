// Rules as text: nothing in force is left out, and a choice tells which alternative is in force and why.
#include "isohydric/report/caution.hpp"
#include "isohydric/report/rule_report.hpp"

#include <doctest/doctest.h>

#include <algorithm>
#include <string>

#include "harness/shipped_rules.hpp"

namespace isohydric::report {

namespace {

bool says(const std::string& text, const std::string& part) {
    return text.find(part) != std::string::npos;
}

}  // namespace

TEST_CASE("rule list: every entry has its line") {
    const std::string text = list_rules(*harness::shipped_rules());
    for (const auto& item : harness::shipped_rules()->by_id) {
        const std::string& id = item.first;
        CHECK_MESSAGE(says(text, "\n  " + id + " "), id);
    }
}

TEST_CASE("rule list: one kind alone, under its heading with the count") {
    const rule::RuleSet& rules = *harness::shipped_rules();
    const std::string text = list_rules(rules, "group");
    CHECK(says(text, "\ngroup (" + std::to_string(rules.groups.size()) + ")\n"));
    CHECK_FALSE(says(text, "\nfinding ("));
}

TEST_CASE("rule list: the kinds are words that can be typed") {
    const std::vector<std::string> kinds = kind_names();
    CHECK(kinds.size() == 11);
    CHECK(std::find(kinds.begin(), kinds.end(), "critical-value") != kinds.end());
    for (const std::string& kind : kinds) {
        CHECK(kind.find(' ') == std::string::npos);
        CHECK(says(list_rules(*harness::shipped_rules(), kind), "\n" + kind + " ("));
    }
}

TEST_CASE("rule page: every entry and every choice has one, within the caution") {
    const rule::RuleSet& rules = *harness::shipped_rules();
    for (const std::string& name : names_to_show(rules)) {
        const std::optional<std::string> page = show_rule(rules, name);
        REQUIRE_MESSAGE(page.has_value(), name);
        CHECK_MESSAGE(page->starts_with(with_caution("").substr(0, 20)), name);
        CHECK_MESSAGE((says(*page, "source") || says(*page, "in force")), name);
    }
    CHECK_FALSE(show_rule(rules, "no-such-entry").has_value());
}

TEST_CASE(
    "rule page: a choice gives one alternative in force, first, with its reason, and all others") {
    const rule::RuleSet& rules = *harness::shipped_rules();
    for (const rule::Convention& convention : rules.conventions) {
        const std::string page = show_rule(rules, convention.choice).value_or("");
        const std::string line =
            (convention.chosen ? "  in force  " : "  or        ") + convention.head.id;
        CHECK_MESSAGE(says(page, line + ": "), convention.head.id);
        CHECK(page.find("  in force  ") < page.find("  or        "));
        CHECK(says(page, "\"conventions\": {\"" + convention.choice + "\""));
    }
}

TEST_CASE("rule page: where an entry has the name of a choice, both are shown") {
    const rule::RuleSet& rules = *harness::shipped_rules();
    REQUIRE(rules.find("anion-gap").has_value());
    const std::string page = show_rule(rules, "anion-gap").value_or("");
    CHECK(says(page, "choice anion-gap\n"));
    CHECK(says(page, "\n  reviewed  "));
}

TEST_CASE("rule page: a quantity of a choice gives the others without their reasons") {
    const rule::RuleSet& rules = *harness::shipped_rules();
    const std::string page = show_rule(rules, "acidosisPCO2Low").value_or("");
    CHECK(says(page, "  in force  "));
    CHECK(says(page, "  or        "));
    CHECK(says(page, "belongs   to convention"));
}

TEST_CASE("caution: a text stands between two, an empty line away from each") {
    const std::string text = with_caution("one\ntwo\n\n", 1000);
    const std::string line = std::string(caution()) + "\n";
    CHECK(text == line + "\none\ntwo\n\n" + line);
}

}  // namespace isohydric::report
