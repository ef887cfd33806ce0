// Results are equal to the bit whatever the size of the blocks, with and without columns that are used again.
#include "isohydric/engine/program.hpp"

#include <doctest/doctest.h>

#include <bit>
#include <random>

#include "engine/rules_by_hand.hpp"

namespace engine = isohydric::engine;
namespace panel = isohydric::panel;
namespace test = isohydric::test;
using panel::Analyte;

namespace {

constexpr std::uint32_t k_seed = 20261201;
constexpr std::size_t k_rows = 2100;  // not a multiple of any block size below

double random_value(std::mt19937& random, double low, double high) {
    constexpr double k_range = 4294967296.0;
    return low + (high - low) * (static_cast<double>(random()) / k_range);
}

panel::Panel random_panel(std::mt19937& random) {
    constexpr std::array<std::tuple<Analyte, double, double>, 8> k_ranges{
        {{Analyte::ph, 6.2, 8.1},
         {Analyte::pco2, 0.5, 150.0},
         {Analyte::na, 110.0, 170.0},
         {Analyte::k, 1.0, 9.0},
         {Analyte::cl, 70.0, 130.0},
         {Analyte::albumin, 0.0, 60.0},
         {Analyte::lactate, 0.0, 20.0},
         {Analyte::so2, 0.0, 1.0}}};
    panel::Panel panel;
    for (const auto& [analyte, low, high] : k_ranges) {
        if (random() % 5 != 0) {
            panel[analyte].emplace().value = random_value(random, low, high);
        }
    }
    panel.context.specimen = static_cast<panel::Specimen>(random() % 8);
    panel.context.population = static_cast<panel::Population>(random() % 6);
    if (random() % 2 == 0) {
        panel.context.age_a = random_value(random, 0.0, 90.0);
    }
    if (random() % 3 == 0) {
        panel.context.altitude_m = random_value(random, 0.0, 5000.0);
    }
    return panel;
}

/// Rules that use every kind of operation.
test::RulesByHand rules_of_every_kind() {
    test::RulesByHand rules;
    auto& adult = rules.interval("gap", "mmol/L", 3.0, 12.0);
    adult.populations = {panel::Population::adult};
    adult.specimens = {panel::Specimen::arterial, panel::Specimen::venous};
    auto& old = rules.interval("gap", "mmol/L", 4.0, 14.0);
    old.age_a = {60.0, {}};
    old.needs_age = true;
    rules.interval("gap", "mmol/L", 2.0, 16.0).altitude_m = {{}, 2000.0};
    rules.model("hco3",
                "carbonicAcid.bicarbonate",
                {"pHmeasured", "pCO2measured", "0.0307 'mmol/L/mm[Hg]'", "6.1"},
                "mmol/L");
    rules.first_of("base", {{"gas", "hco3"}, {"sodium", "Na - 116 'mmol/L'"}}, "mmol/L");
    rules.quantity("gap", "Na - Cl - base", "mmol/L");
    rules.quantity("ratio", "(gap - limits.gap.high) / (24 'mmol/L' - base)", "1");
    rules.quantity("functions",
                   "(ratio.abs() + 1).ln() + sO2.sqrt() + (-pHmeasured).exp() + "
                   "ratio.power(3) + (sO2 + 1).log(10)",
                   "1");
    rules.quantity("choice", "iif(lactate.exists(), 1 'L/mmol' * lactate, ratio)", "1");
    rules.condition("raised", "gap > limits.gap.high and (lactate < 4 'mmol/L').not()");
    rules.condition("odd", "raised xor albumin.empty() or K >= 5 'mmol/L'");
    rules.condition("venous", "context.specimen = 'venous' implies pHmeasured <= 7.4");
    rules.condition("same", "raised = odd or raised != venous or (raised and odd).exists()");
    const auto exception = rules.finding("exception", "albumin = 40 'g/L' or sO2 != 0.5");
    rules.finding("wanted", "raised and odd and same", {exception});
    return rules;
}

struct Bits {
    std::vector<std::uint64_t> numbers;
    std::vector<engine::Truth> truths;
    friend bool operator==(const Bits&, const Bits&) = default;
};

/// Adds every quantity, condition and finding of one row.
void add_row(Bits& bits,
             const engine::Program& program,
             const engine::Scratch& scratch,
             std::size_t row) {
    for (std::uint32_t index = 0; index < program.rules().quantities.size(); ++index) {
        const engine::Slot slot = program.quantity(index).value();
        bits.numbers.push_back(std::bit_cast<std::uint64_t>(scratch.number(slot, row)));
        bits.numbers.push_back(scratch.missing(slot, row) ? 1 : 0);
    }
    for (std::uint32_t index = 0; index < program.rules().conditions.size(); ++index) {
        bits.truths.push_back(scratch.truth(program.condition(index).value(), row));
    }
    for (std::uint32_t index = 0; index < program.rules().findings.size(); ++index) {
        bits.truths.push_back(scratch.truth(program.finding(index).value(), row));
    }
}

Bits evaluate_in_blocks(const test::RulesByHand& rules,
                        const std::vector<panel::Panel>& panels,
                        std::size_t block_size,
                        bool keep_nodes) {
    engine::Selection selection;
    selection.keep_nodes = keep_nodes;
    const engine::Program program(rules.rules(), selection);
    engine::Scratch scratch(program, block_size);
    panel::PanelBlock block(block_size);
    Bits bits;
    for (std::size_t first = 0; first < panels.size(); first += block_size) {
        block.clear();
        for (std::size_t row = first; row < std::min(first + block_size, panels.size()); ++row) {
            block.push(panels[row], row % 7 == 0);
        }
        engine::evaluate(program, block, scratch);
        for (std::size_t row = 0; row < block.size(); ++row) {
            add_row(bits, program, scratch, row);
        }
    }
    return bits;
}

std::vector<panel::Panel> random_panels() {
    std::mt19937 random(k_seed);  // NOLINT(cert-msc51-cpp): the same panels every time
    std::vector<panel::Panel> panels;
    for (std::size_t row = 0; row < k_rows; ++row) {
        panels.push_back(random_panel(random));
    }
    return panels;
}

}  // namespace

