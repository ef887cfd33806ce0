#include "isohydric/units/quantity_text.hpp"

#include "isohydric/diag/text.hpp"

#include <algorithm>
#include <array>
#include <charconv>
#include <cstddef>
#include <optional>

#include <fmt/format.h>

namespace isohydric::units {

namespace {

constexpr std::string_view k_digits = "0123456789";
constexpr std::string_view k_digits_and_marks = "0123456789.,";
constexpr std::string_view k_minus_sign = "\u2212";
/// Longer than a double can tell apart.
constexpr std::size_t k_longest_number = 40;
constexpr std::size_t k_longest_quote = 40;
/// A thousands separator stands before groups of this many digits.
constexpr std::size_t k_thousands_group = 3;

/// The parts of a number as written.
struct Parts {
    bool negative = false;
    std::string_view whole;
    std::string_view fraction;
    int exponent{};
    std::size_t length{};  ///< in the text, from its start
};

/// The text in quotes, shortened between characters.
std::string quoted(std::string_view text) {
    std::size_t end = 0;
    while (end < text.size() && end < k_longest_quote) {
        end += std::max<std::size_t>(1, diag::utf8_sequence_length(text.substr(end)));
    }
    return fmt::format("\"{}{}\"", text.substr(0, end), end < text.size() ? "..." : "");
}

diag::Unexpected<std::string> refusal(std::string_view text, std::string_view reason) {
    return diag::unexpected(fmt::format("{} cannot be read: {}", quoted(text), reason));
}

/// Takes the first of the words that `text` begins with off its front.
template <std::size_t Size>
std::string_view take_any(std::string_view& text, const std::array<std::string_view, Size>& words) {
    for (const std::string_view word : words) {
        if (text.starts_with(word)) {
            text.remove_prefix(word.size());
            return word;
        }
    }
    return {};
}

/// Takes a sign off the front; whether it was a minus.
bool take_sign(std::string_view& text) {
    constexpr std::array<std::string_view, 3> k_signs{"-", "+", k_minus_sign};
    const std::string_view sign = take_any(text, k_signs);
    return !sign.empty() && sign != "+";
}

/// Without white space at both sides, the spaces of typesetters included (no-break, figure, thin, hair).
std::string_view trim_spaces(std::string_view text) {
    constexpr std::array<std::string_view, 5> k_spaces{
        "\u00a0", "\u2007", "\u2009", "\u200a", "\u202f"};
    for (std::size_t before = text.size() + 1; text.size() != before;) {
        before = text.size();
        text = diag::trim(text);
        for (const std::string_view space : k_spaces) {
            text.remove_prefix(text.starts_with(space) ? space.size() : 0);
            text.remove_suffix(text.ends_with(space) ? space.size() : 0);
        }
    }
    return text;
}

std::string_view take_while(std::string_view& text, std::string_view characters) {
    const std::size_t length = std::min(text.find_first_not_of(characters), text.size());
    const std::string_view taken = text.substr(0, length);
    text.remove_prefix(length);
    return taken;
}

/// The exponent at the front of `text`, taken off; 0 if there is none (`e` may begin a unit: `2eq`).
int take_exponent(std::string_view& text) {
    if (!text.starts_with('e') && !text.starts_with('E')) {
        return 0;
    }
    std::string_view rest = text.substr(1);
    const bool negative = take_sign(rest);
    const std::string_view digits = take_while(rest, k_digits);
    if (digits.empty()) {
        return 0;
    }
    constexpr int k_beyond_any_double = 10000;
    int exponent = 0;
    const auto [stop, fault] =
        std::from_chars(digits.data(), digits.data() + digits.size(), exponent);
    exponent = fault == std::errc{} ? std::min(exponent, k_beyond_any_double) : k_beyond_any_double;
    text = rest;
    return negative ? -exponent : exponent;
}

/// Whether a comma before three digits could separate thousands.
bool could_be_thousands(std::string_view whole, std::string_view fraction) {
    return fraction.size() == k_thousands_group && !whole.empty() &&
           whole.size() <= k_thousands_group && whole.front() != '0';
}

/// What is wrong with digits and marks, or nothing.
std::optional<std::string> fault_in(std::string_view token, DecimalMark decimal_mark) {
    if (token.find_first_of(k_digits) == std::string_view::npos) {
        return "there is no number";
    }
    if (token.size() > k_longest_number) {
        return fmt::format("the number is longer than {} characters", k_longest_number);
    }
    const std::size_t mark = token.find_first_of(".,");
    if (mark == std::string_view::npos) {
        return std::nullopt;
    }
    const std::string_view whole = token.substr(0, mark);
    const std::string_view fraction = token.substr(mark + 1);
    if (fraction.find_first_of(".,") != std::string_view::npos) {
        return "there is more than one decimal mark; write no thousands separators";
    }
    if (fraction.empty()) {
        return "no digit follows the decimal mark";
    }
    if (decimal_mark == DecimalMark::comma) {
        return token[mark] == '.' ? std::optional<std::string>(
                                        "its decimal mark is a point where commas are expected")
                                  : std::nullopt;
    }
    if (token[mark] == ',' && could_be_thousands(whole, fraction)) {
        return fmt::format("it could be {0}.{1} or {0}{1}; write one of these", whole, fraction);
    }
    return std::nullopt;
}

/// The number at the front of `text`; the error does not repeat the text.
diag::Result<Parts> scan(std::string_view text, DecimalMark decimal_mark) {
    Parts parts;
    std::string_view rest = text;
    parts.negative = take_sign(rest);
    const std::string_view token = take_while(rest, k_digits_and_marks);
    if (auto fault = fault_in(token, decimal_mark)) {
        return diag::unexpected(*std::move(fault));
    }
    const std::size_t mark = std::min(token.find_first_of(".,"), token.size());
    parts.whole = token.substr(0, mark);
    parts.fraction = token.substr(std::min(mark + 1, token.size()));
    parts.exponent = take_exponent(rest);
    parts.length = text.size() - rest.size();
    return parts;
}

diag::Result<NumberText> number_of(const Parts& parts) {
    NumberText number;
    number.digits =
        fmt::format("{}{}", parts.negative ? "-" : "", parts.whole.empty() ? "0" : parts.whole);
    if (!parts.fraction.empty()) {
        number.digits += fmt::format(".{}", parts.fraction);
    }
    if (parts.exponent != 0) {
        number.digits += fmt::format("e{}", parts.exponent);
    }
    number.decimals = static_cast<int>(parts.fraction.size()) - parts.exponent;
    const char* const end = number.digits.data() + number.digits.size();
    const auto [stop, fault] = std::from_chars(number.digits.data(), end, number.value);
    if (fault != std::errc{} || stop != end) {
        return diag::unexpected("the number is too large or too small");
    }
    return number;
}

/// Takes `<`, `<=`, `>`, `>=` and their single signs off the front.
Censoring take_censoring(std::string_view& text) {
    constexpr std::array<std::string_view, 3> k_below{"<=", "<", "\u2264"};
    constexpr std::array<std::string_view, 3> k_above{">=", ">", "\u2265"};
    if (!take_any(text, k_below).empty()) {
        return Censoring::below;
    }
    return take_any(text, k_above).empty() ? Censoring::none : Censoring::above;
}

/// Whether what follows a number goes on like a number (`12 345`, `4-5`) and not like a unit; `10*` begins a unit.
bool goes_on(std::string_view rest) {
    constexpr std::string_view k_number_signs = "+-.,";
    if (rest.empty() || rest.starts_with("10*")) {
        return false;
    }
    return k_digits.find(rest.front()) != std::string_view::npos ||
           k_number_signs.find(rest.front()) != std::string_view::npos ||
           rest.starts_with(k_minus_sign);
}

/// `'kPa'` -> `kPa`; none if a quotation mark stands without its partner.
std::optional<std::string_view> without_quotes(std::string_view unit) {
    constexpr std::string_view k_quotes = "'\"";
    if (unit.find_first_of(k_quotes) == std::string_view::npos) {
        return unit;
    }
    const bool paired = unit.size() >= 2 && unit.front() == unit.back() &&
                        unit.find_first_of(k_quotes, 1) == unit.size() - 1;
    return paired ? std::optional(trim_spaces(unit.substr(1, unit.size() - 2))) : std::nullopt;
}

}  // namespace

diag::Result<NumberText> parse_number(std::string_view text, DecimalMark decimal_mark) {
    const std::string_view trimmed = trim_spaces(text);
    const auto parts = scan(trimmed, decimal_mark);
    if (!parts) {
        return refusal(text, parts.error());
    }
    if (parts->length != trimmed.size()) {
        return refusal(text,
                       fmt::format("{} follows the number", quoted(trimmed.substr(parts->length))));
    }
    auto number = number_of(*parts);
    if (!number) {
        return refusal(text, number.error());
    }
    return number;
}

diag::Result<QuantityText> split_quantity(std::string_view text, DecimalMark decimal_mark) {
    QuantityText quantity;
    std::string_view rest = trim_spaces(text);
    quantity.censoring = take_censoring(rest);
    rest = trim_spaces(rest);
    const auto parts = scan(rest, decimal_mark);
    if (!parts) {
        return refusal(text, parts.error());
    }
    auto number = number_of(*parts);
    if (!number) {
        return refusal(text, number.error());
    }
    quantity.number = *std::move(number);
    const std::string_view behind = trim_spaces(rest.substr(parts->length));
    if (goes_on(behind)) {
        return refusal(text, fmt::format("{} follows the number", quoted(behind)));
    }
    const auto unit = without_quotes(behind);
    if (!unit) {
        return refusal(text, "a quotation mark has no partner");
    }
    quantity.unit = std::string(*unit);
    return quantity;
}

}  // namespace isohydric::units
