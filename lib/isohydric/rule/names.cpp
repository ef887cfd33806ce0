#include "isohydric/rule/names.hpp"

#include "isohydric/diag/assert.hpp"
#include "isohydric/panel/context.hpp"
#include "isohydric/rule/detail/grammar.hpp"

#include <algorithm>
#include <iterator>

namespace isohydric::rule {
namespace {

using panel::ContextItem;

std::span<const std::string_view> codes_of(ContextItem item) {
    switch (item) {
    case ContextItem::specimen:
        return panel::k_specimen_names;
    case ContextItem::population:
        return panel::k_population_names;
    case ContextItem::onset:
        return panel::k_onset_names;
    case ContextItem::age:
    case ContextItem::altitude:
    case ContextItem::baseline_pco2:
    case ContextItem::baseline_hco3:
    case ContextItem::near:
        break;
    }
    return {};
}

}  // namespace

std::string written_name(std::span<const std::string> path) {
    std::string written;
    for (const std::string& part : path) {
        written += written.empty() ? "" : ".";
        written += is_plain_identifier(part) ? part : "`" + part + "`";
    }
    return written;
}

std::optional<NamedSymbol> find_context_item(std::string_view item) {
    const auto& names = panel::k_context_item_names;
    const auto index = static_cast<std::size_t>(
        std::distance(names.begin(), std::find(names.begin(), names.end(), item)));
    if (index == names.size()) {
        return std::nullopt;
    }
    NamedSymbol named;
    named.symbol = {SymbolKind::context, static_cast<std::uint32_t>(index), {}};
    named.codes = codes_of(static_cast<ContextItem>(index));
    if (const std::string_view code = panel::k_context_item_units[index]; !code.empty()) {
        const diag::Result<units::Unit> unit = units::parse_unit(code);
        ISOHYDRIC_ASSERT(unit.has_value());
        named.type = Type::number;
        named.unit = *unit;
        return named;
    }
    named.type = named.codes.empty() ? Type::truth : Type::code;
    named.never_empty = true;
    return named;
}

}  // namespace isohydric::rule
