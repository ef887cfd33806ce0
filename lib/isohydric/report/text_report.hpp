// An interpretation as text for one screen, or in full.
#pragma once

#include "isohydric/interpret/interpretation.hpp"

#include <string>

namespace isohydric::report {

struct TextOptions {
    bool full = false;        ///< every check, finding, disorder and reason
    std::size_t width = 100;  ///< columns at which lines are broken
};

/// Caution, assumptions, critical values, panel, trust, reading and alternatives, reasons, what would help, caution.
[[nodiscard]] std::string text_report(const interpret::Interpretation& interpretation,
                                      const TextOptions& options = {});

}  // namespace isohydric::report
