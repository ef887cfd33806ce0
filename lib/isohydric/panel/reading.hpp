// Reads one panel from names and texts as a person writes them: `pCO2` `3.9kPa`, `albumin` `2.1 g/dL`, `specimen` `venous`.
// Every value remembers what was written; nothing is guessed silently.
#pragma once

#include "isohydric/diag/report.hpp"
#include "isohydric/diag/result.hpp"
#include "isohydric/panel/catalogue.hpp"
#include "isohydric/panel/conversion.hpp"
#include "isohydric/panel/panel.hpp"
#include "isohydric/panel/site_units.hpp"
#include "isohydric/units/quantity_text.hpp"

#include <array>
#include <functional>
#include <map>
#include <optional>
#include <string>
#include <string_view>
#include <vector>

namespace isohydric::panel {

/// The items that set_context() takes, in the spelling of the command line.
inline constexpr std::array<std::string_view, 7> k_context_option_names{
    "specimen", "population", "age", "altitude", "onset", "baseline-pCO2", "baseline-HCO3"};

/// Takes the values of one panel, then gives the panel. Values may come in any order; errors go to the report.
class PanelReader {
  public:
    /// `site` may be null: no units of a site are known. All three must outlive the reader.
    PanelReader(const Catalogue& catalogue,
                const SiteUnits* site,
                diag::Report& report,
                units::DecimalMark decimal_mark = units::DecimalMark::point_or_comma);

    /// One value, under any name that the catalogue knows.
    void add(std::string_view name, std::string_view value_text, diag::Place place);

    /// One of k_context_option_names; letter case and separators do not matter.
    void set_context(std::string_view item, std::string_view text, diag::Place place);

    /// The panel, or nothing if there was any error. Call it once, at the end.
    [[nodiscard]] std::optional<Panel> finish();

  private:
    /// A value as written, under an analyte's name or as a baseline.
    struct Item {
        std::string name;
        Catalogue::Alias alias;
        units::QuantityText quantity;
        diag::Place place;
    };

    /// A text of the context and where it was said.
    struct Said {
        std::string text;
        diag::Place place;
    };

    std::optional<units::QuantityText>
    split(std::string_view name, std::string_view text, const diag::Place& place);
    [[nodiscard]] WrittenValue written_value(const Item& item) const;
    [[nodiscard]] std::optional<CustomaryUnit> unit_of_site(const Item& item) const;
    [[nodiscard]] diag::Result<CustomaryUnit> unit_of_other(const Item& item, Analyte other) const;
    [[nodiscard]] diag::Result<CustomaryUnit> unit_of_bare_item(const Item& item) const;
    [[nodiscard]] diag::Result<CustomaryUnit> unit_of_written_item(const Item& item) const;
    std::optional<CustomaryUnit> find_unit(const Item& item);
    std::optional<Entered> read_item(const Item& item);
    void read_values();
    std::optional<double> read_baseline(std::string_view option, Analyte analyte);
    [[nodiscard]] const Said* said(std::string_view option) const;
    template <class T>
    std::optional<T> read_option(std::string_view option,
                                 diag::Result<T> (*read)(std::string_view));
    void read_specimen_names();
    void read_population_and_age();
    void error(std::string id, const diag::Place& place, std::string message);

    const Catalogue& catalogue_;
    const SiteUnits* site_;
    diag::Report& report_;
    units::DecimalMark decimal_mark_;
    bool failed_ = false;
    Panel panel_;
    std::vector<Item> items_;
    std::array<std::optional<CustomaryUnit>, k_analyte_count> units_;
    std::map<std::string, Said, std::less<>> said_;  // by the name of the option
};

}  // namespace isohydric::panel
