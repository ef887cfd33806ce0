#include "isohydric/rule/parser.hpp"

#include "isohydric/diag/text.hpp"
#include "isohydric/rule/detail/grammar.hpp"
#include "isohydric/rule/detail/syntax_advice.hpp"
#include "isohydric/rule/detail/token_cursor.hpp"

#include <algorithm>
#include <utility>

#include <fmt/format.h>

namespace isohydric::rule {
namespace {

using MaybeSyntax = std::optional<Syntax>;

constexpr std::string_view k_iif = "iif";

bool is_call(const Syntax& node) {
    return find_function(node.kind) != nullptr;
}

class Parser {
  public:
    Parser(std::vector<Token> tokens, const Locator& locate, diag::Report& report)
        : cursor_(std::move(tokens), locate), report_(report) {}

    MaybeSyntax run() {
        MaybeSyntax node = expression();
        if (node && !cursor_.at_end()) {
            report_after_value(cursor_, report_);
            return std::nullopt;
        }
        return node;
    }

  private:
    // ---- levels of precedence

    MaybeSyntax expression() { return binary(Level::implies); }

    /// Everything that binds at least as tightly as `level`.
    MaybeSyntax binary(Level level) {
        MaybeSyntax left = signed_value();
        const OperatorInfo* previous = nullptr;
        while (left) {
            const OperatorInfo* const info = operator_here();
            if (info == nullptr || info->level < level) {
                break;
            }
            const Token sign = cursor_.take();
            if (previous != nullptr && previous->level == info->level) {
                refuse_chain(*info, sign);
            }
            previous = info;
            MaybeSyntax right = binary(static_cast<Level>(static_cast<int>(info->level) + 1));
            if (!right) {
                return std::nullopt;
            }
            const diag::Place first = left->place;
            left = node(info->kind, sign, first, list(std::move(*left), std::move(*right)));
        }
        return left;
    }

    /// A value with or without a minus, which binds looser than a call and tighter than a product.
    MaybeSyntax signed_value() {
        if (!cursor_.at_symbol("-")) {
            return invocation();
        }
        const Token minus = cursor_.take();
        if (!enter(minus)) {
            return std::nullopt;
        }
        MaybeSyntax operand = signed_value();
        --nesting_;
        if (!operand) {
            return std::nullopt;
        }
        if (is_call(*operand) && grouped_until_ != cursor_.taken()) {
            error("expression-unary-minus",
                  minus,
                  fmt::format("FHIRPath would negate the result of .{0}(); write -(x.{0}(...)) for "
                              "that, or (-x).{0}(...) to negate the value before",
                              find_function(operand->kind)->name));
        }
        return node(NodeKind::negate, minus, cursor_.place(minus), list(std::move(*operand)));
    }

    /// A value and the names and calls behind its points.
    MaybeSyntax invocation() {
        MaybeSyntax value = operand();
        while (value && cursor_.at_symbol(".")) {
            cursor_.take();
            value = cursor_.at_call() ? call(std::move(*value)) : member(std::move(*value));
        }
        return value;
    }

    MaybeSyntax member(Syntax name) {
        const Token& part = cursor_.peek();
        const bool grouped = grouped_until_ + 1 == cursor_.taken();
        const bool word = part.kind == TokenKind::identifier && !is_keyword(part.text);
        if (!word && part.kind != TokenKind::delimited) {
            return fail(
                "expression-syntax",
                fmt::format("found {} after a point; a function such as .abs() or a part of a "
                            "name belongs there",
                            describe(part)));
        }
        if (name.kind != NodeKind::name || grouped) {
            return fail(
                "expression-syntax",
                fmt::format("found {0} after the point behind a value; a function is called "
                            "with parentheses: .{0}()",
                            part.text));
        }
        name.path.push_back(cursor_.take().text);
        name.place = name.mark = cursor_.up_to_here(name.place);
        return name;
    }

