// UCUM codes as text: taken apart into terms, and written from terms.
#pragma once

#include "isohydric/units/unit.hpp"

#include <string>
#include <string_view>
#include <vector>

namespace isohydric::units::detail {

/// The terms of a code in the subset of parse_unit(); `1` and lone annotations give none. The error says which part is
/// wrong, without naming the whole code.
[[nodiscard]] diag::Result<std::vector<Term>> parse_terms(std::string_view code);

/// Equal atoms merged, what cancels dropped, in the order of first appearance.
[[nodiscard]] std::vector<Term> merge(std::vector<Term> terms);

/// A code for merged terms: `mm[Hg].L/mmol`, `/L`, `1`.
[[nodiscard]] std::string write_terms(const std::vector<Term>& terms);

}  // namespace isohydric::units::detail
