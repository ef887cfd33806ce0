// Units as rule files write them.
#pragma once

#include "isohydric/diag/json.hpp"
#include "isohydric/diag/report.hpp"
#include "isohydric/units/unit.hpp"

#include <optional>

namespace isohydric::rule::detail {

/// The unit that a string names; reports one that is no UCUM code.
[[nodiscard]] std::optional<units::Unit> read_unit(const diag::Json& string_value,
                                                   diag::Report& report);

/// A quantity such as `28 d`, converted to `unit`; reports one that cannot be.
[[nodiscard]] std::optional<double>
read_quantity_text(const diag::Json& string_value, const units::Unit& unit, diag::Report& report);

}  // namespace isohydric::rule::detail
