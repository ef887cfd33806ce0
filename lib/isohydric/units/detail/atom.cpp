#include "isohydric/units/detail/atom.hpp"

#include <algorithm>
#include <array>

namespace isohydric::units::detail {

namespace {

struct NamedAtom {
    std::string_view name;
    Atom atom;
};

struct Prefix {
    std::string_view name;
    int decimal_exponent;
};

constexpr Dimension k_number{};
constexpr Dimension k_length{.length = 1};
constexpr Dimension k_volume{.length = 3};
constexpr Dimension k_mass{.mass = 1};
constexpr Dimension k_time{.time = 1};
constexpr Dimension k_temperature{.temperature = 1};
constexpr Dimension k_amount{.amount = 1};
constexpr Dimension k_pressure{.length = -1, .mass = 1, .time = -2};
constexpr Dimension k_mass_concentration{.length = -3, .mass = 1};

/// Zero of the Celsius scale. Defined. [@ucum, section 4.3]
constexpr double k_zero_celsius_in_kelvins = 273.15;
/// A degree Fahrenheit is 5/9 K. Defined. [@ucum, section 4.4]
constexpr double k_degree_fahrenheit_in_kelvins = 5.0 / 9;
/// Zero of the Fahrenheit scale, 459.67 degrees above absolute zero. Derived from 32 degF at 0 degC. [@ucum, section 4.4]
constexpr double k_zero_fahrenheit_in_kelvins = 459.67 * 5 / 9;
/// The conventional column of mercury, 13595.1 kg/m3 times 9.80665 m/s2, in uPa per m, so that it is a whole number.
/// Defined. Printed as 133.3224 Pa for a millimetre [@nist-sp811, appendix B.8 and footnote 12].
constexpr double k_mercury_in_micropascals = 133322387415;
/// 1000 kg/m3 times 9.80665 m/s2: the conventional column of water. Defined. [@ucum, section 4.4]
constexpr double k_water_in_pascals = 9806.65;
/// A pound-force, 0.45359237 kg times 9.80665 m/s2, on a square inch, 0.0254 m squared. Defined. [@ucum, section 4.4]
constexpr double k_psi_in_pascals = 0.45359237 * 9.80665 / (0.0254 * 0.0254);

/// A pascal is 1000 g/(m.s2).
constexpr int k_pascal = 3;
/// A litre is 10^-3 m3.
constexpr int k_litre = -3;

constexpr NamedAtom
metric(std::string_view name, const Dimension& dimension, double mantissa, int decimal_exponent) {
    return {name, {{dimension, mantissa, decimal_exponent, 0}, AtomKind::metric}};
}

constexpr NamedAtom
plain(std::string_view name, const Dimension& dimension, double mantissa, int decimal_exponent) {
    return {name, {{dimension, mantissa, decimal_exponent, 0}, AtomKind::plain}};
}

constexpr NamedAtom
alone(std::string_view name, const Dimension& dimension, double mantissa, double zero_in_kelvins) {
    return {name, {{dimension, mantissa, 0, zero_in_kelvins}, AtomKind::alone}};
}

/// Values and metric marks. A Julian year of 365.25 d, a month of a twelfth of it. [@ucum, sections 4.2 to 4.4]
constexpr std::array k_atoms{
    metric("m", k_length, 1, 0),
    metric("g", k_mass, 1, 0),
    metric("s", k_time, 1, 0),
    plain("min", k_time, 6, 1),
    plain("h", k_time, 36, 2),
    plain("d", k_time, 864, 2),
    plain("wk", k_time, 6048, 2),
    plain("mo", k_time, 26298, 2),
    plain("a", k_time, 315576, 2),
    metric("L", k_volume, 1, k_litre),
    metric("l", k_volume, 1, k_litre),
    metric("mol", k_amount, 1, 0),
    metric("eq", k_amount, 1, 0),
    metric("osm", k_amount, 1, 0),
    metric("Pa", k_pressure, 1, k_pascal),
    metric("bar", k_pressure, 1, k_pascal + 5),
    metric("m[Hg]", k_pressure, k_mercury_in_micropascals, k_pascal - 6),
    metric("m[H2O]", k_pressure, k_water_in_pascals, k_pascal),
    plain("[psi]", k_pressure, k_psi_in_pascals, k_pascal),
    metric("K", k_temperature, 1, 0),
    alone("Cel", k_temperature, 1, k_zero_celsius_in_kelvins),
    alone("[degF]", k_temperature, k_degree_fahrenheit_in_kelvins, k_zero_fahrenheit_in_kelvins),
    plain("%", k_number, 1, -2),
    metric("g%", k_mass_concentration, 1, 1 - k_litre),
    plain("[ppth]", k_number, 1, -3),
    plain("10*", k_number, 1, 1),
    alone("[pH]", k_number, 1, 0),
};

/// [@ucum, section 4.1]
constexpr std::array k_prefixes{
    Prefix{"Y", 24},  Prefix{"Z", 21},  Prefix{"E", 18},  Prefix{"P", 15},  Prefix{"T", 12},
    Prefix{"G", 9},   Prefix{"M", 6},   Prefix{"k", 3},   Prefix{"h", 2},   Prefix{"da", 1},
    Prefix{"d", -1},  Prefix{"c", -2},  Prefix{"m", -3},  Prefix{"u", -6},  Prefix{"n", -9},
    Prefix{"p", -12}, Prefix{"f", -15}, Prefix{"a", -18}, Prefix{"z", -21}, Prefix{"y", -24},
};

const Atom* find_bare(std::string_view name) {
    const auto* found = std::ranges::find(k_atoms, name, &NamedAtom::name);
    return found == k_atoms.end() ? nullptr : &found->atom;
}

}  // namespace

std::optional<Atom> find_atom(std::string_view text) {
    if (const Atom* bare = find_bare(text)) {
        return *bare;
    }
    for (const Prefix& prefix : k_prefixes) {
        if (!text.starts_with(prefix.name)) {
            continue;
        }
        const Atom* metric_atom = find_bare(text.substr(prefix.name.size()));
        if (metric_atom != nullptr && metric_atom->kind == AtomKind::metric) {
            Atom prefixed{metric_atom->scale, AtomKind::plain};
            prefixed.scale.decimal_exponent += prefix.decimal_exponent;
            return prefixed;
        }
    }
    return std::nullopt;
}

double power_of_ten(int exponent) {
    double power = 1;
    for (int i = 0; i < exponent; ++i) {
        power *= 10;
    }
    return power;
}

}  // namespace isohydric::units::detail
