// The runner of worked cases: it counts what it ran, and an expectation that is not met is an error at its place.
#include "isohydric/diag/render.hpp"
#include "isohydric/engine/models.hpp"
#include "isohydric/interpret/case_runner.hpp"
#include "isohydric/io/files.hpp"

#include <doctest/doctest.h>

#include <memory>
#include <optional>
#include <string>

#include "harness/shipped_rules.hpp"

namespace {

using namespace isohydric;

/// The shipped rules with other cases beside the critical values.
interpret::CaseCounts run_with_cases(const std::string& cases, diag::Report& report) {
    const rule::FileReader shipped = io::rule_tree(ISOHYDRIC_SOURCE_DIR "/rules");
    const rule::FileReader files = [&](const std::string& path) -> std::optional<std::string> {
        if (path == "critical/critical.cases.json") {
            return cases;
        }
        return path.ends_with(".cases.json") ? std::nullopt : shipped(path);
    };
    const auto rules = rule::read_rule_set(
        "sets/default.json", files, engine::model_signatures(), report, {.with_cases = true});
    REQUIRE_MESSAGE(rules, diag::render(report));
    return interpret::run_cases(std::make_shared<const engine::Program>(rules), report);
}

std::string one_case(const std::string& panel, const std::string& expect) {
    return R"([{"id": "one", "panel": )" + panel +
           R"(, "context": {"specimen": "arterial"}, "expect": )" + expect +
           R"(, "source": {"ref": "common-practice"}}])";
}

}  // namespace

TEST_CASE("cases: states and numbers that are met are counted") {
    diag::Report report;
    const auto counts = run_with_cases(
        one_case(
            R"({"K": "7.0", "Na": "140", "Cl": "100", "TCO2": "24 mmol/L", "albumin": "40 g/L"})",
            R"({"critical-k-high": "yes", "critical-k-low": "no", "lactate-raised": "unknown", "anionGap": 16.0, "deltaRatio": "unknown"})"),
        report);
    CHECK(counts.cases == 1);
    CHECK(counts.expectations == 5);
    // deltaRatio is 4 / 0: empty, as a division by zero is.
    CHECK_MESSAGE(counts.failed == 0, diag::render(report));
}

TEST_CASE(
    "cases: an expectation that is not met is an error that says what came instead [case-failed]") {
    diag::Report report;
    const auto counts = run_with_cases(
        one_case(
            R"({"K": "7.0", "Na": "140", "Cl": "100", "TCO2": "24 mmol/L"})",
            R"({"critical-k-high": "no", "anionGap": 15.0, "lactate-raised": "yes", "carbonate-contradiction": "yes", "none": "yes", "hypocapnia": "yes"})"),
        report);
    CHECK(counts.failed == 6);
    CHECK(report.error_count() == 6);
    CHECK(report.diagnostics().front().id == "case-failed");
    CHECK(report.diagnostics().front().message.find("critical-k-high is yes, expected no") !=
          std::string::npos);
    CHECK(report.diagnostics().front().place.source->name() == "critical/critical.cases.json");
}

TEST_CASE("cases: a panel that cannot be read fails all that it expects") {
    diag::Report report;
    const auto counts =
        run_with_cases(one_case(R"({"K": "seven"})", R"({"critical-k-high": "yes"})"), report);
    CHECK(counts.failed == 1);
    CHECK(report.has_errors());
}
