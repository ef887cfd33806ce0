// What is said of the specimen: names, ages, altitudes, baselines, and contradictions among them.
#include <doctest/doctest.h>

#include "panel/panel_fixture.hpp"

namespace isohydric::panel::testing {

namespace {

Context context_of(const Texts& context, const Texts& values = {{"pH", "7.4"}}) {
    const Outcome outcome = read(values, context);
    INFO(outcome.messages());
    REQUIRE(outcome.panel.has_value());
    return outcome.panel->context;
}

}  // namespace

TEST_CASE("age: years of 365.25 days, months of a twelfth [@ucum, section 4.3]") {
    CHECK(*read_age_a("4y") == 4);
    CHECK(*read_age_a("4a") == 4);
    CHECK(*read_age_a("4 years") == 4);
    CHECK(*read_age_a("0.5y") == 0.5);
    CHECK(prints_as(*read_age_a("2mo"), 0.166667, 6));
    CHECK(prints_as(*read_age_a("5wk"), 0.0958248, 7));        // 35 / 365.25
    CHECK(prints_as(*read_age_a("3d"), 0.00821355, 8));        // 3 / 365.25
    CHECK(prints_as(*read_age_a("6h"), 0.000684463, 9));       // 0.25 / 365.25
    CHECK(prints_as(*read_age_a("15min"), 0.0000285193, 10));  // 15 / 525960
}

TEST_CASE("age: without a unit, in an ambiguous one or beyond life it is refused") {
    for (const std::string& text : Words{"67", "3m", "4 mmol/L", "-1y", "131y", "<3d", "old", ""}) {
        CAPTURE(text);
        CHECK_FALSE(read_age_a(text).has_value());
    }
    CHECK(read_age_a("67").error().find("with its unit") != std::string::npos);
}

TEST_CASE("altitude: metres, bare or said") {
    CHECK(*read_altitude_m("3510") == 3510);
    CHECK(*read_altitude_m("3510m") == 3510);
    CHECK(*read_altitude_m("3.5km") == 3500);
    CHECK(*read_altitude_m("-430") == -430);
    CHECK_FALSE(read_altitude_m("11500 ft").has_value());
    CHECK(read_altitude_m("11500 ft").error().find("0.3048") != std::string::npos);
    CHECK_FALSE(read_altitude_m("35000").has_value());
    CHECK_FALSE(read_altitude_m("3,510").has_value());  // three and a half metres, or kilometres
}

TEST_CASE("names of specimen, population and onset: case and separators do not matter") {
    for (std::size_t i = 0; i < k_specimen_names.size(); ++i) {
        CHECK(*read_specimen(k_specimen_names[i]) == static_cast<Specimen>(i));
    }
    for (std::size_t i = 0; i < k_population_names.size(); ++i) {
        CHECK(*read_population(k_population_names[i]) == static_cast<Population>(i));
    }
    for (std::size_t i = 0; i < k_onset_names.size(); ++i) {
        CHECK(*read_onset(k_onset_names[i]) == static_cast<StatedOnset>(i));
    }
    CHECK(*read_specimen("Central Venous") == Specimen::central_venous);
    CHECK_FALSE(read_specimen("blood").has_value());
    CHECK(read_specimen("blood").error().find("central-venous") != std::string::npos);
}

TEST_CASE("population: from the age where not stated, and remembered as assumed: common practice") {
    const auto derived = [](const std::string& age) {
        return context_of({{"age", age}}).population;
    };
    CHECK(derived("15min") == Population::neonate);
    CHECK(derived("27d") == Population::neonate);
    CHECK(derived("28d") == Population::child);
    CHECK(derived("4wk") == Population::child);
    CHECK(derived("17.9y") == Population::child);
    CHECK(derived("18y") == Population::adult);
    CHECK(context_of({{"age", "4y"}}).assumed ==
          std::vector<std::string>{"population: child (age 4y)"});
    CHECK(context_of({}).population == Population::adult);
    CHECK(context_of({}).assumed == std::vector<std::string>{"population: adult"});
    CHECK(context_of({{"population", "pregnancy-3"}}).assumed.empty());
}

TEST_CASE("population and age: a contradiction is an error with both places") {
    const std::vector<std::pair<std::string, std::string>> wrong{{"adult", "4y"},
                                                                 {"child", "40y"},
                                                                 {"child", "3d"},
                                                                 {"neonate", "2mo"},
                                                                 {"neonate", "28d"},
                                                                 {"pregnancy-1", "3d"},
                                                                 {"pregnancy-2", "8y"}};
    for (const auto& pair : wrong) {
        const auto population = pair.first;
        const auto age = pair.second;
        const Outcome outcome = read({{"pH", "7.4"}}, {{"population", population}, {"age", age}});
        CAPTURE(population);
        CAPTURE(age);
        REQUIRE(outcome.has("context-contradiction"));
        CHECK(outcome.report.diagnostics().front().notes.size() == 1);
    }
    CHECK(context_of({{"population", "pregnancy-2"}, {"age", "16y"}}).population ==
          Population::pregnancy_2);
    CHECK(context_of({{"population", "neonate"}, {"age", "27d"}}).population ==
          Population::neonate);
    CHECK(context_of({{"population", "adult"}, {"age", "18y"}}).population == Population::adult);
}

TEST_CASE("specimen: not stated stays not stated; a name may state it") {
    CHECK(context_of({}).specimen == Specimen::not_stated);
    CHECK(context_of({}, {{"PaCO2", "40"}}).specimen == Specimen::arterial);
    CHECK(context_of({}, {{"PvCO2", "46"}}).specimen == Specimen::venous);
    CHECK(context_of({}, {{"ScvO2", "70%"}}).specimen == Specimen::central_venous);
    CHECK(context_of({{"specimen", "capillary"}}).specimen == Specimen::capillary);
}

TEST_CASE("specimen: the more special word counts, a contradiction is an error") {
    CHECK(context_of({{"specimen", "mixed-venous"}}, {{"PvCO2", "46"}}).specimen ==
          Specimen::mixed_venous);
    CHECK(context_of({{"specimen", "venous"}}, {{"PcvCO2", "46"}}).specimen ==
          Specimen::central_venous);
    CHECK(context_of({{"specimen", "cord-arterial"}}, {{"PaCO2", "50"}}).specimen ==
          Specimen::cord_arterial);
    const Outcome stated = read({{"PaCO2", "40"}}, {{"specimen", "venous"}});
    REQUIRE(stated.has("panel-specimen"));
    CHECK(stated.says("PaCO2 is arterial, but the specimen is venous"));
    CHECK(stated.report.diagnostics().front().notes.size() == 1);
    CHECK(read({{"PaCO2", "40"}, {"SvO2", "70%"}}).has("panel-specimen"));
    CHECK(read({{"PaCO2", "40"}}, {{"specimen", "capillary"}}).has("panel-specimen"));
    CHECK(read({{"PcvCO2", "46"}}, {{"specimen", "mixed-venous"}}).has("panel-specimen"));
}

TEST_CASE("baseline: units as of the analyte itself") {
    const Context context = context_of({{"baseline-pCO2", "60"}, {"baseline-HCO3", "31"}});
    CHECK(context.baseline_pco2_mmHg == 60);
    CHECK(context.baseline_hco3_mmol_L == 31);
    CHECK(prints_as(*context_of({{"baselinePCO2", "8 kPa"}}).baseline_pco2_mmHg, 60.005, 3));
    CHECK(read({{"pH", "7.4"}}, {{"baseline-pCO2", "8"}}).has("panel-unit-needed"));
    CHECK(read({{"pH", "7.4"}}, {{"baseline-pCO2", "260 mmHg"}}).has("context-value"));
    CHECK(read({{"pH", "7.4"}}, {{"baseline-HCO3", "<31"}}).has("context-value"));
    CHECK(read({{"pH", "7.4"}}, {{"baseline-HCO3", "x"}}).has("panel-number"));
    CHECK_FALSE(context_of({}).baseline_pco2_mmHg.has_value());
}

TEST_CASE("items: unknown or said twice") {
    CHECK(read({{"pH", "7.4"}}, {{"weight", "70 kg"}}).has("context-name"));
    CHECK(read({{"pH", "7.4"}}, {{"weight", "70 kg"}}).says("baseline-pCO2"));
    const Outcome twice = read({{"pH", "7.4"}}, {{"age", "3d"}, {"AGE", "4d"}});
    REQUIRE(twice.has("context-twice"));
    CHECK(twice.report.diagnostics().front().notes.size() == 1);
    CHECK(read({{"pH", "7.4"}}, {{"onset", "sudden"}}).has("context-value"));
}

}  // namespace isohydric::panel::testing
