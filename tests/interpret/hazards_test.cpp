// One test for each hazard of SAFETY.md: the control that stands against it does its work.
#include "isohydric/diag/render.hpp"
#include "isohydric/panel/reading.hpp"
#include "isohydric/report/caution.hpp"
#include "isohydric/report/json_report.hpp"
#include "isohydric/report/text_report.hpp"

#include <doctest/doctest.h>

#include <algorithm>
#include <string>
#include <vector>

#include "harness/shipped_rules.hpp"

namespace {

using namespace isohydric;
using harness::check_of;
using harness::disorder_of;
using harness::explanation_sets;
using harness::finding_of;
using harness::interpreted;
using harness::quantity_of;
using interpret::Outcome;
using interpret::Truth;
using interpret::Verdict;

/// The messages with which a panel is refused; empty if it is read.
std::string refusal(harness::Texts values) {
    diag::Report report;
    panel::PanelReader reader(*harness::shipped_program()->rules().catalogue, nullptr, report);
    for (const auto& [name, text] : values) {
        reader.add(name, text, {});
    }
    return reader.finish() ? std::string() : diag::render(report);
}

bool has(const std::string& text, const std::string& part) {
    return text.find(part) != std::string::npos;
}

bool listed(const std::vector<std::string>& sets, const std::string& wanted) {
    return std::find(sets.begin(), sets.end(), wanted) != sets.end();
}

constexpr const char* k_ma = "metabolic-acidosis";
constexpr const char* k_rk = "respiratory-alkalosis";

}  // namespace

TEST_CASE("hazard: kPa typed where mmHg is meant is refused, never converted") {
    CHECK(has(refusal({{"pH", "7.30"}, {"pCO2", "5.3"}}), "kPa"));
    CHECK(refusal({{"pH", "7.30"}, {"pCO2", "5.3 kPa"}}).empty());
}

TEST_CASE("hazard: albumin in g/dL typed as g/L is refused") {
    CHECK(has(refusal({{"albumin", "4.0"}}), "g/dL"));
    CHECK(refusal({{"albumin", "4.0 g/dL"}}).empty());
}

TEST_CASE("hazard: a bare number with two readings is refused with both") {
    const std::string message = refusal({{"lactate", "9"}});
    CHECK(has(message, "mmol/L"));
    CHECK(has(message, "mg/dL"));
}

TEST_CASE("hazard: haemoglobin in mmol/L without monomer or tetramer is refused") {
    CHECK(has(refusal({{"Hb", "9.3 mmol/L"}}), "monomer"));
}

TEST_CASE("hazard: urea nitrogen is never read as urea [@ciaaw2021, atomic weights]") {
    // 28 mg/dL of nitrogen is 28 / 2.8014 = 10.0 mmol/L, 28 mg/dL of urea 28 / 6.0056 = 4.66 mmol/L.
    CHECK(harness::make_panel({{"BUN", "28 mg/dL"}})[panel::Analyte::urea]->value ==
          doctest::Approx(9.995).epsilon(1e-3));
    CHECK(harness::make_panel({{"urea", "28 mg/dL"}})[panel::Analyte::urea]->value ==
          doctest::Approx(4.662).epsilon(1e-3));
}

TEST_CASE("hazard: a base deficit is minus a base excess") {
    CHECK(harness::make_panel({{"base deficit", "5 mmol/L"}})[panel::Analyte::be]->value == -5);
}

TEST_CASE("hazard: on venous blood respiratory disorders are unknown") {
    const auto result =
        interpreted({{"pH", "7.25"}, {"pCO2", "60 mmHg"}}, {{"specimen", "venous"}});
    CHECK(disorder_of(result, "respiratory-acidosis").bicarbonate == Verdict::unknown);
    CHECK(disorder_of(result, k_rk).bicarbonate == Verdict::unknown);
}

