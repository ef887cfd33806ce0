// In which units a site gives its values when it does not write them: a preset, or a file of its own.
#pragma once

#include "isohydric/diag/report.hpp"
#include "isohydric/diag/source.hpp"
#include "isohydric/panel/analyte.hpp"
#include "isohydric/panel/catalogue.hpp"

#include <memory>
#include <optional>
#include <string>
#include <string_view>
#include <utility>
#include <vector>

namespace isohydric::panel {

/// A unit for each analyte that the site states; of the others a number still needs its unit.
class SiteUnits {
  public:
    /// `si` or `conventional`, as the catalogue marks the units; none for another name.
    [[nodiscard]] static std::optional<SiteUnits> preset(std::string_view name,
                                                         const Catalogue& catalogue);

    explicit SiteUnits(std::string name) : name_(std::move(name)) {}

    /// The preset or file, as reports show it.
    [[nodiscard]] const std::string& name() const { return name_; }

    /// The site's unit of an analyte under a name of that variant (`urea nitrogen`; empty: the plain name), or null.
    [[nodiscard]] const CustomaryUnit* find(Analyte analyte, std::string_view variant) const;

    /// Adds a unit; false if that analyte and variant has one already.
    bool add(Analyte analyte, CustomaryUnit unit);

  private:
    std::string name_;
    std::vector<std::pair<Analyte, CustomaryUnit>> units_;
};

/// Reads `{"units": {"albumin": "g/dL", "BUN": "mg/dL"}}`, names as the catalogue knows them.
[[nodiscard]] std::optional<SiteUnits> read_site_units(std::shared_ptr<const diag::Source> source,
                                                       const Catalogue& catalogue,
                                                       diag::Report& report);

}  // namespace isohydric::panel
