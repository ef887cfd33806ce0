// A panel as JSON: {"panel": {"pH": "7.21", "Na": "138 mmol/L", "K": {"value": 4.1, "unit": "mmol/L"}},
// "context": {"specimen": "arterial", "age": "4 a"}}.
#pragma once

#include "isohydric/diag/json.hpp"
#include "isohydric/panel/reading.hpp"

namespace isohydric::io {

/// Hands every member to the reader with its place. Numbers keep their printed digits. Errors go to the report.
void read_json_panel(const diag::Json& document, panel::PanelReader& reader, diag::Report& report);

}  // namespace isohydric::io