    MaybeSyntax call(Syntax receiver) {
        const diag::Place first = receiver.place;
        const Token name = cursor_.take();
        std::vector<Syntax> children = list(std::move(receiver));
        if (!arguments(name, children)) {
            return std::nullopt;
        }
        const FunctionInfo* const info = find_function(name.text);
        if (info == nullptr) {
            report_unknown_function(name, cursor_, report_);
            return std::move(children.front());
        }
        check_count(name, info->arguments, children.size() - 1);
        return node(info->kind, name, first, std::move(children));
    }

    MaybeSyntax operand() {
        const Token& token = cursor_.peek();
        switch (token.kind) {
        case TokenKind::number:
            return number();
        case TokenKind::text:
            return leaf(NodeKind::code_literal);
        case TokenKind::delimited:
            return name();
        case TokenKind::identifier:
            return word();
        case TokenKind::symbol:
        case TokenKind::end:
            break;
        }
        return cursor_.at_symbol("(") ? group()
                                      : fail("expression-syntax", no_value_message(cursor_));
    }

    MaybeSyntax group() {
        const Token open = cursor_.take();
        if (!enter(open)) {
            return std::nullopt;
        }
        MaybeSyntax inner = expression();
        --nesting_;
        if (!inner || !close(open)) {
            return std::nullopt;
        }
        grouped_until_ = cursor_.taken();
        inner->place = cursor_.up_to_here(cursor_.place(open));
        return inner;
    }

    MaybeSyntax number() {
        MaybeSyntax literal = leaf(NodeKind::number_literal);
        if (cursor_.peek().kind == TokenKind::text) {
            const Token unit = cursor_.take();
            literal->unit = WrittenUnit{unit.text, cursor_.place(unit)};
            literal->place = cursor_.up_to_here(literal->place);
        }
        return literal;
    }

    MaybeSyntax word() {
        const Token& token = cursor_.peek();
        if (token.text == "true" || token.text == "false") {
            return leaf(NodeKind::truth_literal);
        }
        if (cursor_.at_call()) {
            return token.text == k_iif ? choice() : free_function();
        }
        if (token.text == "not") {
            return fail("expression-syntax", "\"not\" stands behind what it negates: (...).not()");
        }
        return is_keyword(token.text) ? fail("expression-syntax", no_value_message(cursor_))
                                      : name();
    }

    MaybeSyntax name() {
        MaybeSyntax found = leaf(NodeKind::name);
        found->path.push_back(found->text);
        return found;
    }

    MaybeSyntax choice() {
        const Token word = cursor_.take();
        std::vector<Syntax> children;
        if (!arguments(word, children)) {
            return std::nullopt;
        }
        check_count(word, 3, children.size());
        return node(NodeKind::iif, word, cursor_.place(word), std::move(children));
    }

    MaybeSyntax free_function() {
        const std::string_view word = cursor_.peek().text;
        if (find_function(word) != nullptr) {
            return fail("expression-syntax",
                        fmt::format("{0} is called on a value: x.{0}(...)", word));
        }
        report_unknown_function(cursor_.peek(), cursor_, report_);
        return std::nullopt;
    }

    // ---- pieces

    /// The arguments between parentheses, appended to `children`.
    bool arguments(const Token& function, std::vector<Syntax>& children) {
        const Token open = cursor_.take();
        if (!enter(function)) {
            return false;
        }
        bool more = !cursor_.at_symbol(")");
        while (more) {
            MaybeSyntax argument = expression();
            if (!argument) {
                return false;
            }
            children.push_back(std::move(*argument));
            more = cursor_.at_symbol(",");
            if (more) {
                cursor_.take();
            }
        }
        --nesting_;
        return close(open);
    }

    bool close(const Token& open) {
        if (cursor_.at_symbol(")")) {
            cursor_.take();
            return true;
        }
        report_after_value(cursor_, report_)
            .notes.push_back({"the parenthesis opened here is still open", cursor_.place(open)});
        return false;
    }

    MaybeSyntax leaf(NodeKind kind) {
        const Token token = cursor_.take();
        Syntax made;
        made.kind = kind;
        made.place = made.mark = cursor_.place(token);
        made.text = token.text;
        return made;
    }

