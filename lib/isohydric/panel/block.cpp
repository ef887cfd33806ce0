#include "isohydric/panel/block.hpp"

#include "isohydric/diag/assert.hpp"

namespace isohydric::panel {

namespace {

void push_number(NumberColumn& column, const std::optional<double>& value) {
    column.values.push_back(value.value_or(0));
    column.missing.push_back(value ? 0 : 1);
}

void reserve(NumberColumn& column, std::size_t rows) {
    column.values.reserve(rows);
    column.missing.reserve(rows);
}

void clear_column(NumberColumn& column) {
    column.values.clear();
    column.missing.clear();
}

constexpr std::size_t index_of(ContextItem item) {
    return static_cast<std::size_t>(item);
}

}  // namespace

PanelBlock::PanelBlock(std::size_t capacity) : capacity_(capacity) {
    for (std::size_t i = 0; i < k_analyte_count; ++i) {
        reserve(values_[i], capacity);
        reserve(rounding_[i], capacity);
    }
    for (std::size_t i = 0; i < k_context_item_names.size(); ++i) {
        reserve(context_numbers_[i], capacity);
        context_codes_[i].reserve(capacity);
    }
}

void PanelBlock::clear() {
    size_ = 0;
    for (std::size_t i = 0; i < k_analyte_count; ++i) {
        clear_column(values_[i]);
        clear_column(rounding_[i]);
    }
    for (std::size_t i = 0; i < k_context_item_names.size(); ++i) {
        clear_column(context_numbers_[i]);
        context_codes_[i].clear();
    }
}

void PanelBlock::push(const Panel& panel, bool near) {
    ISOHYDRIC_ASSERT(size_ < capacity_);
    for (std::size_t i = 0; i < k_analyte_count; ++i) {
        const std::optional<Entered>& entered = panel.values[i];
        const bool known = entered && entered->censoring == Censoring::none;
        push_number(values_[i], known ? std::optional{entered->value} : std::nullopt);
        push_number(rounding_[i], known ? std::optional{entered->half_digit} : std::nullopt);
    }
    const auto number = [this](ContextItem item, const std::optional<double>& value) {
        push_number(context_numbers_[index_of(item)], value);
    };
    number(ContextItem::age, panel.context.age_a);
    number(ContextItem::altitude, panel.context.altitude_m);
    number(ContextItem::baseline_pco2, panel.context.baseline_pco2_mmHg);
    number(ContextItem::baseline_hco3, panel.context.baseline_hco3_mmol_L);
    const auto code = [this](ContextItem item, auto value) {
        context_codes_[index_of(item)].push_back(static_cast<std::uint8_t>(value));
    };
    code(ContextItem::specimen, panel.context.specimen);
    code(ContextItem::population, panel.context.population);
    code(ContextItem::onset, panel.context.onset);
    code(ContextItem::near, near);
    ++size_;
}

const NumberColumn& PanelBlock::context_number(ContextItem item) const {
    ISOHYDRIC_ASSERT(context_numbers_[index_of(item)].values.size() == size_);
    return context_numbers_[index_of(item)];
}

const std::vector<std::uint8_t>& PanelBlock::context_code(ContextItem item) const {
    ISOHYDRIC_ASSERT(context_codes_[index_of(item)].size() == size_);
    return context_codes_[index_of(item)];
}

}  // namespace isohydric::panel
