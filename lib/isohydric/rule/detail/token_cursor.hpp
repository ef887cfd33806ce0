// Goes through the tokens of one expression and tells what stands here and where that is.
#pragma once

#include "isohydric/rule/detail/grammar.hpp"
#include "isohydric/rule/lexer.hpp"

#include <cstddef>
#include <string>
#include <string_view>
#include <vector>

namespace isohydric::rule {

/// A position among tokens, the last of which is `end`.
class TokenCursor {
  public:
    TokenCursor(std::vector<Token> tokens, const Locator& locate)
        : tokens_(std::move(tokens)), locate_(locate) {}

    [[nodiscard]] const Token& peek() const { return tokens_[next_]; }

    /// The token `count` behind the one that stands here, at most the end.
    [[nodiscard]] const Token& ahead(std::size_t count) const;

    /// The token taken last. Requires that one was taken.
    [[nodiscard]] const Token& last() const { return tokens_[next_ - 1]; }

    /// How many tokens were taken.
    [[nodiscard]] std::size_t taken() const { return next_; }

    Token take();

    /// Puts another word into the token that stands here.
    void respell(std::string word) { tokens_[next_].text = std::move(word); }

    [[nodiscard]] bool at_end() const { return peek().kind == TokenKind::end; }

    [[nodiscard]] bool at_symbol(std::string_view sign) const;

    /// Whether a function's name and its opening parenthesis stand here.
    [[nodiscard]] bool at_call() const;

    [[nodiscard]] diag::Place place(const Token& token) const {
        return locate_(token.begin, token.end);
    }

    /// From the beginning of `first` to the end of the token taken last.
    [[nodiscard]] diag::Place up_to_here(const diag::Place& first) const;

  private:
    std::vector<Token> tokens_;
    const Locator& locate_;
    std::size_t next_ = 0;
};

/// A token as a message names it: `"and"`, `the number 5`, `the end of the expression`.
[[nodiscard]] std::string describe(const Token& token);

}  // namespace isohydric::rule
