// The parts of an interpretation, each assembled from one evaluation.
#pragma once

#include "isohydric/interpret/detail/evaluation.hpp"

#include <vector>

namespace isohydric::interpret {

[[nodiscard]] std::vector<CheckResult> check_results(const Evaluation& evaluation);
[[nodiscard]] std::vector<CriticalValue> critical_values(const Evaluation& evaluation);
[[nodiscard]] std::vector<AnalyteResult> analyte_results(const Evaluation& evaluation);
[[nodiscard]] std::vector<QuantityResult> quantity_results(const Evaluation& evaluation,
                                                           const Contradicted& contradicted);
[[nodiscard]] std::vector<FindingResult> finding_results(const Evaluation& evaluation,
                                                         const Contradicted& contradicted);
/// At most six, in the order of DESIGN: fits, early, near; fewest disorders; nearest to the centre; id.
[[nodiscard]] std::vector<ExplanationResult> explanation_results(const Evaluation& evaluation);
[[nodiscard]] std::vector<DisorderResult> disorder_results(const Interpretation& so_far,
                                                           const Evaluation& evaluation);
[[nodiscard]] std::vector<std::string> sentences(const Interpretation& so_far,
                                                 const Evaluation& evaluation);
/// Analytes that were not given and would decide something that is open.
[[nodiscard]] std::vector<std::string> would_help(const Interpretation& so_far,
                                                  const Evaluation& evaluation);
/// Ids of entries in force that hold a value not compared with its source, and had a part in the results.
[[nodiscard]] std::vector<std::string> unchecked_ids(const Interpretation& so_far,
                                                     const Evaluation& evaluation);

}  // namespace isohydric::interpret
