// Runs one operation of any kind.
#pragma once

#include "isohydric/engine/columns.hpp"

namespace isohydric::engine {

/// Writes the result column of `operation` from its operands, for the rows of `columns`.
void run(const Operation& operation, const Columns& columns);

/// Whether an operation only fills its column with one value. A Scratch does that once, not for every block.
[[nodiscard]] bool is_constant(OpCode code);

}  // namespace isohydric::engine
