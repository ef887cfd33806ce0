// One panel: values in canonical units, each of which remembers how it was entered, and the context of the specimen.
#pragma once

#include "isohydric/panel/analyte.hpp"
#include "isohydric/panel/context.hpp"
#include "isohydric/units/quantity_text.hpp"

#include <array>
#include <optional>
#include <string>

namespace isohydric::panel {

/// Whether a value is a bound that the instrument could not pass.
using units::Censoring;

/// One entered value.
struct Entered {
    double value{};          ///< canonical unit
    double half_digit{};     ///< half a unit of the last printed digit, canonical unit
    std::string as_entered;  ///< "3.9 kPa"
    /// What was understood beyond the plain reading: "unit taken from pCO2"; several are joined by "; ".
    std::string note;
    Censoring censoring = Censoring::none;
};

/// The values of one specimen and what is known about it.
struct Panel {
    std::array<std::optional<Entered>, k_analyte_count> values;
    Context context;

    [[nodiscard]] const std::optional<Entered>& operator[](Analyte analyte) const {
        return values[index_of(analyte)];
    }

    [[nodiscard]] std::optional<Entered>& operator[](Analyte analyte) {
        return values[index_of(analyte)];
    }
};

}  // namespace isohydric::panel
