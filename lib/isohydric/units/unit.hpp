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
    int amount{};  ///< mol, eq and osm alike: UCUM defines eq and osm as 1 mol [@ucum, section 4.4]

    friend bool operator==(const Dimension&, const Dimension&) = default;
};

[[nodiscard]] Dimension multiply(const Dimension& left, const Dimension& right);
[[nodiscard]] Dimension divide(const Dimension& left, const Dimension& right);
[[nodiscard]] Dimension power(const Dimension& base, int exponent);

/// The greatest exponent, up or down, of an atom in a code (`m3`).
inline constexpr int k_largest_exponent = 9;
/// The same for `10*`.
inline constexpr int k_largest_decimal_exponent = 30;

class Unit;

namespace detail {

/// One factor of a code: an atom with its prefix (`mmol`, `10*`) and its exponent.
struct Term {
    std::string atom;
    int exponent{};

    friend bool operator==(const Term&, const Term&) = default;
};

/// One of a unit is mantissa * 10^decimal_exponent metres, grams, seconds, kelvins and moles.
struct Scale {
    Dimension dimension;
    double mantissa = 1;
    int decimal_exponent{};
    double zero_in_kelvins{};  ///< of the unit's zero: 273.15 for Cel; 0 without offset
    bool in_range = true;
};

/// Never fails: what no double can hold gives a unit that is not in range.
[[nodiscard]] Unit make_unit(std::string code, std::vector<Term> terms);

}  // namespace detail

/// A unit that parse_unit() accepted or the algebra below made.
class Unit {
  public:
    /// The UCUM code: as given to parse_unit(), or written by the algebra (`mmol/L` times `L` is `mmol`).
    [[nodiscard]] const std::string& code() const { return code_; }

    [[nodiscard]] const Dimension& dimension() const { return scale_.dimension; }

    /// How many metres, grams, seconds, kelvins and moles, multiplied out, one of this unit is.
    [[nodiscard]] double factor() const;

    /// False for a product or power beyond all reason (`m` to the 10000th). It is commensurable with nothing, not even
    /// itself, and whatever is made from it is not in range either.
    [[nodiscard]] bool in_range() const { return scale_.in_range; }

    /// Whether the unit's zero is not the quantity's (`Cel`, `[degF]`).
    [[nodiscard]] bool has_offset() const { return scale_.zero_in_kelvins != 0; }

    [[nodiscard]] const std::vector<detail::Term>& terms() const { return terms_; }

    [[nodiscard]] const detail::Scale& scale() const { return scale_; }

  private:
    friend Unit detail::make_unit(std::string code, std::vector<detail::Term> terms);

    Unit(std::string code, std::vector<detail::Term> terms, const detail::Scale& scale);

    std::string code_;
    std::vector<detail::Term> terms_;
    detail::Scale scale_;
};

/// Reads a UCUM case-sensitive code [@ucum, sections 2 to 4] of this subset:
/// - atoms `m g s min h d wk mo a L l mol eq osm Pa bar m[Hg] m[H2O] [psi] K Cel [degF] % g% 1 [pH] [ppth] 10*`;
/// - UCUM's metric prefixes from `y` to `Y` on those that take them;
/// - exponents, `.` and `/` from left to right (`a/b.c` is `(a/b).c`), a leading `/`;
/// - annotations in braces behind an atom or alone, which count as nothing; no parentheses.
/// `[pH]` is a bare number, where UCUM has a logarithm of mol/L. `Cel`, `[degF]` and `[pH]` stand alone, as in UCUM.
/// `mm[Hg]` is 133.322387415 Pa, where UCUM rounds to 133.322 Pa (a difference of 2.9e-6).
/// The error names the part that is not known, and what is near to the code.
[[nodiscard]] diag::Result<Unit> parse_unit(std::string_view ucum_code);

/// The unit of a bare number, `1`.
[[nodiscard]] Unit one();

/// Whether values of one can be given in the other.
[[nodiscard]] bool commensurable(const Unit& left, const Unit& right);

/// The same measure under whatever code: `mmol/L`, `mmol/l` and `meq/L` are equal; a value needs no conversion.
[[nodiscard]] bool operator==(const Unit& left, const Unit& right);

/// The value in another unit. Requires commensurable units. Between equal units it comes back bit for bit.
[[nodiscard]] double convert(double value, const Unit& from, const Unit& to);

/// How many of `to` one of `from` is, zero points left aside. Requires commensurable units. Exact where the ratio is a
/// power of ten up to 10^22, the nearest double down to 10^-22, otherwise within three units in the last place.
[[nodiscard]] double factor_between(const Unit& from, const Unit& to);

/// Products, for checking expressions: equal atoms merge, annotations and `[pH]` are dropped, `1` changes nothing. `Cel`
/// and `[degF]` count as degrees in a product, without their zero points.
[[nodiscard]] Unit operator*(const Unit& left, const Unit& right);
[[nodiscard]] Unit operator/(const Unit& left, const Unit& right);
[[nodiscard]] Unit power(const Unit& base, int exponent);

}  // namespace isohydric::units
