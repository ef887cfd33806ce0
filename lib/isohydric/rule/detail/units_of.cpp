#include "isohydric/rule/detail/units_of.hpp"

#include "isohydric/units/quantity_text.hpp"

#include <fmt/format.h>

namespace isohydric::rule::detail {
namespace {

void report_unreadable(const diag::Json& string_value,
                       const std::string& reason,
                       diag::Report& report) {
    report.error("rule-unit", string_value.place(), reason);
}

}  // namespace

std::optional<units::Unit> read_unit(const diag::Json& string_value, diag::Report& report) {
    auto unit = units::parse_unit(string_value.text());
    if (!unit) {
        report_unreadable(string_value, unit.error(), report);
        return std::nullopt;
    }
    return *unit;
}

std::optional<double>
read_quantity_text(const diag::Json& string_value, const units::Unit& unit, diag::Report& report) {
    const auto quantity = units::split_quantity(string_value.text());
    if (!quantity) {
        report_unreadable(string_value, quantity.error(), report);
        return std::nullopt;
    }
    const auto written = units::parse_unit(quantity->unit);
    if (!written) {
        report_unreadable(string_value, written.error(), report);
        return std::nullopt;
    }
    if (quantity->censoring != units::Censoring::none || !units::commensurable(*written, unit)) {
        report_unreadable(string_value,
                          fmt::format("\"{}\" is no amount in {}; write a number and a unit of "
                                      "that kind",
                                      string_value.text(),
                                      unit.code()),
                          report);
        return std::nullopt;
    }
    return units::convert(quantity->number.value, *written, unit);
}

}  // namespace isohydric::rule::detail
