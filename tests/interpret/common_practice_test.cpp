// Values that everybody in the trade knows, as checks of the shipped rules and models. Common practice: no source is named.
#include "isohydric/chem/neutral_ph.hpp"

#include <doctest/doctest.h>

#include <algorithm>

#include "harness/shipped_rules.hpp"

namespace {

using namespace isohydric;

const interpret::AnalyteResult& entered(const interpret::Interpretation& result,
                                        panel::Analyte analyte) {
    const auto found = std::find_if(result.entered.begin(),
                                    result.entered.end(),
                                    [&](const auto& item) { return item.analyte == analyte; });
    REQUIRE(found != result.entered.end());
    return *found;
}

}  // namespace

TEST_CASE("common practice: arterial blood has a pH of 7.35 to 7.45") {
    const auto result = harness::interpreted({{"pH", "7.40"}, {"pCO2", "40 mmHg"}});
    CHECK(entered(result, panel::Analyte::ph).low == 7.35);
    CHECK(entered(result, panel::Analyte::ph).high == 7.45);
}

TEST_CASE("common practice: pH 7.0 is 100 nmol/L of hydrogen ion") {
    const auto result = harness::interpreted({{"pH", "7.00"}, {"pCO2", "40 mmHg"}});
    CHECK(*harness::quantity_of(result, "hydrogenIon").value ==
          doctest::Approx(100).epsilon(1e-12));
}

TEST_CASE("common practice: urine has a pH of 4.8 to 7.5") {
    const auto result = harness::interpreted({{"urinepH", "6.0"}}, {});
    CHECK(entered(result, panel::Analyte::urine_ph).low == 4.8);
    CHECK(entered(result, panel::Analyte::urine_ph).high == 7.5);
}

TEST_CASE("common practice: neutral water at 25 degC has a pH of 7.0") {
    CHECK(chem::neutral_ph::at_temperature(25.0) == doctest::Approx(7.0).epsilon(0.05 / 7.0));
}
