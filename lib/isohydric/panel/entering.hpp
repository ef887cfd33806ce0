// A value in the unit that was found for it becomes an entered value in the canonical unit.
#pragma once

#include "isohydric/diag/result.hpp"
#include "isohydric/panel/catalogue.hpp"
#include "isohydric/panel/panel.hpp"
#include "isohydric/units/quantity_text.hpp"

namespace isohydric::panel {

/// The entered value, with half a unit of its last digit, the text as written, and the notes of name and unit. The error
/// says why such a value cannot be: not above zero where nothing else exists, or a thousand times beyond every limit.
[[nodiscard]] diag::Result<Entered> enter(const AnalyteInfo& info,
                                          const Catalogue::Alias& alias,
                                          const units::QuantityText& quantity,
                                          const CustomaryUnit& unit);

}  // namespace isohydric::panel
