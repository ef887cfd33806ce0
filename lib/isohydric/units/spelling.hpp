// How people write units, and the UCUM code each spelling means. What could mean two units is refused.
#pragma once

#include <optional>
#include <string>
#include <string_view>

namespace isohydric::units {

/// The UCUM code that a customary spelling means: `mmHg` -> `mm[Hg]`, `mEq/L` -> `meq/L`, `mM` -> `mmol/L`, `C` -> `Cel`.
/// A UCUM code of parse_unit()'s subset comes back unchanged. Both micro signs (U+00B5, U+03BC) are read; letter case
/// counts, since it tells `m` (milli) from `M` (mega, or molar). None for an empty or unknown text, and for what could be
/// read in two ways (`MMOL/L`, `M`).
[[nodiscard]] std::optional<std::string> ucum_of(std::string_view written);

/// A spelling near to `written` that ucum_of() understands, for "did you mean"; empty if none is near.
[[nodiscard]] std::string suggest_unit(std::string_view written);

}  // namespace isohydric::units
