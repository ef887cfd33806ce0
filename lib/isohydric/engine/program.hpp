// A rule set compiled to a flat list of operations on columns. Compiled once, evaluated over blocks of any size with the
// same bits; a single panel is a block of one.
#pragma once

#include "isohydric/engine/operation.hpp"
#include "isohydric/panel/block.hpp"
#include "isohydric/rule/rule_set.hpp"

#include <cstdint>
#include <map>
#include <memory>
#include <optional>
#include <span>
#include <tuple>
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
    /// Keep the column of every node and of the names in sentences, so that explain, needs and fill work. Without it
    /// columns are used again once nobody needs them: less memory to stream through, the same results.
    bool keep_nodes = true;
};

/// Where the compensation band of an explanation is found.
struct BandSlots {
    Slot low, high;
};

/// An order of names for lookup.
struct SymbolOrder {
    [[nodiscard]] bool operator()(const rule::Symbol& a, const rule::Symbol& b) const {
        return std::tie(a.kind, a.index, a.limit_part) < std::tie(b.kind, b.index, b.limit_part);
    }
};

/// How many columns of each kind an evaluation needs.
struct SlotCounts {
    std::uint32_t numbers = 0, truths = 0, indices = 0;
};

/// The compiled form of a rule set. Immutable; share it between threads.
class Program {
  public:
    explicit Program(std::shared_ptr<const rule::RuleSet> rules, const Selection& selection = {});

    [[nodiscard]] const rule::RuleSet& rules() const { return *rules_; }

    [[nodiscard]] std::span<const Operation> operations() const { return operations_; }

    [[nodiscard]] const SlotCounts& slots() const { return slots_; }

    /// Slots of entries, by their index in the rule set; empty if neither selected nor (with keep_nodes) needed by what is.
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
    /// The slot of any node of a selected entry's expression; only with keep_nodes. Codes have none.
    [[nodiscard]] std::optional<Slot> node(const rule::Expression& expression) const;
    /// The slot of a name that a selected entry uses in an expression or a sentence; only with keep_nodes.
    [[nodiscard]] std::optional<Slot> name(const rule::Symbol& symbol) const;

  private:
    friend class Compiler;
    std::shared_ptr<const rule::RuleSet> rules_;
    std::vector<Operation> operations_;
    SlotCounts slots_;
    std::vector<std::optional<Slot>> quantities_, conditions_, findings_, checks_, criticals_,
        explanations_, intervals_;
    std::vector<std::vector<Slot>> alternatives_;
    std::vector<std::optional<BandSlots>> bands_;
    std::unordered_map<const rule::Expression*, Slot> nodes_;
    std::map<rule::Symbol, Slot, SymbolOrder> names_;
};

/// The columns of one evaluation. One per thread; reused from block to block.
class Scratch {
  public:
    /// Columns for blocks of up to `capacity` rows.
    Scratch(const Program& program, std::size_t capacity);

    [[nodiscard]] std::size_t capacity() const { return capacity_; }

    /// Rows of the block evaluated last.
    [[nodiscard]] std::size_t size() const { return size_; }

    /// The number, 0 where it is missing.
    [[nodiscard]] double number(Slot slot, std::size_t row) const {
        return values_[slot.index * stride_ + row];
    }

    [[nodiscard]] bool missing(Slot slot, std::size_t row) const {
        return missing_[slot.index * stride_ + row] != 0;
    }

    [[nodiscard]] std::optional<double> value(Slot slot, std::size_t row) const {
        return missing(slot, row) ? std::nullopt : std::optional<double>(number(slot, row));
    }

    [[nodiscard]] Truth truth(Slot slot, std::size_t row) const {
        return truths_[slot.index * stride_ + row];
    }

    [[nodiscard]] std::int32_t index(Slot slot, std::size_t row) const {
        return indices_[slot.index * stride_ + row];
    }

  private:
    friend class Columns;
    Scratch(const SlotCounts& slots, std::size_t capacity);

    std::size_t capacity_;
    std::size_t stride_;
    std::size_t size_ = 0;
    std::vector<double> values_;
    std::vector<std::uint8_t> missing_;
    std::vector<Truth> truths_;
    std::vector<std::int32_t> indices_;
};

/// Evaluates every operation over the rows of `block`. Never fails: what cannot be computed is missing or unknown.
/// `scratch` must have been made for `program`, and be large enough for the block.
void evaluate(const Program& program, const panel::PanelBlock& block, Scratch& scratch);

}  // namespace isohydric::engine