TEST_CASE("hazard: a gap without albumin says that it is not corrected") {
    const auto result =
        interpreted({{"pH", "7.40"}, {"pCO2", "40 mmHg"}, {"Na", "140"}, {"Cl", "104"}});
    CHECK(finding_of(result, "albumin-unknown").state == Truth::yes);
    CHECK(std::count(result.would_help.begin(), result.would_help.end(), "albumin") == 1);
}

TEST_CASE("hazard: a gap hidden under low albumin is found [@figge1998, abstract]") {
    // Gap 12 with albumin 20 g/L: 12 + 0.25 x (40 - 20) = 17, more than 3 above 12.
    const auto result = interpreted({{"pH", "7.30"},
                                     {"pCO2", "30 mmHg"},
                                     {"TCO2", "15 mmol/L"},
                                     {"Na", "138"},
                                     {"Cl", "111"},
                                     {"albumin", "20 g/L"}});
    CHECK(*quantity_of(result, "anionGapCorrected").value == doctest::Approx(17).epsilon(1e-9));
    CHECK(finding_of(result, "gap-hidden-by-albumin").state == Truth::yes);
    CHECK(finding_of(result, "gap-raised").state == Truth::yes);
}

TEST_CASE("hazard: a normal pH with both out of their intervals is not read as normal") {
    const auto sets = explanation_sets(interpreted({{"pH", "7.38"}, {"pCO2", "28 mmHg"}}));
    REQUIRE(!sets.empty());
    CHECK(!listed(sets, "none"));
}

TEST_CASE("hazard: a mixed disorder is not lost to a single label [@cicm-papers, 2018 paper 1 "
          "question 12.3]") {
    const auto sets = explanation_sets(interpreted(
        {{"pH", "7.37"}, {"pCO2", "25 mmHg"}, {"Na", "145"}, {"Cl", "93"}, {"TCO2", "14 mmol/L"}}));
    CHECK(sets.front() == "metabolic-acidosis+metabolic-alkalosis+respiratory-alkalosis");
}

TEST_CASE("hazard: an onset that nobody stated is not assumed [@brandis, section 9.3]") {
    const auto sets = explanation_sets(interpreted({{"pCO2", "60 mmHg"}, {"HCO3", "31 mmol/L"}}));
    CHECK(listed(sets, "respiratory-acidosis"));
    CHECK(listed(sets, "metabolic-alkalosis+respiratory-acidosis"));
}

TEST_CASE("hazard: the intervals of pregnancy replace those of adults [@cicm-papers, 2012 paper 2 "
          "question 6.1]") {
    const harness::Texts values{{"pH", "7.31"}, {"pCO2", "42 mmHg"}};
    CHECK(explanation_sets(
              interpreted(
                  values,
                  {{"specimen", "arterial"}, {"population", "pregnancy-3"}, {"onset", "acute"}}))
              .front() == "respiratory-acidosis");
    CHECK(explanation_sets(interpreted(values)).front() != "respiratory-acidosis");
}

TEST_CASE("hazard: values of altitude are not read as a disorder [@moina2023, medians]") {
    const harness::Texts values{{"pH", "7.417"}, {"pCO2", "32.5 mmHg"}};
    CHECK(explanation_sets(interpreted(values, {{"specimen", "arterial"}, {"altitude", "2800 m"}}))
              .front() == "none");
    CHECK(explanation_sets(interpreted(values)).front() != "none");
}

TEST_CASE("hazard: a context without an interval of its own is unknown, never adult") {
    const auto result =
        interpreted({{"pH", "7.30"}, {"pCO2", "50 mmHg"}},
                    {{"specimen", "venous"}, {"population", "neonate"}, {"age", "3d"}});
    CHECK(!quantity_of(result, "pH").low);
    CHECK(result.explanations.empty());
}

