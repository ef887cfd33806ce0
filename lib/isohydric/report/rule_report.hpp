// Rules as text: a list of all entries, and one entry with its expression, sources and alternatives.
#pragma once

#include "isohydric/rule/rule_set.hpp"

#include <optional>
#include <string>
#include <string_view>

namespace isohydric::report {

/// One line an entry: kind, id, what it says, review date, `unchecked` where a value was not compared with its source.
/// `kind` selects one kind (`quantity`, `finding`, ...); empty: all.
[[nodiscard]] std::string list_rules(const rule::RuleSet& rules, std::string_view kind = {});

/// One entry in full: expression in plain words, units, sources, review, place in its file; for a convention, and for an
/// entry that belongs to one, the alternatives, which is in force and why. None if there is no such id.
[[nodiscard]] std::optional<std::string> show_rule(const rule::RuleSet& rules, std::string_view id);

}  // namespace isohydric::report
