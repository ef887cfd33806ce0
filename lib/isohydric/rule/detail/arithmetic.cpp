#include "isohydric/rule/detail/arithmetic.hpp"

#include "isohydric/diag/assert.hpp"
#include "isohydric/rule/detail/conversion.hpp"
#include "isohydric/rule/detail/grammar.hpp"
#include "isohydric/rule/plain_text.hpp"

#include <array>
#include <charconv>
#include <cmath>
#include <optional>
#include <utility>

#include <fmt/format.h>

namespace isohydric::rule {
namespace {

constexpr std::size_t k_brief_limit = 40;

ExpressionPtr
number_node(const Syntax& syntax, const units::Unit& unit, std::vector<ExpressionPtr> children) {
    auto node = std::make_shared<Expression>();
    node->kind = syntax.kind;
    node->type = Type::number;
    node->place = syntax.place;
    node->unit = unit;
    node->children = std::move(children);
    return node;
}

bool is_dimensionless(const units::Unit& unit) {
    return unit.dimension() == units::Dimension{};
}

bool is_bare_literal(const Expression& value) {
    return value.kind == NodeKind::number_literal && value.written_unit == units::one();
}

/// A unit in a message: `in mmol/L`, `without a unit`.
std::string in_words(const units::Unit& unit) {
    return unit == units::one() ? "without a unit" : "in " + unit.code();
}

/// The integer that a literal, negated or not, is written as.
std::optional<int> integer_literal(const Expression& value) {
    if (value.kind == NodeKind::negate) {
        const std::optional<int> inner = integer_literal(*value.children[0]);
        return inner ? std::optional(-*inner) : std::nullopt;
    }
    int integer = 0;
    const char* const end = value.text.data() + value.text.size();
    const auto [stop, error] = std::from_chars(value.text.data(), end, integer);
    const bool whole =
        is_bare_literal(value) && error == std::errc{} && stop == end && !value.text.empty();
    return whole ? std::optional(integer) : std::nullopt;
}

std::string bare_number_message(const Expression& bare, const Expression& other) {
    const std::string& code = other.unit.code();
    std::string message = fmt::format(
        "{0} has no unit, but {1} is in {2}; write {0} '{2}'", bare.text, brief(other), code);
    if (units::commensurable(bare.unit, other.unit)) {
        message += fmt::format(", or {:.15g} '{}' if it is a fraction",
                               units::convert(bare.number, bare.unit, other.unit),
                               code);
    }
    return message;
}

/// The unit, in base units, whose square has the given dimension; none if that has an odd exponent.
std::optional<units::Unit> root_unit(const units::Dimension& square) {
    const std::array parts{std::pair{"m", square.length},
                           std::pair{"g", square.mass},
                           std::pair{"s", square.time},
                           std::pair{"K", square.temperature},
                           std::pair{"mol", square.amount}};
    units::Unit root = units::one();
    for (const auto& [atom, exponent] : parts) {
        if (exponent % 2 != 0) {
            return std::nullopt;
        }
        if (exponent != 0) {
            root = root * units::power(*units::parse_unit(atom), exponent / 2);
        }
    }
    return root;
}

}  // namespace

std::string brief(const Expression& expression) {
    std::string text = plain_text(expression, [](const Expression& name) { return name.text; });
    return text.size() <= k_brief_limit ? text : "this expression";
}

ExpressionPtr Arithmetic::operation(const Syntax& syntax,
                                    const std::vector<ExpressionPtr>& operands) {
    switch (family_of(syntax.kind)) {
    case Family::sum:
        return sum(syntax, operands[0], operands[1]);
    case Family::product:
        return product(syntax, operands[0], operands[1]);
    case Family::unary:
        return same_unit(syntax, operands[0]);
    case Family::power:
        return power(syntax, operands[0], operands[1]);
    case Family::root:
        return square_root(syntax, operands[0]);
    case Family::plain_function:
        return plain_function(syntax, operands);
    case Family::order:
    case Family::equality:
        return comparison(syntax, operands[0], operands[1]);
    case Family::number_literal:
    case Family::truth_literal:
    case Family::code_literal:
    case Family::name:
    case Family::logic:
    case Family::presence:
    case Family::choice:
        break;
    }
    ISOHYDRIC_NEVER();
}

ExpressionPtr Arithmetic::comparison(const Syntax& syntax,
                                     const ExpressionPtr& left,
                                     const ExpressionPtr& right) {
    if (!agree(*left, *right, syntax.mark)) {
        return nullptr;
    }
    const units::Unit unit = common_unit(*left, *right);
    auto node = std::make_shared<Expression>();
    node->kind = syntax.kind;
    node->type = Type::truth;
    node->place = syntax.place;
    node->children = {converted(left, unit), converted(right, unit)};
    return node;
}

ExpressionPtr
Arithmetic::sum(const Syntax& syntax, const ExpressionPtr& left, const ExpressionPtr& right) {
    if (!agree(*left, *right, syntax.mark)) {
        return nullptr;
    }
    const units::Unit unit = common_unit(*left, *right);
    if (!unit.has_offset()) {
        return number_node(syntax, unit, {converted(left, unit), converted(right, unit)});
    }
    // A difference of temperatures is a number of kelvins; a sum of temperatures means nothing.
    const units::Unit kelvin = *units::parse_unit("K");
    if (syntax.kind == NodeKind::subtract && units::factor_between(unit, kelvin) == 1) {
        return number_node(syntax, kelvin, {converted(left, unit), converted(right, unit)});
    }
    report_.error("expression-temperature",
                  syntax.mark,
                  "temperatures have no sum; a difference of two in Cel is in K");
    return nullptr;
}

ExpressionPtr
Arithmetic::product(const Syntax& syntax, const ExpressionPtr& left, const ExpressionPtr& right) {
    if (!without_zero_point(*left, syntax.mark) || !without_zero_point(*right, syntax.mark)) {
        return nullptr;
    }
    const units::Unit unit =
        syntax.kind == NodeKind::multiply ? left->unit * right->unit : left->unit / right->unit;
    ExpressionPtr node = number_node(syntax, unit, {left, right});
    return in_range(*node) ? node : nullptr;
}

ExpressionPtr Arithmetic::same_unit(const Syntax& syntax, const ExpressionPtr& value) {
    return without_zero_point(*value, syntax.mark) ? number_node(syntax, value->unit, {value})
                                                   : nullptr;
}

ExpressionPtr Arithmetic::plain_function(const Syntax& syntax,
                                         const std::vector<ExpressionPtr>& operands) {
    std::vector<ExpressionPtr> plain;
    for (const ExpressionPtr& operand : operands) {
        if (!dimensionless(*operand, syntax.text)) {
            return nullptr;
        }
        plain.push_back(converted(operand, units::one()));
    }
    return number_node(syntax, units::one(), std::move(plain));
}

ExpressionPtr
Arithmetic::power(const Syntax& syntax, const ExpressionPtr& base, const ExpressionPtr& exponent) {
    if (is_dimensionless(base->unit)) {
        return plain_function(syntax, {base, exponent});
    }
    if (!without_zero_point(*base, syntax.mark)) {
        return nullptr;
    }
    const std::optional<int> integer = integer_literal(*exponent);
    if (!integer || std::abs(*integer) > units::k_largest_exponent) {
        report_.error("expression-exponent",
                      exponent->place,
                      fmt::format("{} is {}; its exponent must be written out as an integer from "
                                  "-{} to {}",
                                  brief(*base),
                                  in_words(base->unit),
                                  units::k_largest_exponent,
                                  units::k_largest_exponent));
        return nullptr;
    }
    ExpressionPtr node = number_node(syntax, units::power(base->unit, *integer), {base, exponent});
    return in_range(*node) ? node : nullptr;
}

ExpressionPtr Arithmetic::square_root(const Syntax& syntax, const ExpressionPtr& value) {
    if (!without_zero_point(*value, syntax.mark)) {
        return nullptr;
    }
    const std::optional<units::Unit> root = root_unit(value->unit.dimension());
    if (!root) {
        report_.error("expression-exponent",
                      syntax.mark,
                      fmt::format("{} is {}, which is the square of no unit",
                                  brief(*value),
                                  in_words(value->unit)));
        return nullptr;
    }
    return number_node(syntax, *root, {converted(value, units::power(*root, 2))});
}

ExpressionPtr Arithmetic::choice(const Syntax& syntax,
                                 const ExpressionPtr& condition,
                                 const ExpressionPtr& first,
                                 const ExpressionPtr& second) {
    if (!agree(*first, *second, syntax.mark)) {
        return nullptr;
    }
    const units::Unit unit = common_unit(*first, *second);
    return number_node(syntax, unit, {condition, converted(first, unit), converted(second, unit)});
}

ExpressionPtr Arithmetic::in_unit(const ExpressionPtr& number, const units::Unit& wanted) {
    Expression owner;
    owner.kind = NodeKind::name;
    owner.text = "the entry";
    owner.unit = wanted;
    return agree(*number, owner, number->place) ? converted(number, wanted) : nullptr;
}

bool Arithmetic::agree(const Expression& left, const Expression& right, const diag::Place& place) {
    if (left.unit == right.unit) {
        return true;
    }
    const bool left_bare = is_bare_literal(left);
    if (left_bare || is_bare_literal(right)) {
        const Expression& bare = left_bare ? left : right;
        const Expression& other = left_bare ? right : left;
        report_.error("expression-bare-number", bare.place, bare_number_message(bare, other));
        return false;
    }
    if (!units::commensurable(left.unit, right.unit)) {
        report_.error("expression-dimension",
                      place,
                      fmt::format("{} is {}, but {} is {}; no factor brings one to the other",
                                  brief(left),
                                  in_words(left.unit),
                                  brief(right),
                                  in_words(right.unit)));
        return false;
    }
    const bool with_zeros = left.unit.has_offset() || right.unit.has_offset();
    const bool convertible =
        left.unit.has_offset() && right.unit.has_offset() &&
        (left.kind == NodeKind::number_literal || right.kind == NodeKind::number_literal);
    if (with_zeros && !convertible) {
        report_.error(
            "expression-temperature",
            place,
            fmt::format("{} is in {}, {} in {}; their zeros differ, give both in one unit",
                        brief(left),
                        left.unit.code(),
                        brief(right),
                        right.unit.code()));
        return false;
    }
    return true;
}

bool Arithmetic::without_zero_point(const Expression& value, const diag::Place& place) {
    if (!value.unit.has_offset()) {
        return true;
    }
    report_.error("expression-temperature",
                  place,
                  fmt::format("{} is in {}, whose zero is arbitrary; take a difference first: "
                              "(temperature - 37 'Cel'), which is in K",
                              brief(value),
                              value.unit.code()));
    return false;
}

bool Arithmetic::dimensionless(const Expression& value, const std::string& function) {
    if (is_dimensionless(value.unit)) {
        return true;
    }
    report_.error("expression-dimension",
                  value.place,
                  fmt::format("{} takes numbers without a unit, but {} is {}; divide by one of the "
                              "unit: / 1 '{}'",
                              function,
                              brief(value),
                              in_words(value.unit),
                              value.unit.code()));
    return false;
}

bool Arithmetic::in_range(const Expression& node) {
    if (!node.unit.in_range()) {
        report_.error("expression-dimension",
                      node.place,
                      "the unit of this product is beyond what is computed with");
    }
    return node.unit.in_range();
}

}  // namespace isohydric::rule
