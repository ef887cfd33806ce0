// Lets operations share columns: a column that nobody reads any more takes the next result.
#pragma once

#include "isohydric/engine/operation.hpp"
#include "isohydric/engine/program.hpp"

#include <vector>

namespace isohydric::engine {

/// Renumbers the slots of `operations` and of `outputs`, drops operations that no output needs, and says how many columns
/// remain. Outputs and constants keep a column of their own; no operation writes to a column that it reads.
[[nodiscard]] SlotCounts reuse_columns(std::vector<Operation>& operations,
                                       const std::vector<Slot*>& outputs);

}  // namespace isohydric::engine
