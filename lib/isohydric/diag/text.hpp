// Small helpers for text: the nearest known word, UTF-8, trimming, joining. All of them are blind
// to the locale.
#pragma once

#include <cstddef>
#include <optional>
#include <span>
#include <string>
#include <string_view>
#include <vector>

namespace isohydric::diag {

/// The candidate nearest to `wanted`, for "did you mean"; empty if none is near enough. Letters
/// count without case; an insertion, deletion, replacement or swap of neighbours is one step, and a
/// third of the word's length, at most 3, is near enough. Of equally near candidates the first
/// wins.
[[nodiscard]] std::string nearest(std::string_view wanted, std::span<const std::string> candidates);
[[nodiscard]] std::string nearest(std::string_view wanted,
                                  std::span<const std::string_view> candidates);

/// `; did you mean "x"?` for the nearest candidate, or nothing: the tail of a message.
[[nodiscard]] std::string did_you_mean(std::string_view wanted,
                                       std::span<const std::string> candidates);

/// Length in bytes of the well-formed UTF-8 sequence at the front of `text`; 0 if there is none
/// [@rfc3629, section 4].
[[nodiscard]] std::size_t utf8_sequence_length(std::string_view text);

/// Offset of the first byte that is not part of well-formed UTF-8.
[[nodiscard]] std::optional<std::size_t> first_invalid_utf8(std::string_view text);
[[nodiscard]] bool is_valid_utf8(std::string_view text);

/// Without spaces, tabs and line ends at both sides.
[[nodiscard]] std::string_view trim(std::string_view text);

/// ASCII letters in lower case; all other bytes as they are.
[[nodiscard]] std::string lower(std::string_view text);

/// The parts with `separator` between them.
[[nodiscard]] std::string join(std::span<const std::string> parts, std::string_view separator);

}  // namespace isohydric::diag
