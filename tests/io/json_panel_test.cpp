// A panel as JSON: which shapes of a value are read, and what is said of the others.
#include "isohydric/io/json_panel.hpp"

#include <doctest/doctest.h>

#include <string>

#include "harness/shipped_rules.hpp"

namespace isohydric::io {

namespace {

using panel::Analyte;

std::optional<panel::Panel> read(const std::string& text, diag::Report& report) {
    const std::shared_ptr<const rule::RuleSet> rules = harness::shipped_rules();
    panel::PanelReader reader(*rules->catalogue, nullptr, report);
    const std::optional<diag::Json> document =
        diag::read_json(diag::make_source("panel.json", text), report);
    if (document) {
        read_json_panel(*document, reader, report);
    }
    std::optional<panel::Panel> panel = reader.finish();
    return report.has_errors() ? std::nullopt : panel;
}

std::string only_id(const std::string& text) {
    diag::Report report;
    CHECK_FALSE(read(text, report).has_value());
    REQUIRE(report.diagnostics().size() == 1);
    return report.diagnostics().front().id;
}

}  // namespace

TEST_CASE("json panel: a text, a number, and an object with a unit") {
    diag::Report report;
    const auto panel = read(R"({"panel": {"pH": "7.21", "Na": 138,
        "K": {"value": 4.10, "unit": "mmol/L"}, "Cl": {"value": "98"}, "pCO2": "3,9 kPa"}})",
                            report);
    REQUIRE(panel);
    CHECK((*panel)[Analyte::ph]->value == 7.21);
    CHECK((*panel)[Analyte::na]->value == 138);
    CHECK((*panel)[Analyte::k]->value == 4.1);
    CHECK((*panel)[Analyte::cl]->value == 98);
}

TEST_CASE("json panel: a number keeps the digits with which it was printed") {
    diag::Report report;
    const auto panel = read(R"({"panel": {"pH": 7.40, "K": 4.1}})", report);
    REQUIRE(panel);
    CHECK((*panel)[Analyte::ph]->half_digit == doctest::Approx(0.005).epsilon(1e-9));
    CHECK((*panel)[Analyte::ph]->as_entered == "7.40");
}

TEST_CASE("json panel: the context is read beside the values") {
    diag::Report report;
    const auto panel = read(
        R"({"panel": {"pH": "7.2"}, "context": {"specimen": "cord-arterial", "age": "15min"}})",
        report);
    REQUIRE(panel);
    CHECK(panel->context.specimen == panel::Specimen::cord_arterial);
    CHECK(panel->context.age_a.has_value());
}

TEST_CASE("json panel: a value of another kind is refused by its name") {
    CHECK(only_id(R"({"panel": {"pH": true}})") == "panel-value");
    CHECK(only_id(R"({"panel": {"pH": null}})") == "panel-value");
    CHECK(only_id(R"({"panel": {"pH": [7.4]}})") == "panel-value");
    CHECK(only_id(R"({"panel": {"K": {"unit": "mmol/L"}}})") == "panel-value");
    CHECK(only_id(R"({"panel": {"K": {"value": {}, "unit": "mmol/L"}}})") == "panel-value");
}

TEST_CASE("json panel: members that are not read, and a panel that is not there") {
    CHECK(only_id(R"({"panel": {}, "patient": {"name": "x"}})") == "json-unknown-key");
    CHECK(only_id(R"({"context": {}})") == "json-missing-key");
    CHECK(only_id(R"({"panel": {"K": {"value": 4.1, "units": "mmol/L"}}})") == "json-unknown-key");
    CHECK(only_id(R"(["pH"])") == "json-wrong-kind");
}

}  // namespace isohydric::io
