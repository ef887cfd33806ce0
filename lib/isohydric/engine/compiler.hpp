// Turns the entries of a rule set into operations: each entry that the selection needs, after all that it needs itself.
#pragma once

#include "isohydric/engine/emitter.hpp"
#include "isohydric/engine/program.hpp"

#include <string_view>

namespace isohydric::engine {

/// Compiles one program. The rule set has been checked: names are resolved, types agree, nothing refers to itself.
class Compiler {
  public:
    Compiler(Program& program, const Selection& selection);

    void compile();

  private:
    // Entries (compiler.cpp).
    void compile_finding(std::uint32_t index);
    void compile_check(std::uint32_t index);
    void compile_critical(std::uint32_t index);
    void compile_explanation(std::uint32_t index);
    void compile_bystanders();
    void compile_sentence(std::string_view sentence);
    void forget_unselected();

    Slot quantity(std::uint32_t index);
    Slot first_present(std::uint32_t index);
    Slot model_result(const rule::Quantity& quantity);
    Slot condition(std::uint32_t index);
    Slot finding(std::uint32_t index);
    Slot interval(std::uint32_t name);
    Slot name(const rule::Symbol& symbol);
    Slot name_value(const rule::Symbol& symbol);
    Slot context_item(panel::ContextItem item);

    // Nodes of expressions (compiler_nodes.cpp).
    Slot expression(const rule::Expression& expression);
    Slot node_value(const rule::Expression& expression);
    Slot operator_value(const rule::Expression& expression);
    Slot equality(const rule::Expression& expression);
    Slot exists(const rule::Expression& operand);
    Slot negation(Slot operand);
    Slot both(Slot a, Slot b);
    Slot either(Slot a, Slot b);

    Program& program_;
    const rule::RuleSet& rules_;
    const Selection& selection_;
    Emitter emitter_;
};

}  // namespace isohydric::engine
