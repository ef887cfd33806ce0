// Gathers the lines of a reason: the walk over an expression, and the text of a comparison and of a quantity.
#pragma once

#include "isohydric/engine/explain.hpp"
#include "isohydric/engine/needs.hpp"
#include "isohydric/engine/row_view.hpp"

#include <set>
#include <string>
#include <utility>
#include <vector>

namespace isohydric::engine {

/// Tells why; each comparison, quantity and finding once.
class Explainer {
  public:
    explicit Explainer(const RowView& view) : view_(view), needs_(view) {}

    void tell(const rule::Expression& expression, int depth);
    void tell(const rule::Symbol& name, int depth);
    void tell_number(const rule::Expression& expression, int depth);
    /// Why a finding has its state, without saying which finding it is.
    void tell_reasons(std::uint32_t index, int depth);

    [[nodiscard]] std::vector<Reason> take() { return std::move(lines_); }

  private:
    // Truths (explainer.cpp).
    void tell_parts(const rule::Expression& expression, int depth);
    void tell_comparison(const rule::Expression& expression, int depth);
    void tell_code(const rule::Expression& expression, int depth);
    void tell_presence(const rule::Expression& expression, int depth);
    void tell_condition(std::uint32_t index, int depth);
    void tell_finding(std::uint32_t index, int depth);
    void tell_exception(std::uint32_t index, Truth state, int depth);
    [[nodiscard]] std::string side_text(const rule::Expression& side,
                                        const rule::Expression& other) const;
    [[nodiscard]] std::string limit_text(const rule::Symbol& limit,
                                         const rule::Expression& other) const;

    // Numbers (explainer_quantities.cpp).
    void tell_unknown(const rule::Expression& side, int depth);
    void tell_quantities(const rule::Expression& expression, int depth);
    void tell_quantity(std::uint32_t index, int depth);
    void tell_formula(const rule::Symbol& name,
                      const rule::Alternative& alternative,
                      const std::string& result,
                      int depth);
    [[nodiscard]] std::string formula_text(const rule::Expression& formula,
                                           const std::string& label) const;
    void tell_model(const rule::Symbol& name, const std::string& result, int depth);
    [[nodiscard]] rule::ExpressionPtr
    chosen_sides(const rule::ExpressionPtr& expression,
                 std::vector<rule::ExpressionPtr>& conditions) const;
    [[nodiscard]] std::string in_words(const rule::Expression& expression) const;
    [[nodiscard]] std::string in_values(const rule::Expression& expression) const;
    [[nodiscard]] std::string value_text(const rule::Symbol& symbol) const;
    [[nodiscard]] std::string needs_text(const AnalyteSet& analytes) const;

    void add(std::string text, int depth, std::vector<rule::Citation> sources = {});
    /// The sources of the intervals whose limits `expression` uses.
    [[nodiscard]] std::vector<rule::Citation>
    limit_sources(const rule::Expression& expression) const;

    const RowView& view_;
    Needs needs_;
    std::vector<Reason> lines_;
    std::set<std::string> told_;
    std::set<std::uint32_t> told_quantities_;
    std::set<std::uint32_t> told_findings_;
};

}  // namespace isohydric::engine
