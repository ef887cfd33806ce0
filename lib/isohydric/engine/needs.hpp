// Which missing analytes keep a value unknown.
#pragma once

#include "isohydric/engine/row_view.hpp"

#include <map>
#include <set>

namespace isohydric::engine {

using AnalyteSet = std::set<panel::Analyte>;

/// Walks what is unknown in one row. One object answers any number of questions about the row.
class Needs {
  public:
    explicit Needs(const RowView& view) : view_(view) {}

    [[nodiscard]] AnalyteSet of(const rule::Expression& expression);
    [[nodiscard]] AnalyteSet of(const rule::Symbol& name);

  private:
    [[nodiscard]] bool is_known(const rule::Expression& expression) const;
    [[nodiscard]] AnalyteSet of_quantity(std::uint32_t index);
    [[nodiscard]] AnalyteSet of_finding(std::uint32_t index);
    [[nodiscard]] AnalyteSet of_choice(const rule::Expression& iif);

    const RowView& view_;
    std::map<std::uint32_t, AnalyteSet> quantities_;
};

}  // namespace isohydric::engine