TEST_CASE("blocks: equal to the bit for sizes 1, 2, 7 and 1024, columns kept or used again") {
    const test::RulesByHand rules = rules_of_every_kind();
    const std::vector<panel::Panel> panels = random_panels();
    const Bits expected = evaluate_in_blocks(rules, panels, 1, true);
    for (const std::size_t block_size : {1U, 2U, 7U, 1024U}) {
        for (const bool keep_nodes : {true, false}) {
            INFO("seed " << k_seed << ", block size " << block_size << ", kept " << keep_nodes);
            CHECK(evaluate_in_blocks(rules, panels, block_size, keep_nodes) == expected);
        }
    }
}

TEST_CASE("blocks: the rules of this test see values, missing ones, and every truth") {
    const Bits bits = evaluate_in_blocks(rules_of_every_kind(), random_panels(), 1024, true);
    for (const auto truth : {engine::Truth::no, engine::Truth::yes, engine::Truth::unknown}) {
        CHECK(std::count(bits.truths.begin(), bits.truths.end(), truth) > 500);
    }
    std::size_t missing = 0;
    for (std::size_t at = 1; at < bits.numbers.size(); at += 2) {
        missing += bits.numbers[at];
    }
    CHECK(missing > 1000);
    CHECK(missing < bits.numbers.size() / 4);
}

TEST_CASE("blocks: no number is NaN or infinite, and a missing one is 0") {
    const Bits bits = evaluate_in_blocks(rules_of_every_kind(), random_panels(), 7, true);
    for (std::size_t at = 0; at < bits.numbers.size(); at += 2) {
        const auto value = std::bit_cast<double>(bits.numbers[at]);
        REQUIRE(std::isfinite(value));
        if (bits.numbers[at + 1] != 0) {
            REQUIRE(bits.numbers[at] == 0);
        }
    }
}
