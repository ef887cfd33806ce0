// Arithmetic on number columns.
#include "isohydric/engine/operations.hpp"
#include "isohydric/num/number.hpp"

namespace isohydric::engine {

void op::add(const Operation& operation, const Columns& columns) {
    map_numbers(operation, columns, [](double a, double b) { return a + b; });
}

void op::subtract(const Operation& operation, const Columns& columns) {
    map_numbers(operation, columns, [](double a, double b) { return a - b; });
}

void op::multiply(const Operation& operation, const Columns& columns) {
    map_numbers(operation, columns, [](double a, double b) { return a * b; });
}

void op::divide(const Operation& operation, const Columns& columns) {
    // A quotient by zero is infinite or NaN, and so missing.
    map_numbers(operation, columns, [](double a, double b) { return a / b; });
}

void op::negate(const Operation& operation, const Columns& columns) {
    map_number(operation, columns, [](double a) { return -a; });
}

void op::absolute(const Operation& operation, const Columns& columns) {
    map_number(operation, columns, [](double a) { return num::abs(a); });
}

}  // namespace isohydric::engine
