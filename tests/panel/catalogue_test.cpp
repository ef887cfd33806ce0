// The shipped list of analytes: what it says, and that it agrees with itself and with DESIGN's names.
#include <doctest/doctest.h>

#include <algorithm>
#include <map>
#include <set>

#include "panel/panel_fixture.hpp"

namespace isohydric::panel::testing {

TEST_CASE("analytes: expression names are the ids, but for those that may also be calculated") {
    const std::map<std::string_view, std::string> renamed{{"pH", "pHmeasured"},
                                                          {"pCO2", "pCO2measured"},
                                                          {"HCO3", "HCO3reported"},
                                                          {"BE", "BEreported"},
                                                          {"SBE", "SBEreported"},
                                                          {"AG", "AGreported"},
                                                          {"AGK", "AGKreported"}};
    for (const AnalyteInfo& info : shipped().analytes) {
        const auto found = renamed.find(info.id());
        CHECK(info.expression_name ==
              (found == renamed.end() ? std::string(info.id()) : found->second));
    }
}

TEST_CASE("analytes: every one is complete") {
    for (std::size_t i = 0; i < k_analyte_count; ++i) {
        const AnalyteInfo& info = shipped().analytes[i];
        CAPTURE(info.id());
        CHECK(index_of(info.analyte) == i);
        CHECK_FALSE(info.label.empty());
        CHECK_FALSE(info.sources.empty());
        REQUIRE_FALSE(info.customary.empty());
        CHECK(info.customary.front().ucum == info.unit.code());
        CHECK(info.customary.front().factor == 1);
        CHECK(info.customary.front().offset == 0);
        CHECK(shipped().find(info.id())->analyte == info.analyte);
        for (const std::string& alias : info.aliases) {
            CHECK(shipped().find(alias)->analyte == info.analyte);
        }
    }
}

TEST_CASE("analytes: only values that other values give are marked derived") {
    std::set<std::string_view> derived;
    for (const AnalyteInfo& info : shipped().analytes) {
        if (info.derived) {
            derived.insert(info.id());
        }
    }
    CHECK(derived == std::set<std::string_view>{"BE", "SBE", "AG", "AGK"});
}

TEST_CASE("limits: reference values lie well inside: common practice") {
    const std::map<Analyte, std::pair<double, double>> reference{{Analyte::ph, {7.35, 7.45}},
                                                                 {Analyte::pco2, {35, 45}},
                                                                 {Analyte::hco3, {22, 26}},
                                                                 {Analyte::na, {135, 145}},
                                                                 {Analyte::k, {3.5, 5.0}},
                                                                 {Analyte::cl, {95, 107}},
                                                                 {Analyte::albumin, {35, 50}},
                                                                 {Analyte::lactate, {0.5, 1.6}},
                                                                 {Analyte::phosphate, {0.8, 1.5}},
                                                                 {Analyte::ica, {1.15, 1.30}},
                                                                 {Analyte::ca, {2.2, 2.6}},
                                                                 {Analyte::mg, {0.7, 1.0}}};
    for (const auto& [analyte, interval] : reference) {
        CHECK(shipped()[analyte].plausible.contain(interval.first));
        CHECK(shipped()[analyte].plausible.contain(interval.second));
    }
}

TEST_CASE("limits: measured extremes are accepted [@grocott2009, abstract; @zimmer2008, cases]") {
    CHECK(shipped()[Analyte::pco2].accepted.contain(10.3));  // at 8400 m
    CHECK(shipped()[Analyte::cl].accepted.contain(174));     // electrode under interference
    CHECK(shipped()[Analyte::ag].accepted.contain(-49));
}

TEST_CASE("LOINC: codes by their long common names [@loinc, long common names]") {
    const auto has = [](Analyte analyte, std::string_view code) {
        const auto& codes = shipped()[analyte].loinc;
        return std::find(codes.begin(), codes.end(), code) != codes.end();
    };
    CHECK(has(Analyte::ph, "2744-1"));    // pH of Arterial blood
    CHECK(has(Analyte::pco2, "2019-8"));  // Carbon dioxide [Partial pressure] in Arterial blood
    CHECK(has(Analyte::hco3, "1963-8"));  // Bicarbonate [Moles/volume] in Serum or Plasma
    CHECK(has(Analyte::tco2, "2028-9"));  // Carbon dioxide, total [Moles/volume] in Serum or Plasma
    CHECK(has(Analyte::agk, "1863-0"));   // Anion gap 4
    CHECK(has(Analyte::ag, "10466-1"));   // Anion gap 3
    CHECK_FALSE(has(Analyte::be, "1922-4"));    // Base deficit: the other sign
    CHECK_FALSE(has(Analyte::urea, "3094-0"));  // Urea nitrogen: another mass
    CHECK_FALSE(has(Analyte::ph, "33254-4"));   // at the patient's temperature
    CHECK_FALSE(has(Analyte::so2, "59408-5"));  // by pulse oximetry
}

TEST_CASE("names: the nearest one is offered, none for a word far from all") {
    CHECK(shipped().nearest("sodum") == "sodium");
    CHECK(shipped().nearest("PaC02") == "PaCO2");
    CHECK(shipped().nearest("qqqqqqqqqqqq").empty());
}

}  // namespace isohydric::panel::testing
