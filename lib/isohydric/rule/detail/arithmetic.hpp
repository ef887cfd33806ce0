// Checks operations on numbers: their units by the algebra of units, with every operand brought to the unit in which the
// operation is evaluated.
#pragma once

#include "isohydric/diag/report.hpp"
#include "isohydric/rule/expression.hpp"
#include "isohydric/rule/parser.hpp"

#include <string>
#include <vector>

namespace isohydric::rule {

/// An expression as a message quotes it: its plain text, or `this expression` where that is long.
[[nodiscard]] std::string brief(const Expression& expression);

/// Makes checked nodes out of checked numbers. Errors go to the report, and the result is then null.
class Arithmetic {
  public:
    explicit Arithmetic(diag::Report& report) : report_(report) {}

    /// Any operator or function that takes numbers only.
    [[nodiscard]] ExpressionPtr operation(const Syntax& syntax,
                                          const std::vector<ExpressionPtr>& operands);

    [[nodiscard]] ExpressionPtr
    comparison(const Syntax& syntax, const ExpressionPtr& left, const ExpressionPtr& right);

    [[nodiscard]] ExpressionPtr choice(const Syntax& syntax,
                                       const ExpressionPtr& condition,
                                       const ExpressionPtr& first,
                                       const ExpressionPtr& second);

    /// The number in the unit that its owner wants.
    [[nodiscard]] ExpressionPtr in_unit(const ExpressionPtr& number, const units::Unit& wanted);

  private:
    [[nodiscard]] ExpressionPtr
    sum(const Syntax& syntax, const ExpressionPtr& left, const ExpressionPtr& right);
    [[nodiscard]] ExpressionPtr
    product(const Syntax& syntax, const ExpressionPtr& left, const ExpressionPtr& right);
    [[nodiscard]] ExpressionPtr same_unit(const Syntax& syntax, const ExpressionPtr& value);
    [[nodiscard]] ExpressionPtr plain_function(const Syntax& syntax,
                                               const std::vector<ExpressionPtr>& operands);
    [[nodiscard]] ExpressionPtr
    power(const Syntax& syntax, const ExpressionPtr& base, const ExpressionPtr& exponent);
    [[nodiscard]] ExpressionPtr square_root(const Syntax& syntax, const ExpressionPtr& value);

    /// Whether both can be brought to one unit; reports if not.
    bool agree(const Expression& left, const Expression& right, const diag::Place& place);
    bool without_zero_point(const Expression& value, const diag::Place& place);
    bool dimensionless(const Expression& value, const std::string& function);
    bool in_range(const Expression& node);

    diag::Report& report_;
};

}  // namespace isohydric::rule
