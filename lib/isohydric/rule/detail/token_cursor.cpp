#include "isohydric/rule/detail/token_cursor.hpp"

#include <algorithm>

#include <fmt/format.h>

namespace isohydric::rule {
namespace {

bool is_symbol(const Token& token, std::string_view sign) {
    return token.kind == TokenKind::symbol && token.text == sign;
}

}  // namespace

const Token& TokenCursor::ahead(std::size_t count) const {
    return tokens_[std::min(next_ + count, tokens_.size() - 1)];
}

Token TokenCursor::take() {
    return at_end() ? tokens_[next_] : tokens_[next_++];
}

bool TokenCursor::at_symbol(std::string_view sign) const {
    return is_symbol(peek(), sign);
}

bool TokenCursor::at_call() const {
    const TokenKind kind = peek().kind;
    const bool named = kind == TokenKind::identifier || kind == TokenKind::delimited;
    return named && is_symbol(ahead(1), "(");
}

diag::Place TokenCursor::up_to_here(const diag::Place& first) const {
    return {first.source, {first.span.begin, place(last()).span.end}};
}

std::string describe(const Token& token) {
    switch (token.kind) {
    case TokenKind::end:
        return "the end of the expression";
    case TokenKind::text:
        return fmt::format("the text '{}'", token.text);
    case TokenKind::number:
        return fmt::format("the number {}", token.text);
    case TokenKind::delimited:
        return fmt::format("`{}`", token.text);
    case TokenKind::identifier:
    case TokenKind::symbol:
        break;
    }
    return fmt::format("\"{}\"", token.text);
}

}  // namespace isohydric::rule
