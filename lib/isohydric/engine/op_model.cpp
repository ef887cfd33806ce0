// Chemistry models on columns.
#include "isohydric/engine/models.hpp"
#include "isohydric/engine/operations.hpp"

namespace isohydric::engine {

void op::model(const Operation& operation, const Columns& columns) {
    std::vector<const double*> values;
    std::vector<const std::uint8_t*> missing;
    for (const Slot operand : operation.operands) {
        const Numbers input = columns.numbers(operand);
        values.push_back(input.values);
        missing.push_back(input.missing);
    }
    const NumbersOut out = columns.numbers_out(operation.result);
    evaluate_model(operation.argument, {values, missing, out.values, out.missing, columns.rows()});
}

}  // namespace isohydric::engine
