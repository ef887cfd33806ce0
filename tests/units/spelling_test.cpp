// Customary spellings of units, and what is refused.
#include "isohydric/units/spelling.hpp"
#include "isohydric/units/unit.hpp"

#include <doctest/doctest.h>

#include <array>
#include <string>
#include <string_view>

namespace units = isohydric::units;
using units::suggest_unit;
using units::ucum_of;

TEST_CASE("spelling: UCUM codes pass unchanged [@ucum, section 4]") {
    for (const std::string_view code :
         {"mm[Hg]", "kPa", "mmol/L", "mmol/l", "meq/L", "mosm/kg", "g/dL", "mg%",   "g%",
          "%",      "1",   "Cel",    "[degF]", "K",     "m",       "[pH]", "10*-3", "mosm/kg{H2O}",
          "mbar",   "hPa", "umol/L"}) {
        CHECK(ucum_of(code) == code);
    }
}

TEST_CASE("spelling: customary ones, common practice") {
    struct Meaning {
        std::string_view written;
        std::string_view code;
    };

    constexpr std::array<Meaning, 40> k_meanings{{
        {"mmHg", "mm[Hg]"},
        {"mm Hg", "mm[Hg]"},
        {"torr", "mm[Hg]"},
        {"Torr", "mm[Hg]"},
        {"kpa", "kPa"},
        {"cmH2O", "cm[H2O]"},
        {"mEq/L", "meq/L"},
        {"mEq/l", "meq/l"},
        {"mval/L", "meq/L"},
        {"mM", "mmol/L"},
        {"uM", "umol/L"},
        {"\u00b5M", "umol/L"},
        {"mOsm/kg", "mosm/kg"},
        {"mosmol/kg", "mosm/kg"},
        {"mOsmol/kg", "mosm/kg"},
        {"mOsm/L", "mosm/L"},
        {"mOsm/kg H2O", "mosm/kg{H2O}"},
        {"mOsm/kgH2O", "mosm/kg{H2O}"},
        {"\u00b5mol/L", "umol/L"},
        {"\u03bcmol/L", "umol/L"},
        {"\u00b5g/dL", "ug/dL"},
        {"mcg/dL", "ug/dL"},
        {"\u00b0C", "Cel"},
        {"C", "Cel"},
        {"degC", "Cel"},
        {"\u2103", "Cel"},
        {"\u00b0F", "[degF]"},
        {"F", "[degF]"},
        {"degF", "[degF]"},
        {"percent", "%"},
        {"\u2030", "[ppth]"},
        {"fraction", "1"},
        {"units", "1"},
        {"pH", "[pH]"},
        {"psi", "[psi]"},
        {"mmol / L", "mmol/L"},
        {" mmHg ", "mm[Hg]"},
        {"mmol/litre", "mmol/L"},
        {"gm/dl", "g/dl"},
        {"L/hr", "L/h"},
    }};
    for (const Meaning& meaning : k_meanings) {
        CAPTURE(meaning.written);
        CHECK(ucum_of(meaning.written) == std::string(meaning.code));
        CHECK(units::parse_unit(meaning.code).has_value());
    }
}

TEST_CASE("spelling: nothing, unknown and ambiguous ones are none") {
    for (const std::string_view written : {"",
                                           " ",
                                           "M",
                                           "MM",
                                           "MMOL/L",
                                           "MEQ/L",
                                           "MMHG",
                                           "Mol/L",
                                           "furlong",
                                           "ft",
                                           "mEq/",
                                           "/",
                                           "mg/dl/",
                                           "H2O",
                                           "\u00b5",
                                           "\xff",
                                           "am9"}) {
        CAPTURE(written);
        CHECK_FALSE(ucum_of(written).has_value());
    }
}

TEST_CASE("spelling: a near one is suggested, and can be read") {
    CHECK(suggest_unit("MMOL/L") == "mmol/L");
    CHECK(suggest_unit("MEQ/L") == "mEq/L");
    CHECK(suggest_unit("MMHG") == "mmHg");
    CHECK(suggest_unit("G/DL") == "g/dL");
    CHECK(suggest_unit("mmoll/L") == "mmol/L");
    CHECK(suggest_unit("furlong").empty());
    CHECK(suggest_unit("").empty());
    for (const std::string_view written :
         {"MMOL/L", "KPA", "PERCENT", "MOSM/KG", "MBAR", "UMOL/L", "CMH2O", "DEGC"}) {
        CAPTURE(written);
        CHECK(ucum_of(suggest_unit(written)).has_value());
    }
}
