#include "isohydric/diag/detail/json_grammar.hpp"

#include "isohydric/diag/assert.hpp"

#include <algorithm>
#include <charconv>

namespace isohydric::diag::detail {
namespace {

std::size_t skip_digits(std::string_view text, std::size_t at) {
    return std::min(text.find_first_not_of("0123456789", at), text.size());
}

bool has_one_of(std::string_view text, std::size_t at, std::string_view characters) {
    return at < text.size() && characters.find(text[at]) != std::string_view::npos;
}

}  // namespace

std::size_t skip_space(std::string_view text, std::size_t at) {
    return std::min(text.find_first_not_of(" \t\r\n", at), text.size());
}

std::size_t next_token(std::string_view text, std::size_t at) {
    const std::size_t begin = skip_space(text, at);
    return has_one_of(text, begin, ",:") ? skip_space(text, begin + 1) : begin;
}

std::size_t string_end(std::string_view text, std::size_t begin) {
    ISOHYDRIC_ASSERT(has_one_of(text, begin, "\""));
    std::size_t at = begin + 1;
    while (has_one_of(text, at = std::min(text.find_first_of("\"\\", at), text.size()), "\\")) {
        at += 2;
    }
    ISOHYDRIC_ASSERT(at < text.size());
    return at + 1;
}

std::size_t number_end(std::string_view text, std::size_t begin) {
    std::size_t at = has_one_of(text, begin, "-") ? begin + 1 : begin;
    at = has_one_of(text, at, "0") ? at + 1 : skip_digits(text, at);
    if (has_one_of(text, at, ".")) {
        at = skip_digits(text, at + 1);
    }
    if (has_one_of(text, at, "eE")) {
        const std::size_t sign = has_one_of(text, at + 1, "+-") ? 1 : 0;
        at = skip_digits(text, at + 1 + sign);
    }
    return at;
}

std::optional<std::uint32_t> escaped_unit(std::string_view rest) {
    constexpr std::size_t k_length = 6;
    if (rest.size() < k_length || !rest.starts_with("\\u")) {
        return std::nullopt;
    }
    std::uint32_t unit = 0;
    const char* end = rest.data() + k_length;
    const auto read = std::from_chars(rest.data() + 2, end, unit, 16);
    return read.ptr == end ? std::optional(unit) : std::nullopt;
}

bool is_high_surrogate(std::uint32_t unit) {
    return unit >= 0xD800 && unit < 0xDC00;
}

bool is_low_surrogate(std::uint32_t unit) {
    return unit >= 0xDC00 && unit < 0xE000;
}

StringStep string_step(std::string_view rest) {
    if (rest[0] != '\\') {
        return {1, 1};
    }
    const std::optional<std::uint32_t> unit = escaped_unit(rest);
    if (!unit) {
        return {2, 1};
    }
    if (is_high_surrogate(*unit)) {
        return {12, 4};  // with its partner
    }
    if (*unit < 0x80) {
        return {6, 1};
    }
    return {6, *unit < 0x800 ? std::size_t{2} : std::size_t{3}};
}

}  // namespace isohydric::diag::detail
