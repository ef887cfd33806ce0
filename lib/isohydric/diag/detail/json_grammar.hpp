// The JSON grammar as far as the places of tokens and plain words for syntax errors need it. The
// parsing itself is done by the library behind read_json; here its steps are followed on the text.
#pragma once

#include "isohydric/diag/source.hpp"

#include <cstddef>
#include <cstdint>
#include <optional>
#include <string>
#include <string_view>

namespace isohydric::diag::detail {

/// What reading has just passed; decides what may come next.
enum class After { nothing, array_begin, object_begin, name, array_item, member_value, document };

/// What is wrong and where.
struct SyntaxFault {
    Span span;
    std::string message;
};

/// Offset of the first byte at or behind `at` that is no white space.
[[nodiscard]] std::size_t skip_space(std::string_view text, std::size_t at);

/// Offset behind white space and at most one comma or colon: where the next token of correct text
/// begins.
[[nodiscard]] std::size_t next_token(std::string_view text, std::size_t at);

/// Offset behind the correct string literal that begins at `begin`.
[[nodiscard]] std::size_t string_end(std::string_view text, std::size_t begin);

/// Offset behind the correct number that begins at `begin`.
[[nodiscard]] std::size_t number_end(std::string_view text, std::size_t begin);

/// The UTF-16 code unit that an escape `\uXXXX` at the front of `rest` stands for.
[[nodiscard]] std::optional<std::uint32_t> escaped_unit(std::string_view rest);
[[nodiscard]] bool is_high_surrogate(std::uint32_t unit);
[[nodiscard]] bool is_low_surrogate(std::uint32_t unit);

/// Length in the text, and of the decoded UTF-8, of one step of a string's content: a plain byte or
/// an escape.
struct StringStep {
    std::size_t raw;
    std::size_t decoded;
};

/// The step at the front of `rest`, which is the content of a correct string literal and not empty.
[[nodiscard]] StringStep string_step(std::string_view rest);

/// Explains why text that a JSON parser refused cannot go on; `last_end` is the offset behind the
/// last token it took.
[[nodiscard]] SyntaxFault explain_syntax(std::string_view text, std::size_t last_end, After after);

}  // namespace isohydric::diag::detail
