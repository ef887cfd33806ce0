#include "isohydric/panel/detail/read_units.hpp"

#include "isohydric/diag/text.hpp"
#include "isohydric/panel/conversion.hpp"
#include "isohydric/units/molar_mass.hpp"

#include <algorithm>
#include <utility>

#include <fmt/format.h>

namespace isohydric::panel::detail {

namespace {

using diag::Json;
using diag::Kind;
using diag::ObjectReader;
using diag::Report;

void read_canonical(ObjectReader& entry, AnalyteInfo& info, Report& report) {
    info.unit_text = entry.required_text("unitText").value_or("");
    const Json* code = entry.required("unit", Kind::string);
    if (code == nullptr) {
        return;
    }
    const diag::Result<units::Unit> unit = units::parse_unit(code->text());
    if (unit) {
        info.unit = *unit;
    } else {
        report.error("catalogue-unit", code->place(), unit.error());
    }
}

void read_decimals(ObjectReader& entry, AnalyteInfo& info, Report& report) {
    const Json* decimals = entry.required("decimals", Kind::number);
    if (decimals == nullptr) {
        return;
    }
    const std::string_view text = decimals->text();
    if (text.size() == 1 && text >= "0" && text <= "6") {
        info.decimals = text.front() - '0';
    } else {
        report.error("catalogue-value",
                     decimals->place(),
                     fmt::format("decimals must be a whole number from 0 to 6, not {}", text));
    }
}

/// A number of charges, or a text that says why there is none.
void read_charge(ObjectReader& entry, AnalyteInfo& info, Report& report) {
    const Json* charge = entry.any("charge");
    if (charge == nullptr) {
        return;
    }
    const bool is_number = charge->kind() == Kind::number;
    if (charge->kind() == Kind::string) {
        info.no_charge = charge->text();
    } else if (is_number && (charge->text() == "1" || charge->text() == "2")) {
        info.charge = charge->text().front() - '0';
    } else {
        report.error("catalogue-value",
                     charge->place(),
                     "charge must be 1 or 2, or a text that says why there is no fixed charge");
    }
}

void read_unit_from(ObjectReader& entry, AnalyteInfo& info, Report& report) {
    const Json* other = entry.optional("unitFrom", Kind::string);
    if (other == nullptr) {
        return;
    }
    info.unit_from = analyte_of(other->text());
    if (!info.unit_from || *info.unit_from == info.analyte) {
        report.error(
            "catalogue-value",
            other->place(),
            fmt::format("unitFrom must be the id of another analyte, not \"{}\"", other->text()));
    }
}

std::vector<std::string> read_presets(ObjectReader& object, Report& report) {
    const Json* list = object.optional("presets", Kind::array);
    std::vector<std::string> presets;
    if (list == nullptr) {
        return presets;
    }
    for (const Json& preset : list->items()) {
        const bool known = preset.kind() == Kind::string &&
                           std::ranges::find(k_preset_names, preset.text()) != k_preset_names.end();
        if (known) {
            presets.emplace_back(preset.text());
        } else {
            report.error(
                "catalogue-value", preset.place(), R"(a preset is "si" or "conventional")");
        }
    }
    return presets;
}

std::optional<double> read_molar_mass(ObjectReader& object, Report& report) {
    const Json* name = object.optional("molarMass", Kind::string);
    if (name == nullptr) {
        return std::nullopt;
    }
    const std::optional<double> molar_mass_g_mol = units::molar_mass_g_mol(name->text());
    if (!molar_mass_g_mol) {
        std::vector<std::string> known;
        for (const units::Substance& substance : units::k_substances) {
            known.emplace_back(substance.name);
        }
        report.error("catalogue-unit",
                     name->place(),
                     fmt::format("there is no molar mass of \"{}\"{}",
                                 name->text(),
                                 diag::did_you_mean(name->text(), known)));
    }
    return molar_mass_g_mol;
}

diag::Result<Linear> linear_of_code(const AnalyteInfo& info,
                                    std::string_view ucum,
                                    std::optional<double> molar_mass_g_mol) {
    const diag::Result<units::Unit> parsed = units::parse_unit(ucum);
    if (!parsed) {
        return diag::unexpected(parsed.error());
    }
    return linear_to_canonical(info, *parsed, molar_mass_g_mol);
}

std::optional<CustomaryUnit>
read_customary_unit(const Json& value, const AnalyteInfo& info, Report& report) {
    ObjectReader object(value, report, "customary unit");
    CustomaryUnit unit;
    const Json* code = object.required("unit", Kind::string);
    unit.ucum = code == nullptr ? "" : code->text();
    unit.text = object.optional_text("text").value_or(unit.ucum);
    const std::optional<double> molar_mass_g_mol = read_molar_mass(object, report);
    unit.qualifier = object.optional_text("qualifier").value_or("");
    unit.variant = object.optional_text("variant").value_or("");
    unit.note = object.optional_text("note").value_or("");
    unit.bare = object.optional_bool("bare").value_or(false);
    unit.presets = read_presets(object, report);
    object.finish();
    if (code == nullptr) {
        return std::nullopt;
    }
    const diag::Result<Linear> linear = linear_of_code(info, unit.ucum, molar_mass_g_mol);
    if (!linear) {
        report.error("catalogue-unit", code->place(), linear.error());
        return std::nullopt;
    }
    unit.factor = linear->factor;
    unit.offset = linear->offset;
    return unit;
}

bool same_place_in_list(const CustomaryUnit& left, const CustomaryUnit& right) {
    return left.ucum == right.ucum && left.qualifier == right.qualifier &&
           left.variant == right.variant;
}

bool same_preset(const CustomaryUnit& left, const CustomaryUnit& right) {
    return left.variant == right.variant &&
           std::ranges::any_of(left.presets, [&right](const std::string& preset) {
               return std::ranges::find(right.presets, preset) != right.presets.end();
           });
}

void add_customary(const Json& value, AnalyteInfo& info, Report& report) {
    std::optional<CustomaryUnit> unit = read_customary_unit(value, info, report);
    if (!unit) {
        return;
    }
    for (const CustomaryUnit& other : info.customary) {
        if (same_place_in_list(other, *unit)) {
            report.error("catalogue-twice",
                         value.place(),
                         fmt::format("the unit {} is there twice", unit->ucum));
            return;
        }
        if (same_preset(other, *unit)) {
            report.error("catalogue-twice",
                         value.place(),
                         fmt::format("{} and {} share a preset; a site uses one of them",
                                     other.ucum,
                                     unit->ucum));
            return;
        }
    }
    info.customary.push_back(*std::move(unit));
}

void read_customary(ObjectReader& entry, AnalyteInfo& info, Report& report) {
    CustomaryUnit canonical;
    canonical.ucum = info.unit.code();
    canonical.text = info.unit_text;
    canonical.presets = read_presets(entry, report);
    info.customary.assign(1, canonical);
    const Json* list = entry.optional("customary", Kind::array);
    if (list == nullptr) {
        return;
    }
    for (const Json& value : list->items()) {
        add_customary(value, info, report);
    }
}

}  // namespace

void read_units(ObjectReader& entry, AnalyteInfo& info, Report& report) {
    read_canonical(entry, info, report);
    read_decimals(entry, info, report);
    read_charge(entry, info, report);
    read_unit_from(entry, info, report);
    read_customary(entry, info, report);
}

}  // namespace isohydric::panel::detail
