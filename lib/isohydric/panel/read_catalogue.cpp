// Reads rules/analytes.json into a Catalogue. Whatever could later be misread is an error here, with its place.
#include "isohydric/diag/json.hpp"
#include "isohydric/diag/text.hpp"
#include "isohydric/panel/catalogue.hpp"
#include "isohydric/panel/context.hpp"
#include "isohydric/panel/detail/read_units.hpp"
#include "isohydric/panel/detail/shapes.hpp"

#include <algorithm>
#include <map>
#include <utility>

#include <fmt/format.h>

namespace isohydric::panel {

namespace {

using detail::has_valid_check_digit;
using detail::is_date;
using detail::is_expression_name;
using diag::Json;
using diag::Kind;
using diag::ObjectReader;
using diag::Place;
using diag::Report;

Place place_of(const Json* value, const ObjectReader& object) {
    return value == nullptr ? object.place() : value->place();
}

/// One entry of the list at a time, into the catalogue.
class CatalogueReader {
  public:
    CatalogueReader(Catalogue& catalogue, Report& report)
        : catalogue_(catalogue), report_(report) {}

    void read(const Json& root);

  private:
    void read_entry(const Json& entry);
    std::optional<Analyte> read_id(ObjectReader& reader);
    void read_aliases(ObjectReader& reader, AnalyteInfo& info);
    void read_alias(const Json& value, AnalyteInfo& info);
    void add_name(std::string written, Catalogue::Alias meaning, const Place& place);
    void read_limits(ObjectReader& reader, AnalyteInfo& info);
    Limits read_range(ObjectReader& reader, std::string_view name);
    void read_expression_name(ObjectReader& reader, AnalyteInfo& info);
    void read_loinc(ObjectReader& reader, AnalyteInfo& info);
    void read_sources(ObjectReader& reader, AnalyteInfo& info);
    void read_source(const Json& value, AnalyteInfo& info);
    void claim(std::map<std::string, Place, std::less<>>& taken,
               const std::string& name,
               const Place& place,
               std::string_view what);

