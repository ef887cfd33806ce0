// Asks for a panel at a terminal, value by value, with units and ranges.
#pragma once

#include "isohydric/panel/catalogue.hpp"

#include <string>
#include <utility>
#include <vector>

namespace isohydric::cli {

/// Pairs of name and text as typed; an empty answer leaves a value out, `.` ends the questions.
[[nodiscard]] std::vector<std::pair<std::string, std::string>>
ask_for_panel(const panel::Catalogue& catalogue);

}  // namespace isohydric::cli
