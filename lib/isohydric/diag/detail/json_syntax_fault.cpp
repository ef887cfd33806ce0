// Plain words for JSON syntax errors: what could stand at the place, what stands there, and how it
// is usually meant.
#include "isohydric/diag/assert.hpp"
#include "isohydric/diag/detail/json_grammar.hpp"
#include "isohydric/diag/text.hpp"

#include <algorithm>
#include <array>

#include <fmt/format.h>

namespace isohydric::diag::detail {
namespace {

/// What may come next, in words. `separator` (0 for none) must stand in front of it.
struct Expectation {
    char separator;
    std::string_view instead_of_separator;
    std::string_view token;
};

Expectation expectation(After after) {
    switch (after) {
    case After::nothing:
        return {'\0', "", "a value"};
    case After::array_begin:
        return {'\0', "", "a value or ']'"};
    case After::object_begin:
        return {'\0', "", "a name in double quotes or '}'"};
    case After::name:
        return {':', "':' behind the name", "a value"};
    case After::array_item:
        return {',', "',' or ']'", "a value"};
    case After::member_value:
        return {',', "',' or '}'", "a name in double quotes"};
    case After::document:
        return {'\0', "", "the end of the text"};
    }
    ISOHYDRIC_NEVER();
}

bool expects_name(After after) {
    return after == After::object_begin || after == After::member_value;
}

bool is_digit(char character) {
    return character >= '0' && character <= '9';
}

bool is_letter(char character) {
    return (character >= 'a' && character <= 'z') || (character >= 'A' && character <= 'Z');
}

bool is_word_part(char character) {
    constexpr std::string_view k_others = "_$+-.";
    return is_letter(character) || is_digit(character) ||
           k_others.find(character) != std::string_view::npos;
}

/// What stands at a place: a word or number as a whole, else one character; empty at the end.
std::string_view found_at(std::string_view text, std::size_t begin) {
    const std::string_view rest = text.substr(begin);
    const auto* word_end = std::find_if_not(rest.begin(), rest.end(), is_word_part);
    const auto word_length = static_cast<std::size_t>(word_end - rest.begin());
    return rest.substr(0, std::max(word_length, utf8_sequence_length(rest)));
}

std::string describe_found(std::string_view found) {
    constexpr std::size_t k_longest = 40;
    if (found.empty()) {
        return "the end of the text";
    }
    if (found == "\"") {
        return "a string";
    }
    return fmt::format("'{}{}'", found.substr(0, k_longest), found.size() > k_longest ? "..." : "");
}

/// Words that people write for values, in lower case and without sign, and what to write in JSON.
struct ForeignWord {
    std::string_view word;
    std::string_view advice;
};

constexpr std::string_view k_no_such_number = "JSON has no such number: write null or leave it out";
constexpr std::array<ForeignWord, 8> k_foreign_words{{
    {"nan", k_no_such_number},
    {"inf", k_no_such_number},
    {"infinity", k_no_such_number},
    {"true", "write true in lower case"},
    {"false", "write false in lower case"},
    {"null", "write null in lower case"},
    {"none", "write null or leave it out"},
    {"undefined", "write null or leave it out"},
}};

std::string_view word_advice(std::string_view unsigned_word) {
    const std::string plain = lower(unsigned_word);
    for (const ForeignWord& each : k_foreign_words) {
        if (each.word == plain) {
            return each.advice;
        }
    }
    return "text stands in double quotes";
}

/// Advice for a word, number or single character where a value was expected.
std::string_view value_advice(std::string_view found) {
    const std::size_t sign = found.front() == '-' || found.front() == '+' ? 1 : 0;
    const std::string_view plain = found.substr(sign);
    if (!plain.empty() && is_letter(plain.front())) {
        return word_advice(plain);
    }
    if (found.front() == '+') {
        return "a number has no plus sign in front";
    }
    if (plain.starts_with('.')) {
        return "a number has a digit before its point";
    }
    return is_word_part(found.front()) ? "numbers are written like 12, -0.5 or 3e-7"
                                       : std::string_view();
}

/// Advice for characters that are wrong wherever they stand between tokens.
std::string_view character_advice(std::string_view found) {
    switch (found.front()) {
    case '/':
    case '#':
        return "JSON has no comments";
    case '\'':
        return "names and text stand in double quotes";
    default:
        return {};
    }
}

/// Advice for what was found where the token itself, not its separator, was expected.
std::string_view token_advice(std::string_view found, After after) {
    const bool is_behind_comma = after == After::array_item || after == After::member_value;
    if (is_behind_comma && (found == "}" || found == "]")) {
        return "remove the comma before it";
    }
    if (after == After::document) {
        return "one text holds one value";
    }
    if (expects_name(after)) {
        return is_word_part(found.front()) ? "put the name in double quotes" : std::string_view();
    }
    return value_advice(found);
}

std::optional<SyntaxFault> escape_fault(std::string_view text, std::size_t at) {
    constexpr std::string_view k_simple = "\"\\/bfnrt";
    const std::string_view rest = text.substr(at);
    if (rest.size() > 1 && k_simple.find(rest[1]) != std::string_view::npos) {
        return std::nullopt;
    }
    if (!rest.starts_with("\\u")) {
        return SyntaxFault{
            {at, at + 1},
            "no such escape: those of JSON are \\\" \\\\ \\/ \\b \\f \\n \\r \\t and \\uXXXX"};
    }
    const std::optional<std::uint32_t> unit = escaped_unit(rest);
    if (!unit) {
        return SyntaxFault{{at, at + 2}, "\\u needs four hexadecimal digits behind it"};
    }
    const auto partner = is_high_surrogate(*unit) ? escaped_unit(rest.substr(6)) : std::nullopt;
    const bool has_partner = partner && is_low_surrogate(*partner);
    if (is_low_surrogate(*unit) || (is_high_surrogate(*unit) && !has_partner)) {
        return SyntaxFault{{at, at + 6},
                           "half of a surrogate pair: write both halves, or the character itself"};
    }
    return std::nullopt;
}

/// The fault of the string literal that begins at `begin`.
SyntaxFault string_fault(std::string_view text, std::size_t begin) {
    std::size_t at = begin + 1;
    while (at < text.size() && text[at] != '"') {
        if (text[at] == '\n' || text[at] == '\r') {
            return {{begin, at},
                    "the string is not closed on its line: close it, or write the line end as \\n"};
        }
        if (static_cast<unsigned char>(text[at]) < 0x20) {
            return {{at, at + 1},
                    fmt::format("control character in a string: write it as \\u{:04X}",
                                static_cast<unsigned>(text[at]))};
        }
        if (text[at] == '\\') {
            if (auto fault = escape_fault(text, at)) {
                return *fault;
            }
        }
        at += string_step(text.substr(at)).raw;
    }
    return {{begin, text.size()}, "the string is not closed"};
}

}  // namespace

SyntaxFault explain_syntax(std::string_view text, std::size_t last_end, After after) {
    const Expectation expected = expectation(after);
    std::size_t begin = skip_space(text, last_end);
    bool needs_separator = expected.separator != '\0';
    if (needs_separator && begin < text.size() && text[begin] == expected.separator) {
        begin = skip_space(text, begin + 1);
        needs_separator = false;
    }
    const std::string_view found = found_at(text, begin);
    const Span span{begin, begin + found.size()};
    if (found.empty() && after == After::nothing) {
        return {span, "the text is empty: expected a JSON value"};
    }
    if (found == "\"" && !needs_separator && after != After::document) {
        return string_fault(text, begin);
    }
    std::string_view advice;
    if (!found.empty()) {
        const bool has_leading_zero =
            begin == last_end && begin > 0 && text[begin - 1] == '0' && is_digit(found.front());
        advice = character_advice(found);
        if (advice.empty() && has_leading_zero) {
            advice = "a number has no leading zeros";
        } else if (advice.empty() && !needs_separator) {
            advice = token_advice(found, after);
        }
    }
    return {span,
            fmt::format("expected {}, found {}{}{}",
                        needs_separator ? expected.instead_of_separator : expected.token,
                        describe_found(found),
                        advice.empty() ? "" : "; ",
                        advice)};
}

}  // namespace isohydric::diag::detail
