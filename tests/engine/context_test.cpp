// Context items in expressions, and the interval that holds for each row.
#include <doctest/doctest.h>

#include "engine/evaluated.hpp"

namespace engine = isohydric::engine;
namespace panel = isohydric::panel;
namespace test = isohydric::test;
using engine::Truth;
using panel::Analyte;
using test::Evaluated;
using test::panel_of;
using test::RulesByHand;

namespace {

panel::Panel panel_in(panel::Specimen specimen,
                      panel::Population population,
                      std::optional<double> age_a = {},
                      std::optional<double> altitude_m = {}) {
    panel::Panel panel = panel_of({{Analyte::ph, 7.4}});
    panel.context.specimen = specimen;
    panel.context.population = population;
    panel.context.age_a = age_a;
    panel.context.altitude_m = altitude_m;
    return panel;
}

constexpr auto k_arterial = panel::Specimen::arterial;
constexpr auto k_venous = panel::Specimen::venous;
constexpr auto k_adult = panel::Population::adult;
constexpr auto k_child = panel::Population::child;

/// The lower limit of `x` in each panel.
std::vector<std::optional<double>> low_limits(RulesByHand& rules,
                                              const std::vector<panel::Panel>& panels) {
    const auto low = rules.quantity("lowOfX", "limits.x.low", "1");
    const Evaluated evaluated(rules, panels);
    std::vector<std::optional<double>> limits;
    for (std::size_t row = 0; row < panels.size(); ++row) {
        limits.push_back(evaluated.quantity(low, row));
    }
    return limits;
}

using Limits = std::vector<std::optional<double>>;

}  // namespace

TEST_CASE("context: codes compare with their words") {
    RulesByHand rules;
    const auto is = rules.condition("isVenous", "context.specimen = 'venous'");
    const auto is_not = rules.condition("isNotChild", "context.population != 'child'");
    const auto onset = rules.condition("isChronic", "context.onset = 'chronic'");
    panel::Panel chronic = panel_in(k_venous, k_child);
    chronic.context.onset = panel::StatedOnset::chronic;
    const Evaluated evaluated(rules, {panel_in(k_arterial, k_adult), chronic});
    CHECK(evaluated.condition(is, 0) == Truth::no);
    CHECK(evaluated.condition(is, 1) == Truth::yes);
    CHECK(evaluated.condition(is_not, 0) == Truth::yes);
    CHECK(evaluated.condition(is_not, 1) == Truth::no);
    CHECK(evaluated.condition(onset, 0) == Truth::no);
    CHECK(evaluated.condition(onset, 1) == Truth::yes);
}

TEST_CASE("context: numbers may be missing") {
    RulesByHand rules;
    const auto old = rules.condition("old", "context.age > 60 'a'");
    const auto baseline =
        rules.quantity("base", "context.baselinePCO2 + context.altitude * 0 'mm[Hg]/m'", "mm[Hg]");
    panel::Panel given = panel_in(k_arterial, k_adult, 70.0, 1000.0);
    given.context.baseline_pco2_mmHg = 55.0;
    const Evaluated evaluated(rules, {given, panel_in(k_arterial, k_adult)});
    CHECK(evaluated.condition(old, 0) == Truth::yes);
    CHECK(evaluated.condition(old, 1) == Truth::unknown);
    CHECK(evaluated.quantity(baseline, 0) == 55.0);
    CHECK_FALSE(evaluated.quantity(baseline, 1));
}

TEST_CASE("context: near is a truth of the row") {
    RulesByHand rules;
    const auto near = rules.condition("near", "context.near");
    panel::PanelBlock block(2);
    block.push(panel_of({}), false);
    block.push(panel_of({}), true);
    const Evaluated evaluated(rules, block);
    CHECK(evaluated.condition(near, 0) == Truth::no);
    CHECK(evaluated.condition(near, 1) == Truth::yes);
}

TEST_CASE("intervals: one for anybody") {
    RulesByHand rules;
    rules.interval("x", "1", 1.0, {});
    CHECK(low_limits(rules, {panel_in(k_venous, k_child, 3.0, 2000.0), panel_of({})}) ==
          Limits{1.0, 1.0});
}

