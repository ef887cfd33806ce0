// Brings a checked number to another unit of its dimension, so that evaluation needs plain numbers only.
#pragma once

#include "isohydric/rule/expression.hpp"

namespace isohydric::rule {

/// `number` in the unit `to`. Requires commensurable units, and equal ones if a zero point differs, unless `number` is a
/// literal. The factor goes into literals where there are any: a literal itself, the literal of a product or quotient,
/// the terms of a sum; elsewhere the number is multiplied by a literal without text.
[[nodiscard]] ExpressionPtr converted(const ExpressionPtr& number, const units::Unit& to);

/// The unit to which both are best brought: a name's before a literal's before a computed one, else the left one's.
[[nodiscard]] const units::Unit& common_unit(const Expression& left, const Expression& right);

}  // namespace isohydric::rule
