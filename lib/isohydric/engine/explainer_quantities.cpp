// Numbers: a quantity's formula in words and in values, down to what was measured.
#include "isohydric/engine/explainer.hpp"
#include "isohydric/engine/models.hpp"
#include "isohydric/num/rounding.hpp"
#include "isohydric/rule/plain_text.hpp"
#include "isohydric/rule/walk.hpp"

#include <algorithm>

namespace isohydric::engine {

namespace {

/// Most decimals of a model's input that is no name: constants such as a solubility have four.
constexpr int k_model_input_decimals = 4;

/// Digits of an expression of which no name knows any.
constexpr int k_default_decimals = 2;

[[nodiscard]] bool is_bare(const rule::Expression& expression, rule::SymbolKind kind) {
    return expression.kind == rule::NodeKind::name && expression.symbol.kind == kind;
}

}  // namespace

/// One side of a comparison that cannot be made.
void Explainer::tell_unknown(const rule::Expression& side, int depth) {
    if (!view_.number(side)) {
        add(in_words(side) + " unknown" + needs_text(needs_.of(side)), depth);
    }
}

/// A number that is not a truth: what it is, then the quantities in it.
void Explainer::tell_number(const rule::Expression& expression, int depth) {
    const std::optional<double> value = view_.number(expression);
    if (!value) {
        return tell_unknown(expression, depth);
    }
    add(in_words(expression) + " = " +
            num::format_decimals(*value, view_.decimals(expression).value_or(k_default_decimals)),
        depth,
        limit_sources(expression));
    tell_quantities(expression, depth + 1);
}

/// The quantities of an expression; of an `iif` those of the side that counts.
void Explainer::tell_quantities(const rule::Expression& expression, int depth) {
    if (expression.kind == rule::NodeKind::iif) {
        const bool yes = view_.truth(*expression.children[0]) == Truth::yes;
        return tell_quantities(*expression.children[yes ? 1 : 2], depth);
    }
    if (is_bare(expression, rule::SymbolKind::quantity)) {
        return tell_quantity(expression.symbol.index, depth);
    }
    for (const rule::ExpressionPtr& child : expression.children) {
        tell_quantities(*child, depth);
    }
}

void Explainer::tell_quantity(std::uint32_t index, int depth) {
    if (!told_quantities_.insert(index).second) {
        return;
    }
    const rule::Symbol name{rule::SymbolKind::quantity, index, {}};
    const rule::Quantity& quantity = view_.rules().quantities[index];
    const std::optional<double> value = view_.number(name);
    if (!value) {
        return add(view_.label(name) + " unknown" + needs_text(needs_.of(name)), depth);
    }
    const std::string unit = view_.unit(name);
    const std::string result =
        num::format_decimals(*value, quantity.decimals) + (unit.empty() ? "" : " " + unit);
    if (quantity.model) {
        return tell_model(name, result, depth);
    }
    if (const rule::Alternative* alternative = view_.alternative(index)) {
        tell_formula(name, *alternative, result, depth);
    }
}

/// "anion gap corrected = anion gap + 0.25 x (40 - albumin) = 22.4 + 0.25 x (40 - 20) = 27.4 mmol/L"
void Explainer::tell_formula(const rule::Symbol& name,
                             const rule::Alternative& alternative,
                             const std::string& result,
                             int depth) {
    const rule::Quantity& quantity = view_.rules().quantities[name.index];
    std::vector<rule::ExpressionPtr> conditions;
    const rule::ExpressionPtr formula = chosen_sides(alternative.formula, conditions);
    const bool one_of_several = quantity.alternatives.size() > 1 && !alternative.from.empty();
    const std::string from = one_of_several ? " (" + alternative.from + ")" : "";
    std::vector<rule::Citation> sources = quantity.head.sources;
    const std::vector<rule::Citation> of_limits = limit_sources(*formula);
    sources.insert(sources.end(), of_limits.begin(), of_limits.end());

    if (is_bare(*formula, rule::SymbolKind::analyte)) {
        if (one_of_several) {
            add(view_.label(name) + " " + result + from, depth, std::move(sources));
        }
    } else {
        add(view_.label(name) + " = " + formula_text(*formula, view_.label(name)) + result + from,
            depth,
            std::move(sources));
    }
    for (const rule::ExpressionPtr& condition : conditions) {
        tell(*condition, depth + 1);
    }
    tell_quantities(*formula, depth + 1);
}

/// "anion gap + albumin term = 22.4 + 5.0 = ", as much of it as says more than the label and the result.
std::string Explainer::formula_text(const rule::Expression& formula,
                                    const std::string& label) const {
    if (rule::names_of(formula).empty()) {
        return "";
    }
    const std::string words = in_words(formula);
    const std::string values =
        formula.kind == rule::NodeKind::name ? "" : in_values(formula) + " = ";
    return words == label ? values : words + " = " + values;
}

/// "HCO3 = carbonicAcid.bicarbonate(pH 7.21, pCO2 29.0, solubility 0.0307, pK 6.1) = 11.2 mmol/L"
void Explainer::tell_model(const rule::Symbol& name, const std::string& result, int depth) {
    const rule::Quantity& quantity = view_.rules().quantities[name.index];
    const rule::ModelSignature& signature = model_signatures()[quantity.model->model];
    std::string inputs;
    for (std::size_t input = 0; input < signature.inputs.size(); ++input) {
        const rule::Expression& expression = *quantity.model->inputs[input];
        const double value = view_.number(expression).value_or(0.0);
        const int digits = expression.kind == rule::NodeKind::name
                               ? view_.digits(expression.symbol, value)
                               : digits_needed(value, 0, k_model_input_decimals);
        inputs += (input == 0 ? "" : ", ") + signature.inputs[input].name + " " +
                  num::format_decimals(value, digits);
    }
    add(view_.label(name) + " = " + signature.id + "(" + inputs + ") = " + result,
        depth,
        quantity.head.sources);
    for (const rule::ExpressionPtr& input : quantity.model->inputs) {
        tell_quantities(*input, depth + 1);
    }
}

/// The expression with each `iif` replaced by the side that counts; its conditions are added to `conditions`.
rule::ExpressionPtr Explainer::chosen_sides(const rule::ExpressionPtr& expression,
                                            std::vector<rule::ExpressionPtr>& conditions) const {
    if (expression->kind == rule::NodeKind::iif) {
        conditions.push_back(expression->children[0]);
        const bool yes = view_.truth(*expression->children[0]) == Truth::yes;
        return chosen_sides(expression->children[yes ? 1 : 2], conditions);
    }
    const std::size_t conditions_before = conditions.size();
    rule::Expression copy = *expression;
    for (rule::ExpressionPtr& child : copy.children) {
        child = chosen_sides(child, conditions);
    }
    return conditions.size() == conditions_before
               ? expression
               : std::make_shared<const rule::Expression>(std::move(copy));
}

std::string Explainer::in_words(const rule::Expression& expression) const {
    return rule::plain_text(
        expression, [this](const rule::Expression& name) { return view_.label(name.symbol); });
}

std::string Explainer::in_values(const rule::Expression& expression) const {
    return rule::plain_text(
        expression, [this](const rule::Expression& name) { return value_text(name.symbol); });
}

/// A value as it stands in a formula: a negative one in parentheses.
std::string Explainer::value_text(const rule::Symbol& symbol) const {
    if (RowView::is_truth(symbol)) {
        return std::string(truth_text(view_.truth(symbol)));
    }
    const std::optional<double> value = view_.number(symbol);
    if (!value) {
        return "unknown";
    }
    const std::string text = num::format_decimals(*value, view_.digits(symbol, *value));
    return text.starts_with('-') ? "(" + text + ")" : text;
}

/// ": needs sodium, chloride", or nothing where no analyte would help.
std::string Explainer::needs_text(const AnalyteSet& analytes) const {
    std::string text;
    for (const panel::Analyte analyte : analytes) {
        const rule::Symbol name{rule::SymbolKind::analyte, static_cast<std::uint32_t>(analyte), {}};
        text += (text.empty() ? ": needs " : ", ") + view_.label(name);
    }
    return text;
}

}  // namespace isohydric::engine
