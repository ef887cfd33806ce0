// What the rule tree says about each analyte: unit, customary units, aliases, limits, printed decimals, LOINC codes.
#pragma once

#include "isohydric/diag/report.hpp"
#include "isohydric/diag/source.hpp"
#include "isohydric/panel/analyte.hpp"
#include "isohydric/units/unit.hpp"

#include <array>
#include <memory>
#include <optional>
#include <span>
#include <string>
#include <string_view>
#include <vector>

namespace isohydric::panel {

/// A unit in which an analyte is customarily given, and how to get from it to the canonical unit.
struct CustomaryUnit {
    std::string ucum;   ///< `mg/dL`
    double factor = 1;  ///< canonical = written * factor + offset
    double offset = 0;
    std::string qualifier;  ///< `monomer`, `tetramer`: must be said with the value; empty: none
};

struct Limits {
    double low{}, high{};
};

/// One analyte.
struct AnalyteInfo {
    Analyte analyte{};
    std::string label;  ///< "ionised calcium"
    std::string
        expression_name;  ///< as rules name the entered value: `HCO3reported`, `pHmeasured`, `Na`
    units::Unit unit = units::one();
    std::string unit_text;  ///< as people write it: `mmHg`
    int decimals{};
    std::vector<std::string> aliases;
    std::vector<CustomaryUnit> customary;  ///< the canonical unit first
    std::optional<int> charge;             ///< for mEq/L
    Limits plausible;                      ///< outside: doubtful, a warning
    Limits accepted;                       ///< outside: a stop check
    std::vector<std::string> loinc;
    bool derived = false;  ///< reported by an analyser from other values (AG, BE ...)
};

/// All analytes, read from rules/analytes.json.
class Catalogue {
  public:
    std::array<AnalyteInfo, k_analyte_count> analytes;

    [[nodiscard]] const AnalyteInfo& operator[](Analyte analyte) const {
        return analytes[index_of(analyte)];
    }

    /// What an alias means: an analyte, and facts that the alias itself states (`PaCO2` is arterial, `BUN` is nitrogen,
    /// `base deficit` is minus base excess).
    struct Alias {
        Analyte analyte{};
        std::optional<std::string> specimen;  ///< a name of k_specimen_names
        std::optional<std::string> variant;   ///< `urea nitrogen`: selects its own customary units
        bool negated = false;
    };

    /// Case and separators do not matter where that is unambiguous (`ionised calcium`, `iCa`, `ica`).
    [[nodiscard]] std::optional<Alias> find(std::string_view name) const;
    /// The nearest known name, for an error message; empty if none is near.
    [[nodiscard]] std::string nearest(std::string_view name) const;
};

[[nodiscard]] std::shared_ptr<const Catalogue>
read_catalogue(std::shared_ptr<const diag::Source> source, diag::Report& report);

}  // namespace isohydric::panel
