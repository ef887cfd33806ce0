// Rules as text: a list of all entries, and one entry with its expression, sources and alternatives.
#pragma once

#include "isohydric/rule/rule_set.hpp"

#include <optional>
#include <string>
#include <string_view>
#include <vector>

namespace isohydric::report {

/// The kinds by which a list can be narrowed: `quantity`, `critical-value` ...
[[nodiscard]] std::vector<std::string> kind_names();

/// All entries by kind: id, what it says, "(unchecked)" where a value was not compared with its source.
/// `kind` is one of kind_names(); empty: all.
[[nodiscard]] std::string list_rules(const rule::RuleSet& rules, std::string_view kind = {});

/// One entry in full: expression in plain words, units, sources, review, place in its file; for a convention, a choice
/// and an entry that belongs to one, the alternatives, which is in force and why. None if there is no such name.
[[nodiscard]] std::optional<std::string> show_rule(const rule::RuleSet& rules, std::string_view id);

/// The names that show_rule() knows: ids of entries and choices.
[[nodiscard]] std::vector<std::string> names_to_show(const rule::RuleSet& rules);

}  // namespace isohydric::report
