#include "isohydric/units/unit.hpp"

#include "isohydric/units/detail/atom.hpp"
#include "isohydric/units/detail/code.hpp"
#include "isohydric/units/spelling.hpp"

#include <algorithm>
#include <cstdlib>
#include <iterator>
#include <optional>

#include <fmt/format.h>

namespace isohydric::units {

namespace {

/// Far beyond any unit; inside it no arithmetic on scales overflows.
constexpr int k_largest_term_exponent = 1000;
constexpr int k_largest_scale_exponent = 150;
constexpr double k_largest_mantissa = 1e150;
constexpr std::string_view k_code_out_of_range = "(out of range)";
/// The dimension of nothing else.
constexpr int k_beyond = 1'000'000;
constexpr detail::Scale k_scale_out_of_range{
    .dimension = {k_beyond, k_beyond, k_beyond, k_beyond, k_beyond}, .in_range = false};

double power_of(double base, int exponent) {
    double product = 1;
    for (int i = 0; i < exponent; ++i) {
        product *= base;
    }
    return product;
}

/// The scale of a product, or none if it is out of range.
std::optional<detail::Scale> scale_of(const std::vector<detail::Term>& terms) {
    detail::Scale scale;
    double divisor = 1;
    for (const detail::Term& term : terms) {
        const auto atom = detail::find_atom(term.atom);
        const int times = std::abs(term.exponent);
        if (!atom || times > k_largest_term_exponent) {
            return std::nullopt;
        }
        scale.dimension = multiply(scale.dimension, power(atom->scale.dimension, term.exponent));
        scale.decimal_exponent += atom->scale.decimal_exponent * term.exponent;
        (term.exponent > 0 ? scale.mantissa : divisor) *= power_of(atom->scale.mantissa, times);
        if (terms.size() == 1 && term.exponent == 1) {
            scale.zero_in_kelvins = atom->scale.zero_in_kelvins;
        }
    }
    const bool in_range = scale.mantissa < k_largest_mantissa && divisor < k_largest_mantissa &&
                          std::abs(scale.decimal_exponent) <= k_largest_scale_exponent;
    scale.mantissa /= divisor;
    return in_range ? std::optional(scale) : std::nullopt;
}

/// The exact ratio of two scales as a fraction of two doubles, each rounded at most once.
struct Ratio {
    double above;
    double below;
};

Ratio ratio(const Unit& from, const Unit& to) {
    ISOHYDRIC_ASSERT(commensurable(from, to));
    const int exponent = from.scale().decimal_exponent - to.scale().decimal_exponent;
    if (from.scale().mantissa == to.scale().mantissa) {
        return {detail::power_of_ten(exponent), detail::power_of_ten(-exponent)};
    }
    return {from.scale().mantissa * detail::power_of_ten(exponent),
            to.scale().mantissa * detail::power_of_ten(-exponent)};
}

Unit product(const Unit& left, const Unit& right, int right_exponent) {
    if (!left.in_range() || !right.in_range()) {
        return left.in_range() ? right : left;
    }
    std::vector<detail::Term> terms = left.terms();
    std::ranges::transform(right.terms(), std::back_inserter(terms), [&](detail::Term term) {
        term.exponent *= right_exponent;
        return term;
    });
    terms = detail::merge(std::move(terms));
    std::string code = detail::write_terms(terms);
    return detail::make_unit(std::move(code), std::move(terms));
}

/// A bare number, or a unit of annotations only.
bool is_one(const Unit& unit) {
    return unit.in_range() && unit.terms().empty();
}

/// `; write "meq/L"` or `; did you mean "mmol/L"?`, or nothing.
std::string advice(std::string_view code) {
    if (const auto known = ucum_of(code)) {
        return fmt::format("; write \"{}\"", *known);
    }
    const std::string near = suggest_unit(code);
    return near.empty() ? "" : fmt::format("; did you mean \"{}\"?", near);
}

}  // namespace

Dimension multiply(const Dimension& left, const Dimension& right) {
    return {.length = left.length + right.length,
            .mass = left.mass + right.mass,
            .time = left.time + right.time,
            .temperature = left.temperature + right.temperature,
            .amount = left.amount + right.amount};
}

Dimension divide(const Dimension& left, const Dimension& right) {
    return multiply(left, power(right, -1));
}

Dimension power(const Dimension& base, int exponent) {
    return {.length = base.length * exponent,
            .mass = base.mass * exponent,
            .time = base.time * exponent,
            .temperature = base.temperature * exponent,
            .amount = base.amount * exponent};
}

Unit::Unit(std::string code, std::vector<detail::Term> terms, const detail::Scale& scale)
    : code_(std::move(code)), terms_(std::move(terms)), scale_(scale) {}

double Unit::factor() const {
    return scale_.mantissa * detail::power_of_ten(scale_.decimal_exponent) /
           detail::power_of_ten(-scale_.decimal_exponent);
}

Unit detail::make_unit(std::string code, std::vector<Term> terms) {
    const auto scale = scale_of(terms);
    return scale ? Unit(std::move(code), std::move(terms), *scale)
                 : Unit(std::string(k_code_out_of_range), {}, k_scale_out_of_range);
}

diag::Result<Unit> parse_unit(std::string_view ucum_code) {
    const auto refuse = [&](std::string_view reason) {
        return diag::unexpected(
            fmt::format("unit \"{}\" cannot be read: {}{}", ucum_code, reason, advice(ucum_code)));
    };
    auto terms = detail::parse_terms(ucum_code);
    if (!terms) {
        return refuse(terms.error());
    }
    auto unit = detail::make_unit(std::string(ucum_code), *std::move(terms));
    if (!unit.in_range()) {
        return refuse("its powers are out of range");
    }
    return unit;
}

Unit one() {
    return detail::make_unit("1", {});
}

bool commensurable(const Unit& left, const Unit& right) {
    return left.in_range() && right.in_range() && left.dimension() == right.dimension();
}

bool operator==(const Unit& left, const Unit& right) {
    return commensurable(left, right) &&
           left.scale().zero_in_kelvins == right.scale().zero_in_kelvins &&
           factor_between(left, right) == 1;
}

double convert(double value, const Unit& from, const Unit& to) {
    const auto [above, below] = ratio(from, to);
    const double from_zero_in_kelvins = from.scale().zero_in_kelvins;
    const double to_zero_in_kelvins = to.scale().zero_in_kelvins;
    if (from_zero_in_kelvins == to_zero_in_kelvins) {
        return value * above / below;
    }
    return (value * from.factor() + (from_zero_in_kelvins - to_zero_in_kelvins)) / to.factor();
}

double factor_between(const Unit& from, const Unit& to) {
    const auto [above, below] = ratio(from, to);
    return above / below;
}

Unit operator*(const Unit& left, const Unit& right) {
    if (is_one(left)) {
        return right;
    }
    return is_one(right) ? left : product(left, right, 1);
}

Unit operator/(const Unit& left, const Unit& right) {
    return is_one(right) ? left : product(left, right, -1);
}

Unit power(const Unit& base, int exponent) {
    constexpr int k_surely_out_of_range = k_largest_term_exponent + 1;
    return product(
        one(), base, std::clamp(exponent, -k_surely_out_of_range, k_surely_out_of_range));
}

}  // namespace isohydric::units
