// Rounding for decisions and for print: the 8 decimals at which two values count as one, and decimal
// text without locale.
#pragma once

#include "isohydric/num/exp_log.hpp"

#include <string>

namespace isohydric::num {

namespace detail {

/// The nearest whole number, halves upwards (-2.5 gives -2), for every double.
[[nodiscard, gnu::always_inline]] inline double nearest_whole_half_up(double x) {
    const double magnitude = abs(x);
    const Bits sign = bits_of(x) & k_sign_bit;
    const double whole = std::bit_cast<double>(bits_of((magnitude + 0x1p52) - 0x1p52) | sign);
    const double rounded = select(if_zero((x - whole) - 0.5), whole + 1.0, whole);
    return select(if_negative(magnitude - 0x1p52), rounded, x);
}

}  // namespace detail

/// `x` to the nearest multiple of 1e-8, halves upwards, by the operations that HL7's FHIRPath engine does
/// before it compares, so to the same bits [@fhirpath-js, src/numbers.js]. Not decreasing in `x`; infinite above
/// about 1.8e300; NaN for NaN. For comparison, not for print: a result may be one bit off the decimal.
[[nodiscard, gnu::always_inline]] inline double round_to_8_decimals(double x) {
    constexpr double k_step = 1e-8;
    return detail::nearest_whole_half_up(x / k_step) * k_step;
}

/// -1, 0 or 1 as `a` is below, equal to or above `b` at 8 decimals; 0 if either is NaN.
[[nodiscard, gnu::always_inline]] inline int compare_at_8_decimals(double a, double b) {
    const double difference = round_to_8_decimals(a) - round_to_8_decimals(b);
    const double side = detail::select(detail::if_negative(difference), -1.0, 1.0);
    const detail::Bits if_equal = detail::if_zero(difference) | detail::if_nan(difference);
    return static_cast<int>(detail::select(if_equal, 0.0, side));
}

/// `value` with exactly `decimals` digits (0 or more) after the point. Rounds the shortest decimal
/// that reads back as `value`, half away from zero: 2.675 to two decimals is 2.68. Never "-0".
[[nodiscard]] std::string format_decimals(double value, int decimals);

/// The shortest text that reads back as `value`, in the form [@ecma262, Number::toString] prescribed for
/// canonical JSON [@rfc8785, section 3.2.2.3]. "NaN", "Infinity" and "-Infinity" have no place in JSON.
[[nodiscard]] std::string shortest(double value);

}  // namespace isohydric::num
