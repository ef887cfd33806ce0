// From what a person wrote to an analyte's canonical unit: which units fit an analyte, and what a bare number may mean.
// Nothing is guessed: what can be read in two ways is refused, and both readings are said.
#pragma once

#include "isohydric/diag/result.hpp"
#include "isohydric/panel/catalogue.hpp"
#include "isohydric/units/quantity_text.hpp"
#include "isohydric/units/unit.hpp"

#include <optional>
#include <string>
#include <string_view>

namespace isohydric::panel {

/// canonical = written * factor + offset
struct Linear {
    double factor = 1;
    double offset = 0;
};

/// How a unit leads to the canonical unit of an analyte, which needs only its `unit` and `charge`. mEq/L is divided by the
/// charge; mass and amount need a molar mass; osmoles, and pH, are only what they are called.
[[nodiscard]] diag::Result<Linear> linear_to_canonical(const AnalyteInfo& info,
                                                       const units::Unit& from,
                                                       std::optional<double> molar_mass_g_mol);

/// What has to be known of a name and its value to find the unit.
struct WrittenValue {
    const AnalyteInfo& info;
    std::string_view name;     ///< as written, for messages
    std::string_view variant;  ///< as the alias says, else empty
    const units::NumberText& number;
};

/// The unit `written` (`kPa`, `mEq/L`, `mmol/L monomer`) as a unit of the analyte. The error says why it does not fit.
[[nodiscard]] diag::Result<CustomaryUnit> unit_as_written(const WrittenValue& value,
                                                          std::string_view written);

/// The unit of a number without one: where all customary units give equal values, or where the number is plausible in a
/// unit that needs no saying and in no other. The error shows every reading.
[[nodiscard]] diag::Result<CustomaryUnit> unit_of_bare(const WrittenValue& value);

/// The canonical unit, where no other customary unit would give another value: a column of such numbers needs no unit.
[[nodiscard]] std::optional<CustomaryUnit> unit_needless(const AnalyteInfo& info,
                                                         std::string_view variant);

/// One reading of a number: `9 mg/dL = 1.0 mmol/L`, or `9 mmol/L` in the canonical unit.
[[nodiscard]] std::string describe_reading(const WrittenValue& value, const CustomaryUnit& unit);

}  // namespace isohydric::panel
