// What a program contains: shared operations, folded constants, only what was asked for, columns used again.
#include <doctest/doctest.h>

#include <algorithm>

#include "engine/evaluated.hpp"

namespace engine = isohydric::engine;
namespace panel = isohydric::panel;
namespace rule = isohydric::rule;
namespace test = isohydric::test;
using engine::OpCode;
using engine::Truth;
using panel::Analyte;
using test::Evaluated;
using test::panel_of;
using test::RulesByHand;

namespace {

std::ptrdiff_t count(const engine::Program& program, OpCode code) {
    const auto operations = program.operations();
    return std::count_if(operations.begin(), operations.end(), [code](const auto& operation) {
        return operation.code == code;
    });
}

/// Nothing selected; every column only as long as it is needed.
engine::Selection lean() {
    engine::Selection selection;
    selection.everything = false;
    selection.keep_nodes = false;
    return selection;
}

}  // namespace

TEST_CASE("program: equal subexpressions are computed once") {
    RulesByHand rules;
    const auto a = rules.quantity("a", "(Na - Cl) * 2", "mmol/L");
    const auto b = rules.quantity("b", "(Na - Cl) * 2 + K", "mmol/L");
    const Evaluated evaluated(
        rules, {panel_of({{Analyte::na, 140}, {Analyte::cl, 100}, {Analyte::k, 4}})});
    CHECK(count(evaluated.program(), OpCode::subtract) == 1);
    CHECK(count(evaluated.program(), OpCode::multiply) == 1);
    CHECK(evaluated.quantity(a) == 80.0);
    CHECK(evaluated.quantity(b) == 84.0);
}

TEST_CASE("program: constants are folded, also to missing and to truths") {
    RulesByHand rules;
    const auto sum = rules.quantity("sum", "(2 + 3) * 4", "1");
    const auto missing = rules.quantity("nothing", "1 / (2 - 2)", "1");
    const auto truth = rules.condition("truth", "2 + 2 = 4");
    const auto unknown = rules.condition("unknown", "1 / 0 > 2");
    const Evaluated evaluated(rules, {panel_of({})});
    CHECK(count(evaluated.program(), OpCode::add) == 0);
    CHECK(count(evaluated.program(), OpCode::divide) == 0);
    CHECK(count(evaluated.program(), OpCode::equal) == 0);
    CHECK(evaluated.quantity(sum) == 20.0);
    CHECK_FALSE(evaluated.quantity(missing));
    CHECK(evaluated.condition(truth) == Truth::yes);
    CHECK(evaluated.condition(unknown) == Truth::unknown);
}

TEST_CASE("program: a constant side of and, or is absorbed") {
    RulesByHand rules;
    const auto a = rules.condition("a", "pHmeasured > 7 and true");
    const auto b = rules.condition("b", "false and pHmeasured > 7");
    const auto c = rules.condition("c", "pHmeasured > 7 or true");
    const auto d = rules.condition("d", "false or pHmeasured > 7");
    const Evaluated evaluated(rules, {panel_of({})});
    CHECK(count(evaluated.program(), OpCode::logical_and) == 0);
    CHECK(count(evaluated.program(), OpCode::logical_or) == 0);
    CHECK(evaluated.condition(a) == Truth::unknown);
    CHECK(evaluated.condition(b) == Truth::no);
    CHECK(evaluated.condition(c) == Truth::yes);
    CHECK(evaluated.condition(d) == Truth::unknown);
}

TEST_CASE("program: only what the selection needs is compiled") {
    RulesByHand rules;
    const auto gap = rules.quantity("gap", "Na - Cl", "mmol/L");
    const auto other = rules.quantity("other", "K * 2", "mmol/L");
    const auto raised = rules.finding("raised", "gap > 12 'mmol/L'");
    engine::Selection selection;
    selection.everything = false;
    selection.findings = {raised};
    const engine::Program program(rules.rules(), selection);
    CHECK(program.finding(raised));
    CHECK(program.quantity(gap));
    CHECK_FALSE(program.quantity(other));
    CHECK(count(program, OpCode::multiply) == 0);
}

