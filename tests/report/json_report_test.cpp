// The JSON result against a reader of its own: diag's, which knows neither the writer nor its library.
#include "isohydric/diag/json.hpp"
#include "isohydric/report/caution.hpp"
#include "isohydric/report/json_report.hpp"

#include <doctest/doctest.h>

#include <algorithm>
#include <string>
#include <vector>

#include "harness/shipped_rules.hpp"

namespace isohydric::report {

namespace {

std::vector<std::string> member_names(const diag::Json& object) {
    std::vector<std::string> names;
    for (const diag::Member& member : object.members()) {
        names.emplace_back(member.name);
    }
    return names;
}

const diag::Json& member(const diag::Json& object, std::string_view name) {
    const auto found = std::find_if(object.members().begin(),
                                    object.members().end(),
                                    [&](const diag::Member& entry) { return entry.name == name; });
    REQUIRE(found != object.members().end());
    return found->value;
}

diag::Json read_back(const std::string& text) {
    diag::Report report;
    std::optional<diag::Json> document =
        diag::read_json(diag::make_source("report.json", text), report);
    REQUIRE(document.has_value());
    CHECK(report.diagnostics().empty());
    return *document;
}

const interpret::Interpretation& acidosis() {
    static const interpret::Interpretation result = harness::interpreted({{"pH", "7.21"},
                                                                          {"pCO2", "3.9 kPa"},
                                                                          {"Na", "138"},
                                                                          {"Cl", "98"},
                                                                          {"albumin", "2.1 g/dL"}});
    return result;
}

}  // namespace

TEST_CASE("json report: members in the order of the format, the caution first and last") {
    const diag::Json document = read_back(json_report(acidosis()));
    CHECK(member_names(document) == std::vector<std::string>{"caution",
                                                             "format",
                                                             "engine",
                                                             "rules",
                                                             "panel",
                                                             "context",
                                                             "checks",
                                                             "interpretable",
                                                             "critical",
                                                             "quantities",
                                                             "findings",
                                                             "disorders",
                                                             "explanations",
                                                             "interpretation",
                                                             "would_help",
                                                             "unchecked",
                                                             "caution_end"});
    CHECK(member(document, "caution").text() == caution());
    CHECK(member(document, "caution_end").text() == caution());
    CHECK(member(document, "format").text() == "isohydric.interpretation/1");
}

TEST_CASE("json report: values in the canonical unit, and as they were entered") {
    const diag::Json document = read_back(json_report(acidosis()));
    const diag::Json& albumin = member(member(document, "panel"), "albumin");
    CHECK(member(albumin, "value").number() == 21);
    CHECK(member(albumin, "unit").text() == "g/L");
    CHECK(member(albumin, "as_entered").text() == "2.1 g/dL");
    const diag::Json& pco2 = member(member(document, "panel"), "pCO2");
    // 1 mmHg is 133.322 Pa [@nist-sp811, appendix B.8].
    CHECK(member(pco2, "value").number() == doctest::Approx(3900 / 133.322).epsilon(1e-5));
    CHECK(member(pco2, "unit").text() == "mm[Hg]");
}

TEST_CASE("json report: the sentences are those of the text, one by one") {
    const diag::Json document = read_back(json_report(acidosis()));
    const auto& sentences = member(document, "interpretation").items();
    REQUIRE(sentences.size() == acidosis().sentences.size());
    for (std::size_t i = 0; i < sentences.size(); ++i) {
        CHECK(sentences[i].text() == acidosis().sentences[i]);
    }
}

TEST_CASE("json report: without an indent it is one line") {
    const std::string text = json_report(acidosis(), -1);
    CHECK(text.find('\n') == text.size() - 1);
    CHECK(member_names(read_back(text)).size() == 17);
}

}  // namespace isohydric::report