    /// An inner node that reaches from `first` to the last token taken; nothing if the tree becomes too deep.
    MaybeSyntax
    node(NodeKind kind, const Token& mark, const diag::Place& first, std::vector<Syntax> children) {
        Syntax made;
        made.kind = kind;
        made.place = cursor_.up_to_here(first);
        made.mark = cursor_.place(mark);
        made.text = mark.text;
        for (const Syntax& child : children) {
            made.depth = std::max(made.depth, child.depth + 1);
        }
        made.children = std::move(children);
        if (made.depth > k_depth_limit) {
            too_deep(mark);
            return std::nullopt;
        }
        return made;
    }

    template <class... Nodes>
    static std::vector<Syntax> list(Nodes&&... nodes) {
        std::vector<Syntax> made;
        (made.push_back(std::forward<Nodes>(nodes)), ...);
        return made;
    }

    /// Goes one level deeper into brackets or signs.
    bool enter(const Token& opened) {
        if (++nesting_ > k_depth_limit) {
            too_deep(opened);
            return false;
        }
        return true;
    }

    /// The operator that stands here; `AND` is reported and taken for `and`.
    const OperatorInfo* operator_here() {
        const Token& token = cursor_.peek();
        if (token.kind == TokenKind::symbol) {
            return find_operator(token.text);
        }
        if (token.kind != TokenKind::identifier) {
            return nullptr;
        }
        const std::string word = diag::lower(token.text);
        const OperatorInfo* const found = find_operator(word);
        if (found != nullptr && word != token.text) {
            error("expression-operator",
                  token,
                  fmt::format("found \"{}\"; operators are in lower case: {}", token.text, word));
            cursor_.respell(word);
        }
        return found;
    }

    // ---- messages

    void error(std::string id, const Token& token, std::string message) {
        report_.error(std::move(id), cursor_.place(token), std::move(message));
    }

    MaybeSyntax fail(std::string id, std::string message) {
        error(std::move(id), cursor_.peek(), std::move(message));
        return std::nullopt;
    }

    void too_deep(const Token& token) {
        error(
            "expression-too-deep",
            token,
            fmt::format("more than {} operations inside one another; name a part as a quantity or "
                        "condition of its own",
                        k_depth_limit));
    }

    void refuse_chain(const OperatorInfo& info, const Token& sign) {
        if (info.level == Level::equality || info.level == Level::inequality) {
            error("expression-chained-comparison",
                  sign,
                  "comparisons cannot be chained; write a < b and b < c");
        }
    }

    void check_count(const Token& function, std::size_t wanted, std::size_t found) {
        if (wanted != found) {
            error("expression-arguments",
                  function,
                  fmt::format("{} takes {} argument{}; found {}",
                              function.text,
                              wanted,
                              wanted == 1 ? "" : "s",
                              found));
        }
    }

    TokenCursor cursor_;
    diag::Report& report_;
    std::size_t nesting_ = 0;
    std::size_t grouped_until_ = 0;  // the token behind the last group's closing parenthesis
};

}  // namespace

MaybeSyntax parse_expression(std::string_view text, const Locator& locate, diag::Report& report) {
    if (text.size() > k_length_limit) {
        report.error(
            "expression-too-long",
            locate(0, text.size()),
            fmt::format("an expression of {} bytes; at most {} are read; name parts of it as "
                        "quantities or conditions",
                        text.size(),
                        k_length_limit));
        return std::nullopt;
    }
    const std::size_t errors_before = report.error_count();
    std::optional<std::vector<Token>> tokens = lex(text, locate, report);
    if (!tokens) {
        return std::nullopt;
    }
    MaybeSyntax parsed = Parser(std::move(*tokens), locate, report).run();
    return report.error_count() == errors_before ? parsed : std::nullopt;
}

MaybeSyntax parse_expression(const diag::Json& string_value, diag::Report& report) {
    return parse_expression(string_value.text(), locator_in(string_value), report);
}

}  // namespace isohydric::rule
