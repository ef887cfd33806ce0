// Runs the operations of a program over a block.
#include "isohydric/diag/assert.hpp"
#include "isohydric/engine/dispatch.hpp"
#include "isohydric/engine/operations.hpp"

#include <array>

namespace isohydric::engine {

namespace {

struct Entry {
    OpCode code;
    void (*run)(const Operation& operation, const Columns& columns);
};

/// In the order of the codes.
constexpr std::array k_operations{Entry{OpCode::constant_number, op::constant_number},
                                  Entry{OpCode::constant_missing, op::constant_missing},
                                  Entry{OpCode::constant_truth, op::constant_truth},
                                  Entry{OpCode::load_analyte, op::load_analyte},
                                  Entry{OpCode::load_rounding, op::load_rounding},
                                  Entry{OpCode::load_context, op::load_context},
                                  Entry{OpCode::load_near, op::load_near},
                                  Entry{OpCode::code_equals, op::code_equals},
                                  Entry{OpCode::select_interval, op::select_interval},
                                  Entry{OpCode::load_limit, op::load_limit},
                                  Entry{OpCode::add, op::add},
                                  Entry{OpCode::subtract, op::subtract},
                                  Entry{OpCode::multiply, op::multiply},
                                  Entry{OpCode::divide, op::divide},
                                  Entry{OpCode::negate, op::negate},
                                  Entry{OpCode::absolute, op::absolute},
                                  Entry{OpCode::ln, op::ln},
                                  Entry{OpCode::log, op::log},
                                  Entry{OpCode::exponential, op::exponential},
                                  Entry{OpCode::power, op::power},
                                  Entry{OpCode::square_root, op::square_root},
                                  Entry{OpCode::less, op::less},
                                  Entry{OpCode::less_equal, op::less_equal},
                                  Entry{OpCode::greater, op::greater},
                                  Entry{OpCode::greater_equal, op::greater_equal},
                                  Entry{OpCode::equal, op::equal},
                                  Entry{OpCode::not_equal, op::not_equal},
                                  Entry{OpCode::truth_equal, op::truth_equal},
                                  Entry{OpCode::truth_not_equal, op::truth_not_equal},
                                  Entry{OpCode::logical_and, op::logical_and},
                                  Entry{OpCode::logical_or, op::logical_or},
                                  Entry{OpCode::logical_xor, op::logical_xor},
                                  Entry{OpCode::logical_implies, op::logical_implies},
                                  Entry{OpCode::logical_not, op::logical_not},
                                  Entry{OpCode::number_exists, op::number_exists},
                                  Entry{OpCode::truth_exists, op::truth_exists},
                                  Entry{OpCode::choose_number, op::choose_number},
                                  Entry{OpCode::first_number, op::first_number},
                                  Entry{OpCode::model, op::model}};

constexpr bool in_order() {
    for (std::size_t index = 0; index < k_operations.size(); ++index) {
        if (static_cast<std::size_t>(k_operations[index].code) != index) {
            return false;
        }
    }
    return true;
}

static_assert(in_order());

}  // namespace

void run(const Operation& operation, const Columns& columns) {
    k_operations.at(static_cast<std::size_t>(operation.code)).run(operation, columns);
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
