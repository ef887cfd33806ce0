// Conditions of iif must not be empty: what the checker accepts is compared with evaluation in three-valued logic over
// every combination of missing and present names.
#include <array>
#include <set>

#include "rule/expression_fixture.hpp"

namespace isohydric::rule::testing {
namespace {

constexpr std::string_view k_empty = "expression-empty-condition";

std::string choose(const std::string& condition) {
    return "iif(" + condition + ", 1, 2)";
}

bool accepted(const std::string& condition) {
    const std::string found = faults(choose(condition), number("1"));
    CHECK((found.empty() || found.ends_with(k_empty)));
    return found.empty();
}

enum class Truth { no, yes, empty };

/// Whether a condition is empty when the given names are missing; present numbers are 1. FHIRPath's tables
/// [@hl7-fhirpath, Boolean logic].
Truth evaluate(const Expression& node, const std::set<std::string>& missing) {
    const auto child = [&](std::size_t i) {
        return evaluate(*node.children[i], missing);
    };
    const auto truth_of = [](bool value) {
        return value ? Truth::yes : Truth::no;
    };
    const auto negated = [](Truth t) {
        return t == Truth::empty ? t : t == Truth::yes ? Truth::no : Truth::yes;
    };
    const auto both = [](Truth left, Truth right) {
        if (left == Truth::no || right == Truth::no) {
            return Truth::no;
        }
        return left == Truth::yes && right == Truth::yes ? Truth::yes : Truth::empty;
    };
    switch (node.kind) {
    case NodeKind::name:
        return missing.contains(node.text) ? Truth::empty : Truth::yes;
    case NodeKind::number_literal:
        return Truth::yes;
    case NodeKind::logical_and:
        return both(child(0), child(1));
    case NodeKind::logical_or:
        return negated(both(negated(child(0)), negated(child(1))));
    case NodeKind::logical_implies:
        return negated(both(child(0), negated(child(1))));
    case NodeKind::call_not:
        return negated(child(0));
    case NodeKind::call_exists:
        return truth_of(child(0) != Truth::empty);
    case NodeKind::call_empty:
        return truth_of(child(0) == Truth::empty);
    default: {
        bool empty = false;
        for (std::size_t i = 0; i < node.children.size(); ++i) {
            empty = empty || child(i) == Truth::empty;
        }
        return empty ? Truth::empty : Truth::yes;
    }
    }
}

/// Whether any combination of missing names leaves the condition empty.
bool ever_empty(const std::string& condition) {
    Text text(condition);
    const ExpressionPtr read = text.read(truth());
    REQUIRE_MESSAGE(read != nullptr, ids(text.report));
    const std::array<std::string, 3> names{"Na", "Cl", "lowGas"};
    for (unsigned mask = 0; mask < 8; ++mask) {
        std::set<std::string> missing;
        for (unsigned i = 0; i < 3; ++i) {
            if ((mask >> i & 1U) != 0) {
                missing.insert(names[i]);
            }
        }
        if (evaluate(*read, missing) == Truth::empty) {
            return true;
        }
    }
    return false;
}

}  // namespace

TEST_CASE("emptiness: a condition that asks first is accepted, and cannot be empty") {
    for (const std::string condition : {
             "Na.exists()",
             "Na.empty()",
             "Na.exists() and Na > 140 'mmol/L'",
             "Na.empty().not() and Na > 140 'mmol/L'",
             "Na.empty() or Na > 140 'mmol/L'",
             "Na.exists() implies Na > 140 'mmol/L'",
             "Na.exists() and Cl.exists() and Na - Cl > 36 'mmol/L'",
             "(Na + Cl).exists() and Cl > Na",
             "(Na > Cl).exists() and Cl > Na",
             "Na.exists() and (Cl.empty() or Cl < Na)",
             "(Na.empty() or Cl.empty()).not() and Na > Cl",
             "lowGas.exists() and lowGas",
             "lowGas.exists() and lowGas.not()",
             "context.near",
             "context.near and context.onset = 'acute'",
             "context.specimen != 'arterial' or context.near.not()",
             "1 < 2",
         }) {
        CAPTURE(condition);
        CHECK(accepted(condition));
        CHECK_FALSE(ever_empty(condition));
    }
}

TEST_CASE("emptiness: a condition that can be empty is refused") {
    for (const std::string condition : {
             "Na > 140 'mmol/L'",
             "lowGas",
             "lowGas.not()",
             "Na.exists() and Cl > 100 'mmol/L'",
             "Na.exists() or Na > 140 'mmol/L'",
             "Na.empty() and Na > 140 'mmol/L'",
             "Na.exists() xor Na > 140 'mmol/L'",
             "Na.exists().not() and Na > Cl",
             "(Na.exists() or Cl.exists()) and Na > Cl",
             "context.near and lowGas",
             "context.near or Na > Cl",
         }) {
        CAPTURE(condition);
        CHECK_FALSE(accepted(condition));
        CHECK(ever_empty(condition));
    }
}

TEST_CASE("emptiness: division and functions may be empty although their operands are there") {
    CHECK_FALSE(accepted("Na.exists() and Cl.exists() and Na / Cl > 1"));
    CHECK(accepted("(Na / Cl).exists() and Na / Cl > 1"));
    CHECK_FALSE(accepted("pH.exists() and pH.ln() > 1"));
    CHECK(accepted("pH.ln().exists() and pH.ln() > pH"));
    CHECK_FALSE(accepted("pH.exists() and pH.sqrt() > 1"));
}

TEST_CASE("emptiness: the condition around an iif counts inside its results") {
    const std::string inner = "iif(Na > 140 'mmol/L', 1, 2)";
    CHECK(faults("iif(Na.exists(), " + inner + ", 3)", number("1")).empty());
    CHECK(faults("iif(Na.empty(), 3, " + inner + ")", number("1")).empty());
    CHECK(faults("iif(Na.exists(), 3, " + inner + ")", number("1")) ==
          "1:26-43 expression-empty-condition");
    CHECK(faults("iif(iif(Na.exists(), Na, 0 'mmol/L') > 1 'mmol/L', 1, 2)", number("1")).empty());
}

}  // namespace isohydric::rule::testing
