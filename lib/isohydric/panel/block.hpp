// Panels as columns: what the engine evaluates. Missing is a mask, never a number.
#pragma once

#include "isohydric/panel/analyte.hpp"
#include "isohydric/panel/panel.hpp"

#include <array>
#include <cstddef>
#include <cstdint>
#include <vector>

namespace isohydric::panel {

/// A column of numbers with its missing mask (1: missing), as long as the block has rows. Values under the mask are 0.
struct NumberColumn {
    std::vector<double> values;
    std::vector<std::uint8_t> missing;
};

/// Columns for up to `capacity` panels.
class PanelBlock {
  public:
    explicit PanelBlock(std::size_t capacity);

    [[nodiscard]] std::size_t capacity() const { return capacity_; }

    [[nodiscard]] std::size_t size() const { return size_; }

    void clear();
    /// Appends a row. `near`: evaluate bands widened by the margin of the measurement. A censored value is missing.
    void push(const Panel& panel, bool near = false);

    [[nodiscard]] const NumberColumn& analyte(Analyte analyte) const {
        return values_[index_of(analyte)];
    }

    [[nodiscard]] const NumberColumn& rounding(Analyte analyte) const {
        return rounding_[index_of(analyte)];
    }

    /// age, altitude, baseline values.
    [[nodiscard]] const NumberColumn& context_number(ContextItem item) const;
    /// specimen, population, onset as their numbers; near as 0 or 1.
    [[nodiscard]] const std::vector<std::uint8_t>& context_code(ContextItem item) const;

  private:
    std::size_t capacity_;
    std::size_t size_ = 0;
    std::array<NumberColumn, k_analyte_count> values_;
    std::array<NumberColumn, k_analyte_count> rounding_;
    std::array<NumberColumn, k_context_item_names.size()> context_numbers_;
    std::array<std::vector<std::uint8_t>, k_context_item_names.size()> context_codes_;
};

}  // namespace isohydric::panel
