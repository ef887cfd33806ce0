// The caution that begins and ends every output.
#pragma once

#include <string_view>

namespace isohydric::report {

/// What this program is not, and who decides.
[[nodiscard]] std::string_view caution();

}  // namespace isohydric::report
