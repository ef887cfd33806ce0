// Collects the operations of a program: equal ones once, and none whose result is known.
#pragma once

#include "isohydric/engine/operation.hpp"
#include "isohydric/engine/program.hpp"

#include <map>
#include <vector>

namespace isohydric::engine {

/// The operations emitted so far, in an order in which every operand is computed before it is read.
class Emitter {
  public:
    explicit Emitter(const rule::RuleSet& rules) : rules_(rules) {}

    [[nodiscard]] Slot number(double value);
    [[nodiscard]] Slot truth(bool value);

    /// The slot that holds the result of `operation`, whose own `result` says only of which kind it is.
    [[nodiscard]] Slot emit(Operation operation);

    [[nodiscard]] const SlotCounts& slots() const { return slots_; }

    /// Hands the operations over.
    [[nodiscard]] std::vector<Operation> take() { return std::move(operations_); }

  private:
    [[nodiscard]] const Operation& producer(Slot slot) const;
    [[nodiscard]] bool is_known(Slot slot) const;
    [[nodiscard]] bool is_known(Slot slot, Truth value) const;
    [[nodiscard]] bool can_fold(const Operation& operation) const;
    [[nodiscard]] Operation fold(const Operation& operation) const;
    [[nodiscard]] std::optional<Slot> absorb(const Operation& operation) const;
    [[nodiscard]] Slot append(Operation operation);

    const rule::RuleSet& rules_;
    std::vector<Operation> operations_;
    std::map<Operation, Slot> known_;        ///< operation without result -> where it is
    std::map<Slot, std::size_t> producers_;  ///< slot -> index of its operation
    SlotCounts slots_;
};

/// The slot count of one kind.
[[nodiscard]] std::uint32_t& count_of(SlotCounts& counts, SlotKind kind);

}  // namespace isohydric::engine
