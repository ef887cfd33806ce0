// Asks for a panel at a terminal, value by value, with units and ranges.
#pragma once

#include "isohydric/panel/panel.hpp"
#include "isohydric/panel/site_units.hpp"

#include <map>
#include <optional>
#include <string>

namespace isohydric::cli {

/// Asks for specimen, values and onset; what `context` says already is not asked again. An answer that cannot be read is
/// asked again at once. An empty answer leaves a value out; a single point, or the end of input, ends the questions.
/// Nothing is given if no value was.
[[nodiscard]] std::optional<panel::Panel>
ask_for_panel(const panel::Catalogue& catalogue,
              const panel::SiteUnits* units,
              const std::map<std::string, std::string>& context);

}  // namespace isohydric::cli
