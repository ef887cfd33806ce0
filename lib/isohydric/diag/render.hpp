// Diagnostics as text, without colour: `file:line:column: error: message [id]`, the source line, a
// caret under the place; then the notes in the same shape.
#pragma once

#include "isohydric/diag/report.hpp"

#include <string>
#include <string_view>

namespace isohydric::diag {

/// One diagnostic, ending in a line feed. Without a known place: `error: message [id]`.
[[nodiscard]] std::string render(const Diagnostic& diagnostic);

/// The first 100 diagnostics of a report; the rest are counted in a last line.
[[nodiscard]] std::string render(const Report& report);

/// `file:line:column`, or nothing without a known place.
[[nodiscard]] std::string render(const Place& place);

/// The text with control characters and bytes that are not UTF-8 shown as `\xNN`.
[[nodiscard]] std::string printable(std::string_view text);

}  // namespace isohydric::diag
