// The units of a site decide what a bare number means; a unit that is written decides before them.
#include <doctest/doctest.h>

#include "panel/panel_fixture.hpp"

namespace isohydric::panel::testing {

namespace {

Entered with_site(const SiteUnits& site, const std::string& name, const std::string& text) {
    const Outcome outcome = read({{name, text}}, {}, &site);
    INFO(name, "=", text, "\n", outcome.messages());
    REQUIRE(outcome.panel.has_value());
    return outcome.panel->values[index_of(shipped().find(name)->analyte)].value();
}

std::optional<SiteUnits> site_of(const std::string& json, diag::Report& report) {
    return read_site_units(diag::make_source("site.json", json), shipped(), report);
}

std::string fault(const std::string& json) {
    diag::Report report;
    CHECK_FALSE(site_of(json, report).has_value());
    REQUIRE(report.error_count() == 1);
    CHECK(report.diagnostics().front().place);
    return report.diagnostics().front().id;
}

}  // namespace

TEST_CASE("presets: si") {
    const SiteUnits si = SiteUnits::preset("si", shipped()).value();
    CHECK(si.name() == "si");
    CHECK(prints_as(with_site(si, "pCO2", "5.3").value, 39.7533, 4));
    CHECK(prints_as(with_site(si, "pO2", "12").value, 90.0074, 4));
    CHECK(with_site(si, "albumin", "40").value == 40);
    CHECK(with_site(si, "lactate", "9").value == 9);
    CHECK(with_site(si, "BUN", "8").value == 8);
    CHECK(with_site(si, "pCO2", "5.3").note == "unit of the site: kPa");
    CHECK(with_site(si, "pCO2", "5.3").as_entered == "5.3");
}

TEST_CASE("presets: conventional") {
    const SiteUnits site = SiteUnits::preset("conventional", shipped()).value();
    CHECK(with_site(site, "pCO2", "40").value == 40);
    CHECK(with_site(site, "albumin", "4.0").value == 40);
    CHECK(with_site(site, "Hb", "14").value == 140);
    CHECK(prints_as(with_site(site, "BUN", "14").value, 4.9975, 4));
    CHECK(prints_as(with_site(site, "glucose", "90").value, 4.99567, 5));
    CHECK(prints_as(with_site(site, "creatinine", "1.0").value, 88.4017, 4));
    CHECK(prints_as(with_site(site, "Ca", "10").value, 2.49513, 5));
    // Sites differ: these still need their unit.
    CHECK(read({{"lactate", "9"}}, {}, &site).has("panel-unit-needed"));
    CHECK(read({{"urea", "30"}}, {}, &site).has("panel-unit-needed"));
}

TEST_CASE("presets: a value implausible in the site's unit is read all the same, for the checks to "
          "judge") {
    const SiteUnits site = SiteUnits::preset("conventional", shipped()).value();
    CHECK(with_site(site, "pCO2", "5.3").value == 5.3);
}

TEST_CASE("a unit that is written decides before the site's") {
    const SiteUnits si = SiteUnits::preset("si", shipped()).value();
    CHECK(with_site(si, "pCO2", "40 mmHg").value == 40);
    CHECK(with_site(si, "pCO2", "40 mmHg").note.empty());
}

TEST_CASE("the site's unit of pO2 comes before that of pCO2") {
    const SiteUnits si = SiteUnits::preset("si", shipped()).value();
    const Outcome outcome = read({{"pCO2", "40 mmHg"}, {"pO2", "12"}}, {}, &si);
    REQUIRE(outcome.panel.has_value());
    CHECK(prints_as((*outcome.panel)[Analyte::po2]->value, 90.0074, 4));
}

TEST_CASE("presets: there is no third") {
    CHECK_FALSE(SiteUnits::preset("imperial", shipped()).has_value());
    CHECK_FALSE(SiteUnits::preset("", shipped()).has_value());
}

TEST_CASE("a file of the site: names and units as people write them") {
    diag::Report report;
    const auto site = site_of(
        R"({"units": {"albumin": "g/dL", "BUN": "mg/dl", "haemoglobin": "mmol/L monomer", "pCO2": "kPa"}})",
        report);
    INFO(diag::render(report));
    REQUIRE(site.has_value());
    CHECK(site->name() == "site.json");
    CHECK(with_site(*site, "albumin", "2.1").value == 21);
    CHECK(prints_as(with_site(*site, "BUN", "14").value, 4.9975, 4));
    CHECK(prints_as(with_site(*site, "Hb", "9.3").value, 149.865, 3));  // 9.3 * 16.1145
    CHECK(read({{"urea", "14"}}, {}, &*site).has("panel-unit-needed"));
    const Entered written = with_site(*site, "Hb", "9.3 mmol/L");
    CHECK(prints_as(written.value, 149.865, 3));
    CHECK(written.note == "monomer by the units of the site");
    CHECK(with_site(*site, "Na", "140").value == 140);
}

TEST_CASE("a file of the site: its faults") {
    CHECK(fault(R"({"units": {"albumen": "g/dL"}})") == "site-units-name");
    CHECK(fault(R"({"units": {"albumin": "stone"}})") == "site-units-unit");
    CHECK(fault(R"({"units": {"albumin": "mmHg"}})") == "site-units-unit");
    CHECK(fault(R"({"units": {"Hb": "mmol/L"}})") == "site-units-unit");
    CHECK(fault(R"({"units": {"phosphate": "mEq/L"}})") == "site-units-unit");
    CHECK(fault(R"({"units": {"pCO2": "kPa", "PaCO2": "mmHg"}})") == "site-units-twice");
    CHECK(fault(R"({"units": {"albumin": 3}})") == "json-wrong-kind");
    CHECK(fault(R"({"units": {}, "unit": {}})") == "json-unknown-key");
    CHECK(fault(R"({})") == "json-missing-key");
    CHECK(fault("[") == "json-syntax");
}

}  // namespace isohydric::panel::testing
