// Panels as columns: values, rounding and context in the row they were pushed to; missing is a mask.
#include "isohydric/diag/assert.hpp"
#include "isohydric/panel/block.hpp"

#include <doctest/doctest.h>

#include "panel/panel_fixture.hpp"

namespace isohydric::panel::testing {

namespace {

Panel panel_of(const Texts& values, const Texts& context = {}) {
    const Outcome outcome = read(values, context);
    INFO(outcome.messages());
    REQUIRE(outcome.panel.has_value());
    return *outcome.panel;
}

}  // namespace

TEST_CASE("block: values and their rounding stand in the row of their panel") {
    PanelBlock block(4);
    block.push(panel_of({{"pH", "7.21"}, {"Na", "138"}}));
    block.push(panel_of({{"pH", "7.405"}}));
    CHECK(block.size() == 2);
    CHECK(block.capacity() == 4);
    CHECK(block.analyte(Analyte::ph).values == std::vector<double>{7.21, 7.405});
    CHECK(block.analyte(Analyte::ph).missing == std::vector<std::uint8_t>{0, 0});
    CHECK(block.rounding(Analyte::ph).values == std::vector<double>{0.005, 0.0005});
    CHECK(block.analyte(Analyte::na).values == std::vector<double>{138, 0});
    CHECK(block.analyte(Analyte::na).missing == std::vector<std::uint8_t>{0, 1});
    CHECK(block.rounding(Analyte::na).missing == std::vector<std::uint8_t>{0, 1});
}

TEST_CASE("block: a bound is missing, zero is not") {
    PanelBlock block(2);
    block.push(panel_of({{"lactate", "<0.5 mmol/L"}, {"BE", "0"}}));
    CHECK(block.analyte(Analyte::lactate).missing.front() == 1);
    CHECK(block.analyte(Analyte::lactate).values.front() == 0);
    CHECK(block.rounding(Analyte::lactate).missing.front() == 1);
    CHECK(block.analyte(Analyte::be).missing.front() == 0);
}

TEST_CASE("block: context") {
    PanelBlock block(2);
    block.push(panel_of({{"PvCO2", "46"}},
                        {{"population", "pregnancy-2"},
                         {"onset", "chronic"},
                         {"altitude", "3510"},
                         {"age", "30y"},
                         {"baseline-pCO2", "60"}}),
               true);
    block.push(panel_of({{"pH", "7.4"}}));
    CHECK(block.context_code(ContextItem::specimen) ==
          std::vector<std::uint8_t>{1, 7});  // venous, not stated
    CHECK(block.context_code(ContextItem::population) == std::vector<std::uint8_t>{4, 0});
    CHECK(block.context_code(ContextItem::onset) == std::vector<std::uint8_t>{2, 0});
    CHECK(block.context_code(ContextItem::near) == std::vector<std::uint8_t>{1, 0});
    CHECK(block.context_number(ContextItem::age).values == std::vector<double>{30, 0});
    CHECK(block.context_number(ContextItem::age).missing == std::vector<std::uint8_t>{0, 1});
    CHECK(block.context_number(ContextItem::altitude).values.front() == 3510);
    CHECK(block.context_number(ContextItem::baseline_pco2).values.front() == 60);
    CHECK(block.context_number(ContextItem::baseline_hco3).missing ==
          std::vector<std::uint8_t>{1, 1});
}

TEST_CASE("block: cleared it starts anew; full it takes no more; a code is no number") {
    PanelBlock block(1);
    const Panel panel = panel_of({{"pH", "7.4"}});
    block.push(panel);
    CHECK_THROWS_AS(block.push(panel), diag::InternalError);
    CHECK_THROWS_AS((void)block.context_number(ContextItem::specimen), diag::InternalError);
    CHECK_THROWS_AS((void)block.context_code(ContextItem::age), diag::InternalError);
    block.clear();
    CHECK(block.size() == 0);
    CHECK(block.analyte(Analyte::ph).values.empty());
    block.push(panel);
    CHECK(block.analyte(Analyte::ph).values == std::vector<double>{7.4});
    CHECK(block.context_code(ContextItem::near) == std::vector<std::uint8_t>{0});
}

}  // namespace isohydric::panel::testing
