#include "isohydric/num/rounding.hpp"

#include <algorithm>
#include <array>
#include <charconv>
#include <cstddef>
#include <limits>
#include <string_view>

namespace isohydric::num {

namespace {

/// The magnitude 0.d1d2d3... times 10^point, first and last digit not 0 (but for the value 0).
struct Decimal {
    std::string digits;
    std::ptrdiff_t point;
};

/// The shortest digits that read back as `magnitude`, which is finite and not negative.
Decimal shortest_decimal(double magnitude) {
    std::array<char, 32> buffer{};
    const auto written = std::to_chars(
        buffer.data(), buffer.data() + buffer.size(), magnitude, std::chars_format::scientific);
    const std::string_view text(buffer.data(), written.ptr);
    const std::size_t mark = text.find('e');
    const bool small = text[mark + 1] == '-';
    int exponent = 0;
    std::from_chars(text.data() + mark + 2, text.data() + text.size(), exponent);

    std::string digits(text.substr(0, mark));
    std::erase(digits, '.');
    return {digits, (small ? -exponent : exponent) + 1};
}

/// Cuts after `count` digits, half away from zero; the carry may add a digit in front.
void round_to_digits(Decimal& value, std::ptrdiff_t count) {
    if (count < 0) {
        value.digits.clear();
        return;
    }
    const auto kept = static_cast<std::size_t>(count);
    if (kept >= value.digits.size()) {
        return;
    }
    const bool away = value.digits[kept] >= '5';
    value.digits.resize(kept);
    if (!away) {
        return;
    }
    const std::size_t last_below_9 = value.digits.find_last_not_of('9');
    if (last_below_9 == std::string::npos) {
        value.digits.assign(kept + 1, '0');
        value.digits.front() = '1';
        ++value.point;
        return;
    }
    ++value.digits[last_below_9];
    std::fill(value.digits.begin() + static_cast<std::ptrdiff_t>(last_below_9) + 1,
              value.digits.end(),
              '0');
}

/// Plain notation with exactly `decimals` digits after the point.
std::string plain(Decimal value, std::ptrdiff_t decimals) {
    if (value.point < 1) {
        value.digits.insert(0, static_cast<std::size_t>(1 - value.point), '0');
        value.point = 1;
    }
    value.digits.resize(static_cast<std::size_t>(value.point + decimals), '0');
    if (decimals > 0) {
        value.digits.insert(static_cast<std::size_t>(value.point), 1, '.');
    }
    return value.digits;
}

/// One digit before the point and a power of ten.
std::string scientific(const Decimal& value) {
    const std::ptrdiff_t exponent = value.point - 1;
    std::string text = value.digits.substr(0, 1);
    if (value.digits.size() > 1) {
        text += '.' + value.digits.substr(1);
    }
    return text + (exponent < 0 ? "e-" : "e+") +
           std::to_string(exponent < 0 ? -exponent : exponent);
}

std::string not_finite(double value) {
    if (value != value) {
        return "NaN";
    }
    return value < 0.0 ? "-Infinity" : "Infinity";
}

bool is_finite(double value) {
    return abs(value) <= std::numeric_limits<double>::max();
}

}  // namespace

std::string format_decimals(double value, int decimals) {
    if (!is_finite(value)) {
        return not_finite(value);
    }
    const std::ptrdiff_t places = std::max(decimals, 0);
    Decimal magnitude = shortest_decimal(abs(value));
    round_to_digits(magnitude, magnitude.point + places);
    const std::string text = plain(magnitude, places);
    const bool is_zero = text.find_first_not_of("0.") == std::string::npos;
    return value < 0.0 && !is_zero ? '-' + text : text;
}

std::string shortest(double value) {
    if (!is_finite(value)) {
        return not_finite(value);
    }
    const Decimal magnitude = shortest_decimal(abs(value));
    const auto size = static_cast<std::ptrdiff_t>(magnitude.digits.size());
    const bool is_plain = magnitude.point > -6 && magnitude.point <= 21;
    const std::string text =
        is_plain ? plain(magnitude, std::max(size - magnitude.point, std::ptrdiff_t{0}))
                 : scientific(magnitude);
    return value < 0.0 ? '-' + text : text;
}

}  // namespace isohydric::num
