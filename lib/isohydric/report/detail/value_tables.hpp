// The tables of entered and of calculated values.
#pragma once

#include "isohydric/interpret/interpretation.hpp"
#include "isohydric/report/detail/text_layout.hpp"

namespace isohydric::report {

/// Entered values with their interval. In full each has a line with what was entered; else they stand side by side, and
/// what was entered is said below where it was written in another way.
void write_panel(const interpret::Interpretation& of, bool full, TextLayout& out);

/// What was calculated, with its interval and its origin.
void write_calculated(const interpret::Interpretation& of, bool full, TextLayout& out);

}  // namespace isohydric::report
