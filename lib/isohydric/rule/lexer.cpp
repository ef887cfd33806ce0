#include "isohydric/rule/lexer.hpp"

#include "isohydric/diag/text.hpp"

#include <algorithm>
#include <array>
#include <optional>
#include <utility>

#include <fmt/format.h>

namespace isohydric::rule {
namespace {

constexpr std::size_t k_digit_limit = 30;

/// A sign that may occur in an expression. `meant` is the token it gives, empty if there is none; `advice` is what to
/// tell the writer, empty if the sign is one of ours.
struct Sign {
    std::string_view spelling;
    std::string_view meant;
    std::string_view advice;
};

// Longer signs first, so that the first that fits is the longest.
constexpr std::array k_signs{
    Sign{"\xE2\x89\xA4", "<=", "write <="},
    Sign{"\xE2\x89\xA5", ">=", "write >="},
    Sign{"\xE2\x89\xA0", "!=", "write !="},
    Sign{"\xE2\x88\x92", "-", "write the ASCII minus -"},
    Sign{"\xE2\x80\x93", "-", "write the ASCII minus -"},
    Sign{"\xC3\x97", "*", "write *"},
    Sign{"\xC2\xB7", "*", "write *"},
    Sign{"\xC3\xB7", "/", "write /"},
    Sign{"!=", "!=", ""},
    Sign{"<=", "<=", ""},
    Sign{">=", ">=", ""},
    Sign{"==", "=", "FHIRPath compares with a single ="},
    Sign{"=<", "<=", "write <="},
    Sign{"=>", ">=", "write >="},
    Sign{"<>", "!=", "write !="},
    Sign{"&&", "and", "write and"},
    Sign{"||", "or", "write or"},
    Sign{"!~", "", "equivalence is not part of the rule language; use !="},
    Sign{"**", "", "write x.power(n)"},
    Sign{"//", "", "expressions have no comments; a note of the entry's source can hold a remark"},
    Sign{"/*", "", "expressions have no comments; a note of the entry's source can hold a remark"},
    Sign{"{}", "", "ask x.empty() or x.exists()"},
    Sign{"+", "+", ""},
    Sign{"-", "-", ""},
    Sign{"*", "*", ""},
    Sign{"/", "/", ""},
    Sign{"=", "=", ""},
    Sign{"<", "<", ""},
    Sign{">", ">", ""},
    Sign{"(", "(", ""},
    Sign{")", ")", ""},
    Sign{".", ".", ""},
    Sign{",", ",", ""},
    Sign{"!", "", "to negate, write (...).not()"},
    Sign{"^", "", "write x.power(n)"},
    Sign{"&", "", "joining texts is not part of the rule language; for a conjunction write and"},
    Sign{"|", "", "unions are not part of the rule language; for a disjunction write or"},
    Sign{"~", "", "equivalence is not part of the rule language; use ="},
    Sign{"%",
         "",
         "variables are not part of the rule language; as a unit, % goes into quotes: 95 '%'"},
    Sign{"{", "", "braces are not part of the rule language"},
    Sign{"}", "", "braces are not part of the rule language"},
    Sign{"[",
         "",
         "indexing is not part of the rule language; a unit such as mm[Hg] goes into quotes"},
    Sign{"]",
         "",
         "indexing is not part of the rule language; a unit such as mm[Hg] goes into quotes"},
    Sign{"$", "", "$this and its like are not part of the rule language; write the name"},
    Sign{"@", "", "dates are not part of the rule language"},
};

bool is_space(char c) {
    return c == ' ' || c == '\t' || c == '\n' || c == '\r';
}

bool is_digit(char c) {
    return c >= '0' && c <= '9';
}

bool is_letter(char c) {
    return (c >= 'a' && c <= 'z') || (c >= 'A' && c <= 'Z') || c == '_';
}

bool is_word(char c) {
    return is_letter(c) || is_digit(c);
}

class Lexer {
  public:
    Lexer(std::string_view text, const Locator& locate, diag::Report& report)
        : text_(text), locate_(locate), report_(report) {}

    std::optional<std::vector<Token>> run() {
        for (skip_spaces(); next_ < text_.size(); skip_spaces()) {
            read_token();
        }
        add(TokenKind::end, next_, "");
        return complete_ ? std::optional(std::move(tokens_)) : std::nullopt;
    }

  private:
    void skip_spaces() { take_while(is_space); }

