// The version of the library, for every record that must say what produced it.
#pragma once

#include <string_view>

namespace isohydric {

/// Version of this build, `major.minor.patch`.
[[nodiscard]] std::string_view version();

}  // namespace isohydric
