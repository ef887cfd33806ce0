// Reads groups: what a rule author declares exclusive or exhaustive, and the audit proves.
#include "isohydric/rule/detail/entry_reader.hpp"

#include <algorithm>
#include <array>

#include <fmt/format.h>

namespace isohydric::rule::detail {
namespace {

constexpr std::string_view k_explanations_of = "explanations:";

std::vector<std::string> explanations_of(const Written& member, const EntryContext& context) {
    const Written approach{member.text.substr(k_explanations_of.size()), member.place};
    const std::string name = checked_approach(approach, context.report);
    std::vector<std::string> ids;
    for (const Explanation& explanation : context.rules.explanations) {
        if (!name.empty() && explanation.approach == name) {
            ids.push_back(explanation.head.id);
        }
    }
    if (!name.empty() && ids.empty()) {
        context.report.error("rule-id-unknown",
                             member.place,
                             fmt::format("the approach \"{}\" has no explanations", name));
    }
    return ids;
}

/// The ids that one word of `members` stands for.
std::vector<std::string> unfold(const Written& member, const EntryContext& context) {
    constexpr std::array<EntryKind, 3> k_allowed{
        EntryKind::finding, EntryKind::check, EntryKind::explanation};
    if (member.text.starts_with(k_explanations_of)) {
        return explanations_of(member, context);
    }
    const auto entry = context.rules.find(member.text);
    if (entry && entry->kind == EntryKind::table) {
        return context.rules.tables[entry->index].rows;
    }
    if (entry && std::ranges::find(k_allowed, entry->kind) != k_allowed.end()) {
        return {member.text};
    }
    context.report.error(
        "rule-id-unknown",
        member.place,
        fmt::format("\"{}\" is no member of a group; members are findings, checks, "
                    "explanations, tables, or \"explanations:\" and an approach",
                    member.text));
    return {};
}

}  // namespace

Group read_group(const diag::Json& json, const EntryContext& context) {
    diag::ObjectReader reader(json, context.report, "group");
    Group group;
    group.head = read_head(reader, context);
    reader.required("members", diag::Kind::array);
    for (const Written& member : read_list(reader, "members", context.report)) {
        for (std::string& id : unfold(member, context)) {
            if (std::ranges::find(group.members, id) == group.members.end()) {
                group.members.push_back(std::move(id));
            }
        }
    }
    group.exclusive = reader.optional_bool("exclusive").value_or(false);
    group.exhaustive = reader.optional_bool("exhaustive").value_or(false);
    group.domain = read_truth(reader, "domain", context);
    reader.finish();
    if (!group.exclusive && !group.exhaustive) {
        context.report.error("rule-group-empty",
                             group.head.place,
                             fmt::format("\"{}\" declares nothing; set \"exclusive\", "
                                         "\"exhaustive\" or both",
                                         group.head.id));
    }
    return group;
}

}  // namespace isohydric::rule::detail
