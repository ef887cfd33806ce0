// Values and words of one row.
#include "isohydric/engine/row_view.hpp"

#include "isohydric/diag/assert.hpp"
#include "isohydric/engine/explain.hpp"
#include "isohydric/num/rounding.hpp"
#include "isohydric/rule/walk.hpp"

#include <algorithm>
#include <array>

namespace isohydric::engine {

namespace {

constexpr int k_most_decimals = 8;

[[nodiscard]] const panel::AnalyteInfo& analyte_info(const rule::RuleSet& rules,
                                                     const rule::Symbol& symbol) {
    return (*rules.catalogue)[static_cast<panel::Analyte>(symbol.index)];
}

[[nodiscard]] std::string context_label(std::uint32_t item) {
    switch (static_cast<panel::ContextItem>(item)) {
    case panel::ContextItem::baseline_pco2:
        return "baseline pCO2";
    case panel::ContextItem::baseline_hco3:
        return "baseline HCO3";
    case panel::ContextItem::near:
        return "margin of the measurement";
    case panel::ContextItem::specimen:
    case panel::ContextItem::population:
    case panel::ContextItem::onset:
    case panel::ContextItem::age:
    case panel::ContextItem::altitude:
        break;
    }
    return std::string(panel::k_context_item_names.at(item));
}

}  // namespace

Truth RowView::truth(const rule::Expression& expression) const {
    const std::optional<Slot> slot = program_.node(expression);
    ISOHYDRIC_ASSERT(slot.has_value());
    return scratch_.truth(*slot, row_);
}

std::optional<double> RowView::number(const rule::Expression& expression) const {
    const std::optional<Slot> slot = program_.node(expression);
    ISOHYDRIC_ASSERT(slot.has_value());
    return scratch_.value(*slot, row_);
}

std::optional<double> RowView::number(const rule::Symbol& symbol) const {
    const std::optional<Slot> slot = program_.name(symbol);
    return slot ? scratch_.value(*slot, row_) : std::nullopt;
}

Truth RowView::truth(const rule::Symbol& symbol) const {
    const std::optional<Slot> slot = program_.name(symbol);
    return slot ? scratch_.truth(*slot, row_) : Truth::unknown;
}

bool RowView::is_truth(const rule::Symbol& symbol) {
    return symbol.kind == rule::SymbolKind::condition || symbol.kind == rule::SymbolKind::finding ||
           symbol == rule::Symbol{rule::SymbolKind::context,
                                  static_cast<std::uint32_t>(panel::ContextItem::near),
                                  {}};
}

const rule::Interval* RowView::interval(std::uint32_t name) const {
    const std::optional<Slot> slot = program_.interval(name);
    const std::int32_t index = slot ? scratch_.index(*slot, row_) : -1;
    return index < 0 ? nullptr : &rules().intervals[static_cast<std::size_t>(index)];
}

const rule::Alternative* RowView::alternative(std::uint32_t quantity) const {
    const std::span<const Slot> slots = program_.alternatives(quantity);
    const auto present = std::find_if(
        slots.begin(), slots.end(), [this](Slot slot) { return !scratch_.missing(slot, row_); });
    if (present == slots.end()) {
        return nullptr;
    }
    return &rules()
                .quantities[quantity]
                .alternatives[static_cast<std::size_t>(present - slots.begin())];
}

std::string RowView::label(const rule::Symbol& symbol) const {
    switch (symbol.kind) {
    case rule::SymbolKind::analyte:
        return analyte_info(rules(), symbol).label;
    case rule::SymbolKind::rounding:
        return "rounding of " + analyte_info(rules(), symbol).label;
    case rule::SymbolKind::quantity: {
        const rule::Quantity& quantity = rules().quantities[symbol.index];
        return quantity.label.empty() ? quantity.head.id : quantity.label;
    }
    case rule::SymbolKind::condition:
        return rules().conditions[symbol.index].head.id;
    case rule::SymbolKind::finding: {
        const rule::Finding& finding = rules().findings[symbol.index];
        return finding.label.empty() ? finding.head.id : finding.label;
    }
    case rule::SymbolKind::limit: {
        constexpr std::array<const char*, 3> k_parts{"lower limit", "mid-value", "upper limit"};
        return std::string(k_parts.at(static_cast<std::size_t>(symbol.limit_part))) + " of " +
               rules().interval_names[symbol.index];
    }
    case rule::SymbolKind::context:
        return context_label(symbol.index);
    }
    ISOHYDRIC_NEVER();
}

std::string RowView::unit(const rule::Symbol& symbol) const {
    switch (symbol.kind) {
    case rule::SymbolKind::analyte:
    case rule::SymbolKind::rounding:
        return analyte_info(rules(), symbol).unit_text;
    case rule::SymbolKind::quantity:
        return unit_text(rules().quantities[symbol.index].unit.code());
    case rule::SymbolKind::limit:
        return unit_text(rules().interval_units[symbol.index].code());
    case rule::SymbolKind::context:
        return unit_text(panel::k_context_item_units.at(symbol.index));
    case rule::SymbolKind::condition:
    case rule::SymbolKind::finding:
        return {};
    }
    ISOHYDRIC_NEVER();
}

int RowView::digits(const rule::Symbol& symbol, double value) const {
    const int printed = decimals(symbol).value_or(0);
    if (symbol.kind == rule::SymbolKind::quantity) {
        return printed;
    }
    const bool entered = symbol.kind == rule::SymbolKind::analyte;
    return digits_needed(value, printed, entered ? printed + 1 : k_most_decimals);
}

std::optional<int> RowView::decimals(const rule::Symbol& symbol) const {
    if (symbol.kind == rule::SymbolKind::analyte) {
        return analyte_info(rules(), symbol).decimals;
    }
    if (symbol.kind == rule::SymbolKind::quantity) {
        return rules().quantities[symbol.index].decimals;
    }
    return std::nullopt;
}

std::optional<int> RowView::decimals(const rule::Expression& expression) const {
    std::optional<int> most;
    for (const rule::Symbol& name : rule::names_of(expression)) {
        most = std::max(most, decimals(name));  // none is less than any number
    }
    return most;
}

std::string_view truth_text(Truth truth) {
    constexpr std::array<std::string_view, 3> k_texts{"no", "yes", "unknown"};
    return k_texts.at(static_cast<std::size_t>(truth));
}

std::string unit_text(std::string_view ucum) {
    constexpr std::array<std::pair<std::string_view, std::string_view>, 5> k_spoken{
        {{"1", ""}, {"[pH]", ""}, {"Cel", "degC"}, {"a", "years"}, {"mosm/kg", "mOsm/kg"}}};
    for (const auto& [code, spoken] : k_spoken) {
        if (ucum == code) {
            return std::string(spoken);
        }
    }
    constexpr std::string_view k_code = "mm[Hg]";
    std::string text(ucum);
    for (auto at = text.find(k_code); at != std::string::npos; at = text.find(k_code)) {
        text.replace(at, k_code.size(), "mmHg");
    }
    return text;
}

int digits_needed(double value, int least, int most) {
    const std::string text = num::format_decimals(value, most);
    const std::size_t last = text.find_last_not_of('0');
    const int trailing_zeros = static_cast<int>(text.size() - 1 - last);
    return std::max(least, most - trailing_zeros);
}

std::string exactly(double value, int decimals) {
    return num::format_decimals(value, digits_needed(value, decimals, k_most_decimals));
}

int digits_apart(double value, int decimals, double against) {
    const bool equal = num::compare_at_8_decimals(value, against) == 0;
    int digits = decimals;
    while (digits < k_most_decimals && (num::format_decimals(value, digits) ==
                                        num::format_decimals(against, digits)) != equal) {
        ++digits;
    }
    return digits;
}

}  // namespace isohydric::engine