TEST_CASE("intervals: specimen and population of each row, none without one") {
    RulesByHand rules;
    auto& arterial = rules.interval("x", "1", 1.0, {});
    arterial.specimens = {k_arterial};
    arterial.populations = {k_adult};
    auto& venous = rules.interval("x", "1", 2.0, {});
    venous.specimens = {k_venous, panel::Specimen::central_venous};
    CHECK(low_limits(rules,
                     {panel_in(k_venous, k_child),
                      panel_in(k_arterial, k_adult),
                      panel_in(k_arterial, k_child),
                      panel_in(panel::Specimen::central_venous, k_adult),
                      panel_in(panel::Specimen::not_stated, k_adult)}) ==
          Limits{2.0, 1.0, {}, 2.0, {}});
}

TEST_CASE("intervals: of two that hold, the first in the rule set counts") {
    RulesByHand rules;
    rules.interval("x", "1", 1.0, {});
    rules.interval("x", "1", 2.0, {});
    rules.interval("y", "1", 3.0, {});
    CHECK(low_limits(rules, {panel_of({})}) == Limits{1.0});
}

TEST_CASE("intervals: an age criterion holds from its start to just below its end") {
    RulesByHand rules;
    auto& young = rules.interval("x", "1", 1.0, {});
    young.age_a = {1.0, 18.0};
    young.needs_age = true;
    CHECK(low_limits(rules,
                     {panel_in(k_arterial, k_child, 0.9),
                      panel_in(k_arterial, k_child, 1.0),
                      panel_in(k_arterial, k_child, 17.9),
                      panel_in(k_arterial, k_child, 18.0)}) == Limits{{}, 1.0, 1.0, {}});
}

TEST_CASE("intervals: without an age no age criterion holds, not even one that starts at 0") {
    RulesByHand rules;
    auto& young = rules.interval("x", "1", 1.0, {});
    young.age_a = {0.0, 18.0};
    young.needs_age = true;
    CHECK(low_limits(rules, {panel_in(k_arterial, k_child)}) == Limits{{}});
}

TEST_CASE("intervals: an altitude that is not given counts as sea level") {
    RulesByHand rules;
    auto& sea_level = rules.interval("x", "1", 1.0, {});
    sea_level.altitude_m = {{}, 1500.0};
    auto& high = rules.interval("x", "1", 2.0, {});
    high.altitude_m = {1500.0, {}};
    CHECK(low_limits(rules,
                     {panel_in(k_arterial, k_adult),
                      panel_in(k_arterial, k_adult, {}, 1499.0),
                      panel_in(k_arterial, k_adult, {}, 1500.0)}) == Limits{1.0, 1.0, 2.0});
}

TEST_CASE("intervals: a limit that the interval lacks is missing") {
    RulesByHand rules;
    auto& interval = rules.interval("x", "1", {}, 9.0);
    interval.mid = 5.0;
    const auto low = rules.quantity("a", "limits.x.low", "1");
    const auto mid = rules.quantity("b", "limits.x.mid", "1");
    const auto high = rules.quantity("c", "limits.x.high", "1");
    const Evaluated evaluated(rules, {panel_of({})});
    CHECK_FALSE(evaluated.quantity(low));
    CHECK(evaluated.quantity(mid) == 5.0);
    CHECK(evaluated.quantity(high) == 9.0);
}

TEST_CASE("intervals: the program says which one holds") {
    RulesByHand rules;
    rules.interval("other", "1", 0.0, {});
    auto& interval = rules.interval("x", "1", 1.0, {});
    interval.specimens = {k_arterial};
    rules.quantity("low", "limits.x.low", "1");
    const Evaluated evaluated(rules, {panel_in(k_arterial, k_adult), panel_in(k_venous, k_adult)});
    const auto slot = evaluated.program().interval(1).value();
    CHECK(evaluated.scratch().index(slot, 0) == 1);
    CHECK(evaluated.scratch().index(slot, 1) == -1);
    // One that no entry asks for is chosen too: entered values are shown against it.
    const auto unasked = evaluated.program().interval(0).value();
    CHECK(evaluated.scratch().index(unasked, 0) == 0);
}