    Catalogue& catalogue_;
    Report& report_;
    std::map<std::string, Place, std::less<>> ids_, expression_names_, loinc_codes_;
};

void CatalogueReader::read(const Json& root) {
    ObjectReader reader(root, report_, "list of analytes");
    reader.optional_text("$schema");
    const Json* entries = reader.required("analytes", Kind::array);
    reader.finish();
    if (entries == nullptr) {
        return;
    }
    for (const Json& entry : entries->items()) {
        read_entry(entry);
    }
    for (const std::string_view id : k_analyte_ids) {
        if (!ids_.contains(id)) {
            report_.error(
                "catalogue-analyte-missing",
                entries->place(),
                fmt::format("the analyte \"{}\" is missing; every analyte must be listed once",
                            id));
        }
    }
}

void CatalogueReader::read_entry(const Json& entry) {
    ObjectReader reader(entry, report_, "analyte");
    const std::optional<Analyte> analyte = read_id(reader);
    if (!analyte) {
        return;
    }
    AnalyteInfo& info = catalogue_.analytes[index_of(*analyte)];
    info.analyte = *analyte;
    info.label = reader.required_text("label").value_or("");
    info.derived = reader.optional_bool("derived").value_or(false);
    read_expression_name(reader, info);
    detail::read_units(reader, info, report_);
    read_aliases(reader, info);
    read_limits(reader, info);
    read_loinc(reader, info);
    read_sources(reader, info);
    reader.finish();
}

/// Takes a name that must not be used twice.
void CatalogueReader::claim(std::map<std::string, Place, std::less<>>& taken,
                            const std::string& name,
                            const Place& place,
                            std::string_view what) {
    const auto [first, is_new] = taken.emplace(name, place);
    if (!is_new) {
        report_
            .error(
                "catalogue-twice", place, fmt::format("the {} \"{}\" is there twice", what, name))
            .notes.push_back({"first here", first->second});
    }
}

std::optional<Analyte> CatalogueReader::read_id(ObjectReader& reader) {
    const Json* id = reader.required("id", Kind::string);
    if (id == nullptr) {
        return std::nullopt;
    }
    const std::optional<Analyte> analyte = analyte_of(id->text());
    if (!analyte) {
        const std::string near = diag::nearest(id->text(), k_analyte_ids);
        report_.error("catalogue-analyte",
                      id->place(),
                      fmt::format("there is no analyte \"{}\"{}; the list of analytes is fixed",
                                  id->text(),
                                  near.empty() ? "" : fmt::format(", did you mean \"{}\"?", near)));
        return std::nullopt;
    }
    claim(ids_, std::string(id->text()), id->place(), "analyte");
    return analyte;
}

void CatalogueReader::read_expression_name(ObjectReader& reader, AnalyteInfo& info) {
    const Json* as = reader.optional("as", Kind::string);
    info.expression_name = as == nullptr ? info.id() : as->text();
    const Place place = place_of(as, reader);
    if (!is_expression_name(info.expression_name)) {
        report_.error("catalogue-value",
                      place,
                      fmt::format("\"{}\" cannot be a name in expressions; use letters and digits",
                                  info.expression_name));
    }
    claim(expression_names_, info.expression_name, place, "expression name");
}

void CatalogueReader::read_aliases(ObjectReader& reader, AnalyteInfo& info) {
    add_name(std::string(info.id()),
             {.analyte = info.analyte, .specimen = {}, .variant = {}},
             reader.place());
    const Json* list = reader.required("aliases", Kind::array);
    if (list == nullptr) {
        return;
    }
    for (const Json& value : list->items()) {
        read_alias(value, info);
    }
}

void CatalogueReader::read_alias(const Json& value, AnalyteInfo& info) {
    Catalogue::Alias meaning{.analyte = info.analyte, .specimen = {}, .variant = {}};
    if (value.kind() == Kind::string) {
        info.aliases.emplace_back(value.text());
        add_name(std::string(value.text()), meaning, value.place());
        return;
    }
    ObjectReader reader(value, report_, "alias");
    const std::optional<std::string> name = reader.required_text("name");
    meaning.specimen = reader.optional_text("specimen");
    meaning.variant = reader.optional_text("variant");
    meaning.negated = reader.optional_bool("negated").value_or(false);
    reader.finish();
    if (meaning.specimen &&
        std::ranges::find(k_specimen_names, *meaning.specimen) == k_specimen_names.end()) {
        report_.error("catalogue-value",
                      value.place(),
                      fmt::format("there is no specimen \"{}\"", *meaning.specimen));
    }
    const bool has_canonical = std::ranges::any_of(info.customary, [&](const CustomaryUnit& unit) {
        return unit.ucum == info.unit.code() && unit.variant == meaning.variant_name();
    });
    if (!has_canonical) {
        report_.error("catalogue-unit",
                      value.place(),
                      fmt::format("the variant \"{}\" has no customary unit {}",
                                  meaning.variant_name(),
                                  info.unit.code()));
    }
    if (name) {
        info.aliases.push_back(*name);
        add_name(*name, meaning, value.place());
    }
}

void CatalogueReader::add_name(std::string written, Catalogue::Alias meaning, const Place& place) {
    const std::string shown = written;
    if (fold_name(written).empty()) {
        report_.error("catalogue-name", place, "a name must have letters");
        return;
    }
    const Catalogue::Name* first = catalogue_.add_name({.written = std::move(written),
                                                        .folded = {},
                                                        .meaning = std::move(meaning),
                                                        .place = place});
    if (first != nullptr) {
        report_
            .error("catalogue-name",
                   place,
                   fmt::format("the name \"{}\" cannot be told from \"{}\" of {}; letter case and "
                               "separators do not count",
                               shown,
                               first->written,
                               id_of(first->meaning.analyte)))
            .notes.push_back({"first here", first->place});
    }
}

Limits CatalogueReader::read_range(ObjectReader& reader, std::string_view name) {
    const Json* value = reader.required(name, Kind::object);
    if (value == nullptr) {
        return {};
    }
    ObjectReader range(*value, report_, std::string(name));
    const std::optional<double> low = range.required_number("low");
    const std::optional<double> high = range.required_number("high");
    range.finish();
    if (low && high && !(*low < *high)) {
        report_.error("catalogue-limits", value->place(), "low must lie below high");
    }
    return {.low = low.value_or(0), .high = high.value_or(0)};
}

void CatalogueReader::read_limits(ObjectReader& reader, AnalyteInfo& info) {
    info.plausible = read_range(reader, "plausible");
    info.accepted = read_range(reader, "accepted");
    if (!info.accepted.contain(info.plausible.low) || !info.accepted.contain(info.plausible.high)) {
        report_.error(
            "catalogue-limits",
            reader.place(),
            fmt::format("{}: what is plausible must lie within what is accepted", info.id()));
    }
}

void CatalogueReader::read_loinc(ObjectReader& reader, AnalyteInfo& info) {
    const Json* codes = reader.required("loinc", Kind::array);
    if (codes == nullptr) {
        return;
    }
    for (const Json& code : codes->items()) {
        if (!diag::expect_kind(code, Kind::string, "LOINC code", report_)) {
            continue;
        }
        if (!has_valid_check_digit(code.text())) {
            report_.error("catalogue-value",
                          code.place(),
                          fmt::format("\"{}\" is no LOINC code: digits, a hyphen and the right "
                                      "check digit are expected",
                                      code.text()));
        }
        claim(loinc_codes_, std::string(code.text()), code.place(), "LOINC code");
        info.loinc.emplace_back(code.text());
    }
}

void CatalogueReader::read_sources(ObjectReader& reader, AnalyteInfo& info) {
    const Json* source = reader.any("source");
    if (source == nullptr) {
        report_.error("json-missing-key", reader.place(), "analyte: \"source\" is missing");
    } else if (source->kind() == Kind::array) {
        for (const Json& one : source->items()) {
            read_source(one, info);
        }
    } else {
        read_source(*source, info);
    }
    const Json* reviewed = reader.required("reviewed", Kind::string);
    if (reviewed != nullptr && !is_date(reviewed->text())) {
        report_.error(
            "catalogue-value", reviewed->place(), "reviewed must be a date such as 2026-12-01");
    }
}

void CatalogueReader::read_source(const Json& value, AnalyteInfo& info) {
    ObjectReader reader(value, report_, "source");
    const Json* ref = reader.required("ref", Kind::string);
    const std::optional<std::string> at = reader.optional_text("at");
    reader.optional_bool("checked");
    reader.optional_text("note");
    reader.finish();
    if (ref == nullptr) {
        return;
    }
    if (at.has_value() == (ref->text() == "common-practice")) {
        report_.error("catalogue-value",
                      ref->place(),
                      at ? "common practice has no place \"at\" which it could be looked up"
                         : "say the place in the source: \"at\"");
    }
    info.sources.push_back({std::string(ref->text()), ref->place()});
}

}  // namespace

std::shared_ptr<const Catalogue> read_catalogue(std::shared_ptr<const diag::Source> source,
                                                diag::Report& report) {
    const std::size_t errors_before = report.error_count();
    const std::optional<Json> root = diag::read_json(std::move(source), report);
    if (!root) {
        return nullptr;
    }
    const auto catalogue = std::make_shared<Catalogue>();
    CatalogueReader(*catalogue, report).read(*root);
    return report.error_count() == errors_before ? catalogue : nullptr;
}

}  // namespace isohydric::panel
