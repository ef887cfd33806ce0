// Numbers and quantities as people write them: decimal point or comma, a real minus sign, a unit close behind.
// What could be read in two ways is refused with both readings.
#pragma once

#include "isohydric/diag/result.hpp"

#include <string>
#include <string_view>

namespace isohydric::units {

/// Which sign may stand before the decimals.
enum class DecimalMark {
    point_or_comma,  ///< either; `1,234` is ambiguous and refused
    comma  ///< the source is known to write commas: `1,234` is 1.234, and a point is refused
};

/// A number and how finely it was written.
struct NumberText {
    double value{};
    int decimals{};  ///< the last digit stands for 10^-decimals; negative with an exponent (`1e3`: -3)
    std::string digits;  ///< as written, with `-` and `.` in ASCII and no `+`: `-4.5`
};

/// Reads one number: digits with a decimal point or comma, a sign (`+`, `-`, U+2212), a plain exponent (`1e3`), spaces
/// around it. Refused: thousands separators, hexadecimal, `nan`, `inf`, anything behind the number, and what is longer
/// than 40 characters or outside the range of a double.
[[nodiscard]] diag::Result<NumberText>
parse_number(std::string_view text, DecimalMark decimal_mark = DecimalMark::point_or_comma);

/// Whether a value is a bound that the instrument could not pass.
enum class Censoring {
    none,
    below,  ///< `<0.5`, `<=0.5`, U+2264
    above   ///< `>20`, `>=20`, U+2265
};

/// A quantity as written.
struct QuantityText {
    NumberText number;
    Censoring censoring = Censoring::none;
    std::string unit;  ///< as written, without quotes; empty: none. See ucum_of().
};

/// Separates number and unit: `3.9kPa`, `3.9 kPa`, `5.3 'kPa'`, `7.21`, `<0.5 mmol/L`. The unit is not looked up.
[[nodiscard]] diag::Result<QuantityText>
split_quantity(std::string_view text, DecimalMark decimal_mark = DecimalMark::point_or_comma);

}  // namespace isohydric::units
