// Units of measurement: a documented subset of UCUM's case-sensitive codes, with dimension, scale and zero point.
// Scales are kept as mantissa times power of ten, so that decimal conversions are exact.
#pragma once

#include "isohydric/diag/result.hpp"

#include <string>
#include <string_view>
#include <vector>

namespace isohydric::units {

/// Exponents of the base quantities.
struct Dimension {
    int length{};
    int mass{};
    int time{};
    int temperature{};
    int amount{};  ///< mol, eq and osm alike [@ucum, tables 3 and 6]

    friend bool operator==(const Dimension&, const Dimension&) = default;
};

[[nodiscard]] Dimension multiply(const Dimension& left, const Dimension& right);
[[nodiscard]] Dimension divide(const Dimension& left, const Dimension& right);
[[nodiscard]] Dimension power(const Dimension& base, int exponent);

/// The greatest exponent, up or down, of one atom (`m3`) and of power(); `10*` takes up to 30.
inline constexpr int k_largest_exponent = 9;

namespace detail {

/// One factor of a code: an atom with its prefix (`mmol`, `10*`) and its exponent.
struct Term {
    std::string atom;
    int exponent{};

    friend bool operator==(const Term&, const Term&) = default;
};

/// How much one of a unit is, in metres, grams, seconds, kelvins and moles: mantissa * 10^decimal_exponent, above zero_K.
struct Scale {
    Dimension dimension;
    double mantissa = 1;
    int decimal_exponent{};
    double zero_K{};  ///< 273.15 for Cel: the zero point of the unit; 0 for all others
};

}  // namespace detail

/// A unit that parse_unit() accepted or the algebra below made.
class Unit {
  public:
    /// The UCUM code: as given to parse_unit(), or written by the algebra (`mmol/L` times `L` is `mmol`).
    [[nodiscard]] const std::string& code() const { return code_; }

    [[nodiscard]] const Dimension& dimension() const { return scale_.dimension; }

    /// How many metres, grams, seconds, kelvins and moles, multiplied out, one of this unit is.
    [[nodiscard]] double factor() const;

    /// Whether the unit's zero is not the quantity's (`Cel`, `[degF]`).
    [[nodiscard]] bool has_offset() const { return scale_.zero_K != 0; }

    /// The same measure under whatever code: `mmol/L`, `mmol/l` and `meq/L` are equal, and a value needs no conversion.
    friend bool operator==(const Unit& left, const Unit& right);

    friend diag::Result<Unit> parse_unit(std::string_view ucum_code);
    friend double convert(double value, const Unit& from, const Unit& to);
    friend double factor_between(const Unit& from, const Unit& to);
    friend Unit operator*(const Unit& left, const Unit& right);
    friend Unit operator/(const Unit& left, const Unit& right);
    friend Unit power(const Unit& base, int exponent);
    friend Unit one();

  private:
    Unit(std::string code, std::vector<detail::Term> terms, const detail::Scale& scale);

    std::string code_;
    std::vector<detail::Term> terms_;
    detail::Scale scale_;
};

/// Reads a UCUM case-sensitive code [@ucum, sections 1 to 3] of this subset:
/// - atoms `m g s min h d wk mo a L l mol eq osm Pa bar m[Hg] m[H2O] [psi] K Cel [degF] % g% 1 [pH] [ppth] 10*`;
/// - UCUM's metric prefixes from `y` to `Y` on those that take them;
/// - integer exponents, `.` and `/` from left to right (`a/b.c` is `(a/b).c`), a leading `/`;
/// - annotations in braces, which count as nothing; no parentheses.
/// `[pH]` is dimensionless, in UCUM it is a logarithm of mol/L; `Cel` and `[degF]` stand alone, in products write `K`.
/// `mm[Hg]` is 133.322387415 Pa, where UCUM rounds to 133.322 Pa (a difference of 2.9e-6).
/// The error names the atom that is not known, and a known one that is near.
[[nodiscard]] diag::Result<Unit> parse_unit(std::string_view ucum_code);

/// The unit of a bare number, `1`.
[[nodiscard]] Unit one();

/// Whether values of one can be given in the other.
[[nodiscard]] bool commensurable(const Unit& left, const Unit& right);

/// The value in another unit. Requires commensurable units. Between equal units the value comes back bit for bit.
[[nodiscard]] double convert(double value, const Unit& from, const Unit& to);

/// How many of `to` one of `from` is, zero points left aside. Requires commensurable units. Exact for powers of ten of
/// 1 and above; otherwise the nearest double of the exact ratio, unless the codes raise a pressure of a liquid column to
/// powers.
[[nodiscard]] double factor_between(const Unit& from, const Unit& to);

/// Products for checking expressions; equal atoms merge, annotations are dropped. `Cel` and `[degF]` count as degrees
/// there, without their zero points, except times or over `1`, which leaves a unit as it is.
[[nodiscard]] Unit operator*(const Unit& left, const Unit& right);
[[nodiscard]] Unit operator/(const Unit& left, const Unit& right);
/// Requires an exponent within +/- k_largest_exponent.
[[nodiscard]] Unit power(const Unit& base, int exponent);

}  // namespace isohydric::units
