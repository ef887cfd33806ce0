// Names, signs, bounds, duplicates: what becomes of a value besides its unit.
#include <doctest/doctest.h>

#include "panel/panel_fixture.hpp"

namespace isohydric::panel::testing {

TEST_CASE("names: letter case and separators do not matter") {
    for (const std::string name :
         {"iCa", "ica", "ICA", "ionised calcium", "Ionized-Calcium", "IONISED_CALCIUM"}) {
        CHECK(shipped().find(name)->analyte == Analyte::ica);
    }
    for (const std::string& name : Words{"pCO2", "PCO2", "p(CO2)", "p CO2"}) {
        CHECK(shipped().find(name)->analyte == Analyte::pco2);
    }
    CHECK(shipped().find("β-hydroxybutyrate")->analyte == Analyte::bhb);
    CHECK(shipped().find("HCO3-")->analyte == Analyte::hco3);
    CHECK(shipped().find("Na+")->analyte == Analyte::na);
}

TEST_CASE("names: what could mean two analytes is none of them") {
    CHECK_FALSE(shipped().find("CO2").has_value());         // total CO2 or its pressure
    CHECK_FALSE(shipped().find("Ca++").has_value());        // total or ionised
    CHECK_FALSE(shipped().find("osmolarity").has_value());  // per litre, not per kilogram
}

TEST_CASE("names: an unknown one is an error with the nearest") {
    const Outcome outcome = read({{"albumine", "40 g/L"}, {"lactat", "2 mmol/L"}, {"xyzzy", "1"}});
    CHECK_FALSE(outcome.panel.has_value());
    CHECK(outcome.report.error_count() == 3);
    CHECK(outcome.says("did you mean \"albumin\"?"));
    CHECK(outcome.says("did you mean \"lactate\"?"));
    CHECK(outcome.says("\"xyzzy\" is not the name of an analyte [panel-name]"));
}

TEST_CASE("duplicates: the same analyte twice, also under two names, with a note at the first") {
    const Outcome outcome = read({{"pCO2", "40"}, {"PaCO2", "41 mmHg"}});
    REQUIRE(outcome.has("panel-twice"));
    const diag::Diagnostic& diagnostic = outcome.report.diagnostics().front();
    REQUIRE(diagnostic.notes.size() == 1);
    CHECK(diagnostic.notes.front().place.source->text() == "pCO2=40");
    CHECK(read({{"BUN", "20 mg/dL"}, {"urea", "7.1 mmol/L"}}).has("panel-twice"));
}

TEST_CASE("base deficit is minus base excess, and says so") {
    const Entered entered = read_one("base deficit", "8");
    CHECK(entered.value == -8);
    CHECK(entered.as_entered == "8");
    CHECK(entered.note == "entered as a deficit, sign reversed");
    CHECK(read_one("BE", "-8").value == -8);
    CHECK(read_one("base deficit", "-3").value == 3);
    CHECK(read_one("BD(ecf)", "5").value == -5);
    const Outcome outcome = read({{"BD(ecf)", "5"}});
    CHECK((*outcome.panel)[Analyte::sbe].has_value());
    CHECK_FALSE((*outcome.panel)[Analyte::be].has_value());
}

TEST_CASE("numbers: decimal comma, real minus sign, surrounding blanks") {
    CHECK(read_one("pH", "7,21").value == 7.21);
    CHECK(read_one("BE", "\u221212,5").value == -12.5);
    CHECK(read_one("K", "  4.1  mmol/L ").value == 4.1);
}

TEST_CASE("numbers: thousands read only where the comma is known to be the decimal mark") {
    CHECK(read({{"urineOsmolality", "1,234"}}).has("panel-number"));
    const Outcome known =
        read({{"urineOsmolality", "1,234"}}, {}, nullptr, units::DecimalMark::comma);
    CHECK_FALSE(known.has("panel-number"));
}

TEST_CASE("numbers: text that is none is an error at its place") {
    for (const std::string& text : Words{"", "nan", "inf", "seven", "7..2", "--3", "7.2.1"}) {
        const Outcome outcome = read({{"pH", text}});
        CAPTURE(text);
        CHECK(outcome.has("panel-number"));
        CHECK_FALSE(outcome.panel.has_value());
        CHECK(outcome.report.diagnostics().front().place);
    }
    CHECK_FALSE(read({{"pH", "0x10"}}).panel.has_value());  // 0 of an unknown unit x10
}

TEST_CASE("values: zero or less cannot be where only more exists") {
    CHECK(read({{"Na", "0"}}).has("panel-value"));
    CHECK(read({{"Na", "-140"}}).has("panel-value"));
    CHECK(read({{"pCO2", "0 kPa"}}).has("panel-value"));
    CHECK(read({{"temperature", "-3 °C"}}).has("panel-value"));
    CHECK(read({{"lactate", "0"}}).says("lactate must be above zero"));
    CHECK(read_one("MetHb", "0 %").value == 0);
    CHECK(read_one("ethanol", "0").value == 0);
    CHECK(read({{"ethanol", "-1 mmol/L"}}).says("ethanol cannot be negative"));
    CHECK(read_one("BE", "0").value == 0);
    CHECK(read_one("AG", "-3").value == -3);
}

TEST_CASE("values: beyond what is accepted is no error of reading, enormous is") {
    CHECK(read_one("pCO2", "300 mmHg").value == 300);
    CHECK(read_one("K", "18").value == 18);
    CHECK(read_one("albumin", "100 g/L").value == 100);
    CHECK(read({{"Na", "1e300"}}).has("panel-value"));
    CHECK(read({{"Na", "1e400"}}).has("panel-number"));
    CHECK(read({{"BE", "-1000000"}}).has("panel-value"));
}

TEST_CASE("bounds: what an instrument could not pass is kept as such") {
    CHECK(read_one("lactate", "<0.5 mmol/L").censoring == Censoring::below);
    CHECK(read_one("lactate", ">20 mmol/L").censoring == Censoring::above);
    CHECK(read_one("lactate", "0.5 mmol/L").censoring == Censoring::none);
    CHECK(read_one("base deficit", "<2").censoring == Censoring::above);  // an excess above -2
    CHECK(read_one("base deficit", "<2").value == -2);
    CHECK(read_one("base deficit", ">25").censoring == Censoring::below);
}

TEST_CASE("a panel: many values, no error, nothing left out") {
    const Outcome outcome = read({{"pH", "7.21"},
                                  {"pCO2", "3.9kPa"},
                                  {"Na", "138"},
                                  {"Cl", "98"},
                                  {"albumin", "2.1g/dL"},
                                  {"lactate", "6.2mmol/L"}},
                                 {{"onset", "acute"}});
    INFO(outcome.messages());
    REQUIRE(outcome.panel.has_value());
    CHECK(outcome.report.diagnostics().empty());
    const Panel& panel = *outcome.panel;
    CHECK(panel[Analyte::ph]->value == 7.21);
    CHECK(prints_as(panel[Analyte::pco2]->value, 29.25, 2));
    CHECK(panel[Analyte::albumin]->value == 21);
    CHECK(panel.context.onset == StatedOnset::acute);
    CHECK_FALSE(panel[Analyte::po2].has_value());
}

TEST_CASE("errors: all of them in one run") {
    const Outcome outcome = read({{"pCO2", "5.3"}, {"albumin", "4.0"}, {"pH", "x"}, {"foo", "1"}},
                                 {{"age", "67"}, {"specimen", "blood"}});
    CHECK_FALSE(outcome.panel.has_value());
    CHECK(outcome.report.error_count() == 6);
}

}  // namespace isohydric::panel::testing
