#include "isohydric/rule/detail/conversion.hpp"

#include "isohydric/rule/detail/grammar.hpp"

#include <algorithm>
#include <utility>

namespace isohydric::rule {
namespace {

std::shared_ptr<Expression> copy_in(const Expression& original, const units::Unit& unit) {
    auto copy = std::make_shared<Expression>(original);
    copy->unit = unit;
    return copy;
}

ExpressionPtr multiplied(const ExpressionPtr& number, const units::Unit& to) {
    auto factor = std::make_shared<Expression>();
    factor->kind = NodeKind::number_literal;
    factor->place = number->place;
    factor->unit = factor->written_unit = to / number->unit;
    factor->number = units::factor_between(number->unit, to);
    auto product = std::make_shared<Expression>();
    product->kind = NodeKind::multiply;
    product->place = number->place;
    product->unit = to;
    product->children = {number, std::move(factor)};
    return product;
}

/// A literal times the factor between two units that need not be its own: a coefficient takes over its product's factor.
ExpressionPtr scaled(const ExpressionPtr& literal, const units::Unit& from, const units::Unit& to) {
    auto copy = copy_in(*literal, literal->unit * (to / from));
    copy->number *= units::factor_between(from, to);
    return copy;
}

bool is_literal(const ExpressionPtr& node) {
    return node->kind == NodeKind::number_literal;
}

/// A product or quotient in another unit by way of its coefficient, or null if it has none.
ExpressionPtr through_coefficient(const Expression& product, const units::Unit& to) {
    const bool second = product.kind == NodeKind::multiply && is_literal(product.children[1]);
    const std::size_t coefficient = second ? 1 : 0;
    if (!is_literal(product.children[coefficient])) {
        return nullptr;
    }
    auto copy = copy_in(product, to);
    ExpressionPtr& literal = copy->children[coefficient];
    literal = scaled(literal, product.unit, to);
    return copy;
}

/// The same operation with the children from `first` on in the unit `to`.
ExpressionPtr with_children(const Expression& node, std::size_t first, const units::Unit& to) {
    auto copy = copy_in(node, to);
    for (std::size_t i = first; i < copy->children.size(); ++i) {
        copy->children[i] = converted(copy->children[i], to);
    }
    return copy;
}

/// How much a reader would want to see the number in its own unit: a name 2, a literal 1, a computed one 0.
int rank(const Expression& number) {
    const Family family = family_of(number.kind);
    if (family == Family::name || family == Family::number_literal) {
        return family == Family::name ? 2 : 1;
    }
    const bool keeps_units =
        family == Family::unary || family == Family::sum || family == Family::choice;
    int highest = 0;
    for (std::size_t i = family == Family::choice ? 1 : 0;
         keeps_units && i < number.children.size();
         ++i) {
        highest = std::max(highest, rank(*number.children[i]));
    }
    return highest;
}

}  // namespace

ExpressionPtr converted(const ExpressionPtr& number, const units::Unit& to) {
    if (number->unit == to) {
        return number;
    }
    const Family family = family_of(number->kind);
    if (family == Family::number_literal) {
        auto copy = copy_in(*number, to);
        copy->number = units::convert(number->number, number->unit, to);
        return copy;
    }
    if (family == Family::choice) {
        return with_children(*number, 1, to);
    }
    // A difference of temperatures is in another unit than they are.
    const bool of_terms = (family == Family::sum || family == Family::unary) &&
                          number->children[0]->unit == number->unit;
    if (of_terms) {
        return with_children(*number, 0, to);
    }
    ExpressionPtr product = family == Family::product ? through_coefficient(*number, to) : nullptr;
    return product ? product : multiplied(number, to);
}

const units::Unit& common_unit(const Expression& left, const Expression& right) {
    return rank(left) >= rank(right) ? left.unit : right.unit;
}

}  // namespace isohydric::rule
