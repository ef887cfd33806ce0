// Conditions of iif must not be empty: what the checker accepts is compared with evaluation in three-valued logic over
// every combination of missing and present names.
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

/// One way in which things may stand: the names that are missing, what is false, and whether comparisons hold.
struct World {
    std::set<std::string> missing, untrue;
    bool comparisons_hold{};
};

/// The truth of a condition by FHIRPath's tables [@hl7-fhirpath, Boolean logic]; a number that is there counts as yes.
Truth evaluate(const Expression& node, const World& world) {
    const auto child = [&](std::size_t i) {
        return evaluate(*node.children[i], world);
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
    if (node.kind == NodeKind::name) {
        return world.missing.contains(node.text) ? Truth::empty
                                                 : truth_of(!world.untrue.contains(node.text));
    }
    if (node.kind == NodeKind::logical_and) {
        return both(child(0), child(1));
    }
    if (node.kind == NodeKind::logical_or) {
        return negated(both(negated(child(0)), negated(child(1))));
    }
    if (node.kind == NodeKind::logical_implies) {
        return negated(both(child(0), negated(child(1))));
    }
    if (node.kind == NodeKind::call_not) {
        return negated(child(0));
    }
    if (node.kind == NodeKind::call_exists || node.kind == NodeKind::call_empty) {
        return truth_of((child(0) == Truth::empty) == (node.kind == NodeKind::call_empty));
    }
    bool empty = false;
    for (std::size_t i = 0; i < node.children.size(); ++i) {
        empty = empty || child(i) == Truth::empty;
    }
    const bool compares = node.type == Type::truth;
    return empty ? Truth::empty : truth_of(!compares || world.comparisons_hold);
}

/// Whether the condition is empty in any world.
bool ever_empty(const std::string& condition) {
    Text text(condition);
    const ExpressionPtr read = text.read(truth());
    REQUIRE_MESSAGE(read != nullptr, ids(text.report));
    for (unsigned bits = 0; bits < 64; ++bits) {
        const auto bit = [bits](unsigned i) {
            return (bits >> i & 1U) != 0;
        };
        World world;
        unsigned next = 0;
        for (const std::string name : {"Na", "Cl", "lowGas"}) {
            if (bit(next++)) {
                world.missing.insert(name);
            }
        }
        for (const std::string name : {"lowGas", "context.near"}) {
            if (bit(next++)) {
                world.untrue.insert(name);
            }
        }
        world.comparisons_hold = bit(next);
        if (evaluate(*read, world) == Truth::empty) {
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
