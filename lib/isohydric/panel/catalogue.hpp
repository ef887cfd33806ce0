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

/// Sets of units that a site may name instead of listing its own.
inline constexpr std::array<std::string_view, 2> k_preset_names{"si", "conventional"};

/// A unit in which an analyte is customarily given, and how to get from it to the canonical unit.
struct CustomaryUnit {
    std::string ucum;   ///< `mg/dL`
    std::string text;   ///< as people write it: `mEq/L`; empty for pH and fractions
    double factor = 1;  ///< canonical = written * factor + offset
    double offset = 0;
    std::string qualifier;  ///< `monomer`, `tetramer`: must be said with the value; empty: none
    std::string variant;    ///< `urea nitrogen`: only under a name that means it; empty: the rest
    std::string note;       ///< said beside a value given so: "counted as mmol/L of urea"
    bool bare = false;      ///< a number without a unit may mean it; always so of the canonical one
    std::vector<std::string> presets;  ///< `si`, `conventional`: sites that use it

    /// Text and qualifier: `mmol/L monomer`.
    [[nodiscard]] std::string spoken() const {
        return qualifier.empty() ? text : text + " " + qualifier;
    }

    /// A difference. Where the factor is below one, its inverse divides, so that 95 % are 0.95 to the bit.
    [[nodiscard]] double scaled(double written) const {
        return factor < 1 ? written / (1 / factor) : written * factor;
    }

    [[nodiscard]] double to_canonical(double written) const { return scaled(written) + offset; }
};

/// Two ends, both inclusive.
struct Limits {
    double low{}, high{};

    [[nodiscard]] bool contain(double value) const { return value >= low && value <= high; }
};

/// A citation by its key, so that whoever holds the bibliography can look it up.
struct SourceRef {
    std::string ref;
    diag::Place place;
};

/// One analyte.
struct AnalyteInfo {
    Analyte analyte{};
    std::string label;  ///< "ionised calcium"
    /// As rules name the entered value: `HCO3reported`, `pHmeasured`, `Na`.
    std::string expression_name;
    units::Unit unit = units::one();
    std::string unit_text;  ///< as people write it: `mmHg`
    int decimals{};
    std::vector<std::string> aliases;
    std::vector<CustomaryUnit> customary;  ///< the canonical unit first
    std::optional<Analyte> unit_from;      ///< whose unit a number without one takes
    std::optional<int> charge;             ///< for mEq/L
    std::string no_charge;  ///< why mEq/L is refused: "its charge depends on pH"; empty: not said
    Limits plausible;       ///< outside: doubtful, a warning
    Limits accepted;        ///< outside: a stop check. Its sign says which values can exist at all
    std::vector<std::string> loinc;
    bool derived = false;  ///< reported by an analyser from other values (AG, BE ...)
    std::vector<SourceRef> sources;

    [[nodiscard]] std::string_view id() const { return id_of(analyte); }
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

        /// The variant, or empty; lives as long as the alias.
        [[nodiscard]] std::string_view variant_name() const {
            return variant ? std::string_view{*variant} : std::string_view{};
        }
    };

    /// A name and what it means.
    struct Name {
        std::string written;
        std::string folded;  ///< see fold_name()
        Alias meaning;
        diag::Place place;
    };

    /// Case and separators do not matter (`ionised calcium`, `Ionised-Calcium`, `iCa`, `ica`): no two names differ in
    /// those alone.
    [[nodiscard]] std::optional<Alias> find(std::string_view name) const;
    /// The nearest known name, for an error message; empty if none is near.
    [[nodiscard]] std::string nearest(std::string_view name) const;

    /// Adds a name unless one with the same folded form is there, which is returned then.
    const Name* add_name(Name name);

  private:
    std::vector<Name> names_;  // sorted by folded
};

/// What is compared of a name: ASCII letters in lower case, spaces and `- _ . ( ) / ,` left out. `+` stays (`Ca++`).
[[nodiscard]] std::string fold_name(std::string_view name);

/// "there is no analyte ...", with the nearest known name.
[[nodiscard]] std::string unknown_name(const Catalogue& catalogue, std::string_view name);

/// The analyte with exactly this id (`pCO2`).
[[nodiscard]] std::optional<Analyte> analyte_of(std::string_view id);

/// Reads and checks the list of analytes; every analyte must be there once. Gives nothing if there is any error.
[[nodiscard]] std::shared_ptr<const Catalogue>
read_catalogue(std::shared_ptr<const diag::Source> source, diag::Report& report);

}  // namespace isohydric::panel
