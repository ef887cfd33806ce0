// Reasons, needs, sentences and printed numbers.
#include "isohydric/engine/explain.hpp"

#include <doctest/doctest.h>

#include "engine/evaluated.hpp"

namespace engine = isohydric::engine;
namespace panel = isohydric::panel;
namespace rule = isohydric::rule;
namespace test = isohydric::test;
using panel::Analyte;
using test::Evaluated;
using test::panel_of;
using test::RulesByHand;

namespace doctest {

template <>
struct StringMaker<std::vector<std::string>> {
    static String convert(const std::vector<std::string>& lines) {
        std::string text;
        for (const std::string& line : lines) {
            text += "\n" + line;
        }
        return text.c_str();
    }
};

}  // namespace doctest

namespace {

/// Anion gap, corrected for albumin, and its finding.
RulesByHand gap_rules() {
    RulesByHand rules;
    auto& interval = rules.interval("gap", "mmol/L", 3.0, 12.0);
    interval.head.sources = {{"limits-source", "table 1", true, ""}};
    rules.quantity("gap", "Na - Cl - HCO3reported", "mmol/L");
    rules.quantity("gapCorrected", "gap + 0.25 'mmol/g' * (40 'g/L' - albumin)", "mmol/L");
    rules.set().quantities[0].label = "anion gap";
    rules.set().quantities[1].label = "anion gap corrected";
    rules.set().quantities[1].interval = "gap";
    rules.set().quantities[1].head.sources = {{"correction-source", "abstract", true, ""}};
    rules.finding("raised", "gapCorrected > limits.gap.high");
    return rules;
}

const std::vector<panel::Panel>& gap_panel() {
    static const std::vector<panel::Panel> k_panels{panel_of({{Analyte::na, 140.0},
                                                              {Analyte::cl, 102.6},
                                                              {Analyte::hco3, 15.0},
                                                              {Analyte::albumin, 20.0}})};
    return k_panels;
}

/// "depth text" lines.
std::vector<std::string> lines(const std::vector<engine::Reason>& reasons) {
    std::vector<std::string> texts;
    texts.reserve(reasons.size());
    for (const engine::Reason& reason : reasons) {
        texts.push_back(std::to_string(reason.depth) + " " + reason.text);
    }
    return texts;
}

std::vector<std::string> explained(const Evaluated& evaluated, const rule::Symbol& name) {
    return lines(engine::explain(evaluated.program(), evaluated.scratch(), 0, name));
}

std::vector<std::string> needed(const Evaluated& evaluated, const rule::Symbol& name) {
    std::vector<std::string> ids;
    for (const Analyte analyte : engine::needs(evaluated.program(), evaluated.scratch(), 0, name)) {
        ids.emplace_back(panel::id_of(analyte));
    }
    return ids;
}

rule::Symbol finding(std::uint32_t index) {
    return {rule::SymbolKind::finding, index, {}};
}

rule::Symbol condition(std::uint32_t index) {
    return {rule::SymbolKind::condition, index, {}};
}

/// The reasons of a condition over one panel.
std::vector<std::string> why(const std::string& when, const panel::Panel& panel) {
    RulesByHand rules;
    const auto index = rules.condition("wanted", when);
    return explained(Evaluated(rules, {panel}), condition(index));
}

using Lines = std::vector<std::string>;

}  // namespace

TEST_CASE("explain: a comparison with its values, then each quantity down to what was measured") {
    const RulesByHand rules = gap_rules();
    const Evaluated evaluated(rules, gap_panel());
    CHECK(
        explained(evaluated, finding(0)) ==
        Lines{
            "0 anion gap corrected 27.4 > 12.0 (upper limit)",
            "1 anion gap corrected = anion gap + 0.25 x (40 - albumin) = 22.4 + 0.25 x (40 - 20) = "
            "27.4 mmol/L",
            "2 anion gap = sodium - chloride - bicarbonate = 140 - 102.6 - 15.0 = 22.4 mmol/L"});
}

TEST_CASE("explain: sources of the limit and of each quantity") {
    const RulesByHand rules = gap_rules();
    const Evaluated evaluated(rules, gap_panel());
    const auto reasons = engine::explain(evaluated.program(), evaluated.scratch(), 0, finding(0));
    REQUIRE(reasons.size() == 3);
    REQUIRE(reasons[0].sources.size() == 1);
    CHECK(reasons[0].sources[0].ref == "limits-source");
    REQUIRE(reasons[1].sources.size() == 1);
    CHECK(reasons[1].sources[0].ref == "correction-source");
}

TEST_CASE("explain: a comparison that does not hold is written as the one that does") {
    CHECK(why("Na > 145 'mmol/L'", panel_of({{Analyte::na, 140.0}})) ==
          Lines{"0 sodium 140 <= 145"});
    CHECK(why("Na = 145 'mmol/L'", panel_of({{Analyte::na, 140.0}})) ==
          Lines{"0 sodium 140 != 145"});
    CHECK(why("(Na < 145 'mmol/L').not()", panel_of({{Analyte::na, 150.0}})) ==
          Lines{"0 sodium 150 >= 145"});
}