TEST_CASE(
    "hazard: contradictory pH, pCO2 and bicarbonate stop the reading [@kassirer1965, abstract]") {
    // 24 x 25.5 / 42.7 nmol/L is a bicarbonate of 14.3, not 6.5.
    const auto result = interpreted({{"pH", "7.37"}, {"pCO2", "3.4 kPa"}, {"HCO3", "6.5 mmol/L"}});
    CHECK(check_of(result, "carbonate-contradiction").outcome == Outcome::stop);
    CHECK(!result.interpretable);
    CHECK(result.explanations.empty());
}

TEST_CASE("hazard: critical values are said although the panel is contradictory [@ulm2022, alert "
          "values]") {
    const auto result =
        interpreted({{"pH", "7.10"}, {"pCO2", "30 mmHg"}, {"HCO3", "25 mmol/L"}, {"K", "7.0"}});
    CHECK(!result.interpretable);
    CHECK(std::any_of(result.critical.begin(), result.critical.end(), [](const auto& value) {
        return value.id == "critical-k-high";
    }));
    const std::string text = report::text_report(result);
    CHECK(text.find("potassium") < text.find("Not interpretable"));
}

TEST_CASE("hazard: interference with the chloride electrode stops the reading [@zimmer2008, "
          "chloride 174 with gap -49]") {
    const auto result =
        interpreted({{"pH", "7.40"}, {"pCO2", "40 mmHg"}, {"Na", "150"}, {"Cl", "174"}});
    CHECK(check_of(result, "anion-gap-impossible").outcome == Outcome::stop);
    CHECK(!result.interpretable);
}

TEST_CASE("hazard: a sentence that rests on a shipped gap limit says so") {
    const auto result =
        interpreted({{"pH", "7.20"}, {"pCO2", "25 mmHg"}, {"Na", "140"}, {"Cl", "100"}});
    CHECK(finding_of(result, "gap-raised").shipped_limit);
    CHECK(has(result.sentences.front(), "shipped limit, not your laboratory's"));
}

TEST_CASE("hazard: a value exactly on a limit is decided as printed [@hl7-fhirpath, equality of "
          "decimals]") {
    // 140.3 - 104.1 - 24.2 is 12 on paper and a little less in binary.
    const auto result = interpreted({{"pH", "7.40"},
                                     {"pCO2", "39.6 mmHg"},
                                     {"TCO2", "24.2 mmol/L"},
                                     {"Na", "140.3 mmol/L"},
                                     {"Cl", "104.1 mmol/L"},
                                     {"albumin", "40 g/L"}});
    CHECK(finding_of(result, "gap-above-limit").state == Truth::no);
}

TEST_CASE("hazard: a missing value is unknown, never zero") {
    const auto result = interpreted({{"pH", "7.20"}, {"pCO2", "25 mmHg"}});
    CHECK(finding_of(result, "lactate-raised").state == Truth::unknown);
    CHECK(finding_of(result, "lactate-raised").needs == std::vector<std::string>{"lactate"});
    CHECK(!quantity_of(result, "anionGap").value);
}

TEST_CASE("hazard: a censored value is not used as a number") {
    const auto result =
        interpreted({{"pH", "7.20"}, {"pCO2", "25 mmHg"}, {"lactate", ">20 mmol/L"}});
    CHECK(finding_of(result, "lactate-raised").state == Truth::unknown);
}

TEST_CASE("hazard: text and JSON begin and end with the caution") {
    const auto result = interpreted({{"pH", "7.40"}, {"pCO2", "40 mmHg"}});
    const std::string caution(report::caution());
    const std::string text = report::text_report(result, {.full = false, .width = 1000});
    CHECK(text.starts_with(caution));
    CHECK(text.ends_with(caution + "\n"));
    const std::string json = report::json_report(result, -1);
    CHECK(json.starts_with("{\"caution\":"));
    CHECK(json.find("\"caution_end\":") > json.find("\"unchecked\":"));
}

