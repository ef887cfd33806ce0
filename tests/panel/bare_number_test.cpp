// Numbers without a unit: accepted where they can mean one thing only, otherwise refused with every reading.
#include "isohydric/panel/conversion.hpp"

#include <doctest/doctest.h>

#include <algorithm>
#include <cmath>

#include "panel/panel_fixture.hpp"

namespace isohydric::panel::testing {

namespace {

void refused(const std::string& name,
             const std::string& text,
             const std::vector<std::string>& readings) {
    const Outcome outcome = read({{name, text}});
    CAPTURE(name);
    CAPTURE(text);
    CAPTURE(outcome.messages());
    CHECK_FALSE(outcome.panel.has_value());
    CHECK(outcome.has("panel-unit-needed"));
    for (const std::string& reading : readings) {
        CAPTURE(reading);
        CHECK(outcome.says(reading));
    }
}

}  // namespace

TEST_CASE("bare: two plausible readings are both shown") {
    refused("lactate", "9", {"9 mmol/L, or 9 mg/dL = 1.0 mmol/L", "write the unit"});
    refused("pCO2", "12", {"12 mmHg, or 12 kPa = 90.0 mmHg"});
    refused("glucose", "20", {"20 mmol/L, or 20 mg/dL = 1.1 mmol/L"});
    refused("BUN", "23", {"BUN may be 23 mmol/L, or 23 mg/dL = 8.2 mmol/L"});
    refused("COHb", "0.5", {"0.5 as a fraction, or 0.5 % = 0.005 as a fraction"});
    refused("Ca", "2.7", {"2.7 mmol/L, or 2.7 mEq/L = 1.35 mmol/L"});
}

TEST_CASE("bare: a value in another unit than the canonical one is refused with both readings") {
    refused("pCO2", "5.3", {"5.3 kPa = 39.8 mmHg", "5.3 mmHg is implausible"});
    refused("albumin", "4.0", {"4.0 g/dL = 40 g/L", "4.0 g/L", "is implausible"});
    refused("Hb", "14", {"14 g/dL = 140 g/L", "14 mmol/L monomer = 226 g/L"});
    refused("glucose", "90", {"90 mg/dL = 5.0 mmol/L", "90 mmol/L is implausible"});
    refused("temperature", "98.6", {"98.6 °F = 37.0 °C", "98.6 °C"});
    refused("pressure", "101.3", {"101.3 kPa = 760 mmHg"});
    refused("creatinine", "1.2", {"1.2 mg/dL = 106 µmol/L"});
}

TEST_CASE("bare: implausible in every unit") {
    refused("pCO2", "140", {"140 mmHg", "140 kPa = 1050.1 mmHg", "implausible"});
}

TEST_CASE("bare: one plausible reading, in the canonical unit") {
    CHECK(read_one("pCO2", "40").value == 40);
    CHECK(read_one("albumin", "40").value == 40);
    CHECK(read_one("lactate", "2.0").value == 2);
    CHECK(read_one("Hb", "140").value == 140);
    CHECK(read_one("iCa", "1.20").value == 1.2);
    CHECK(read_one("Ca", "2.40").value == 2.4);
    CHECK(read_one("glucose", "6.0").value == 6);
    CHECK(read_one("creatinine", "80").value == 80);
    CHECK(read_one("temperature", "37").value == 37);
    CHECK(read_one("pCO2", "40").note.empty());
}

TEST_CASE("bare: where all units give equal values none is needed, however odd the value") {
    CHECK(read_one("pH", "7.21").value == 7.21);
    CHECK(read_one("pH", "6.2").value == 6.2);  // beyond what is accepted: a stop check later
    CHECK(read_one("Na", "60").value == 60);    // likewise
    CHECK(read_one("HCO3", "2").value == 2);
    CHECK(read_one("BE", "-31").value == -31);
    CHECK(read_one("osmolality", "290").value == 290);
    CHECK(read_one("urineNa", "20").value == 20);
}

TEST_CASE("bare: percent and fraction, and the note says which") {
    CHECK(read_one("FiO2", "40").value == 0.40);
    CHECK(read_one("FiO2", "40").note == "read as %");
    CHECK(read_one("FiO2", "0.4").value == 0.4);
    CHECK(read_one("FiO2", "0.4").note.empty());
    CHECK(read_one("FiO2", "21").value == 0.21);
    CHECK(read_one("FiO2", "1").value == 1);
    CHECK(read_one("sO2", "97").value == 0.97);
    CHECK(read_one("sO2", "0.97").value == 0.97);
    CHECK(read_one("MetHb", "1.2").value == doctest::Approx(0.012).epsilon(1e-12));
}

TEST_CASE("bare: pO2 takes the unit of pCO2, in whatever order, and says so") {
    for (const Texts& values :
         {Texts{{"pCO2", "3.9kPa"}, {"pO2", "11.2"}}, Texts{{"pO2", "11.2"}, {"pCO2", "3.9kPa"}}}) {
        const Outcome outcome = read(values);
        REQUIRE(outcome.panel.has_value());
        const Entered& po2 = (*outcome.panel)[Analyte::po2].value();
        CHECK(prints_as(po2.value, 84.007, 3));  // 11.2 * 7.500615758
        CHECK(po2.note == "unit taken from pCO2");
        CHECK(po2.as_entered == "11.2");
    }
    const Outcome same = read({{"pCO2", "40"}, {"pO2", "90"}});
    REQUIRE(same.panel.has_value());
    CHECK((*same.panel)[Analyte::po2]->value == 90);
    CHECK((*same.panel)[Analyte::po2]->note == "unit taken from pCO2");
}

TEST_CASE("bare: pO2 that the unit of pCO2 makes implausible is refused") {
    const Outcome outcome = read({{"pCO2", "3.9kPa"}, {"pO2", "95"}});
    CHECK(outcome.has("panel-unit-needed"));
    CHECK(outcome.says("95 kPa = 712.6 mmHg"));
    CHECK(read({{"pCO2", "40"}, {"pO2", "9"}}).has("panel-unit-needed"));
}

TEST_CASE(
    "bare: every number between the plausible limits is taken in one way or refused with two") {
    std::size_t taken = 0;
    std::size_t refusals = 0;
    for (const AnalyteInfo& info : shipped().analytes) {
        for (int step = 0; step <= 200; ++step) {
            const double at =
                info.plausible.low + (info.plausible.high - info.plausible.low) * step / 200;
            const std::string digits = fmt::format("{:.3f}", at);
            const double value = std::stod(digits);
            std::vector<double> possible;  // plausible values, each once
            for (const CustomaryUnit& unit : info.customary) {
                const double canonical = unit.to_canonical(value);
                const bool is_new = std::ranges::none_of(possible, [canonical](double other) {
                    return std::abs(other - canonical) <= 1e-9 * std::abs(other);
                });
                if (unit.variant.empty() && is_new && info.plausible.contain(canonical)) {
                    possible.push_back(canonical);
                }
            }
            const Outcome outcome = read({{std::string(info.id()), digits}});
            CAPTURE(info.id());
            CAPTURE(digits);
            CAPTURE(outcome.messages());
            if (outcome.panel) {
                REQUIRE(possible.size() == 1);
                REQUIRE(outcome.panel->values[index_of(info.analyte)]->value == possible.front());
                ++taken;
            } else {
                REQUIRE(outcome.has("panel-unit-needed"));
                const std::string text = outcome.messages();
                REQUIRE(
                    (possible.size() > 1 ? outcome.says(", or ") : outcome.says("implausible")));
                ++refusals;
            }
        }
    }
    CHECK(taken > 1000);
    CHECK(refusals > 1000);
}

TEST_CASE("columns: which analytes need no unit at all") {
    const auto needless = [](Analyte analyte) {
        return unit_needless(shipped()[analyte], "").has_value();
    };
    CHECK(needless(Analyte::ph));
    CHECK(needless(Analyte::na));
    CHECK(needless(Analyte::hco3));
    CHECK(needless(Analyte::osmolality));
    CHECK_FALSE(needless(Analyte::pco2));
    CHECK_FALSE(needless(Analyte::lactate));
    CHECK_FALSE(needless(Analyte::so2));
    CHECK_FALSE(needless(Analyte::temperature));
    CHECK_FALSE(unit_needless(shipped()[Analyte::urea], "urea nitrogen").has_value());
}

}  // namespace isohydric::panel::testing
