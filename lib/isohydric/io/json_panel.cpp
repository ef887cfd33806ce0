#include "isohydric/io/json_panel.hpp"

#include <optional>
#include <string>

#include <fmt/format.h>

namespace isohydric::io {

namespace {

std::optional<std::string>
value_text(const diag::Json& value, std::string_view name, diag::Report& report) {
    switch (value.kind()) {
    case diag::Kind::string:
    case diag::Kind::number:
        return std::string(value.text());
    case diag::Kind::object: {
        diag::ObjectReader reader(value, report, "value");
        const diag::Json* number = reader.any("value");
        const std::optional<std::string> unit = reader.optional_text("unit");
        reader.finish();
        if (number == nullptr ||
            (number->kind() != diag::Kind::number && number->kind() != diag::Kind::string)) {
            report.error(
                "panel-value",
                value.place(),
                fmt::format("{} has no value; write {{\"value\": 4.1, \"unit\": \"mmol/L\"}}",
                            name));
            return std::nullopt;
        }
        return std::string(number->text()) + (unit ? " " + *unit : "");
    }
    case diag::Kind::null:
    case diag::Kind::boolean:
    case diag::Kind::array:
        break;
    }
    report.error(
        "panel-value",
        value.place(),
        fmt::format(
            "{} is {}; expected a number, a text with a unit, or an object with value and unit",
            name,
            diag::describe(value.kind())));
    return std::nullopt;
}

}  // namespace

void read_json_panel(const diag::Json& document, panel::PanelReader& reader, diag::Report& report) {
    diag::ObjectReader object(document, report, "panel file");
    const diag::Json* values = object.required("panel", diag::Kind::object);
    const diag::Json* context = object.optional("context", diag::Kind::object);
    object.finish();
    if (values != nullptr) {
        for (const diag::Member& member : values->members()) {
            if (const std::optional<std::string> text =
                    value_text(member.value, member.name, report)) {
                reader.add(member.name, *text, member.value.place());
            }
        }
    }
    if (context != nullptr) {
        for (const diag::Member& member : context->members()) {
            if (const std::optional<std::string> text =
                    value_text(member.value, member.name, report)) {
                reader.set_context(member.name, *text, member.value.place());
            }
        }
    }
}

}  // namespace isohydric::io
