// Cuts the text of an expression into tokens. Each token knows its bytes, so that every later message can point at them.
#pragma once

#include "isohydric/diag/json.hpp"
#include "isohydric/diag/report.hpp"
#include "isohydric/diag/source.hpp"

#include <cstddef>
#include <cstdint>
#include <functional>
#include <memory>
#include <optional>
#include <string>
#include <string_view>
#include <vector>

namespace isohydric::rule {

/// Gives the place in a file of the bytes [begin, end) of an expression.
using Locator = std::function<diag::Place(std::size_t begin, std::size_t end)>;

/// The locator of an expression that is a JSON string: escapes are seen through. The string must outlive it.
[[nodiscard]] Locator locator_in(const diag::Json& string_value);

/// The locator of an expression that is a whole source of its own.
[[nodiscard]] Locator locator_in(std::shared_ptr<const diag::Source> source);

enum class TokenKind : std::uint8_t { end, number, text, identifier, delimited, symbol };

/// One token. `text` is decoded: digits as written, a text or a delimited identifier without its quotes and escapes.
struct Token {
    TokenKind kind{};
    std::size_t begin{}, end{};
    std::string text;
};

/// All tokens of `text`, the last of kind `end`. Signs that are only spelt otherwise (`==`, `&&`) are reported and read as
/// what was meant, so that the parser can go on; empty if something had no meaning at all.
[[nodiscard]] std::optional<std::vector<Token>>
lex(std::string_view text, const Locator& locate, diag::Report& report);

}  // namespace isohydric::rule
