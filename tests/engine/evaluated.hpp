// One evaluation of a rule set made by hand, read by the names of its entries.
#pragma once

#include "isohydric/engine/program.hpp"

#include <memory>
#include <string_view>

#include "engine/rules_by_hand.hpp"

namespace isohydric::test {

/// A program, a block and its columns.
class Evaluated {
  public:
    Evaluated(const RulesByHand& rules,
              const panel::PanelBlock& block,
              const engine::Selection& selection = {})
        : program_(rules.rules(), selection), scratch_(program_, block.capacity()) {
        engine::evaluate(program_, block, scratch_);
    }

    Evaluated(const RulesByHand& rules, const std::vector<panel::Panel>& panels)
        : Evaluated(rules, block_of(panels)) {}

    [[nodiscard]] std::optional<double> quantity(std::uint32_t index, std::size_t row = 0) const {
        return scratch_.value(program_.quantity(index).value(), row);
    }

    [[nodiscard]] engine::Truth condition(std::uint32_t index, std::size_t row = 0) const {
        return scratch_.truth(program_.condition(index).value(), row);
    }

    [[nodiscard]] engine::Truth finding(std::uint32_t index, std::size_t row = 0) const {
        return scratch_.truth(program_.finding(index).value(), row);
    }

    [[nodiscard]] const engine::Program& program() const { return program_; }

    [[nodiscard]] const engine::Scratch& scratch() const { return scratch_; }

  private:
    engine::Program program_;
    engine::Scratch scratch_;
};

}  // namespace isohydric::test
