#include "isohydric/panel/context.hpp"

#include "isohydric/diag/text.hpp"
#include "isohydric/panel/catalogue.hpp"
#include "isohydric/units/quantity_text.hpp"
#include "isohydric/units/unit.hpp"

#include <algorithm>
#include <span>

#include <fmt/format.h>

namespace isohydric::panel {

namespace {

template <class Code>
diag::Result<Code>
read_code(std::string_view text, std::span<const std::string_view> names, std::string_view what) {
    const std::string folded = fold_name(text);
    const auto found = std::ranges::find_if(
        names, [&folded](std::string_view name) { return fold_name(name) == folded; });
    if (found != names.end()) {
        return static_cast<Code>(found - names.begin());
    }
    const std::vector<std::string> known(names.begin(), names.end());
    return diag::unexpected(
        fmt::format("there is no {} \"{}\"; known are {}", what, text, diag::join(known, ", ")));
}

/// A spelling of a unit and its UCUM code.
struct Spelling {
    std::string_view written;
    std::string_view ucum;
};

constexpr std::array k_age_units{Spelling{"min", "min"},
                                 Spelling{"minutes", "min"},
                                 Spelling{"h", "h"},
                                 Spelling{"hours", "h"},
                                 Spelling{"d", "d"},
                                 Spelling{"days", "d"},
                                 Spelling{"wk", "wk"},
                                 Spelling{"w", "wk"},
                                 Spelling{"weeks", "wk"},
                                 Spelling{"mo", "mo"},
                                 Spelling{"months", "mo"},
                                 Spelling{"y", "a"},
                                 Spelling{"yr", "a"},
                                 Spelling{"years", "a"},
                                 Spelling{"a", "a"}};
constexpr std::array k_altitude_units{
    Spelling{"", "m"}, Spelling{"m", "m"}, Spelling{"metres", "m"}, Spelling{"km", "km"}};

double convert_codes(double value, std::string_view from, std::string_view to) {
    return units::convert(value, *units::parse_unit(from), *units::parse_unit(to));
}

/// A quantity in one of the spelled units, converted; `help` says how to write it.
diag::Result<double> read_in(std::string_view text,
                             std::span<const Spelling> spellings,
                             std::string_view to,
                             std::string_view help) {
    const diag::Result<units::QuantityText> quantity = units::split_quantity(text);
    if (!quantity) {
        return diag::unexpected(fmt::format("{}; {}", quantity.error(), help));
    }
    const auto found = std::ranges::find(spellings, quantity->unit, &Spelling::written);
    if (found == spellings.end() || quantity->censoring != units::Censoring::none) {
        return diag::unexpected(fmt::format("\"{}\" was found; {}", text, help));
    }
    return convert_codes(quantity->number.value, found->ucum, to);
}

double neonate_below_a() {
    constexpr double k_neonate_below_d = 28;
    return convert_codes(k_neonate_below_d, "d", "a");
}

constexpr double k_child_below_a = 18;
constexpr double k_pregnancy_from_a = 10;

}  // namespace

diag::Result<Specimen> read_specimen(std::string_view text) {
    return read_code<Specimen>(text, k_specimen_names, "specimen");
}

diag::Result<Population> read_population(std::string_view text) {
    return read_code<Population>(text, k_population_names, "population");
}

diag::Result<StatedOnset> read_onset(std::string_view text) {
    return read_code<StatedOnset>(text, k_onset_names, "onset");
}

diag::Result<double> read_age_a(std::string_view text) {
    constexpr double k_oldest_a = 130;
    constexpr std::string_view k_help =
        "write an age with its unit, such as 15min, 6h, 3d, 5wk, 2mo, 4y";
    diag::Result<double> age_a = read_in(text, k_age_units, "a", k_help);
    if (age_a && !(*age_a >= 0 && *age_a <= k_oldest_a)) {
        return diag::unexpected(
            fmt::format("\"{}\" is not an age between 0 and {} years", text, k_oldest_a));
    }
    return age_a;
}

diag::Result<double> read_altitude_m(std::string_view text) {
    constexpr double k_lowest_m = -500;
    constexpr double k_highest_m = 9000;
    constexpr std::string_view k_help = "write an altitude in metres (1 ft is 0.3048 m)";
    diag::Result<double> altitude_m = read_in(text, k_altitude_units, "m", k_help);
    if (altitude_m && !(*altitude_m >= k_lowest_m && *altitude_m <= k_highest_m)) {
        return diag::unexpected(fmt::format(
            "\"{}\" is not an altitude between {} and {} metres", text, k_lowest_m, k_highest_m));
    }
    return altitude_m;
}

Population population_of_age(double age_a) {
    if (age_a < neonate_below_a()) {
        return Population::neonate;
    }
    return age_a < k_child_below_a ? Population::child : Population::adult;
}

bool fits_age(Population population, double age_a) {
    if (population >= Population::pregnancy_1) {
        return age_a >= k_pregnancy_from_a;
    }
    return population == population_of_age(age_a);
}

}  // namespace isohydric::panel
