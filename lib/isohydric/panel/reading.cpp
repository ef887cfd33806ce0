#include "isohydric/panel/reading.hpp"

#include "isohydric/diag/text.hpp"
#include "isohydric/panel/entering.hpp"

#include <algorithm>
#include <utility>

#include <fmt/format.h>

namespace isohydric::panel {

namespace {

constexpr std::string_view k_specimen = k_context_option_names[0];
constexpr std::string_view k_population = k_context_option_names[1];
constexpr std::string_view k_age = k_context_option_names[2];
constexpr std::string_view k_altitude = k_context_option_names[3];
constexpr std::string_view k_onset = k_context_option_names[4];
constexpr std::string_view k_baseline_pco2 = k_context_option_names[5];
constexpr std::string_view k_baseline_hco3 = k_context_option_names[6];

void add_note(CustomaryUnit& unit, const std::string& note) {
    unit.note += unit.note.empty() ? note : "; " + note;
}

/// Whether one name of a specimen is the other or a kind of it: `central-venous` is a kind of `venous`.
bool is_kind_of(std::string_view special, std::string_view general) {
    return special == general || special.ends_with("-" + std::string(general));
}

}  // namespace

PanelReader::PanelReader(const Catalogue& catalogue,
                         const SiteUnits* site,
                         diag::Report& report,
                         units::DecimalMark decimal_mark)
    : catalogue_(catalogue), site_(site), report_(report), decimal_mark_(decimal_mark) {}

void PanelReader::error(std::string id, const diag::Place& place, std::string message) {
    failed_ = true;
    report_.error(std::move(id), place, std::move(message));
}

std::optional<units::QuantityText>
PanelReader::split(std::string_view name, std::string_view text, const diag::Place& place) {
    diag::Result<units::QuantityText> quantity = units::split_quantity(text, decimal_mark_);
    if (!quantity) {
        error("panel-number", place, fmt::format("{}: {}", name, quantity.error()));
        return std::nullopt;
    }
    return *std::move(quantity);
}

void PanelReader::add(std::string_view name, std::string_view value_text, diag::Place place) {
    std::optional<Catalogue::Alias> alias = catalogue_.find(name);
    if (!alias) {
        error("panel-name", place, unknown_name(catalogue_, name));
        return;
    }
    const auto first = std::ranges::find_if(
        items_, [&alias](const Item& item) { return item.alias.analyte == alias->analyte; });
    if (first != items_.end()) {
        failed_ = true;
        report_
            .error("panel-twice",
                   place,
                   fmt::format("{} is there twice; leave one out", id_of(alias->analyte)))
            .notes.push_back({fmt::format("first here, as {}", first->name), first->place});
        return;
    }
    std::optional<units::QuantityText> quantity = split(name, value_text, place);
    if (quantity) {
        items_.push_back(
            {std::string(name), *std::move(alias), *std::move(quantity), std::move(place)});
    }
}

void PanelReader::set_context(std::string_view item, std::string_view text, diag::Place place) {
    const std::string folded = fold_name(item);
    const auto* const option =
        std::ranges::find_if(k_context_option_names, [&folded](std::string_view name) {
            return fold_name(name) == folded;
        });
    if (option == k_context_option_names.end()) {
        const std::vector<std::string> known(k_context_option_names.begin(),
                                             k_context_option_names.end());
        error("context-name",
              place,
              fmt::format("\"{}\" is not known of a specimen; known are {}",
                          item,
                          diag::join(known, ", ")));
        return;
    }
    const auto [first, is_new] =
        said_.try_emplace(std::string(*option), Said{std::string(text), place});
    if (!is_new) {
        failed_ = true;
        report_
            .error("context-twice", place, fmt::format("{} is there twice; leave one out", *option))
            .notes.push_back({"first here", first->second.place});
    }
}

WrittenValue PanelReader::written_value(const Item& item) const {
    return {.info = catalogue_[item.alias.analyte],
            .name = item.name,
            .variant = item.alias.variant_name(),
            .number = item.quantity.number};
}

std::optional<CustomaryUnit> PanelReader::unit_of_site(const Item& item) const {
    const CustomaryUnit* stated =
        site_ == nullptr ? nullptr : site_->find(item.alias.analyte, item.alias.variant_name());
    if (stated == nullptr) {
        return std::nullopt;
    }
    CustomaryUnit unit = *stated;
    const std::string name = unit.spoken();
    if (!name.empty()) {
        add_note(unit, fmt::format("unit of the site: {}", name));
    }
    return unit;
}

diag::Result<CustomaryUnit> PanelReader::unit_of_other(const Item& item, Analyte other) const {
    const AnalyteInfo& info = catalogue_[item.alias.analyte];
    const WrittenValue value = written_value(item);
    diag::Result<CustomaryUnit> unit = unit_as_written(value, units_[index_of(other)]->text);
    if (!unit) {
        return unit;
    }
    if (!info.plausible.contain(unit->to_canonical(item.quantity.number.value))) {
        return diag::unexpected(
            fmt::format("{} is implausible in the unit of {} ({}); write the unit",
                        item.name,
                        id_of(other),
                        describe_reading(value, *unit)));
    }
    add_note(*unit, fmt::format("unit taken from {}", id_of(other)));
    return unit;
}

diag::Result<CustomaryUnit> PanelReader::unit_of_bare_item(const Item& item) const {
    if (std::optional<CustomaryUnit> stated = unit_of_site(item)) {
        return *std::move(stated);
    }
    const std::optional<Analyte> other = catalogue_[item.alias.analyte].unit_from;
    if (other && units_[index_of(*other)]) {
        return unit_of_other(item, *other);
    }
    diag::Result<CustomaryUnit> unit = unit_of_bare(written_value(item));
    if (unit && unit->factor != 1) {
        add_note(*unit, fmt::format("read as {}", unit->text));
    }
    return unit;
}

/// A written unit; the site may have said what the unit alone leaves open: `mmol/L` of haemoglobin, monomer.
diag::Result<CustomaryUnit> PanelReader::unit_of_written_item(const Item& item) const {
    const WrittenValue value = written_value(item);
    diag::Result<CustomaryUnit> unit = unit_as_written(value, item.quantity.unit);
    const std::optional<CustomaryUnit> stated = unit_of_site(item);
    if (unit || !stated || stated->qualifier.empty()) {
        return unit;
    }
    unit = unit_as_written(value, fmt::format("{} {}", item.quantity.unit, stated->qualifier));
    if (unit) {
        add_note(*unit, fmt::format("{} by the units of the site", stated->qualifier));
    }
    return unit;
}

std::optional<CustomaryUnit> PanelReader::find_unit(const Item& item) {
    const std::string& written = item.quantity.unit;
    diag::Result<CustomaryUnit> unit =
        written.empty() ? unit_of_bare_item(item) : unit_of_written_item(item);
    if (unit) {
        return *std::move(unit);
    }
    if (written.empty()) {
        error("panel-unit-needed", item.place, std::move(unit).error());
    } else {
        error("panel-unit", item.place, std::move(unit).error());
    }
    return std::nullopt;
}

std::optional<Entered> PanelReader::read_item(const Item& item) {
    const std::optional<CustomaryUnit> unit = find_unit(item);
    if (!unit) {
        return std::nullopt;
    }
    diag::Result<Entered> entered =
        enter(catalogue_[item.alias.analyte], item.alias, item.quantity, *unit);
    if (!entered) {
        error("panel-value", item.place, fmt::format("{}: {}", item.name, entered.error()));
        return std::nullopt;
    }
    units_[index_of(item.alias.analyte)] = unit;
    return *std::move(entered);
}

/// Values that may take another's unit come after all others.
void PanelReader::read_values() {
    std::stable_partition(items_.begin(), items_.end(), [this](const Item& item) {
        return !catalogue_[item.alias.analyte].unit_from.has_value();
    });
    for (const Item& item : items_) {
        panel_[item.alias.analyte] = read_item(item);
    }
}

const PanelReader::Said* PanelReader::said(std::string_view option) const {
    const auto found = said_.find(option);
    return found == said_.end() ? nullptr : &found->second;
}

template <class T>
std::optional<T> PanelReader::read_option(std::string_view option,
                                          diag::Result<T> (*read)(std::string_view)) {
    const Said* text = said(option);
    if (text == nullptr) {
        return std::nullopt;
    }
    const diag::Result<T> value = read(text->text);
    if (!value) {
        error("context-value", text->place, fmt::format("{}: {}", option, value.error()));
        return std::nullopt;
    }
    return *value;
}

std::optional<double> PanelReader::read_baseline(std::string_view option, Analyte analyte) {
    const Said* text = said(option);
    if (text == nullptr) {
        return std::nullopt;
    }
    std::optional<units::QuantityText> quantity = split(option, text->text, text->place);
    if (!quantity) {
        return std::nullopt;
    }
    const std::optional<Entered> entered =
        read_item({.name = std::string(option),
                   .alias = {.analyte = analyte, .specimen = {}, .variant = {}},
                   .quantity = *std::move(quantity),
                   .place = text->place});
    if (!entered) {
        return std::nullopt;
    }
    const bool known = entered->censoring == Censoring::none &&
                       catalogue_[analyte].accepted.contain(entered->value);
    if (!known) {
        error("context-value",
              text->place,
              fmt::format("{}: {} cannot be a baseline", option, entered->as_entered));
    }
    return entered->value;
}

/// What names and context say of the specimen must agree; the more special word counts.
void PanelReader::read_specimen_names() {
    std::optional<std::pair<std::string_view, diag::Place>> so_far;
    const std::optional<Specimen> stated = read_option(k_specimen, &read_specimen);
    if (stated && *stated != Specimen::not_stated) {
        so_far.emplace(k_specimen_names[static_cast<std::size_t>(*stated)],
                       said(k_specimen)->place);
    }
    for (const Item& item : items_) {
        if (!item.alias.specimen) {
            continue;
        }
        const std::string_view named = *item.alias.specimen;
        if (!so_far || is_kind_of(named, so_far->first)) {
            so_far.emplace(named, item.place);
        } else if (!is_kind_of(so_far->first, named)) {
            failed_ = true;
            report_
                .error("panel-specimen",
                       item.place,
                       fmt::format("{} is {}, but the specimen is {}; correct one of them",
                                   item.name,
                                   named,
                                   so_far->first))
                .notes.push_back({fmt::format("{} is said here", so_far->first), so_far->second});
        }
    }
    if (so_far) {
        panel_.context.specimen = *read_specimen(so_far->first);
    }
}

void PanelReader::read_population_and_age() {
    Context& context = panel_.context;
    context.age_a = read_option(k_age, &read_age_a);
    const std::optional<Population> stated = read_option(k_population, &read_population);
    if (stated && context.age_a && !fits_age(*stated, *context.age_a)) {
        failed_ = true;
        report_
            .error("context-contradiction",
                   said(k_population)->place,
                   fmt::format(
                       "population {} and age {} contradict each other; correct or leave out one",
                       said(k_population)->text,
                       said(k_age)->text))
            .notes.push_back({"the age is said here", said(k_age)->place});
    }
    if (stated) {
        context.population = *stated;
        return;
    }
    context.population = context.age_a ? population_of_age(*context.age_a) : Population::adult;
    context.assumed.push_back(
        fmt::format("population: {}{}",
                    k_population_names[static_cast<std::size_t>(context.population)],
                    context.age_a ? fmt::format(" (age {})", said(k_age)->text) : std::string{}));
}

std::optional<Panel> PanelReader::finish() {
    read_specimen_names();
    read_population_and_age();
    Context& context = panel_.context;
    context.onset = read_option(k_onset, &read_onset).value_or(StatedOnset::unknown);
    context.altitude_m = read_option(k_altitude, &read_altitude_m);
    read_values();
    context.baseline_pco2_mmHg = read_baseline(k_baseline_pco2, Analyte::pco2);
    context.baseline_hco3_mmol_L = read_baseline(k_baseline_hco3, Analyte::hco3);
    return failed_ ? std::nullopt : std::optional{std::move(panel_)};
}

}  // namespace isohydric::panel
