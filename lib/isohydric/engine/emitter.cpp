// Sharing, folding and appending of operations.
#include "isohydric/engine/emitter.hpp"

#include "isohydric/diag/assert.hpp"
#include "isohydric/engine/dispatch.hpp"

#include <algorithm>

namespace isohydric::engine {

std::uint32_t& count_of(SlotCounts& counts, SlotKind kind) {
    switch (kind) {
    case SlotKind::number:
        return counts.numbers;
    case SlotKind::truth:
        return counts.truths;
    case SlotKind::index:
        return counts.indices;
    }
    ISOHYDRIC_NEVER();
}

Slot Emitter::number(double value) {
    return emit({.code = OpCode::constant_number, .result = {SlotKind::number}, .number = value});
}

Slot Emitter::truth(bool value) {
    return emit({.code = OpCode::constant_truth,
                 .result = {SlotKind::truth},
                 .argument = static_cast<std::uint32_t>(truth_of(value))});
}

Slot Emitter::emit(Operation operation) {
    if (const std::optional<Slot> operand = absorb(operation)) {
        return *operand;
    }
    if (can_fold(operation)) {
        operation = fold(operation);
    }
    const auto found = known_.find(operation);
    return found != known_.end() ? found->second : append(std::move(operation));
}

const Operation& Emitter::producer(Slot slot) const {
    return operations_[producers_.at(slot)];
}

bool Emitter::is_known(Slot slot) const {
    return is_constant(producer(slot).code);
}

bool Emitter::is_known(Slot slot, Truth value) const {
    const Operation& operation = producer(slot);
    return operation.code == OpCode::constant_truth &&
           operation.argument == static_cast<std::uint32_t>(value);
}

bool Emitter::can_fold(const Operation& operation) const {
    return !operation.operands.empty() &&
           std::all_of(operation.operands.begin(), operation.operands.end(), [this](Slot operand) {
               return is_known(operand);
           });
}

/// Runs the operation itself on a scratch of one row, so that folding cannot differ from evaluating.
Operation Emitter::fold(const Operation& operation) const {
    SlotCounts counts;
    const auto renamed = [&counts](Slot slot) {
        return Slot{slot.kind, count_of(counts, slot.kind)++};
    };
    std::vector<Operation> steps;
    Operation last = operation;
    for (Slot& operand : last.operands) {
        steps.push_back(producer(operand));
        operand = steps.back().result = renamed(operand);
    }
    last.result = renamed(operation.result);
    steps.push_back(last);

    Scratch scratch = Columns::make_scratch(counts, 1);
    const Columns columns(scratch, rules_, nullptr, 1);
    for (const Operation& step : steps) {
        run(step, columns);
    }
    if (last.result.kind == SlotKind::truth) {
        return {.code = OpCode::constant_truth,
                .result = {SlotKind::truth},
                .argument = static_cast<std::uint32_t>(scratch.truth(last.result, 0))};
    }
    const std::optional<double> value = scratch.value(last.result, 0);
    return {.code = value ? OpCode::constant_number : OpCode::constant_missing,
            .result = {SlotKind::number},
            .number = value.value_or(0.0)};
}

/// The operand that alone decides an `and` or `or` one side of which is a constant, or whose sides are the same.
std::optional<Slot> Emitter::absorb(const Operation& operation) const {
    const bool is_and = operation.code == OpCode::logical_and;
    if (!is_and && operation.code != OpCode::logical_or) {
        return std::nullopt;
    }
    const Truth deciding = is_and ? Truth::no : Truth::yes;
    const Slot a = operation.operands[0];
    const Slot b = operation.operands[1];
    if (a == b || is_known(a, deciding) || is_known(b, not_of(deciding))) {
        return a;
    }
    if (is_known(b, deciding) || is_known(a, not_of(deciding))) {
        return b;
    }
    return std::nullopt;
}

Slot Emitter::append(Operation operation) {
    const Slot slot{operation.result.kind, count_of(slots_, operation.result.kind)++};
    known_.emplace(operation, slot);
    producers_.emplace(slot, operations_.size());
    operation.result = slot;
    operations_.push_back(std::move(operation));
    return slot;
}

}  // namespace isohydric::engine
