// Sharing of columns by a walk over the operations in order, as a compiler assigns registers to straight-line code.
#include "isohydric/engine/reuse.hpp"

#include "isohydric/engine/dispatch.hpp"
#include "isohydric/engine/emitter.hpp"

#include <limits>
#include <map>

namespace isohydric::engine {

namespace {

constexpr std::size_t k_for_ever = std::numeric_limits<std::size_t>::max();

/// The last operation that reads each slot that anybody needs; later than all for outputs and constants.
using LastReads = std::map<Slot, std::size_t>;

/// Walks backwards: the first reader met is the last, and an operation whose result nobody has read is not needed.
[[nodiscard]] LastReads find_last_reads(const std::vector<Operation>& operations,
                                        const std::vector<Slot*>& outputs) {
    LastReads last_reads;
    for (const Slot* output : outputs) {
        last_reads.emplace(*output, k_for_ever);
    }
    for (std::size_t index = operations.size(); index-- > 0;) {
        const Operation& operation = operations[index];
        const auto needed = last_reads.find(operation.result);
        if (needed == last_reads.end()) {
            continue;
        }
        if (is_constant(operation.code)) {
            needed->second = k_for_ever;
        }
        for (const Slot operand : operation.operands) {
            last_reads.emplace(operand, index);
        }
    }
    return last_reads;
}

/// Hands out columns, those that were free for the shortest time first, since they are still in the cache.
class ColumnPool {
  public:
    [[nodiscard]] Slot take_new(SlotKind kind) { return {kind, count_of(counts_, kind)++}; }

    [[nodiscard]] Slot take(SlotKind kind) {
        std::vector<Slot>& free = free_[kind];
        if (free.empty()) {
            return take_new(kind);
        }
        const Slot slot = free.back();
        free.pop_back();
        return slot;
    }

    void give_back(Slot slot) { free_[slot.kind].push_back(slot); }

    [[nodiscard]] const SlotCounts& counts() const { return counts_; }

  private:
    SlotCounts counts_;
    std::map<SlotKind, std::vector<Slot>> free_;
};

}  // namespace

SlotCounts reuse_columns(std::vector<Operation>& operations, const std::vector<Slot*>& outputs) {
    const LastReads last_reads = find_last_reads(operations, outputs);
    ColumnPool pool;
    std::map<Slot, Slot> columns;
    std::vector<Operation> kept;
    for (std::size_t index = 0; index < operations.size(); ++index) {
        Operation& operation = operations[index];
        if (!last_reads.contains(operation.result)) {
            continue;
        }
        // A constant is written once, before the first block: its column must never have been another's.
        const SlotKind kind = operation.result.kind;
        const Slot column = is_constant(operation.code) ? pool.take_new(kind) : pool.take(kind);
        columns.emplace(operation.result, column);
        operation.result = column;
        std::vector<Slot> finished;
        for (Slot& operand : operation.operands) {
            const bool last = last_reads.at(operand) == index;
            operand = columns.at(operand);
            if (last && std::find(finished.begin(), finished.end(), operand) == finished.end()) {
                finished.push_back(operand);
            }
        }
        for (const Slot slot : finished) {
            pool.give_back(slot);
        }
        kept.push_back(std::move(operation));
    }
    for (Slot* output : outputs) {
        *output = columns.at(*output);
    }
    operations = std::move(kept);
    return pool.counts();
}

}  // namespace isohydric::engine
