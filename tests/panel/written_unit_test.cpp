// Values with a unit: converted by published factors, and remembered as they were written.
#include <doctest/doctest.h>

#include "panel/panel_fixture.hpp"

namespace isohydric::panel::testing {

namespace {

/// What a laboratory's table of conversions would print, computed outside this program.
struct Known {
    const char* name;
    const char* text;
    double canonical;
    int decimals;
};

void check(const Known& known) {
    const Entered entered = read_one(known.name, known.text);
    CAPTURE(known.name);
    CAPTURE(known.text);
    CAPTURE(entered.value);
    CHECK(prints_as(entered.value, known.canonical, known.decimals));
}

}  // namespace

TEST_CASE("mass concentrations: conventional atomic weights [@ciaaw2021, table of abridged "
          "standard atomic weights]") {
    // Each product is the factor mg/dL -> mmol/L of 10 over the molar mass, by hand from the weights.
    check({"glucose", "100 mg/dL", 5.5507, 4});     // 180.156 g/mol
    check({"lactate", "9.0078 mg/dL", 1.0000, 4});  // 90.078, as the acid
    check({"phosphate", "3 mg/dL", 0.96855, 5});    // 30.974, as phosphorus
    check({"Ca", "10 mg/dL", 2.49513, 5});          // 40.078
    check({"iCa", "4.8 mg/dL", 1.19766, 5});        // 40.078
    check({"Mg", "2 mg/dL", 0.82288, 5});           // 24.305
    check({"urea", "60 mg/dL", 9.9907, 4});         // 60.056, the whole molecule
    check({"BUN", "23 mg/dL", 8.2102, 4});          // 28.014, its two nitrogen atoms
    check({"creatinine", "1 mg/dL", 88.4017, 4});   // 113.120, in umol/L
    check({"ethanol", "100 mg/dL", 21.7066, 4});    // 46.069
    check({"BHB", "10 mg/dL", 0.96057, 5});         // 104.105
    check({"urineGlucose", "100 mg/dL", 5.5507, 4});
    check({"urine urea nitrogen", "280.14 mg/dL", 100.0000, 4});
}

TEST_CASE("proteins: molar masses as measured [@pmc3934467, table 1]") {
    // 1 g/dL of haemoglobin is 0.62063 mmol/L of subunits, within 0.012 percent of the mass used here.
    CHECK(read_one("Hb", "0.62063 mmol/L monomer").value == doctest::Approx(10).epsilon(2e-4));
    CHECK(read_one("Hb", "0.62063 mmol/L{monomer}").value == doctest::Approx(10).epsilon(2e-4));
    // Four subunits make a tetramer.
    CHECK(read_one("Hb", "2.3 mmol/L tetramer").value ==
          doctest::Approx(4 * read_one("Hb", "2.3 mmol/L monomer").value).epsilon(1e-12));
}

TEST_CASE("pressures: the conventional millimetre of mercury is 133.322387415 Pa [@nist-sp811, "
          "appendix B.8]") {
    check({"pCO2", "5.3 kPa", 39.7533, 4});
    check({"pCO2", "3.9kPa", 29.2524, 4});
    check({"pressure", "101.325 kPa", 759.9999, 4});
    check({"pressure", "1013.25 hPa", 759.9999, 4});
    check({"pressure", "1013.25 mbar", 759.9999, 4});
    check({"pCO2", "40 torr", 40.0000, 4});
}

TEST_CASE("powers of ten are exact: arithmetic, no source") {
    CHECK(read_one("albumin", "2.1 g/dL").value == 21);
    CHECK(read_one("Hb", "14.5 g/dL").value == 145);
    CHECK(read_one("Na", "140 mmol/L").value == 140);
    CHECK(read_one("Na", "140 mEq/L").value == 140);
    CHECK(read_one("sO2", "95 %").value == 0.95);
    CHECK(read_one("osmolality", "290 mmol/kg").value == 290);
}

TEST_CASE("temperatures: the zero points count [@nist-sp811, appendix B.8]") {
    check({"temperature", "98.6 °F", 37.0000, 4});
    check({"temperature", "310.15 K", 37.0000, 4});
    check({"temperature", "37 °C", 37.0000, 4});
}

TEST_CASE("mEq/L: divided by the charge of the ion [@ucum, section 4.4]") {
    CHECK(read_one("Ca", "4.8 mEq/L").value == 2.4);
    CHECK(read_one("iCa", "2.4 mEq/L").value == 1.2);
    CHECK(read_one("Mg", "1.7 mEq/L").value == 0.85);
    CHECK(read_one("lactate", "2 mEq/L").value == 2);
    CHECK(read_one("AG", "12 mEq/L").value == 12);
}

TEST_CASE("mEq/L: refused with the reason where no charge is fixed") {
    for (const std::string& name : Words{"phosphate", "albumin", "protein"}) {
        const Outcome outcome = read({{name, "2.4 mEq/L"}});
        CHECK(outcome.has("panel-unit"));
        CHECK(outcome.says("its charge depends on pH"));
    }
    const Outcome uncharged = read({{"glucose", "5 mEq/L"}});
    CHECK(uncharged.says("it carries no charge"));
}

TEST_CASE("urea: BUN is nitrogen, never urea mass, and says so") {
    const Entered nitrogen = read_one("BUN", "23 mg/dL");
    CHECK(nitrogen.note == "urea nitrogen");
    CHECK(nitrogen.as_entered == "23 mg/dL");
    const Entered molar = read_one("BUN", "8 mmol/L");
    CHECK(molar.value == 8);
    CHECK(molar.note == "urea nitrogen; counted as mmol/L of urea");
    CHECK(read_one("urea", "8 mmol/L").note.empty());
}

TEST_CASE("haemoglobin in mmol/L must say of which molecule: both readings are shown") {
    const Outcome outcome = read({{"Hb", "9.3 mmol/L"}});
    CHECK(outcome.has("panel-unit"));
    CHECK(outcome.says("9.3 mmol/L monomer = 150 g/L"));   // 9.3 * 16.1145
    CHECK(outcome.says("9.3 mmol/L tetramer = 599 g/L"));  // 9.3 * 64.458
}

TEST_CASE("units that do not belong to the analyte are refused, whatever their dimension") {
    const Texts wrong{{"albumin", "40 mmHg"},
                      {"Na", "140 mosm/L"},
                      {"osmolality", "290 mOsm/L"},
                      {"pH", "740 %"},
                      {"sO2", "0.95 [pH]"},
                      {"pCO2", "40 Cel"},
                      {"Na", "3.2 g/L"},
                      {"temperature", "37 mmol/L"}};
    for (const auto& pair : wrong) {
        const auto name = pair.first;
        const auto text = pair.second;
        const Outcome outcome = read({{name, text}});
        CAPTURE(name);
        CAPTURE(text);
        CHECK(outcome.has("panel-unit"));
        CHECK_FALSE(outcome.panel.has_value());
    }
    CHECK(read({{"albumin", "40 mmHg"}}).says("its units are g/L, g/dL"));
    CHECK(read({{"Na", "140 furlong"}}).says("the unit \"furlong\" is not known"));
}

TEST_CASE(
    "pH: a hydrogen ion concentration is never converted, and the message says what to give") {
    for (const std::string& text : Words{"40 nmol/L", "40", "4e-8 mol/L"}) {
        const Outcome outcome = read({{"pH", text}});
        CAPTURE(text);
        CHECK_FALSE(outcome.panel.has_value());
        CHECK(outcome.says("give the pH"));
    }
    CHECK(read_one("pH", "9.1").value == 9.1);  // a stop check's affair
}

TEST_CASE("as entered: what was written, with the unit in its usual spelling") {
    CHECK(read_one("pCO2", "3.9kPa").as_entered == "3.9 kPa");
    CHECK(read_one("Na", "140meq/L").as_entered == "140 mEq/L");
    CHECK(read_one("pH", "7,21").as_entered == "7.21");
    CHECK(read_one("Hb", "9.3mmol/L  monomer").as_entered == "9.3 mmol/L monomer");
    CHECK(read_one("glucose", "1.0 g/L").as_entered == "1.0 g/L");
    CHECK(read_one("lactate", "<0.5 mmol/L").as_entered == "<0.5 mmol/L");
}

TEST_CASE("rounding: half a unit of the last digit, in the canonical unit") {
    CHECK(read_one("pH", "7.40").half_digit == 0.005);
    CHECK(read_one("Na", "140").half_digit == 0.5);
    CHECK(read_one("Na", "140.0 mmol/L").half_digit == 0.05);
    CHECK(read_one("albumin", "4.0 g/dL").half_digit == 0.5);
    CHECK(prints_as(read_one("pCO2", "5.3 kPa").half_digit, 0.37503, 5));  // 0.05 kPa
    CHECK(read_one("creatinine", "1e2 umol/L").half_digit == 50);
}

TEST_CASE("every customary unit of every analyte reads as its factor says") {
    std::size_t tried = 0;
    for (const AnalyteInfo& info : shipped().analytes) {
        for (const CustomaryUnit& unit : info.customary) {
            if (!unit.variant.empty()) {
                continue;  // has a name of its own, see the next test
            }
            const double middle = (info.plausible.low + info.plausible.high) / 2;
            const double written = (middle - unit.offset) / unit.factor;
            const std::string digits = fmt::format("{:.4f}", written);
            const std::string shown = unit.spoken();
            const std::string end = shown.empty() ? "'" + unit.ucum + "'" : shown;
            const Entered entered = read_one(std::string(info.id()), digits + " " + end);
            CAPTURE(info.id());
            CAPTURE(unit.ucum);
            CHECK(entered.value ==
                  doctest::Approx(std::stod(digits) * unit.factor + unit.offset).epsilon(1e-12));
            CHECK(entered.as_entered == (shown.empty() ? digits : digits + " " + shown));
            ++tried;
        }
    }
    CHECK(tried > 70);
}

TEST_CASE("every name that means a variant reads in the units of that variant") {
    std::size_t tried = 0;
    for (const AnalyteInfo& info : shipped().analytes) {
        for (const std::string& alias : info.aliases) {
            const std::string variant = shipped().find(alias)->variant.value_or("");
            for (const CustomaryUnit& unit : info.customary) {
                if (variant.empty() || unit.variant != variant) {
                    continue;
                }
                CHECK(read_one(alias, "100 " + unit.text).value ==
                      doctest::Approx(100 * unit.factor).epsilon(1e-12));
                ++tried;
            }
        }
    }
    CHECK(tried == 12);  // three names of blood and of urine, two units each
}

}  // namespace isohydric::panel::testing
