// Runs the worked cases that lie beside the rule files.
#pragma once

#include "isohydric/diag/report.hpp"
#include "isohydric/engine/program.hpp"

#include <memory>

namespace isohydric::interpret {

struct CaseCounts {
    std::size_t cases = 0;
    std::size_t expectations = 0;
    std::size_t failed = 0;  ///< expectations that were not met
};

/// Evaluates every case of the rule set; an expectation that is not met is an error in the report, at its place.
/// Yes, no and unknown are the states of findings, conditions, checks (yes: something is wrong), critical values and
/// explanations; a number is met within half a unit of its last printed digit.
[[nodiscard]] CaseCounts run_cases(const std::shared_ptr<const engine::Program>& program,
                                   diag::Report& report);

}  // namespace isohydric::interpret
