// The part of an analyte's entry that says in which units it is given.
#pragma once

#include "isohydric/diag/json.hpp"
#include "isohydric/panel/catalogue.hpp"

namespace isohydric::panel::detail {

/// Reads `unit`, `unitText`, `decimals`, `charge`, `presets`, `customary` and `unitFrom` into `info`, whose analyte is known.
void read_units(diag::ObjectReader& entry, AnalyteInfo& info, diag::Report& report);

}  // namespace isohydric::panel::detail
