#include "isohydric/panel/site_units.hpp"

#include "isohydric/diag/json.hpp"
#include "isohydric/panel/conversion.hpp"

#include <algorithm>

#include <fmt/format.h>

namespace isohydric::panel {

namespace {

void read_unit(const diag::Member& member,
               const Catalogue& catalogue,
               SiteUnits& site,
               diag::Report& report) {
    const std::optional<Catalogue::Alias> alias = catalogue.find(member.name);
    if (!alias) {
        report.error("site-units-name", member.name_place, unknown_name(catalogue, member.name));
        return;
    }
    if (!diag::expect_kind(member.value, diag::Kind::string, "unit", report)) {
        return;
    }
    const units::NumberText one{.value = 1, .decimals = 0, .digits = "1"};
    const WrittenValue value{.info = catalogue[alias->analyte],
                             .name = member.name,
                             .variant = alias->variant_name(),
                             .number = one};
    diag::Result<CustomaryUnit> unit = unit_as_written(value, member.value.text());
    if (!unit) {
        report.error("site-units-unit", member.value.place(), unit.error());
        return;
    }
    if (!site.add(alias->analyte, *std::move(unit))) {
        report.error("site-units-twice",
                     member.name_place,
                     fmt::format("the unit of {} is there twice", id_of(alias->analyte)));
    }
}

}  // namespace

std::optional<SiteUnits> SiteUnits::preset(std::string_view name, const Catalogue& catalogue) {
    if (std::ranges::find(k_preset_names, name) == k_preset_names.end()) {
        return std::nullopt;
    }
    SiteUnits site{std::string(name)};
    for (const AnalyteInfo& info : catalogue.analytes) {
        for (const CustomaryUnit& unit : info.customary) {
            if (std::ranges::find(unit.presets, name) != unit.presets.end()) {
                site.add(info.analyte, unit);
            }
        }
    }
    return site;
}

const CustomaryUnit* SiteUnits::find(Analyte analyte, std::string_view variant) const {
    const auto found = std::ranges::find_if(units_, [&](const auto& entry) {
        return entry.first == analyte && entry.second.variant == variant;
    });
    return found == units_.end() ? nullptr : &found->second;
}

bool SiteUnits::add(Analyte analyte, CustomaryUnit unit) {
    if (find(analyte, unit.variant) != nullptr) {
        return false;
    }
    units_.emplace_back(analyte, std::move(unit));
    return true;
}

std::optional<SiteUnits> read_site_units(std::shared_ptr<const diag::Source> source,
                                         const Catalogue& catalogue,
                                         diag::Report& report) {
    const std::size_t errors_before = report.error_count();
    SiteUnits site{source->name()};
    const std::optional<diag::Json> root = diag::read_json(std::move(source), report);
    if (!root) {
        return std::nullopt;
    }
    diag::ObjectReader reader(*root, report, "site's units");
    const diag::Json* units = reader.required("units", diag::Kind::object);
    reader.finish();
    if (units != nullptr) {
        for (const diag::Member& member : units->members()) {
            read_unit(member, catalogue, site, report);
        }
    }
    return report.error_count() == errors_before ? std::optional{std::move(site)} : std::nullopt;
}

}  // namespace isohydric::panel
