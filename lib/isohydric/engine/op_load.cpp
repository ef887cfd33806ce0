// Operations that bring constants, panel values and context items into columns.
#include "isohydric/engine/operations.hpp"

#include <algorithm>

namespace isohydric::engine {

namespace {

void copy(const panel::NumberColumn& from, const Operation& operation, const Columns& columns) {
    const NumbersOut out = columns.numbers_out(operation.result);
    std::copy_n(from.values.begin(), columns.rows(), out.values);
    std::copy_n(from.missing.begin(), columns.rows(), out.missing);
}

void fill(const Operation& operation, const Columns& columns, double value, std::uint8_t missing) {
    const NumbersOut out = columns.numbers_out(operation.result);
    std::fill_n(out.values, columns.rows(), value);
    std::fill_n(out.missing, columns.rows(), missing);
}

void compare_code(const Operation& operation,
                  const Columns& columns,
                  panel::ContextItem item,
                  std::uint32_t wanted) {
    const std::uint8_t* codes = columns.block().context_code(item).data();
    Truth* __restrict out = columns.truths_out(operation.result);
    const std::size_t rows = columns.rows();
    for (std::size_t row = 0; row < rows; ++row) {
        out[row] = codes[row] == wanted ? Truth::yes : Truth::no;
    }
}

}  // namespace

void op::constant_number(const Operation& operation, const Columns& columns) {
    fill(operation, columns, operation.number, 0);
}

void op::constant_missing(const Operation& operation, const Columns& columns) {
    fill(operation, columns, 0.0, 1);
}

void op::constant_truth(const Operation& operation, const Columns& columns) {
    std::fill_n(columns.truths_out(operation.result),
                columns.rows(),
                static_cast<Truth>(operation.argument));
}

void op::load_analyte(const Operation& operation, const Columns& columns) {
    copy(columns.block().analyte(static_cast<panel::Analyte>(operation.argument)),
         operation,
         columns);
}

void op::load_rounding(const Operation& operation, const Columns& columns) {
    copy(columns.block().rounding(static_cast<panel::Analyte>(operation.argument)),
         operation,
         columns);
}

void op::load_context(const Operation& operation, const Columns& columns) {
    copy(columns.block().context_number(static_cast<panel::ContextItem>(operation.argument)),
         operation,
         columns);
}

void op::load_near(const Operation& operation, const Columns& columns) {
    compare_code(operation, columns, panel::ContextItem::near, 1);
}

void op::code_equals(const Operation& operation, const Columns& columns) {
    compare_code(
        operation, columns, static_cast<panel::ContextItem>(operation.argument), operation.part);
}

}  // namespace isohydric::engine
