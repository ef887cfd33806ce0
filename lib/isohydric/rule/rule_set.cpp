#include "isohydric/rule/rule_set.hpp"

#include <algorithm>
#include <array>

namespace isohydric::rule {

std::string_view describe(EntryKind kind) {
    constexpr std::array<std::string_view, 11> k_names{"quantity",
                                                       "condition",
                                                       "interval",
                                                       "finding",
                                                       "table",
                                                       "explanation",
                                                       "group",
                                                       "check",
                                                       "critical value",
                                                       "disorder",
                                                       "convention"};
    return k_names.at(static_cast<std::size_t>(kind));
}

std::optional<EntryRef> RuleSet::find(std::string_view id_wanted) const {
    const auto found = by_id.find(id_wanted);
    return found == by_id.end() ? std::nullopt : std::optional(found->second);
}

std::optional<std::uint32_t> RuleSet::find(std::string_view id_wanted, EntryKind kind) const {
    const auto entry = find(id_wanted);
    return entry && entry->kind == kind ? std::optional(entry->index) : std::nullopt;
}

std::optional<std::uint32_t> RuleSet::find_quantity(std::string_view id_wanted) const {
    return find(id_wanted, EntryKind::quantity);
}

std::optional<std::uint32_t> RuleSet::find_condition(std::string_view id_wanted) const {
    return find(id_wanted, EntryKind::condition);
}

std::optional<std::uint32_t> RuleSet::find_finding(std::string_view id_wanted) const {
    return find(id_wanted, EntryKind::finding);
}

std::optional<std::uint32_t> RuleSet::find_disorder(std::string_view id_wanted) const {
    return find(id_wanted, EntryKind::disorder);
}

std::optional<std::uint32_t> RuleSet::find_explanation(std::string_view id_wanted) const {
    return find(id_wanted, EntryKind::explanation);
}

std::optional<std::uint32_t> RuleSet::find_interval_name(std::string_view name) const {
    const auto found = std::ranges::find(interval_names, name);
    return found == interval_names.end()
               ? std::nullopt
               : std::optional(static_cast<std::uint32_t>(found - interval_names.begin()));
}

std::string_view RuleSet::citation(std::string_view ref) const {
    const auto found = std::ranges::find(bibliography, ref, &BibliographyItem::id);
    return found == bibliography.end() ? ref : std::string_view(found->citation);
}

}  // namespace isohydric::rule
