// One fault at a time in the shipped list of analytes: each is found, at its place, under its own id.
#include <doctest/doctest.h>

#include "panel/panel_fixture.hpp"

namespace isohydric::panel::testing {

namespace {

/// The shipped list with the first occurrence of `from` behind the entry of `id` replaced.
std::string damaged(const std::string& id, const std::string& from, const std::string& to) {
    std::string text = shipped_text();
    const std::size_t entry = text.find("\"id\": \"" + id + "\"");
    REQUIRE(entry != std::string::npos);
    const std::size_t at = text.find(from, entry);
    REQUIRE(at != std::string::npos);
    return text.replace(at, from.size(), to);
}

/// The ids of all errors, which the damage alone must have made.
std::vector<std::string> errors_of(const std::string& text) {
    diag::Report report;
    CHECK(read_catalogue(diag::make_source("analytes.json", text), report) == nullptr);
    std::vector<std::string> ids;
    for (const diag::Diagnostic& diagnostic : report.diagnostics()) {
        CHECK(diagnostic.place);
        ids.push_back(diagnostic.id);
    }
    INFO(diag::render(report));
    REQUIRE_FALSE(ids.empty());
    return ids;
}

using Ids = std::vector<std::string>;

}  // namespace

TEST_CASE("faults: analytes unknown, twice, missing") {
    CHECK(errors_of(damaged("Na", "\"Na\"", "\"Natrium\"")) ==
          Ids{"catalogue-analyte", "catalogue-analyte-missing"});
    CHECK(errors_of(damaged("Na", "\"id\": \"Na\"", "\"id\": \"K\"")).front() == "catalogue-twice");
}

TEST_CASE("faults: keys") {
    CHECK(errors_of(damaged("Na", "\"label\"", "\"lable\"")) ==
          Ids{"json-missing-key", "json-unknown-key"});
    CHECK(errors_of(damaged("Na", "\"decimals\": 0", "\"decimals\": \"0\"")) ==
          Ids{"json-wrong-kind"});
    CHECK(errors_of(damaged("Na", "\"decimals\": 0", "\"decimals\": 0.5")) ==
          Ids{"catalogue-value"});
    CHECK(errors_of(damaged("Na", "\"charge\": 1", "\"charge\": 7")) ==
          Ids{"catalogue-value", "catalogue-unit"});
    CHECK(errors_of(damaged("Na", "\"charge\": 1", "\"charge\": true")) ==
          Ids{"catalogue-value", "catalogue-unit"});
    CHECK(errors_of(damaged("pO2", "\"unitFrom\": \"pCO2\"", "\"unitFrom\": \"pO2\"")) ==
          Ids{"catalogue-value"});
    CHECK(errors_of(damaged("pCO2", "\"as\": \"pCO2measured\"", "\"as\": \"pCO2 measured\"")) ==
          Ids{"catalogue-value"});
    CHECK(errors_of(damaged("pCO2", "\"as\": \"pCO2measured\"", "\"as\": \"Na\"")) ==
          Ids{"catalogue-twice"});
}

TEST_CASE("faults: units") {
    CHECK(errors_of(damaged("Na", "\"unit\": \"mmol/L\"", "\"unit\": \"mmolar\"")).front() ==
          "catalogue-unit");
    CHECK(errors_of(damaged("pCO2", "\"unit\": \"kPa\"", "\"unit\": \"kg\"")) ==
          Ids{"catalogue-unit"});
    CHECK(errors_of(damaged("pCO2", "\"unit\": \"kPa\"", "\"unit\": \"mm[Hg]\"")) ==
          Ids{"catalogue-twice"});
    CHECK(
        errors_of(damaged("glucose", "\"molarMass\": \"glucose\"", "\"molarMass\": \"glucos\"")) ==
        Ids{"catalogue-unit", "catalogue-unit"});
    CHECK(errors_of(damaged("glucose", "\"molarMass\": \"glucose\", ", "")) ==
          Ids{"catalogue-unit"});
    CHECK(errors_of(damaged("pCO2", "[\"si\"]", "[\"metric\"]")) == Ids{"catalogue-value"});
    CHECK(errors_of(damaged("pCO2", "[\"si\"]", "[\"conventional\"]")) == Ids{"catalogue-twice"});
}

TEST_CASE("faults: names that two analytes share, in whatever spelling") {
    CHECK(errors_of(damaged("Na", "[\"sodium\"", "[\"chloride\"")) == Ids{"catalogue-name"});
    CHECK(errors_of(damaged("Na", "[\"sodium\"", "[\"ICA\"")) == Ids{"catalogue-name"});
    CHECK(errors_of(damaged("Na", "[\"sodium\"", "[\"p-H\"")) == Ids{"catalogue-name"});
    CHECK(errors_of(damaged("Na", "[\"sodium\"", "[\"-\"")) == Ids{"catalogue-name"});
    CHECK(errors_of(damaged("pCO2", "\"specimen\": \"arterial\"", "\"specimen\": \"aortic\"")) ==
          Ids{"catalogue-value"});
    CHECK(
        errors_of(damaged("urea", "\"variant\": \"urea nitrogen\"", "\"variant\": \"nitrogen\"")) ==
        Ids{"catalogue-unit"});
}

TEST_CASE("faults: limits") {
    CHECK(errors_of(
              damaged("Na", "{\"low\": 110, \"high\": 175}", "{\"low\": 175, \"high\": 110}")) ==
          Ids{"catalogue-limits"});
    CHECK(
        errors_of(damaged("Na", "{\"low\": 110, \"high\": 175}", "{\"low\": 70, \"high\": 175}")) ==
        Ids{"catalogue-limits"});
    CHECK(errors_of(damaged("Na", "{\"low\": 110, \"high\": 175}", "{\"low\": 110}")).front() ==
          "json-missing-key");
}

TEST_CASE("faults: LOINC codes with a wrong digit, or of two analytes") {
    CHECK(errors_of(damaged("Na", "2951-2", "2951-3")) == Ids{"catalogue-value"});
    CHECK(errors_of(damaged("Na", "2951-2", "2915-2")) == Ids{"catalogue-value"});
    CHECK(errors_of(damaged("Na", "2951-2", "29512")) == Ids{"catalogue-value"});
    CHECK(errors_of(damaged("Na", "2951-2", "2823-3")) == Ids{"catalogue-twice"});
}

TEST_CASE("faults: sources and dates") {
    CHECK(
        errors_of(damaged("Na", "\"reviewed\": \"2026-12-01\"", "\"reviewed\": \"1 Dec 2026\"")) ==
        Ids{"catalogue-value"});
    CHECK(errors_of(damaged("Na",
                            "\"ref\": \"loinc\", \"at\": \"long common names of the codes\"",
                            "\"ref\": \"loinc\"")) == Ids{"catalogue-value"});
    CHECK(errors_of(damaged("Na",
                            "\"ref\": \"common-practice\"",
                            "\"ref\": \"common-practice\", \"at\": \"p. 3\"")) ==
          Ids{"catalogue-value"});
}

TEST_CASE("faults: no list at all") {
    CHECK(errors_of("[]") == Ids{"json-wrong-kind"});
    CHECK(errors_of("{}") == Ids{"json-missing-key"});
    CHECK(errors_of("{\"analytes\": []}").size() == k_analyte_count);
    CHECK(errors_of("") == Ids{"json-syntax"});
}

}  // namespace isohydric::panel::testing
