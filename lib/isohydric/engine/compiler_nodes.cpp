// Nodes of expressions to operations.
#include "isohydric/diag/assert.hpp"
#include "isohydric/engine/compiler.hpp"

namespace isohydric::engine {

namespace {

using rule::NodeKind;

/// The operation of a node that has exactly one operation of its own.
[[nodiscard]] OpCode op_code(NodeKind kind) {
    switch (kind) {
    case NodeKind::negate:
        return OpCode::negate;
    case NodeKind::add:
        return OpCode::add;
    case NodeKind::subtract:
        return OpCode::subtract;
    case NodeKind::multiply:
        return OpCode::multiply;
    case NodeKind::divide:
        return OpCode::divide;
    case NodeKind::less:
        return OpCode::less;
    case NodeKind::less_equal:
        return OpCode::less_equal;
    case NodeKind::greater:
        return OpCode::greater;
    case NodeKind::greater_equal:
        return OpCode::greater_equal;
    case NodeKind::logical_and:
        return OpCode::logical_and;
    case NodeKind::logical_or:
        return OpCode::logical_or;
    case NodeKind::logical_xor:
        return OpCode::logical_xor;
    case NodeKind::logical_implies:
        return OpCode::logical_implies;
    case NodeKind::call_not:
        return OpCode::logical_not;
    case NodeKind::call_abs:
        return OpCode::absolute;
    case NodeKind::call_ln:
        return OpCode::ln;
    case NodeKind::call_log:
        return OpCode::log;
    case NodeKind::call_exp:
        return OpCode::exponential;
    case NodeKind::call_power:
        return OpCode::power;
    case NodeKind::call_sqrt:
        return OpCode::square_root;
    case NodeKind::iif:
        return OpCode::choose_number;
    case NodeKind::number_literal:
    case NodeKind::truth_literal:
    case NodeKind::code_literal:
    case NodeKind::name:
    case NodeKind::equal:
    case NodeKind::not_equal:
    case NodeKind::call_exists:
    case NodeKind::call_empty:
        break;
    }
    ISOHYDRIC_NEVER();
}

[[nodiscard]] Slot unnumbered(rule::Type type) {
    ISOHYDRIC_ASSERT(type != rule::Type::code);
    return {type == rule::Type::number ? SlotKind::number : SlotKind::truth};
}

}  // namespace

Slot Compiler::expression(const rule::Expression& expression) {
    const Slot slot = node_value(expression);
    program_.nodes_.emplace(&expression, slot);
    return slot;
}

Slot Compiler::node_value(const rule::Expression& expression) {
    if (expression.kind == NodeKind::number_literal) {
        return emitter_.number(expression.number);
    }
    if (expression.kind == NodeKind::truth_literal) {
        return emitter_.truth(expression.truth);
    }
    if (expression.kind == NodeKind::name) {
        return name(expression.symbol);
    }
    if (expression.kind == NodeKind::equal || expression.kind == NodeKind::not_equal) {
        return equality(expression);
    }
    if (expression.kind == NodeKind::call_exists) {
        return exists(*expression.children[0]);
    }
    if (expression.kind == NodeKind::call_empty) {
        return negation(exists(*expression.children[0]));
    }
    return operator_value(expression);
}

Slot Compiler::operator_value(const rule::Expression& expression) {
    Operation operation{.code = op_code(expression.kind), .result = unnumbered(expression.type)};
    for (const rule::ExpressionPtr& child : expression.children) {
        operation.operands.push_back(this->expression(*child));
    }
    return emitter_.emit(std::move(operation));
}

/// `=` and `!=` of numbers, truths, or a code and a text.
Slot Compiler::equality(const rule::Expression& expression) {
    const rule::Expression& left = *expression.children[0];
    const rule::Expression& right = *expression.children[1];
    const bool is_equal = expression.kind == NodeKind::equal;
    if (left.type == rule::Type::code) {
        const bool literal_first = left.kind == NodeKind::code_literal;
        const rule::Expression& item = literal_first ? right : left;
        const rule::Expression& literal = literal_first ? left : right;
        const Slot same = emitter_.emit({.code = OpCode::code_equals,
                                         .result = {SlotKind::truth},
                                         .argument = item.symbol.index,
                                         .part = literal.code});
        return is_equal ? same : negation(same);
    }
    const bool of_numbers = left.type == rule::Type::number;
    const OpCode same = of_numbers ? OpCode::equal : OpCode::truth_equal;
    const OpCode different = of_numbers ? OpCode::not_equal : OpCode::truth_not_equal;
    return emitter_.emit({.code = is_equal ? same : different,
                          .result = {SlotKind::truth},
                          .operands = {this->expression(left), this->expression(right)}});
}

Slot Compiler::exists(const rule::Expression& operand) {
    if (operand.type == rule::Type::code) {
        return emitter_.truth(true);  // a code is never missing
    }
    const bool of_number = operand.type == rule::Type::number;
    return emitter_.emit({.code = of_number ? OpCode::number_exists : OpCode::truth_exists,
                          .result = {SlotKind::truth},
                          .operands = {expression(operand)}});
}

Slot Compiler::negation(Slot operand) {
    return emitter_.emit(
        {.code = OpCode::logical_not, .result = {SlotKind::truth}, .operands = {operand}});
}

Slot Compiler::both(Slot a, Slot b) {
    return emitter_.emit(
        {.code = OpCode::logical_and, .result = {SlotKind::truth}, .operands = {a, b}});
}

Slot Compiler::either(Slot a, Slot b) {
    return emitter_.emit(
        {.code = OpCode::logical_or, .result = {SlotKind::truth}, .operands = {a, b}});
}

}  // namespace isohydric::engine
