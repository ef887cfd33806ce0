// The caution that begins and ends every output.
#pragma once

#include <cstddef>
#include <string>
#include <string_view>

namespace isohydric::report {

/// What this program is not, and who decides.
[[nodiscard]] std::string_view caution();

/// A text with the caution before and after it, each set off by an empty line and broken at `width` columns.
[[nodiscard]] std::string with_caution(std::string_view text, std::size_t width = 100);

}  // namespace isohydric::report
