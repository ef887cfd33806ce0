// An interpretation as JSON, `isohydric.interpretation/1`.
#pragma once

#include "isohydric/interpret/interpretation.hpp"

#include <string>

namespace isohydric::report {

/// The members of the format in their fixed order. `indent` < 0: one line.
[[nodiscard]] std::string json_report(const interpret::Interpretation& interpretation,
                                      int indent = 2);

}  // namespace isohydric::report
