// One function for each operation code, in one file for each kind. `OpCode` says what each does.
#pragma once

#include "isohydric/engine/columns.hpp"

namespace isohydric::engine::op {

// op_load.cpp
void constant_number(const Operation& operation, const Columns& columns);
void constant_missing(const Operation& operation, const Columns& columns);
void constant_truth(const Operation& operation, const Columns& columns);
void load_analyte(const Operation& operation, const Columns& columns);
void load_rounding(const Operation& operation, const Columns& columns);
void load_context(const Operation& operation, const Columns& columns);
void load_near(const Operation& operation, const Columns& columns);
void code_equals(const Operation& operation, const Columns& columns);

// op_limits.cpp
void select_interval(const Operation& operation, const Columns& columns);
void load_limit(const Operation& operation, const Columns& columns);

// op_arithmetic.cpp
void add(const Operation& operation, const Columns& columns);
void subtract(const Operation& operation, const Columns& columns);
void multiply(const Operation& operation, const Columns& columns);
void divide(const Operation& operation, const Columns& columns);
void negate(const Operation& operation, const Columns& columns);
void absolute(const Operation& operation, const Columns& columns);

// op_function.cpp
void ln(const Operation& operation, const Columns& columns);
void log(const Operation& operation, const Columns& columns);
void exponential(const Operation& operation, const Columns& columns);
void power(const Operation& operation, const Columns& columns);
void square_root(const Operation& operation, const Columns& columns);

// op_compare.cpp
void less(const Operation& operation, const Columns& columns);
void less_equal(const Operation& operation, const Columns& columns);
void greater(const Operation& operation, const Columns& columns);
void greater_equal(const Operation& operation, const Columns& columns);
void equal(const Operation& operation, const Columns& columns);
void not_equal(const Operation& operation, const Columns& columns);

// op_logic.cpp
void truth_equal(const Operation& operation, const Columns& columns);
void truth_not_equal(const Operation& operation, const Columns& columns);
void logical_and(const Operation& operation, const Columns& columns);
void logical_or(const Operation& operation, const Columns& columns);
void logical_xor(const Operation& operation, const Columns& columns);
void logical_implies(const Operation& operation, const Columns& columns);
void logical_not(const Operation& operation, const Columns& columns);
void number_exists(const Operation& operation, const Columns& columns);
void truth_exists(const Operation& operation, const Columns& columns);

// op_choose.cpp
void choose_number(const Operation& operation, const Columns& columns);
void first_number(const Operation& operation, const Columns& columns);

// op_model.cpp
void model(const Operation& operation, const Columns& columns);

}  // namespace isohydric::engine::op
