#include "isohydric/units/spelling.hpp"

#include "isohydric/diag/text.hpp"
#include "isohydric/units/detail/code.hpp"

#include <algorithm>
#include <array>
#include <utility>

namespace isohydric::units {

namespace {

struct Spelling {
    std::string_view written;
    std::string_view ucum;
};

/// Whole units that are not composed as UCUM's are. Common practice.
constexpr std::array k_whole{
    Spelling{"mmHg", "mm[Hg]"},
    Spelling{"mm Hg", "mm[Hg]"},
    Spelling{"mmhg", "mm[Hg]"},
    // 101325/760 Pa, 1.4e-7 less than mm[Hg]: below any instrument.
    Spelling{"torr", "mm[Hg]"},
    Spelling{"Torr", "mm[Hg]"},
    Spelling{"kpa", "kPa"},
    Spelling{"KPa", "kPa"},
    Spelling{"hpa", "hPa"},
    Spelling{"mb", "mbar"},
    Spelling{"cmH2O", "cm[H2O]"},
    Spelling{"cm H2O", "cm[H2O]"},
    Spelling{"psi", "[psi]"},
    Spelling{"C", "Cel"},
    Spelling{"degC", "Cel"},
    Spelling{"deg C", "Cel"},
    Spelling{"\u00b0C", "Cel"},
    Spelling{"\u00b0 C", "Cel"},
    Spelling{"\u2103", "Cel"},
    Spelling{"Celsius", "Cel"},
    Spelling{"F", "[degF]"},
    Spelling{"degF", "[degF]"},
    Spelling{"deg F", "[degF]"},
    Spelling{"\u00b0F", "[degF]"},
    Spelling{"\u00b0 F", "[degF]"},
    Spelling{"\u2109", "[degF]"},
    Spelling{"Fahrenheit", "[degF]"},
    Spelling{"mM", "mmol/L"},
    Spelling{"uM", "umol/L"},
    Spelling{"nM", "nmol/L"},
    Spelling{"percent", "%"},
    Spelling{"\u2030", "[ppth]"},
    Spelling{"fraction", "1"},
    Spelling{"ratio", "1"},
    Spelling{"pH", "[pH]"},
    Spelling{"pH units", "[pH]"},
    Spelling{"units", "1"},
};

/// Parts on either side of a `/`. Common practice.
constexpr std::array k_parts{
    Spelling{"Eq", "eq"},       Spelling{"mEq", "meq"},       Spelling{"uEq", "ueq"},
    Spelling{"mval", "meq"},    Spelling{"Osm", "osm"},       Spelling{"mOsm", "mosm"},
    Spelling{"mOsmol", "mosm"}, Spelling{"mosmol", "mosm"},   Spelling{"mMol", "mmol"},
    Spelling{"mcmol", "umol"},  Spelling{"mcg", "ug"},        Spelling{"gm", "g"},
    Spelling{"Kg", "kg"},       Spelling{"kgH2O", "kg{H2O}"}, Spelling{"kg H2O", "kg{H2O}"},
    Spelling{"litre", "L"},     Spelling{"liter", "L"},       Spelling{"sec", "s"},
    Spelling{"hr", "h"},
};

/// What a misspelling may have meant: the units of the trade, the commoner of two near ones first.
constexpr std::array<std::string_view, 31> k_suggestions{
    "mmol/L",  "mEq/L",     "mmHg",    "kPa",     "g/dL",     "g/L",   "mg/dL", "umol/L",
    "mOsm/kg", "mosmol/kg", "mmol/kg", "mmol/dL", "nmol/L",   "mol/L", "ug/dL", "mg/L",
    "ng/mL",   "mOsm/L",    "mL/dL",   "percent", "hPa",      "mbar",  "cmH2O", "torr",
    "mm[Hg]",  "degC",      "degF",    "Celsius", "fraction", "min",   "L/min",
};

/// The micro sign and the Greek letter, both read as UCUM's `u`.
constexpr std::array<std::string_view, 2> k_micro{"\u00b5", "\u03bc"};

std::string with_ascii_micro(std::string_view text) {
    std::string result;
    while (!text.empty()) {
        const auto* const micro = std::ranges::find_if(
            k_micro, [&](std::string_view sign) { return text.starts_with(sign); });
        const std::size_t length = micro == k_micro.end() ? 1 : micro->size();
        result += micro == k_micro.end() ? text.substr(0, length) : "u";
        text.remove_prefix(length);
    }
    return result;
}

template <std::size_t Size>
std::optional<std::string_view> look_up(const std::array<Spelling, Size>& table,
                                        std::string_view written) {
    const auto found = std::ranges::find(table, written, &Spelling::written);
    return found == table.end() ? std::nullopt : std::optional(found->ucum);
}

bool is_code(std::string_view text) {
    auto terms = detail::parse_terms(text);
    return terms && detail::make_unit({}, *std::move(terms)).in_range();
}

/// Each part between slashes by itself: `mEq / l` -> `meq/l`.
std::string by_parts(std::string_view text) {
    std::string code;
    for (;;) {
        const std::size_t slash = text.find('/');
        const std::string_view part = diag::trim(text.substr(0, slash));
        code += look_up(k_parts, part).value_or(part);
        if (slash == std::string_view::npos) {
            return code;
        }
        code += '/';
        text.remove_prefix(slash + 1);
    }
}

}  // namespace

std::optional<std::string> ucum_of(std::string_view written) {
    const std::string text = with_ascii_micro(diag::trim(written));
    if (is_code(text)) {
        return text;
    }
    if (const auto whole = look_up(k_whole, text)) {
        return std::string(*whole);
    }
    std::string code = by_parts(text);
    return is_code(code) ? std::optional(std::move(code)) : std::nullopt;
}

std::string suggest_unit(std::string_view written) {
    return diag::nearest(with_ascii_micro(diag::trim(written)), k_suggestions);
}

}  // namespace isohydric::units
