// The walk over what is unknown: a known part needs nothing, an unknown one what its own parts need.
#include "isohydric/engine/needs.hpp"

#include "isohydric/engine/explain.hpp"

namespace isohydric::engine {

AnalyteSet Needs::of(const rule::Expression& expression) {
    if (is_known(expression)) {
        return {};
    }
    if (expression.kind == rule::NodeKind::name) {
        return of(expression.symbol);
    }
    if (expression.kind == rule::NodeKind::iif) {
        return of_choice(expression);
    }
    AnalyteSet all;
    for (const rule::ExpressionPtr& child : expression.children) {
        all.merge(of(*child));
    }
    return all;
}

/// An unknown condition, else the side that it chose.
AnalyteSet Needs::of_choice(const rule::Expression& iif) {
    const Truth condition = view_.truth(*iif.children[0]);
    if (condition == Truth::unknown) {
        return of(*iif.children[0]);
    }
    return of(*iif.children[condition == Truth::yes ? 1 : 2]);
}

AnalyteSet Needs::of(const rule::Symbol& name) {
    switch (name.kind) {
    case rule::SymbolKind::analyte:
    case rule::SymbolKind::rounding:
        return view_.number(name) ? AnalyteSet{}
                                  : AnalyteSet{static_cast<panel::Analyte>(name.index)};
    case rule::SymbolKind::quantity:
        return of_quantity(name.index);
    case rule::SymbolKind::condition:
        return of(*view_.rules().conditions[name.index].when);
    case rule::SymbolKind::finding:
        return of_finding(name.index);
    case rule::SymbolKind::limit:
    case rule::SymbolKind::context:
        break;  // no analyte would help
    }
    return {};
}

bool Needs::is_known(const rule::Expression& expression) const {
    if (expression.type == rule::Type::code) {
        return true;
    }
    return expression.type == rule::Type::number ? view_.number(expression).has_value()
                                                 : view_.truth(expression) != Truth::unknown;
}

AnalyteSet Needs::of_quantity(std::uint32_t index) {
    if (view_.number(rule::Symbol{rule::SymbolKind::quantity, index, {}})) {
        return {};
    }
    if (const auto known = quantities_.find(index); known != quantities_.end()) {
        return known->second;
    }
    const rule::Quantity& quantity = view_.rules().quantities[index];
    AnalyteSet fewest;
    if (quantity.model) {
        for (const rule::ExpressionPtr& input : quantity.model->inputs) {
            fewest.merge(of(*input));
        }
    }
    for (const rule::Alternative& alternative : quantity.alternatives) {
        AnalyteSet lacking = of(*alternative.formula);
        if (!lacking.empty() && (fewest.empty() || lacking.size() < fewest.size())) {
            fewest = std::move(lacking);
        }
    }
    return quantities_.emplace(index, std::move(fewest)).first->second;
}

/// What its condition and the findings that take precedence need, as far as they leave it unknown.
AnalyteSet Needs::of_finding(std::uint32_t index) {
    if (view_.truth(rule::Symbol{rule::SymbolKind::finding, index, {}}) != Truth::unknown) {
        return {};
    }
    const rule::Finding& finding = view_.rules().findings[index];
    AnalyteSet all = of(*finding.when);
    for (const std::uint32_t exception : finding.unless) {
        all.merge(of_finding(exception));
    }
    return all;
}

namespace {

[[nodiscard]] std::vector<panel::Analyte> listed(const AnalyteSet& analytes) {
    return {analytes.begin(), analytes.end()};
}

}  // namespace

std::vector<panel::Analyte> needs(const Program& program,
                                  const Scratch& scratch,
                                  std::size_t row,
                                  const rule::Expression& expression) {
    const RowView view(program, scratch, row);
    return listed(Needs(view).of(expression));
}

std::vector<panel::Analyte>
needs(const Program& program, const Scratch& scratch, std::size_t row, const rule::Symbol& name) {
    const RowView view(program, scratch, row);
    return listed(Needs(view).of(name));
}

}  // namespace isohydric::engine
