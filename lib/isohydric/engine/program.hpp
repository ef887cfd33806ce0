// A rule set compiled to a flat list of operations on columns. Compiled once, evaluated over blocks of any size with the
// same bits; a single panel is a block of one.
#pragma once

#include "isohydric/engine/operation.hpp"
#include "isohydric/panel/block.hpp"
#include "isohydric/rule/rule_set.hpp"

#include <cstdint>
#include <memory>
#include <optional>
#include <span>
#include <unordered_map>
#include <vector>

namespace isohydric::engine {

/// What a caller wants computed. Only what these need is evaluated.
struct Selection {
    bool everything = true;  ///< all entries; the lists are ignored
    std::vector<std::uint32_t> quantities;
    std::vector<std::uint32_t> conditions;
    std::vector<std::uint32_t> findings;
    std::vector<std::uint32_t> checks;
    std::vector<std::uint32_t> criticals;
    std::vector<std::uint32_t> explanations;  ///< with their compensation bands
};

/// Where the compensation band of an explanation is found.
struct BandSlots {
    Slot low, high;
};

/// The compiled form of a rule set. Immutable; share it between threads.
class Program {
  public:
    explicit Program(std::shared_ptr<const rule::RuleSet> rules, const Selection& selection = {});

    [[nodiscard]] const rule::RuleSet& rules() const { return *rules_; }

    [[nodiscard]] std::span<const Operation> operations() const { return operations_; }

    /// Slots of entries, by their index in the rule set; empty if not selected.
    [[nodiscard]] std::optional<Slot> quantity(std::uint32_t index) const;
    /// Slots of a quantity's alternatives, in order (to say which one counted).
    [[nodiscard]] std::span<const Slot> alternatives(std::uint32_t quantity_index) const;
    [[nodiscard]] std::optional<Slot> condition(std::uint32_t index) const;
    [[nodiscard]] std::optional<Slot> finding(std::uint32_t index) const;
    [[nodiscard]] std::optional<Slot> check(std::uint32_t index) const;
    [[nodiscard]] std::optional<Slot> critical(std::uint32_t index) const;
    [[nodiscard]] std::optional<Slot> explanation(std::uint32_t index) const;
    [[nodiscard]] std::optional<BandSlots> band(std::uint32_t explanation_index) const;
    /// Which interval of a name holds: an index column into RuleSet::intervals, -1 for none.
    [[nodiscard]] std::optional<Slot> interval(std::uint32_t name_index) const;
    /// The slot of any node of a selected entry's expression.
    [[nodiscard]] std::optional<Slot> node(const rule::Expression& expression) const;

  private:
    friend class Compiler;
    std::shared_ptr<const rule::RuleSet> rules_;
    std::vector<Operation> operations_;
    std::vector<std::optional<Slot>> quantities_, conditions_, findings_, checks_, criticals_,
        explanations_, intervals_;
    std::vector<std::vector<Slot>> alternatives_;
    std::vector<std::optional<BandSlots>> bands_;
    std::unordered_map<const rule::Expression*, Slot> nodes_;
};

/// The columns of one evaluation. One per thread; reused from block to block.
class Scratch {
  public:
    Scratch(const Program& program, std::size_t capacity);

    [[nodiscard]] std::size_t size() const { return size_; }

    [[nodiscard]] double number(Slot slot, std::size_t row) const {
        return numbers_[slot.index].values[row];
    }

    [[nodiscard]] bool missing(Slot slot, std::size_t row) const {
        return numbers_[slot.index].missing[row] != 0;
    }

    [[nodiscard]] std::optional<double> value(Slot slot, std::size_t row) const {
        return missing(slot, row) ? std::nullopt : std::optional<double>(number(slot, row));
    }

    [[nodiscard]] Truth truth(Slot slot, std::size_t row) const { return truths_[slot.index][row]; }

    [[nodiscard]] std::int32_t index(Slot slot, std::size_t row) const {
        return indices_[slot.index][row];
    }

  private:
    friend void evaluate(const Program&, const panel::PanelBlock&, Scratch&);
    friend struct Columns;
    std::size_t size_ = 0;
    std::vector<panel::NumberColumn> numbers_;
    std::vector<std::vector<Truth>> truths_;
    std::vector<std::vector<std::int32_t>> indices_;
};

/// Evaluates every operation over the rows of `block`. Never fails: what cannot be computed is missing or unknown.
void evaluate(const Program& program, const panel::PanelBlock& block, Scratch& scratch);

}  // namespace isohydric::engine
