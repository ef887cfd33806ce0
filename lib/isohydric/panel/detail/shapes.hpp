// The shapes of small texts in rules/analytes.json.
#pragma once

#include <algorithm>
#include <string_view>

namespace isohydric::panel::detail {

/// The check digit of a LOINC code: mod 10 over the part before the hyphen [@loinc, users guide: check digit].
[[nodiscard]] inline bool has_valid_check_digit(std::string_view code) {
    const std::size_t hyphen = code.find('-');
    if (hyphen == std::string_view::npos || hyphen == 0 || hyphen + 2 != code.size() ||
        code.find_first_not_of("0123456789-") != std::string_view::npos) {
        return false;
    }
    int sum = code.back() - '0';
    bool doubled = true;
    for (std::size_t i = hyphen; i-- > 0; doubled = !doubled) {
        const int digit = (code[i] - '0') * (doubled ? 2 : 1);
        sum += digit / 10 + digit % 10;
    }
    return sum % 10 == 0;
}

[[nodiscard]] inline bool is_date(std::string_view text) {
    constexpr std::string_view k_shape = "dddd-dd-dd";
    return text.size() == k_shape.size() &&
           std::equal(text.begin(), text.end(), k_shape.begin(), [](char c, char shape) {
               return shape == 'd' ? c >= '0' && c <= '9' : c == shape;
           });
}

[[nodiscard]] inline bool is_expression_name(std::string_view text) {
    const auto letter = [](char c) {
        return (c >= 'a' && c <= 'z') || (c >= 'A' && c <= 'Z');
    };
    return !text.empty() && letter(text.front()) &&
           std::ranges::all_of(text, [&](char c) { return letter(c) || (c >= '0' && c <= '9'); });
}

}  // namespace isohydric::panel::detail
