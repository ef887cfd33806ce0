// Worked cases beside the rule files: `<name>.cases.json`.
#pragma once

#include "isohydric/diag/json.hpp"
#include "isohydric/rule/rule_set.hpp"

#include <functional>
#include <string>
#include <string_view>
#include <vector>

namespace isohydric::rule {

/// `gap/anion-gap.cases.json` for `gap/anion-gap.json`.
[[nodiscard]] std::string cases_path_of(std::string_view rule_file_path);

/// The cases of one file, checked against the rule set: its entries, the analytes of its catalogue, its context items.
/// Expectations of ids for which `superseded` holds are left out: they speak of an entry that a later set replaced or
/// removed. Faults are reported.
[[nodiscard]] std::vector<Case>
read_cases(const diag::Json& file,
           const RuleSet& rules,
           const std::function<bool(std::string_view id)>& superseded,
           diag::Report& report);

}  // namespace isohydric::rule
