#include "isohydric/diag/text.hpp"

#include <algorithm>
#include <array>
#include <numeric>

#include <fmt/format.h>

namespace isohydric::diag {
namespace {

constexpr std::size_t k_longest_word = 64;  // bounds the work on hostile names

/// Steps from one word to another; neighbours swap in one step, and no piece is changed twice (the
/// "optimal string alignment" form of the Damerau-Levenshtein distance).
std::size_t distance(std::string_view from, std::string_view to) {
    std::vector<std::size_t> before_last(to.size() + 1);
    std::vector<std::size_t> last(to.size() + 1);
    std::vector<std::size_t> current(to.size() + 1);
    std::iota(last.begin(), last.end(), std::size_t{0});
    for (std::size_t i = 1; i <= from.size(); ++i) {
        current[0] = i;
        for (std::size_t j = 1; j <= to.size(); ++j) {
            const std::size_t replaced = last[j - 1] + (from[i - 1] == to[j - 1] ? 0 : 1);
            current[j] = std::min({replaced, last[j] + 1, current[j - 1] + 1});
            if (i > 1 && j > 1 && from[i - 1] == to[j - 2] && from[i - 2] == to[j - 1]) {
                current[j] = std::min(current[j], before_last[j - 2] + 1);
            }
        }
        before_last.swap(last);
        last.swap(current);
    }
    return last.back();
}

template <class Word>
std::string nearest_of(std::string_view wanted, std::span<const Word> candidates) {
    if (wanted.size() > k_longest_word) {
        return {};
    }
    const std::string wanted_lower = lower(wanted);
    std::size_t allowed = std::min<std::size_t>(3, wanted.size() / 3);
    std::string best;
    for (const Word& candidate : candidates) {
        if (candidate.size() > wanted.size() + allowed || candidate.empty()) {
            continue;
        }
        const std::size_t steps = distance(wanted_lower, lower(candidate));
        if (steps < allowed || (steps == allowed && best.empty())) {
            allowed = steps;
            best = candidate;
        }
    }
    return best;
}

/// One row of the table of well-formed sequences of more than one byte; all bytes behind the second
/// are 80..BF.
struct Utf8Row {
    unsigned char lead_low;
    unsigned char lead_high;
    unsigned char second_low;
    unsigned char second_high;
    std::size_t length;
};

constexpr std::array<Utf8Row, 8> k_utf8_rows{{
    {0xC2, 0xDF, 0x80, 0xBF, 2},
    {0xE0, 0xE0, 0xA0, 0xBF, 3},
    {0xE1, 0xEC, 0x80, 0xBF, 3},
    {0xED, 0xED, 0x80, 0x9F, 3},
    {0xEE, 0xEF, 0x80, 0xBF, 3},
    {0xF0, 0xF0, 0x90, 0xBF, 4},
    {0xF1, 0xF3, 0x80, 0xBF, 4},
    {0xF4, 0xF4, 0x80, 0x8F, 4},
}};

bool is_between(char byte, unsigned char low, unsigned char high) {
    const auto value = static_cast<unsigned char>(byte);
    return low <= value && value <= high;
}

}  // namespace

std::string nearest(std::string_view wanted, std::span<const std::string> candidates) {
    return nearest_of(wanted, candidates);
}

std::string nearest(std::string_view wanted, std::span<const std::string_view> candidates) {
    return nearest_of(wanted, candidates);
}

std::string did_you_mean(std::string_view wanted, std::span<const std::string> candidates) {
    const std::string found = nearest(wanted, candidates);
    return found.empty() ? std::string() : fmt::format("; did you mean \"{}\"?", found);
}

std::size_t utf8_sequence_length(std::string_view text) {
    if (text.empty()) {
        return 0;
    }
    if (is_between(text[0], 0x00, 0x7F)) {
        return 1;
    }
    const auto fits = [&](const Utf8Row& row) {
        const auto is_tail = [](char byte) {
            return is_between(byte, 0x80, 0xBF);
        };
        return is_between(text[0], row.lead_low, row.lead_high) && text.size() >= row.length &&
               is_between(text[1], row.second_low, row.second_high) &&
               std::all_of(text.begin() + 2,
                           text.begin() + static_cast<std::ptrdiff_t>(row.length),
                           is_tail);
    };
    const auto* row = std::find_if(k_utf8_rows.begin(), k_utf8_rows.end(), fits);
    return row == k_utf8_rows.end() ? 0 : row->length;
}

std::optional<std::size_t> first_invalid_utf8(std::string_view text) {
    std::size_t at = 0;
    while (at < text.size()) {
        const std::size_t length = utf8_sequence_length(text.substr(at));
        if (length == 0) {
            return at;
        }
        at += length;
    }
    return std::nullopt;
}

bool is_valid_utf8(std::string_view text) {
    return !first_invalid_utf8(text);
}

std::string_view trim(std::string_view text) {
    constexpr std::string_view k_space = " \t\r\n";
    const std::size_t begin = text.find_first_not_of(k_space);
    if (begin == std::string_view::npos) {
        return {};
    }
    return text.substr(begin, text.find_last_not_of(k_space) - begin + 1);
}

std::string lower(std::string_view text) {
    std::string result(text);
    for (char& letter : result) {
        if (letter >= 'A' && letter <= 'Z') {
            letter = static_cast<char>(letter - 'A' + 'a');
        }
    }
    return result;
}

std::string join(std::span<const std::string> parts, std::string_view separator) {
    return fmt::format("{}", fmt::join(parts.begin(), parts.end(), separator));
}

}  // namespace isohydric::diag
