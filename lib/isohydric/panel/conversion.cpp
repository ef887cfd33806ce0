#include "isohydric/panel/conversion.hpp"

#include "isohydric/diag/text.hpp"
#include "isohydric/units/molar_mass.hpp"
#include "isohydric/units/spelling.hpp"

#include <algorithm>
#include <cmath>
#include <cstdint>
#include <utility>
#include <vector>

#include <fmt/format.h>

namespace isohydric::panel {

namespace {

/// What a unit counts. UCUM gives all but the last the dimension of an amount, yet one is not another.
enum class Counts : std::uint8_t { particles, charges, osmoles, ph };

std::string without_annotations(std::string_view code) {
    std::string bare;
    bool inside = false;
    for (const char c : code) {
        inside = inside ? c != '}' : c == '{';
        if (!inside && c != '}') {
            bare += c;
        }
    }
    return bare;
}

Counts counts(const units::Unit& unit) {
    const std::string code = without_annotations(unit.code());
    const auto has = [&code](std::string_view atom) {
        return code.find(atom) != std::string::npos;
    };
    if (has("eq")) {
        return Counts::charges;
    }
    if (has("osm")) {
        return Counts::osmoles;
    }
    return has("[pH]") ? Counts::ph : Counts::particles;
}

bool alike(const units::Unit& left, const units::Unit& right) {
    return counts(left) == counts(right) && units::commensurable(left, right);
}

Linear linear_between(const units::Unit& from, const units::Unit& to) {
    return {.factor = units::factor_between(from, to),
            .offset = from.has_offset() || to.has_offset() ? units::convert(0, from, to) : 0.0};
}

std::string known_units(const AnalyteInfo& info) {
    std::vector<std::string> known;
    for (const CustomaryUnit& unit : info.customary) {
        const std::string name = unit.spoken();
        if (!name.empty() && std::ranges::find(known, name) == known.end()) {
            known.push_back(name);
        }
    }
    return diag::join(known, ", ");
}

diag::Unexpected<std::string> unfit(const AnalyteInfo& info, std::string_view unit) {
    const std::string known = known_units(info);
    return diag::unexpected(
        known.empty()
            ? fmt::format("{} has no unit, but {} was found", info.id(), unit)
            : fmt::format("{} cannot be given in {}; its units are {}", info.id(), unit, known));
}

diag::Result<Linear> linear_from_charges(const AnalyteInfo& info, const units::Unit& from) {
    if (info.charge && units::commensurable(from, info.unit)) {
        return Linear{.factor = units::factor_between(from, info.unit) / *info.charge, .offset = 0};
    }
    if (info.no_charge.empty()) {
        return unfit(info, from.code());
    }
    return diag::unexpected(
        fmt::format("{} cannot be given in {}: {}", info.id(), from.code(), info.no_charge));
}

/// What a hydrogen ion concentration given as pH is told; empty if it is none.
std::string hydrogen_ion_hint(const AnalyteInfo& info, bool looks_like_it) {
    return counts(info.unit) == Counts::ph && looks_like_it
               ? fmt::format("{} looks like a hydrogen ion concentration in nmol/L, which is not "
                             "converted; give the pH",
                             info.id())
               : std::string{};
}

/// Whether amounts may stand where the canonical unit counts something else: mmol/kg for osmolality, a bare 1 for pH.
bool may_stand_for(const units::Unit& from, const units::Unit& canonical) {
    const Counts wanted = counts(canonical);
    return counts(from) == Counts::particles && units::commensurable(from, canonical) &&
           (wanted == Counts::osmoles ||
            (wanted == Counts::ph && without_annotations(from.code()) == "1"));
}

/// Takes the word that tells two customary units apart off the end: `mmol/L monomer`, `mmol/L{monomer}`.
struct QualifiedUnit {
    std::string_view unit;
    std::string qualifier;
};

QualifiedUnit split_qualifier(const AnalyteInfo& info, std::string_view written) {
    const std::string lowered = diag::lower(written);
    for (const CustomaryUnit& unit : info.customary) {
        const std::string& word = unit.qualifier;
        for (const std::string& end : {" " + word, "{" + word + "}", " (" + word + ")"}) {
            if (!word.empty() && lowered.ends_with(end)) {
                return {diag::trim(written.substr(0, written.size() - end.size())), word};
            }
        }
    }
    return {written, {}};
}

std::vector<const CustomaryUnit*> of_variant(const AnalyteInfo& info, std::string_view variant) {
    std::vector<const CustomaryUnit*> units;
    for (const CustomaryUnit& unit : info.customary) {
        if (unit.variant == variant) {
            units.push_back(&unit);
        }
    }
    return units;
}

bool equal_values(double left, double right) {
    constexpr double k_relative = 1e-9;
    return std::abs(left - right) <= k_relative * std::max(std::abs(left), std::abs(right));
}

/// The unit that was parsed, seen through a customary one of the same kind.
CustomaryUnit seen_through(const CustomaryUnit& known,
                           const units::Unit& known_unit,
                           const units::Unit& parsed,
                           std::string_view written) {
    CustomaryUnit unit = known;
    if (!(parsed == known_unit)) {
        const Linear step = linear_between(parsed, known_unit);
        unit.ucum = parsed.code();
        unit.text = written;
        unit.factor = step.factor * known.factor;
        unit.offset = step.offset * known.factor + known.offset;
    }
    return unit;
}

/// The parsed unit seen through each customary unit of its kind, the one nearest to what was written first.
std::vector<CustomaryUnit> readings_of(const std::vector<const CustomaryUnit*>& customary,
                                       const units::Unit& parsed,
                                       const QualifiedUnit& written) {
    std::vector<CustomaryUnit> same_code;
    std::vector<CustomaryUnit> same_unit;
    std::vector<CustomaryUnit> same_kind;
    for (const CustomaryUnit* known : customary) {
        const units::Unit unit = *units::parse_unit(known->ucum);
        const bool said = written.qualifier.empty() || known->qualifier == written.qualifier;
        if (said && alike(parsed, unit)) {
            auto& list = parsed.code() == known->ucum ? same_code
                         : parsed == unit             ? same_unit
                                                      : same_kind;
            list.push_back(seen_through(*known, unit, parsed, written.unit));
        }
    }
    same_code.insert(same_code.end(), same_unit.begin(), same_unit.end());
    same_code.insert(same_code.end(), same_kind.begin(), same_kind.end());
    return same_code;
}

diag::Result<units::Unit> parse_written(std::string_view written) {
    const std::optional<std::string> code = units::ucum_of(written);
    if (!code) {
        const std::string near = units::suggest_unit(written);
        return diag::unexpected(
            fmt::format("the unit \"{}\" is not known{}",
                        written,
                        near.empty() ? "" : fmt::format("; did you mean {}?", near)));
    }
    return units::parse_unit(*code);
}

/// The readings of a bare number, one for each different value.
struct BareReadings {
    std::vector<CustomaryUnit> plausible;
    std::vector<CustomaryUnit> implausible;
};

BareReadings bare_readings(const WrittenValue& value) {
    BareReadings readings;
    std::vector<double> seen;
    for (const CustomaryUnit* unit : of_variant(value.info, value.variant)) {
        const double canonical = unit->to_canonical(value.number.value);
        if (std::ranges::any_of(seen,
                                [&](double other) { return equal_values(canonical, other); })) {
            continue;
        }
        seen.push_back(canonical);
        auto& list =
            value.info.plausible.contain(canonical) ? readings.plausible : readings.implausible;
        list.push_back(*unit);
    }
    return readings;
}

/// Each of the units as a reading of the value.
std::string list_readings(const WrittenValue& value,
                          const std::vector<CustomaryUnit>& units,
                          std::string_view separator) {
    std::string shown;
    for (const CustomaryUnit& unit : units) {
        shown += shown.empty() ? "" : separator;
        shown += describe_reading(value, unit);
    }
    return shown;
}

std::string with_unit(std::string_view digits, std::string_view text) {
    return text.empty() ? fmt::format("{} as a fraction", digits)
                        : fmt::format("{} {}", digits, text);
}

}  // namespace

diag::Result<Linear> linear_to_canonical(const AnalyteInfo& info,
                                         const units::Unit& from,
                                         std::optional<double> molar_mass_g_mol) {
    if (counts(from) == Counts::charges) {
        return linear_from_charges(info, from);
    }
    if (alike(from, info.unit) || may_stand_for(from, info.unit)) {
        return linear_between(from, info.unit);
    }
    if (molar_mass_g_mol && counts(from) == Counts::particles) {
        const std::optional<double> factor =
            units::factor_by_molar_mass(from, info.unit, *molar_mass_g_mol);
        if (factor) {
            return Linear{.factor = *factor, .offset = 0};
        }
    }
    return unfit(info, from.code());
}

diag::Result<CustomaryUnit> unit_as_written(const WrittenValue& value, std::string_view written) {
    const AnalyteInfo& info = value.info;
    const QualifiedUnit qualified = split_qualifier(info, written);
    const diag::Result<units::Unit> parsed = parse_written(qualified.unit);
    if (!parsed) {
        return diag::unexpected(parsed.error());
    }
    const std::vector<CustomaryUnit> readings =
        readings_of(of_variant(info, value.variant), *parsed, qualified);
    const bool ambiguous =
        readings.size() > 1 && qualified.qualifier.empty() && !readings.front().qualifier.empty();
    if (ambiguous) {
        return diag::unexpected(fmt::format(
            "{} may be {}; say which", value.name, list_readings(value, readings, ", or ")));
    }
    if (!readings.empty()) {
        return readings.front();
    }
    std::string hint =
        hydrogen_ion_hint(info, units::commensurable(*parsed, *units::parse_unit("nmol/L")));
    if (!hint.empty()) {
        return diag::unexpected(std::move(hint));
    }
    const diag::Result<Linear> linear = linear_to_canonical(info, *parsed, std::nullopt);
    if (!linear) {
        return counts(*parsed) == Counts::charges ? diag::unexpected(linear.error())
                                                  : unfit(info, qualified.unit);
    }
    CustomaryUnit unit;
    unit.ucum = parsed->code();
    unit.text = qualified.unit;
    unit.factor = linear->factor;
    unit.offset = linear->offset;
    unit.variant = value.variant;
    return unit;
}

diag::Result<CustomaryUnit> unit_of_bare(const WrittenValue& value) {
    constexpr Limits k_hydrogen_ion_nmol_L{.low = 20, .high = 160};
    std::string hint =
        hydrogen_ion_hint(value.info, k_hydrogen_ion_nmol_L.contain(value.number.value));
    if (!hint.empty()) {
        return diag::unexpected(std::move(hint));
    }
    const BareReadings readings = bare_readings(value);
    const std::size_t different = readings.plausible.size() + readings.implausible.size();
    const auto needs_no_saying = [&value](const CustomaryUnit& unit) {
        return unit.bare || unit.ucum == value.info.unit.code();
    };
    if (different == 1) {
        return (readings.plausible.empty() ? readings.implausible : readings.plausible).front();
    }
    if (readings.plausible.size() == 1 && needs_no_saying(readings.plausible.front())) {
        return readings.plausible.front();
    }
    if (readings.plausible.empty()) {
        return diag::unexpected(
            fmt::format("{} is implausible as {}; write the unit",
                        value.name,
                        list_readings(value, readings.implausible, " and as ")));
    }
    const bool one = readings.plausible.size() == 1;
    return diag::unexpected(fmt::format(
        "{} may be {}{}; write the unit",
        value.name,
        list_readings(value, readings.plausible, ", or "),
        one ? fmt::format(" ({} is implausible)", list_readings(value, readings.implausible, ", "))
            : std::string{}));
}

std::optional<CustomaryUnit> unit_needless(const AnalyteInfo& info, std::string_view variant) {
    const std::vector<const CustomaryUnit*> units = of_variant(info, variant);
    const bool equal = std::ranges::all_of(units, [&units](const CustomaryUnit* unit) {
        return equal_values(unit->factor, units.front()->factor) &&
               unit->offset == units.front()->offset;
    });
    return equal ? std::optional{*units.front()} : std::nullopt;
}

std::string describe_reading(const WrittenValue& value, const CustomaryUnit& unit) {
    std::string written = with_unit(value.number.digits, unit.spoken());
    if (unit.factor == 1 && unit.offset == 0) {
        return written;
    }
    const double canonical = unit.to_canonical(value.number.value);
    return fmt::format(
        "{} = {}",
        written,
        with_unit(fmt::format("{:.{}f}", canonical, value.info.decimals), value.info.unit_text));
}

}  // namespace isohydric::panel
