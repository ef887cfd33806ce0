// Look-up in a compiled program, and the columns of an evaluation.
#include "isohydric/engine/program.hpp"

#include "isohydric/engine/compiler.hpp"
#include "isohydric/engine/dispatch.hpp"

namespace isohydric::engine {

namespace {

/// Columns start a cache line apart from a power of two, so that those read together do not share a cache set.
constexpr std::size_t k_padding_rows = 64;

}  // namespace

Program::Program(std::shared_ptr<const rule::RuleSet> rules, const Selection& selection)
    : rules_(std::move(rules)) {
    Compiler(*this, selection).compile();
}

std::optional<Slot> Program::quantity(std::uint32_t index) const {
    return quantities_.at(index);
}

std::span<const Slot> Program::alternatives(std::uint32_t quantity_index) const {
    return alternatives_.at(quantity_index);
}

std::optional<Slot> Program::condition(std::uint32_t index) const {
    return conditions_.at(index);
}

std::optional<Slot> Program::finding(std::uint32_t index) const {
    return findings_.at(index);
}

std::optional<Slot> Program::check(std::uint32_t index) const {
    return checks_.at(index);
}

std::optional<Slot> Program::critical(std::uint32_t index) const {
    return criticals_.at(index);
}

std::optional<Slot> Program::explanation(std::uint32_t index) const {
    return explanations_.at(index);
}

std::optional<BandSlots> Program::band(std::uint32_t explanation_index) const {
    return bands_.at(explanation_index);
}

std::optional<Slot> Program::interval(std::uint32_t name_index) const {
    return intervals_.at(name_index);
}

std::optional<Slot> Program::node(const rule::Expression& expression) const {
    const auto found = nodes_.find(&expression);
    return found == nodes_.end() ? std::nullopt : std::optional(found->second);
}

std::optional<Slot> Program::name(const rule::Symbol& symbol) const {
    if (symbol.kind == rule::SymbolKind::quantity) {
        return quantity(symbol.index);
    }
    if (symbol.kind == rule::SymbolKind::condition) {
        return condition(symbol.index);
    }
    if (symbol.kind == rule::SymbolKind::finding) {
        return finding(symbol.index);
    }
    const auto found = names_.find(symbol);
    return found == names_.end() ? std::nullopt : std::optional(found->second);
}

Scratch::Scratch(const SlotCounts& slots, std::size_t capacity)
    : capacity_(capacity),
      stride_(capacity + k_padding_rows),
      values_(slots.numbers * stride_),
      missing_(slots.numbers * stride_),
      truths_(slots.truths * stride_),
      indices_(slots.indices * stride_) {}

Scratch::Scratch(const Program& program, std::size_t capacity)
    : Scratch(program.slots(), capacity) {
    const Columns columns(*this, program.rules(), nullptr, capacity);
    for (const Operation& operation : program.operations()) {
        if (is_constant(operation.code)) {
            run(operation, columns);
        }
    }
    size_ = 0;
}

}  // namespace isohydric::engine
