// Runs the operations of a program over a block.
#include "isohydric/diag/assert.hpp"
#include "isohydric/engine/dispatch.hpp"
#include "isohydric/engine/operations.hpp"

namespace isohydric::engine {

void run(const Operation& operation, const Columns& columns) {
    switch (operation.code) {
    case OpCode::constant_number:
        return op::constant_number(operation, columns);
    case OpCode::constant_missing:
        return op::constant_missing(operation, columns);
    case OpCode::constant_truth:
        return op::constant_truth(operation, columns);
    case OpCode::load_analyte:
        return op::load_analyte(operation, columns);
    case OpCode::load_rounding:
        return op::load_rounding(operation, columns);
    case OpCode::load_context:
        return op::load_context(operation, columns);
    case OpCode::load_near:
        return op::load_near(operation, columns);
    case OpCode::code_equals:
        return op::code_equals(operation, columns);
    case OpCode::select_interval:
        return op::select_interval(operation, columns);
    case OpCode::load_limit:
        return op::load_limit(operation, columns);
    case OpCode::add:
        return op::add(operation, columns);
    case OpCode::subtract:
        return op::subtract(operation, columns);
    case OpCode::multiply:
        return op::multiply(operation, columns);
    case OpCode::divide:
        return op::divide(operation, columns);
    case OpCode::negate:
        return op::negate(operation, columns);
    case OpCode::absolute:
        return op::absolute(operation, columns);
    case OpCode::ln:
        return op::ln(operation, columns);
    case OpCode::log:
        return op::log(operation, columns);
    case OpCode::exponential:
        return op::exponential(operation, columns);
    case OpCode::power:
        return op::power(operation, columns);
    case OpCode::square_root:
        return op::square_root(operation, columns);
    case OpCode::less:
        return op::less(operation, columns);
    case OpCode::less_equal:
        return op::less_equal(operation, columns);
    case OpCode::greater:
        return op::greater(operation, columns);
    case OpCode::greater_equal:
        return op::greater_equal(operation, columns);
    case OpCode::equal:
        return op::equal(operation, columns);
    case OpCode::not_equal:
        return op::not_equal(operation, columns);
    case OpCode::truth_equal:
        return op::truth_equal(operation, columns);
    case OpCode::truth_not_equal:
        return op::truth_not_equal(operation, columns);
    case OpCode::logical_and:
        return op::logical_and(operation, columns);
    case OpCode::logical_or:
        return op::logical_or(operation, columns);
    case OpCode::logical_xor:
        return op::logical_xor(operation, columns);
    case OpCode::logical_implies:
        return op::logical_implies(operation, columns);
    case OpCode::logical_not:
        return op::logical_not(operation, columns);
    case OpCode::number_exists:
        return op::number_exists(operation, columns);
    case OpCode::truth_exists:
        return op::truth_exists(operation, columns);
    case OpCode::choose_number:
        return op::choose_number(operation, columns);
    case OpCode::first_number:
        return op::first_number(operation, columns);
    case OpCode::model:
        return op::model(operation, columns);
    }
}

bool is_constant(OpCode code) {
    return code == OpCode::constant_number || code == OpCode::constant_missing ||
           code == OpCode::constant_truth;
}

void evaluate(const Program& program, const panel::PanelBlock& block, Scratch& scratch) {
    ISOHYDRIC_ASSERT(block.size() <= scratch.capacity());
    const Columns columns(scratch, program.rules(), &block, block.size());
    for (const Operation& operation : program.operations()) {
        if (!is_constant(operation.code)) {
            run(operation, columns);
        }
    }
}

}  // namespace isohydric::engine
