#include "isohydric/rule/rule_names.hpp"

#include "isohydric/rule/detail/emptiness.hpp"

#include <algorithm>
#include <array>
#include <iterator>

namespace isohydric::rule {
namespace {

constexpr std::array<std::string_view, 3> k_limit_parts{"low", "mid", "high"};

NamedSymbol truth(SymbolKind kind, std::uint32_t index) {
    NamedSymbol named;
    named.symbol = {.kind = kind, .index = index, .limit_part = {}};
    named.type = Type::truth;
    return named;
}

NamedSymbol number(SymbolKind kind, std::uint32_t index, const units::Unit& unit) {
    NamedSymbol named = truth(kind, index);
    named.type = Type::number;
    named.unit = unit;
    return named;
}

std::vector<std::string> split(std::string_view dotted) {
    std::vector<std::string> parts;
    for (std::size_t begin = 0;;) {
        const std::size_t point = dotted.find('.', begin);
        parts.emplace_back(dotted.substr(begin, point - begin));
        if (point == std::string_view::npos) {
            return parts;
        }
        begin = point + 1;
    }
}

}  // namespace

std::optional<NamedSymbol> RuleNames::find(std::span<const std::string> path) const {
    if (path.size() == 1) {
        return find_single(path[0]);
    }
    if (path.size() == 2 && path[0] == "context") {
        return find_context_item(path[1]);
    }
    if (path.size() == 2 && path[0] == "rounding") {
        return find_rounding(path[1]);
    }
    if (path.size() == 3 && path[0] == "limits") {
        return find_limit(path[1], path[2]);
    }
    return std::nullopt;
}

std::optional<NamedSymbol> RuleNames::find(std::string_view dotted) const {
    return find(std::span<const std::string>(split(dotted)));
}

bool RuleNames::never_empty(std::uint32_t condition, std::set<std::uint32_t>& open) const {
    const ExpressionPtr& when = rules_.conditions[condition].when;
    if (!when || !open.insert(condition).second) {
        return false;
    }
    const bool never = !can_be_empty(*when, [&](const Symbol& symbol) {
        return symbol.kind == SymbolKind::condition && never_empty(symbol.index, open);
    });
    open.erase(condition);
    return never;
}

std::optional<NamedSymbol> RuleNames::find_single(std::string_view name) const {
    for (const panel::AnalyteInfo& info : rules_.catalogue->analytes) {
        if (info.expression_name == name) {
            return number(SymbolKind::analyte,
                          static_cast<std::uint32_t>(panel::index_of(info.analyte)),
                          info.unit);
        }
    }
    const auto entry = rules_.find(name);
    if (!entry) {
        return std::nullopt;
    }
    if (entry->kind == EntryKind::quantity) {
        return number(SymbolKind::quantity, entry->index, rules_.quantities[entry->index].unit);
    }
    if (entry->kind == EntryKind::condition) {
        NamedSymbol condition = truth(SymbolKind::condition, entry->index);
        std::set<std::uint32_t> open;
        condition.never_empty = never_empty(entry->index, open);
        return condition;
    }
    if (entry->kind == EntryKind::finding) {
        return truth(SymbolKind::finding, entry->index);
    }
    return std::nullopt;
}

std::optional<NamedSymbol> RuleNames::find_limit(std::string_view name,
                                                 std::string_view part) const {
    const auto index = rules_.find_interval_name(name);
    const auto which = static_cast<std::size_t>(
        std::distance(k_limit_parts.begin(), std::ranges::find(k_limit_parts, part)));
    if (!index || which == k_limit_parts.size()) {
        return std::nullopt;
    }
    NamedSymbol limit = number(SymbolKind::limit, *index, rules_.interval_units[*index]);
    limit.symbol.limit_part = static_cast<LimitPart>(which);
    return limit;
}

std::optional<NamedSymbol> RuleNames::find_rounding(std::string_view analyte_id) const {
    const auto analyte = panel::analyte_of(analyte_id);
    if (!analyte) {
        return std::nullopt;
    }
    return number(SymbolKind::rounding,
                  static_cast<std::uint32_t>(panel::index_of(*analyte)),
                  (*rules_.catalogue)[*analyte].unit);
}

std::vector<std::string> RuleNames::candidates() const {
    std::vector<std::string> names;
    const auto add = [&](std::initializer_list<std::string> path) {
        names.push_back(written_name(std::vector<std::string>(path)));
    };
    for (const panel::AnalyteInfo& info : rules_.catalogue->analytes) {
        add({info.expression_name});
        add({"rounding", std::string(panel::id_of(info.analyte))});
    }
    for (const auto& [id, entry] : rules_.by_id) {
        if (find_single(id)) {
            add({id});
        }
    }
    for (const std::string& name : rules_.interval_names) {
        for (const std::string_view part : k_limit_parts) {
            add({"limits", name, std::string(part)});
        }
    }
    for (const std::string_view item : panel::k_context_item_names) {
        add({"context", std::string(item)});
    }
    return names;
}

}  // namespace isohydric::rule
