#include "isohydric/panel/entering.hpp"

#include "isohydric/diag/text.hpp"

#include <algorithm>
#include <cmath>
#include <string>
#include <vector>

#include <fmt/format.h>

namespace isohydric::panel {

namespace {

/// Powers of ten up to 10^22 are exact in a double, and so is their product up to there.
double half_of_last_digit(int decimals) {
    double power = 1;
    for (int i = 0; i < std::abs(decimals); ++i) {
        power *= 10;
    }
    constexpr double k_half = 0.5;
    return decimals < 0 ? k_half * power : k_half / power;
}

std::string text_of(const units::QuantityText& quantity, const CustomaryUnit& unit) {
    std::string text = quantity.number.digits;
    if (quantity.censoring == Censoring::below) {
        text.insert(0, "<");
    } else if (quantity.censoring == Censoring::above) {
        text.insert(0, ">");
    }
    const std::string unit_text = quantity.unit.empty() ? std::string{} : unit.spoken();
    return unit_text.empty() ? text : fmt::format("{} {}", text, unit_text);
}

std::string notes(const Catalogue::Alias& alias, const CustomaryUnit& unit) {
    std::vector<std::string> parts;
    if (alias.variant) {
        parts.push_back(*alias.variant);
    }
    if (!unit.note.empty()) {
        parts.push_back(unit.note);
    }
    if (alias.negated) {
        parts.emplace_back("entered as a deficit, sign reversed");
    }
    return diag::join(parts, "; ");
}

Censoring mirrored(Censoring censoring) {
    switch (censoring) {
    case Censoring::below:
        return Censoring::above;
    case Censoring::above:
        return Censoring::below;
    case Censoring::none:
        break;
    }
    return Censoring::none;
}

/// Why the value cannot be; empty if it can.
std::string impossible(const AnalyteInfo& info, double value) {
    constexpr double k_enormous = 1000;
    const double largest = std::max(std::abs(info.accepted.low), std::abs(info.accepted.high));
    if (std::abs(value) > k_enormous * largest) {
        return fmt::format("it is far beyond anything that {} can be; check it", info.label);
    }
    if (info.accepted.low > 0 && !(value > 0)) {
        return fmt::format("{} must be above zero; leave it out if it was not measured",
                           info.label);
    }
    if (info.accepted.low == 0 && value < 0) {
        return fmt::format("{} cannot be negative; check it", info.label);
    }
    return {};
}

}  // namespace

diag::Result<Entered> enter(const AnalyteInfo& info,
                            const Catalogue::Alias& alias,
                            const units::QuantityText& quantity,
                            const CustomaryUnit& unit) {
    const double value = unit.to_canonical(quantity.number.value);
    Entered entered;
    entered.value = alias.negated ? -value : value;
    entered.half_digit = unit.scaled(half_of_last_digit(quantity.number.decimals));
    entered.as_entered = text_of(quantity, unit);
    entered.note = notes(alias, unit);
    entered.censoring = alias.negated ? mirrored(quantity.censoring) : quantity.censoring;
    const std::string why = impossible(info, entered.value);
    if (!why.empty()) {
        return diag::unexpected(fmt::format("{} was found, but {}", entered.as_entered, why));
    }
    return entered;
}

}  // namespace isohydric::panel
