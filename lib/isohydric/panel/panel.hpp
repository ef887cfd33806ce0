// One panel: values in canonical units, each of which remembers how it was entered, and the context of the specimen.
#pragma once

#include "isohydric/panel/analyte.hpp"
#include "isohydric/panel/context.hpp"

#include <array>
#include <optional>
#include <string>
#include <vector>

namespace isohydric::panel {

enum class Censoring : std::uint8_t { none, below, above };

/// One entered value.
struct Entered {
    double value{};          ///< canonical unit
    double half_digit{};     ///< half a unit of the last printed digit, canonical unit
    std::string as_entered;  ///< "3.9 kPa"
    std::string note;  ///< what was understood beyond the plain reading: "unit taken from pCO2"
    Censoring censoring = Censoring::none;
};

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