TEST_CASE("explain: more digits where the printed comparison would look false") {
    CHECK(why("Na > 145 'mmol/L'", panel_of({{Analyte::na, 145.02}})) ==
          Lines{"0 sodium 145.02 > 145"});
    CHECK(why("Na > 145.25 'mmol/L'", panel_of({{Analyte::na, 145.4}})) ==
          Lines{"0 sodium 145.4 > 145.25"});
}

TEST_CASE("explain: a value that was given with more digits than usual shows one more") {
    CHECK(why("Na > 145 'mmol/L'", panel_of({{Analyte::na, 150.25}})) ==
          Lines{"0 sodium 150.3 > 145"});
    CHECK(why("Na > 145 'mmol/L'", panel_of({{Analyte::na, 150.02}})) ==
          Lines{"0 sodium 150 > 145"});
}

TEST_CASE("explain: of and, or the parts that decide") {
    const auto panel = panel_of({{Analyte::na, 150.0}, {Analyte::k, 4.0}, {Analyte::cl, 100.0}});
    CHECK(why("Na > 145 'mmol/L' and K > 5 'mmol/L' and Cl < 90 'mmol/L'", panel) ==
          Lines{"0 potassium 4.0 <= 5.0", "0 chloride 100 >= 90"});
    CHECK(why("Na > 145 'mmol/L' and K < 5 'mmol/L'", panel) ==
          Lines{"0 sodium 150 > 145", "0 potassium 4.0 < 5.0"});
    CHECK(why("Na > 145 'mmol/L' or K > 5 'mmol/L'", panel) == Lines{"0 sodium 150 > 145"});
    CHECK(why("Na > 155 'mmol/L' or K > 5 'mmol/L'", panel) ==
          Lines{"0 sodium 150 <= 155", "0 potassium 4.0 <= 5.0"});
    CHECK(why("Na > 155 'mmol/L' implies K > 5 'mmol/L'", panel) == Lines{"0 sodium 150 <= 155"});
}

TEST_CASE("explain: context, presence and the margin") {
    auto panel = panel_of({{Analyte::na, 150.0}});
    panel.context.specimen = panel::Specimen::venous;
    CHECK(why("context.specimen = 'arterial'", panel) == Lines{"0 specimen is not arterial"});
    CHECK(why("context.specimen != 'arterial'", panel) == Lines{"0 specimen is not arterial"});
    CHECK(why("context.specimen = 'venous'", panel) == Lines{"0 specimen is venous"});
    CHECK(why("K.exists()", panel) == Lines{"0 potassium is missing"});
    CHECK(why("Na.empty()", panel) == Lines{"0 sodium is given"});
    CHECK(why("context.near", panel) ==
          Lines{"0 bands not widened by the margin of the measurement"});
}

TEST_CASE("explain: a limit that is a quantity says its name once") {
    RulesByHand rules;
    rules.interval("x", "mmol/L", 1.0, 145.0);
    rules.quantity("upper", "limits.x.high", "mmol/L");
    rules.set().quantities[0].label = "upper limit of x";
    const auto high = rules.condition("high", "Na > upper");
    CHECK(explained(Evaluated(rules, {panel_of({{Analyte::na, 150.0}})}), condition(high)) ==
          Lines{"0 sodium 150 > upper limit of x 145.0", "1 upper limit of x = 145.0 mmol/L"});
}

TEST_CASE("explain: an unknown comparison says what it needs") {
    CHECK(why("Na > 145 'mmol/L' and K > Cl", panel_of({{Analyte::na, 150.0}})) ==
          Lines{"0 potassium unknown: needs potassium", "0 chloride unknown: needs chloride"});
    const RulesByHand rules = gap_rules();
    const Evaluated evaluated(rules, {panel_of({{Analyte::na, 140.0}})});
    CHECK(explained(evaluated, finding(0)) ==
          Lines{"0 anion gap corrected unknown: needs bicarbonate, chloride, albumin"});
}

TEST_CASE("explain: a formula that is no name shows its value") {
    CHECK(why("Na - Cl > K * 10",
              panel_of({{Analyte::na, 150.0}, {Analyte::k, 4.0}, {Analyte::cl, 100.0}})) ==
          Lines{"0 sodium - chloride (= 50) > potassium x 10 (= 40.0)"});
}

TEST_CASE("explain: an alternative says where it is from, an iif which side counts") {
    RulesByHand rules;
    rules.first_of(
        "base", {{"from total CO2", "TCO2 - 1 'mmol/L'"}, {"reported", "HCO3reported"}}, "mmol/L");
    rules.quantity("choice",
                   "iif(base.exists() and base > 20 'mmol/L', base * 2, base + 1 'mmol/L')",
                   "mmol/L");
    const auto wanted = rules.condition("wanted", "choice > 5 'mmol/L'");
    CHECK(explained(Evaluated(rules, {panel_of({{Analyte::hco3, 15.0}})}), condition(wanted)) ==
          Lines{"0 choice 16.0 > 5.0",
                "1 choice = base + 1 = 15.0 + 1 = 16.0 mmol/L",
                "2 base 15.0 <= 20.0",
                "3 base 15.0 mmol/L (reported)"});
}