TEST_CASE("program: without nodes only selected entries have columns") {
    RulesByHand rules;
    const auto gap = rules.quantity("gap", "Na - Cl", "mmol/L");
    const auto raised = rules.finding("raised", "gap > 12 'mmol/L'");
    engine::Selection selection = lean();
    selection.findings = {raised};
    const Evaluated evaluated(
        rules, test::block_of({panel_of({{Analyte::na, 140}, {Analyte::cl, 100}})}), selection);
    CHECK_FALSE(evaluated.program().quantity(gap));
    CHECK_FALSE(evaluated.program().node(*rules.set().findings[raised].when));
    CHECK(evaluated.finding(raised) == Truth::yes);
}

TEST_CASE("program: columns are used again once nobody reads them") {
    RulesByHand rules;
    std::string chain = "Na";
    for (int step = 0; step < 20; ++step) {
        chain.insert(0, "(").append(" + K) * 2");
    }
    const auto wanted = rules.quantity("wanted", chain, "mmol/L");
    engine::Selection selection = lean();
    selection.quantities = {wanted};
    const engine::Program reused(rules.rules(), selection);
    const engine::Program kept(rules.rules());
    // The chain needs its two sides, K, and the constant 2.
    CHECK(reused.slots().numbers == 4);
    CHECK(kept.slots().numbers > 40);
    for (const engine::Operation& operation : reused.operations()) {
        CHECK(std::find(operation.operands.begin(), operation.operands.end(), operation.result) ==
              operation.operands.end());
    }
}

TEST_CASE("program: the names of a sentence have columns") {
    RulesByHand rules;
    const auto raised = rules.finding("raised", "Na > 145 'mmol/L'");
    rules.set().findings[raised].states = "Sodium {Na}, potassium {K:bare}.";
    const Evaluated evaluated(rules, {panel_of({{Analyte::na, 150}, {Analyte::k, 4}})});
    const rule::Symbol potassium{
        rule::SymbolKind::analyte, static_cast<std::uint32_t>(Analyte::k), {}};
    const auto slot = evaluated.program().name(potassium);
    REQUIRE(slot);
    CHECK(evaluated.scratch().value(*slot, 0) == 4.0);
}

TEST_CASE("program: checks, critical values and explanations have their columns") {
    RulesByHand rules;
    const auto ph = rules.quantity("pH", "pHmeasured", "1");
    rule::Check check;
    check.when = rules.expression("pHmeasured > 8", rule::Type::truth);
    rules.set().checks.push_back(check);
    rule::Critical critical;
    critical.when = rules.expression("pHmeasured < 7.2", rule::Type::truth);
    critical.value = {rule::SymbolKind::quantity, ph, {}};
    rules.set().criticals.push_back(critical);
    rule::Explanation explanation;
    explanation.when = rules.expression("pHmeasured >= 7", rule::Type::truth);
    explanation.compensation =
        rule::Compensation{ph,
                           rules.expression("pHmeasured - 1", rule::Type::number, "1"),
                           rules.expression("pHmeasured + 1", rule::Type::number, "1"),
                           ""};
    rules.set().explanations.push_back(explanation);
    const Evaluated evaluated(rules, {panel_of({{Analyte::ph, 7.0}})});
    const engine::Program& program = evaluated.program();
    const engine::Scratch& scratch = evaluated.scratch();
    CHECK(scratch.truth(program.check(0).value(), 0) == Truth::no);
    CHECK(scratch.truth(program.critical(0).value(), 0) == Truth::yes);
    CHECK(scratch.truth(program.explanation(0).value(), 0) == Truth::yes);
    CHECK(scratch.value(program.band(0).value().low, 0) == 6.0);
    CHECK(scratch.value(program.band(0).value().high, 0) == 8.0);
}

TEST_CASE("program: a scratch serves block after block, smaller ones too") {
    RulesByHand rules;
    const auto doubled = rules.quantity("doubled", "pHmeasured * 2", "1");
    const engine::Program program(rules.rules());
    engine::Scratch scratch(program, 3);
    const auto slot = program.quantity(doubled).value();
    engine::evaluate(
        program,
        test::block_of(
            {panel_of({{Analyte::ph, 7.0}}), panel_of({{Analyte::ph, 7.1}}), panel_of({})}),
        scratch);
    CHECK(scratch.size() == 3);
    CHECK(scratch.value(slot, 1) == 14.2);
    engine::evaluate(program, test::block_of({panel_of({})}), scratch);
    CHECK(scratch.size() == 1);
    CHECK_FALSE(scratch.value(slot, 0));
}
