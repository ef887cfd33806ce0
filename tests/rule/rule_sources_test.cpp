// Sources, review dates and the bibliography.
#include "isohydric/diag/render.hpp"

#include <doctest/doctest.h>

#include "rule/rule_tree.hpp"

using namespace isohydric;
using test::check_complaint_in_rules;

namespace {

std::string condition(const std::string& members) {
    return R"({"conditions": [{"id": @@"a", "when": "true", )" + members + "}]}";
}

std::string unmarked(std::string text) {
    text.erase(text.find("@@"), 2);
    return text;
}

}  // namespace

TEST_CASE("sources: every entry has one, with its place") {
    check_complaint_in_rules(condition(R"("reviewed": "2026-12-01")"), "rule-source-place");
    const auto sourced = [](const std::string& source) {
        return unmarked(condition(R"("reviewed": "2026-12-01", "source": )" + source));
    };
    check_complaint_in_rules(sourced(R"(@@{"ref": "known2001"})"), "rule-source-place");
    check_complaint_in_rules(sourced(R"(@@{"ref": "common-practice", "at": "page 1"})"),
                             "rule-source-place");
    check_complaint_in_rules(sourced("@@[]"), "rule-source-place");
    check_complaint_in_rules(sourced(R"({"ref": @@"unknown1999", "at": "page 1"})"),
                             "rule-source-unknown");
    check_complaint_in_rules(
        sourced(R"([{"ref": "known2001", "at": "p. 1"}, {"ref": @@"know2001", "at": "p. 2"}])"),
        "rule-source-unknown");
    check_complaint_in_rules(sourced(R"({"ref": "known2001", "at": "p. 1", @@"page": 2})"),
                             "json-unknown-key");
}

TEST_CASE("sources: what is not checked is known as such") {
    const test::Reading reading = test::read(test::tree_with(unmarked(condition(
        R"("reviewed": "2026-12-01", "policy": true,
           "source": [{"ref": "common-practice"}, {"ref": "known2001", "at": "p. 1", "checked": false, "note": "n"}])"))));
    REQUIRE(reading.rules != nullptr);
    const rule::EntryHead& head = reading.rules->conditions.at(1).head;
    CHECK(head.unchecked());
    CHECK(head.policy);
    CHECK(head.sources.at(1).at == "p. 1");
    CHECK(head.sources.at(1).note == "n");
    CHECK_FALSE(reading.rules->conditions.at(0).head.unchecked());
}

TEST_CASE("review dates: calendar dates only [@rfc3339, section 5.6]") {
    for (const char* wrong : {"2026-13-01",
                              "2026-02-30",
                              "2025-02-29",
                              "2026-2-3",
                              "01.12.2026",
                              "2026-12-01 ",
                              "",
                              "20261201",
                              "+026-12-01",
                              "2026-12-1x"}) {
        CAPTURE(wrong);
        check_complaint_in_rules(
            unmarked(condition(R"("source": {"ref": "common-practice"}, "reviewed": @@")" +
                               std::string(wrong) + "\"")),
            "rule-date");
    }
    CHECK(test::read(test::tree_with(unmarked(condition(
                         R"("source": {"ref": "common-practice"}, "reviewed": "2024-02-29")"))))
              .rules != nullptr);
    check_complaint_in_rules(
        R"({"conditions": [@@{"id": "a", "when": "true", "source": {"ref": "common-practice"}}]})",
        "json-missing-key");
}

TEST_CASE("bibliography: keys are unique, and lines are short") {
    test::RuleTree tree = test::base_tree();
    std::string& sources = tree["sources.json"];
    sources.insert(
        1, R"({"id": "albert1967", "type": "article-journal", "title": "Quantitative displacement",
      "author": [{"family": "Albert", "given": "Morris S."}, {"family": "Dell", "given": "Ralph B"},
                 {"family": "Winters", "given": "RW"}],
      "container-title": "Ann Intern Med", "issued": {"date-parts": [[1967, 2]]}, "volume": 66, "page": "312-22"},
     {"id": "agency2020", "type": "webpage", "title": "A guide", "author": [{"literal": "An agency"}],
      "publisher": "An agency", "issued": {"date-parts": [["2020"]]}},
     {"id": "many2000", "type": "article-journal", "title": "T", "container-title": "J",
      "author": [{"family": "A"}, {"family": "B"}, {"family": "C"}, {"family": "D"}]},
)");
    const test::Reading reading = test::read(tree);
    INFO(diag::render(reading.report));
    REQUIRE(reading.rules != nullptr);
    CHECK(reading.rules->citation("albert1967") ==
          "Albert MS, Dell RB, Winters RW. Ann Intern Med 1967;66:312-22");
    CHECK(reading.rules->citation("agency2020") == "An agency. A guide. An agency 2020");
    CHECK(reading.rules->citation("many2000") == "A, B, C, et al. J");
    CHECK(reading.rules->citation("common-practice") == "common-practice");

    sources.insert(1, R"({"id": "known2001", "type": "book", "title": "t"},)");
    CHECK(test::read(tree).has("rule-source-twice"));
    sources = R"([{"id": @@"x", "type": "book", "DOI": "10.1/x"}])";
    test::check_complaint(tree, "rule-source-empty");
    sources = R"([@@{"id": "x", "title": "t"}])";
    test::check_complaint(tree, "json-missing-key");
    sources = "@@{}";
    test::check_complaint(tree, "json-wrong-kind");
}