TEST_CASE("explain: a model shows its inputs") {
    RulesByHand rules;
    rules.model("hco3",
                "carbonicAcid.bicarbonate",
                {"pHmeasured", "pCO2measured", "0.0307 'mmol/L/mm[Hg]'", "6.1"},
                "mmol/L");
    const auto low = rules.condition("low", "hco3 < 22 'mmol/L'");
    const Evaluated evaluated(rules, {panel_of({{Analyte::ph, 7.2}, {Analyte::pco2, 40.0}})});
    CHECK(explained(evaluated, condition(low)) ==
          Lines{"0 hco3 15.5 < 22.0",
                "1 hco3 = carbonicAcid.bicarbonate(pH 7.20, pCO2 40.0, solubility 0.0307, pK 6.1) "
                "= 15.5 mmol/L"});
}

TEST_CASE("explain: a finding that another takes precedence over") {
    RulesByHand rules;
    const auto severe = rules.finding("severe", "Na > 155 'mmol/L'");
    const auto high = rules.finding("high", "Na > 145 'mmol/L'", {severe});
    const Evaluated evaluated(rules, {panel_of({{Analyte::na, 160.0}})});
    CHECK(explained(evaluated, finding(high)) ==
          Lines{"0 severe takes precedence", "1 sodium 160 > 155"});
}

TEST_CASE("needs: only what is missing and would decide") {
    RulesByHand rules;
    const auto known = rules.finding("known", "Na > 145 'mmol/L' or K > 5 'mmol/L'");
    const auto open = rules.finding("open", "Na > 155 'mmol/L' or K > Cl");
    const auto blocked = rules.finding("blocked", "Na / (Na - Na) > 1");
    const auto except = rules.finding("except", "Na > 145 'mmol/L'", {open});
    const Evaluated evaluated(rules, {panel_of({{Analyte::na, 150.0}})});
    CHECK(needed(evaluated, finding(known)).empty());
    CHECK(needed(evaluated, finding(open)) == Lines{"K", "Cl"});
    CHECK(needed(evaluated, finding(blocked)).empty());
    CHECK(needed(evaluated, finding(except)) == Lines{"K", "Cl"});
}

TEST_CASE("needs: of several alternatives the one that lacks fewest") {
    RulesByHand rules;
    rules.first_of(
        "base", {{"gas", "Na - K"}, {"reported", "HCO3reported"}, {"total", "TCO2"}}, "mmol/L");
    const auto low = rules.finding("low", "base < 22 'mmol/L'");
    CHECK(needed(Evaluated(rules, {panel_of({})}), finding(low)) == Lines{"HCO3"});
    CHECK(needed(Evaluated(rules, {panel_of({{Analyte::na, 140.0}})}), finding(low)) == Lines{"K"});
}

TEST_CASE("fill: values with units, bare values, truths and missing ones") {
    RulesByHand rules = gap_rules();
    rules.set().findings[0].states =
        "Gap {gap}, corrected {gapCorrected:bare}, limit {limits.gap.high}, K {K}.";
    const Evaluated evaluated(rules, gap_panel());
    CHECK(
        engine::fill(evaluated.program(), evaluated.scratch(), 0, rules.set().findings[0].states) ==
        "Gap 22.4 mmol/L, corrected 27.4, limit 12 mmol/L, K unknown.");
}

TEST_CASE("fill: two numbers that differ look different") {
    RulesByHand rules;
    const auto close = rules.finding("close", "Na > 145 'mmol/L'");
    rules.set().findings[close].states = "{Na} against {Cl}";
    const Evaluated evaluated(rules, {panel_of({{Analyte::na, 145.04}, {Analyte::cl, 145.01}})});
    CHECK(engine::fill(
              evaluated.program(), evaluated.scratch(), 0, rules.set().findings[close].states) ==
          "145.04 mmol/L against 145.01 mmol/L");
}

TEST_CASE("printed: digits of a report") {
    CHECK(engine::printed(26.02, 0) == "26");
    CHECK(engine::printed(26.02, 0, 26.0) == "26.02");
    CHECK(engine::printed(26.0, 0, 26.0) == "26");
    CHECK(engine::printed(12.4, 1, 12.0) == "12.4");
    CHECK(engine::printed(0.1 + 0.2, 1, 0.3) == "0.3");
    CHECK(engine::printed(-0.01, 1) == "0.0");
}

TEST_CASE("printed: units as people write them") {
    CHECK(engine::unit_text("mm[Hg]") == "mmHg");
    CHECK(engine::unit_text("mmol/L/mm[Hg]") == "mmol/L/mmHg");
    CHECK(engine::unit_text("1").empty());
    CHECK(engine::unit_text("mmol/L") == "mmol/L");
    CHECK(engine::unit_text("mosm/kg") == "mOsm/kg");
}
