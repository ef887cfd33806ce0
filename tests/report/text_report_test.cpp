// What a report says and leaves out, for panels of a ward, a clinic, a laboratory.
#include "isohydric/report/caution.hpp"
#include "isohydric/report/detail/text_layout.hpp"
#include "isohydric/report/text_report.hpp"

#include <doctest/doctest.h>

#include <algorithm>
#include <sstream>
#include <string>
#include <vector>

#include "harness/shipped_rules.hpp"

namespace isohydric::report {

namespace {

using harness::interpreted;
using interpret::Interpretation;

std::vector<std::string> lines_of(const std::string& text) {
    std::vector<std::string> lines;
    std::istringstream stream(text);
    for (std::string line; std::getline(stream, line);) {
        lines.push_back(line);
    }
    return lines;
}

bool says(const std::string& text, const std::string& part) {
    return text.find(part) != std::string::npos;
}

std::size_t times(const std::string& text, const std::string& part) {
    std::size_t count = 0;
    for (std::size_t at = text.find(part); at != std::string::npos; at = text.find(part, at + 1)) {
        ++count;
    }
    return count;
}

/// Everything that a ward's analyser prints.
const Interpretation& ward() {
    static const Interpretation result = interpreted({{"pH", "7.21"},
                                                      {"pCO2", "3.9 kPa"},
                                                      {"pO2", "11.2 kPa"},
                                                      {"HCO3", "11.4 mmol/L"},
                                                      {"Na", "138"},
                                                      {"K", "5.1"},
                                                      {"Cl", "98"},
                                                      {"iCa", "1.12 mmol/L"},
                                                      {"glucose", "7.9 mmol/L"},
                                                      {"lactate", "6.2 mmol/L"},
                                                      {"albumin", "2.1 g/dL"},
                                                      {"creatinine", "140 umol/L"},
                                                      {"urea", "11 mmol/L"},
                                                      {"Hb", "102 g/L"}});
    return result;
}

const Interpretation& healthy() {
    static const Interpretation result = interpreted(
        {{"pH", "7.40"}, {"pCO2", "40 mmHg"}, {"Na", "140"}, {"Cl", "104"}, {"albumin", "42 g/L"}});
    return result;
}

}  // namespace

TEST_CASE("text report: the caution is first and last, whatever was found") {
    for (const Interpretation* const result : {&ward(), &healthy()}) {
        for (const bool full : {false, true}) {
            const std::string text = text_report(*result, {.full = full, .width = 1000});
            CHECK(text.starts_with(std::string(caution()) + "\n"));
            CHECK(text.ends_with("\n" + std::string(caution()) + "\n"));
        }
    }
}

TEST_CASE("text report: no line is wider than was asked for, in short and in full") {
    for (const std::size_t width : {80U, 100U}) {
        for (const bool full : {false, true}) {
            for (const std::string& line : lines_of(text_report(ward(), {full, width}))) {
                CHECK_MESSAGE(columns_of(line) <= width, line);
            }
        }
    }
}

TEST_CASE("text report: a full ward panel fits on one screen of 60 lines") {
    CHECK(lines_of(text_report(ward())).size() <= 60);
}

TEST_CASE("text report: a critical value stands before every other finding") {
    const std::string text = text_report(ward());
    const std::size_t critical = text.find("CRITICAL VALUES");
    REQUIRE(critical != std::string::npos);
    CHECK(critical < text.find("Panel"));
    CHECK(critical < text.find("Interpretation"));
    CHECK_FALSE(says(text_report(healthy()), "CRITICAL"));
}

TEST_CASE("text report: what was written in another unit is repeated, what was not is not") {
    const std::string text = text_report(ward());
    CHECK(says(text, "entered as pCO2 3.9 kPa, pO2 11.2 kPa, albumin 2.1 g/dL"));
    CHECK_FALSE(says(text_report(healthy()), "entered as"));
}

TEST_CASE("text report: an assumption stands beside what was assumed") {
    CHECK(says(text_report(healthy()), "Specimen: arterial, adult (assumed), onset not stated"));
    const Interpretation stated =
        interpreted({{"pH", "7.40"}, {"pCO2", "40 mmHg"}},
                    {{"specimen", "arterial"}, {"population", "adult"}, {"onset", "acute"}});
    CHECK(says(text_report(stated), "Specimen: arterial, adult, onset acute\n"));
}

TEST_CASE("text report: age, altitude and baseline are in the line of the specimen") {
    const std::string text = text_report(interpreted({{"pH", "7.36"}, {"pCO2", "55 mmHg"}},
                                                     {{"specimen", "arterial"},
                                                      {"age", "64y"},
                                                      {"altitude", "1600"},
                                                      {"baseline-pCO2", "55 mmHg"}}),
                                         {.full = false, .width = 1000});
    CHECK(says(text, "64 years old, altitude 1600 m, onset not stated, usual pCO2 55 mmHg"));
    const std::string neonate = text_report(interpreted({{"pH", "7.36"}, {"pCO2", "40 mmHg"}},
                                                        {{"specimen", "arterial"}, {"age", "3d"}}));
    CHECK(says(neonate, "3 days old"));
}

TEST_CASE("text report: chemistry alone is no arterial specimen, and has no onset") {
    const std::string text = text_report(
        interpreted({{"Na", "138"}, {"Cl", "98"}, {"TCO2", "12"}, {"albumin", "41 g/L"}}, {}));
    CHECK(says(text, "Specimen: not stated, adult (assumed)\n"));
    CHECK(says(text, "no gas: respiratory part unknown"));
}

TEST_CASE("text report: ids of models are not for people") {
    for (const bool full : {false, true}) {
        const std::string text = text_report(ward(), {.full = full});
        CHECK(says(text, "hydrogen ion"));
        const std::size_t calculated = text.find("\nCalculated");
        const std::size_t next = text.find("\nCan the numbers");
        CHECK_FALSE(says(text.substr(calculated, next - calculated), "hydrogenIon."));
    }
}

TEST_CASE("text report: a sentence ends in one point") {
    for (const Interpretation* const result : {&ward(), &healthy()}) {
        CHECK_FALSE(says(text_report(*result, {.full = true}), ".."));
    }
}

TEST_CASE(
    "text report: the first screen tells no reason twice and none that says only what is given") {
    const std::string text = text_report(ward());
    CHECK_FALSE(says(text, " is given\n"));
    CHECK_FALSE(says(text, " is missing\n"));
    CHECK(times(text, "anion gap raised:") == 1);
    CHECK(says(text_report(ward(), {.full = true}), " is given\n"));
}

TEST_CASE("text report: what is not interpretable says so once, and gives no reading") {
    const Interpretation result =
        interpreted({{"pH", "6.90"}, {"pCO2", "60 mmHg"}, {"HCO3", "40 mmol/L"}});
    REQUIRE_FALSE(result.interpretable);
    const std::string text = text_report(result);
    CHECK(times(text, "Not interpretable: ") == 1);
    CHECK(times(text, "contradicts") == 1);
    CHECK_FALSE(says(text, "Reading:"));
    CHECK_FALSE(says(text, "Reasons"));
}

TEST_CASE("text report: without a disorder the reading tells what it rests on") {
    CHECK(says(text_report(healthy()),
               "Reading: no disorder: pCO2 and bicarbonate inside their intervals."));
    const std::string venous =
        text_report(interpreted({{"pH", "7.36"}, {"pCO2", "46 mmHg"}}, {{"specimen", "venous"}}));
    CHECK(says(venous, "respiratory part needs arterial"));
    CHECK_FALSE(says(venous, "no disorder"));
}

TEST_CASE("text report: a bound that was reported is shown as a bound") {
    const std::string text =
        text_report(interpreted({{"pH", "7.40"}, {"pCO2", "40 mmHg"}, {"lactate", "<0.5 mmol/L"}}));
    CHECK(says(text, "<0.5 mmol/L"));
    CHECK(says(text, "bound"));
}

TEST_CASE("text report: in full, every check and every open finding is there") {
    const std::string text = text_report(ward(), {.full = true});
    for (const interpret::CheckResult& check : ward().checks) {
        CHECK_MESSAGE(says(text, "  " + check.id + ": "), check.id);
    }
    for (const interpret::ExplanationResult& explanation : ward().explanations) {
        CHECK_MESSAGE(times(text, explanation.statement.substr(0, 20)) >= 1, explanation.statement);
    }
}

TEST_CASE("text report: what would help is named as people name it") {
    const Interpretation result =
        interpreted({{"pH", "7.21"}, {"pCO2", "29 mmHg"}, {"Na", "138"}, {"Cl", "98"}});
    REQUIRE(std::find(result.would_help.begin(), result.would_help.end(), "BHB") !=
            result.would_help.end());
    CHECK(says(text_report(result), "beta-hydroxybutyrate"));
}

}  // namespace isohydric::report
