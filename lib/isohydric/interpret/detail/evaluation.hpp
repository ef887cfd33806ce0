// One panel's evaluated rules, with the questions that every part of the interpretation asks of them.
#pragma once

#include "isohydric/interpret/interpretation.hpp"

#include <cstdint>
#include <optional>
#include <string>
#include <vector>

namespace isohydric::interpret {

/// Row 0 is the panel; row 1 the same panel with `context.near`: bands widened by the margin of the measurement.
inline constexpr std::size_t k_panel_row = 0;
inline constexpr std::size_t k_near_row = 1;

/// What rests on values that a stop check found in contradiction.
class Contradicted {
  public:
    Contradicted(const rule::RuleSet& rules, const std::vector<std::uint32_t>& analytes);

    [[nodiscard]] bool quantity(std::uint32_t index) const { return quantities_[index]; }

    [[nodiscard]] bool finding(std::uint32_t index) const { return findings_[index]; }

    /// Whether any explanation rests on them: then none is given.
    [[nodiscard]] bool any_explanation() const { return any_explanation_; }

  private:
    [[nodiscard]] bool rests(const rule::Expression& expression) const;
    [[nodiscard]] bool rests(const rule::Symbol& symbol) const;
    [[nodiscard]] bool rests(const rule::Quantity& quantity) const;
    bool spread(const rule::RuleSet& rules);

    std::vector<bool> analytes_, quantities_, conditions_, findings_;
    bool any_explanation_ = false;
};

class Evaluation {
  public:
    Evaluation(const engine::Program& program,
               const engine::Scratch& scratch,
               const panel::Panel& panel)
        : program_(program), scratch_(scratch), panel_(panel) {}

    [[nodiscard]] const engine::Program& program() const { return program_; }

    [[nodiscard]] const rule::RuleSet& rules() const { return program_.rules(); }

    [[nodiscard]] const panel::Panel& panel() const { return panel_; }

    [[nodiscard]] Truth truth(std::optional<engine::Slot> slot,
                              std::size_t row = k_panel_row) const;
    [[nodiscard]] std::optional<double> number(std::optional<engine::Slot> slot,
                                               std::size_t row = k_panel_row) const;
    [[nodiscard]] std::string fill(const std::string& sentence) const;
    [[nodiscard]] std::vector<engine::Reason> because(const rule::Expression& expression) const;
    [[nodiscard]] std::vector<panel::Analyte> needs(const rule::Expression& expression) const;
    /// The interval of a name that holds for the panel's context.
    [[nodiscard]] const rule::Interval* interval(const std::string& name) const;
    /// Which alternative of a quantity counted.
    [[nodiscard]] std::optional<std::size_t> alternative(std::uint32_t quantity) const;
    /// Whether an expression, or a quantity or condition in it, looks up a limit that a laboratory has yet to replace.
    [[nodiscard]] bool rests_on_shipped_limit(const rule::Expression& expression) const;

  private:
    const engine::Program& program_;
    const engine::Scratch& scratch_;
    const panel::Panel& panel_;
};

}  // namespace isohydric::interpret