TEST_CASE("hazard: every result names its rule set, with hash, and a draft is called one") {
    const auto result = interpreted({{"pH", "7.40"}, {"pCO2", "40 mmHg"}});
    CHECK(result.program->rules().sha256.size() == 64);
    CHECK(has(report::json_report(result), result.program->rules().sha256));
    CHECK(has(report::text_report(result), "draft"));
}

TEST_CASE("hazard: total CO2 of another hour warns") {
    const auto result = interpreted({{"pH", "7.40"}, {"pCO2", "40 mmHg"}, {"TCO2", "18 mmol/L"}});
    CHECK(check_of(result, "total-co2-difference").outcome == Outcome::warn);
    CHECK(result.interpretable);
}

TEST_CASE("hazard: a body temperature changes no reading and warns of corrected values") {
    const auto plain = interpreted({{"pH", "7.30"}, {"pCO2", "30 mmHg"}});
    const auto cold = interpreted({{"pH", "7.30"}, {"pCO2", "30 mmHg"}, {"temperature", "30 Cel"}});
    CHECK(explanation_sets(plain) == explanation_sets(cold));
    CHECK(check_of(cold, "temperature-corrected").outcome == Outcome::warn);
}

TEST_CASE("hazard: a reading that a digit would change is listed as near, with its miss") {
    // 1.5 x 10 + 8 = 23, so 21 to 25; pCO2 25.9 is outside by 0.9.
    const auto result = interpreted({{"pCO2", "25.9 mmHg"}, {"HCO3", "10.0 mmol/L"}});
    const auto near = std::find_if(
        result.explanations.begin(), result.explanations.end(), [](const auto& explanation) {
            return explanation.fit != interpret::Fit::fits;
        });
    REQUIRE(near != result.explanations.end());
    CHECK(near->disorders.front() == k_ma);
}

TEST_CASE("hazard: an analyte that is not known is refused with the nearest name") {
    CHECK(has(refusal({{"lactat", "2.0 mmol/L"}}), "lactate"));
}

TEST_CASE("hazard: no sentence of the rules gives a treatment, a dose or a diagnosis") {
    const std::vector<std::string> forbidden{"treat",
                                             "give ",
                                             "administer",
                                             "dose",
                                             "infuse",
                                             "therapy",
                                             "prescribe",
                                             "diagnos",
                                             "intubate",
                                             "dialy",
                                             "insulin"};
    const rule::RuleSet& rules = harness::shipped_program()->rules();
    const auto clean = [&](const std::string& sentence) {
        return std::none_of(forbidden.begin(), forbidden.end(), [&](const std::string& word) {
            return has(sentence, word);
        });
    };
    std::size_t sentences = 0;
    for (const rule::Finding& finding : rules.findings) {
        CHECK_MESSAGE(clean(finding.states), finding.head.id);
        ++sentences;
    }
    for (const rule::Check& check : rules.checks) {
        CHECK_MESSAGE(clean(check.states), check.head.id);
        ++sentences;
    }
    for (const rule::Explanation& explanation : rules.explanations) {
        CHECK_MESSAGE(clean(explanation.states), explanation.head.id);
        ++sentences;
    }
    CHECK(sentences > 150);
}

TEST_CASE("hazard: opposite respiratory disorders never stand in one list") {
    const auto sets = explanation_sets(
        interpreted({{"pH", "7.40"}, {"pCO2", "60 mmHg"}, {"Na", "140"}, {"Cl", "80"}}));
    const bool acidosis = std::any_of(sets.begin(), sets.end(), [](const std::string& set) {
        return has(set, "respiratory-acidosis");
    });
    const bool alkalosis = std::any_of(
        sets.begin(), sets.end(), [](const std::string& set) { return has(set, k_rk); });
    CHECK(!(acidosis && alkalosis));
}

TEST_CASE("hazard: values that no specimen can have stop the reading") {
    const auto result = interpreted({{"pH", "8.20"}, {"pCO2", "40 mmHg"}});
    CHECK(check_of(result, "reject-p-h").outcome == Outcome::stop);
    CHECK(!result.interpretable);
}