    void read_token() {
        const char c = text_[next_];
        if (is_digit(c)) {
            read_number();
        } else if (is_letter(c)) {
            const std::size_t begin = next_;
            add(TokenKind::identifier, begin, std::string(take_while(is_word)));
        } else if (c == '\'') {
            read_quoted(TokenKind::text, c);
        } else if (c == '`') {
            read_quoted(TokenKind::delimited, c);
        } else if (c == '"') {
            error(
                "expression-operator", next_, next_ + 1, "texts and units stand in single quotes");
            read_quoted(TokenKind::text, c);
        } else {
            read_sign();
        }
    }

    void read_number() {
        const std::size_t begin = next_;
        take_while(is_digit);
        if (next_ + 1 < text_.size() && text_[next_] == '.' && is_digit(text_[next_ + 1])) {
            ++next_;
            take_while(is_digit);
        }
        const std::size_t end = next_;
        if (end - begin > k_digit_limit) {
            lost("expression-number",
                 begin,
                 end,
                 fmt::format(
                     "a number of {} characters; at most {} are read", end - begin, k_digit_limit));
        }
        add(TokenKind::number, begin, std::string(text_.substr(begin, end - begin)));
        if (const std::string_view tail = take_while(is_word); !tail.empty()) {
            lost("expression-number",
                 begin,
                 next_,
                 fmt::format("\"{}\" is no number; write all digits without an exponent, and a "
                             "unit in quotes behind it: 5 'mmol/L'",
                             text_.substr(begin, next_ - begin)));
        }
    }

    void read_quoted(TokenKind kind, char quote) {
        const std::size_t begin = next_++;
        std::string content;
        while (next_ < text_.size() && text_[next_] != quote) {
            if (text_[next_] == '\\') {
                lost("expression-escape",
                     next_,
                     std::min(next_ + 2, text_.size()),
                     "a backslash in quotes; codes, units and names need none");
                ++next_;
            }
            if (next_ < text_.size()) {
                content += text_[next_++];
            }
        }
        if (next_ == text_.size()) {
            lost("expression-unterminated",
                 begin,
                 text_.size(),
                 fmt::format("this {} has no closing {}", quote == '`' ? "name" : "text", quote));
            return;
        }
        ++next_;
        add(kind, begin, std::move(content));
    }

    void read_sign() {
        const std::string_view rest = text_.substr(next_);
        const auto* const sign =
            std::find_if(k_signs.begin(), k_signs.end(), [rest](const Sign& s) {
                return rest.starts_with(s.spelling);
            });
        const std::size_t begin = next_;
        if (sign == k_signs.end()) {
            next_ += std::max<std::size_t>(diag::utf8_sequence_length(rest), 1);
            lost("expression-character",
                 begin,
                 next_,
                 "this character has no meaning in an expression");
            return;
        }
        next_ += sign->spelling.size();
        if (sign->meant.empty()) {
            lost("expression-not-supported",
                 begin,
                 next_,
                 fmt::format("found \"{}\"; {}", sign->spelling, sign->advice));
            return;
        }
        if (!sign->advice.empty()) {
            error("expression-operator",
                  begin,
                  next_,
                  fmt::format("found \"{}\"; {}", sign->spelling, sign->advice));
        }
        const bool word = is_letter(sign->meant.front());
        add(word ? TokenKind::identifier : TokenKind::symbol, begin, std::string(sign->meant));
    }

    std::string_view take_while(bool (*accepted)(char)) {
        const std::size_t begin = next_;
        while (next_ < text_.size() && accepted(text_[next_])) {
            ++next_;
        }
        return text_.substr(begin, next_ - begin);
    }

    void add(TokenKind kind, std::size_t begin, std::string token_text) {
        tokens_.push_back({kind, begin, next_, std::move(token_text)});
    }

    void error(std::string id, std::size_t begin, std::size_t end, std::string message) {
        report_.error(std::move(id), locate_(begin, end), std::move(message));
    }

    /// An error after which the tokens no longer say what was meant.
    void lost(std::string id, std::size_t begin, std::size_t end, std::string message) {
        error(std::move(id), begin, end, std::move(message));
        complete_ = false;
    }

    std::string_view text_;
    const Locator& locate_;
    diag::Report& report_;
    std::size_t next_ = 0;
    bool complete_ = true;
    std::vector<Token> tokens_;
};

}  // namespace

Locator locator_in(const diag::Json& string_value) {
    return [&string_value](std::size_t begin, std::size_t end) {
        return diag::string_place(string_value, begin, end);
    };
}

Locator locator_in(std::shared_ptr<const diag::Source> source) {
    return [source = std::move(source)](std::size_t begin, std::size_t end) {
        return diag::Place{source, {begin, end}};
    };
}

std::optional<std::vector<Token>>
lex(std::string_view text, const Locator& locate, diag::Report& report) {
    return Lexer(text, locate, report).run();
}

}  // namespace isohydric::rule
