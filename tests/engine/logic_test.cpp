// Truths: three-valued logic, comparisons, findings and the findings that take precedence.
#include <doctest/doctest.h>

#include <array>

#include "engine/evaluated.hpp"

using isohydric::engine::Truth;
using isohydric::panel::Analyte;
using isohydric::test::Evaluated;
using isohydric::test::panel_of;
using isohydric::test::RulesByHand;

namespace {

constexpr std::array k_truths{Truth::yes, Truth::no, Truth::unknown};

/// A panel in which `a` (pH above 7) and `b` (sO2 above 0.5) have these truths.
isohydric::panel::Panel panel_with(Truth a, Truth b) {
    auto panel = panel_of({});
    if (a != Truth::unknown) {
        panel[Analyte::ph].emplace().value = a == Truth::yes ? 7.4 : 6.9;
    }
    if (b != Truth::unknown) {
        panel[Analyte::so2].emplace().value = b == Truth::yes ? 0.9 : 0.1;
    }
    return panel;
}

/// The nine truths of an expression over `a` and `b`, in the order of k_truths, `a` outermost.
std::vector<Truth> table_of(const std::string& expression) {
    RulesByHand rules;
    rules.condition("a", "pHmeasured > 7");
    rules.condition("b", "sO2 > 0.5");
    const auto wanted = rules.condition("wanted", expression);
    std::vector<Truth> table;
    for (const Truth a : k_truths) {
        for (const Truth b : k_truths) {
            table.push_back(Evaluated(rules, {panel_with(a, b)}).condition(wanted));
        }
    }
    return table;
}

/// `+` yes, `-` no, `?` unknown.
std::vector<Truth> truths(std::string_view text) {
    std::vector<Truth> result;
    for (const char c : text) {
        result.push_back(c == '+' ? Truth::yes : c == '-' ? Truth::no : Truth::unknown);
    }
    return result;
}

Truth truth_at(const std::string& expression, double ph) {
    RulesByHand rules;
    const auto wanted = rules.condition("wanted", expression);
    return Evaluated(rules, {panel_of({{Analyte::ph, ph}})}).condition(wanted);
}

}  // namespace

TEST_CASE("logic: the truth tables of FHIRPath [@hl7-fhirpath, section 6.5]") {
    CHECK(table_of("a and b") == truths("+-?---?-?"));
    CHECK(table_of("a or b") == truths("++++-?+??"));
    CHECK(table_of("a xor b") == truths("-+?+-????"));
    CHECK(table_of("a implies b") == truths("+-?++++??"));
    CHECK(table_of("a.not()") == truths("---+++???"));
}

TEST_CASE("logic: equality of truths is unknown if either is [@hl7-fhirpath, section 6.1.1]") {
    CHECK(table_of("a = b") == truths("+-?-+????"));
    CHECK(table_of("a != b") == truths("-+?+-????"));
}

TEST_CASE("logic: whether a truth is there is never unknown") {
    CHECK(table_of("a.exists()") == truths("++++++---"));
    CHECK(table_of("a.empty()") == truths("------+++"));
}

TEST_CASE("logic: comparisons at, below and above") {
    const auto tables =
        std::array<std::pair<const char*, std::string_view>, 6>{{{"pHmeasured < 7", "+--"},
                                                                 {"pHmeasured <= 7", "++-"},
                                                                 {"pHmeasured > 7", "--+"},
                                                                 {"pHmeasured >= 7", "-++"},
                                                                 {"pHmeasured = 7", "-+-"},
                                                                 {"pHmeasured != 7", "+-+"}}};
    for (const auto& [expression, expected] : tables) {
        CHECK(truth_at(expression, 6.9) == truths(expected)[0]);
        CHECK(truth_at(expression, 7.0) == truths(expected)[1]);
        CHECK(truth_at(expression, 7.1) == truths(expected)[2]);
    }
}

TEST_CASE("logic: comparisons are decided at 8 decimals") {
    CHECK(truth_at("pHmeasured + 0.1 = 0.3", 0.2) == Truth::yes);
    CHECK(truth_at("pHmeasured + 0.1 > 0.3", 0.2) == Truth::no);
    CHECK(truth_at("pHmeasured > 7", 7.000000004) == Truth::no);
    CHECK(truth_at("pHmeasured > 7", 7.00000001) == Truth::yes);
}

TEST_CASE("logic: a comparison with a missing value is unknown") {
    RulesByHand rules;
    const auto left = rules.condition("left", "pHmeasured < sO2");
    const auto right = rules.condition("right", "sO2 = pHmeasured");
    const Evaluated evaluated(rules, {panel_of({{Analyte::so2, 0.9}})});
    CHECK(evaluated.condition(left) == Truth::unknown);
    CHECK(evaluated.condition(right) == Truth::unknown);
}

TEST_CASE("logic: a finding holds when its condition does and nothing takes precedence") {
    RulesByHand rules;
    rules.condition("a", "pHmeasured > 7");
    const auto exception = rules.finding("exception", "sO2 > 0.5");
    const auto wanted = rules.finding("wanted", "a", {exception});
    std::vector<Truth> table;
    for (const Truth a : k_truths) {
        for (const Truth b : k_truths) {
            table.push_back(Evaluated(rules, {panel_with(a, b)}).finding(wanted));
        }
    }
    // An exception that holds means no even where the condition is unknown.
    CHECK(table == truths("-+?----??"));
}

TEST_CASE("logic: any one of several exceptions takes precedence") {
    RulesByHand rules;
    const auto first = rules.finding("first", "sO2 > 0.5");
    const auto second = rules.finding("second", "pHmeasured > 8");
    const auto wanted = rules.finding("wanted", "pHmeasured > 7", {first, second});
    const Evaluated evaluated(rules,
                              {panel_of({{Analyte::ph, 7.4}, {Analyte::so2, 0.1}}),
                               panel_of({{Analyte::ph, 8.4}, {Analyte::so2, 0.1}}),
                               panel_of({{Analyte::ph, 7.4}, {Analyte::so2, 0.9}}),
                               panel_of({{Analyte::ph, 8.4}}),
                               panel_of({{Analyte::ph, 7.4}})});
    CHECK(evaluated.finding(wanted, 0) == Truth::yes);
    CHECK(evaluated.finding(wanted, 1) == Truth::no);
    CHECK(evaluated.finding(wanted, 2) == Truth::no);
    CHECK(evaluated.finding(wanted, 3) == Truth::no);
    CHECK(evaluated.finding(wanted, 4) == Truth::unknown);
}

TEST_CASE("logic: zero and minus zero are equal, and so are numbers too large to round") {
    CHECK(truth_at("pHmeasured * 0 < 0", -1.0) == Truth::no);
    CHECK(truth_at("pHmeasured * 0 = 0", -1.0) == Truth::yes);
    CHECK(truth_at("pHmeasured < 2 * pHmeasured", 8e307) == Truth::no);
    CHECK(truth_at("pHmeasured = 2 * pHmeasured", 8e307) == Truth::yes);
    CHECK(truth_at("pHmeasured < 2 * pHmeasured", 8e299) == Truth::yes);
    CHECK(truth_at("-pHmeasured < pHmeasured", 8e307) == Truth::yes);
}
