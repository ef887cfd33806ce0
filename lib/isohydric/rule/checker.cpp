#include "isohydric/rule/checker.hpp"

#include "isohydric/diag/assert.hpp"
#include "isohydric/diag/text.hpp"
#include "isohydric/rule/detail/arithmetic.hpp"
#include "isohydric/rule/detail/conversion.hpp"
#include "isohydric/rule/detail/emptiness.hpp"
#include "isohydric/rule/detail/grammar.hpp"
#include "isohydric/rule/walk.hpp"

#include <algorithm>
#include <charconv>
#include <cmath>
#include <utility>

#include <fmt/format.h>

namespace isohydric::rule {
namespace {

std::string_view describe(Type type) {
    switch (type) {
    case Type::number:
        return "a number";
    case Type::truth:
        return "a truth";
    case Type::code:
        break;
    }
    return "a code";
}

std::string_view advice(Type wanted, Type found) {
    if (found == Type::code) {
        return "; compare it with a text: context.onset = 'chronic'";
    }
    return wanted == Type::truth ? "; compare it: x > 12 'mmol/L', or ask x.exists()" : "";
}

std::shared_ptr<Expression> made_from(const Syntax& syntax, Type type) {
    auto node = std::make_shared<Expression>();
    node->kind = syntax.kind;
    node->type = type;
    node->place = syntax.place;
    return node;
}

class Checker {
  public:
    Checker(const NameTable& names, const Wanted& wanted, diag::Report& report)
        : names_(names), wanted_(wanted), arithmetic_(report), report_(report) {}

    ExpressionPtr run(const Syntax& syntax) {
        ExpressionPtr root = typed(syntax, wanted_.type, "this place");
        if (root && wanted_.type == Type::number && wanted_.unit) {
            root = arithmetic_.in_unit(root, *wanted_.unit);
        }
        if (root) {
            check_literals(*root);
            check_choices(*root, report_);
        }
        return root;
    }

  private:
    ExpressionPtr visit(const Syntax& syntax) {
        switch (family_of(syntax.kind)) {
        case Family::number_literal:
            return number(syntax);
        case Family::truth_literal:
            return truth(syntax);
        case Family::code_literal:
            return stray_text(syntax);
        case Family::name:
            return name(syntax);
        case Family::equality:
            return equality(syntax);
        case Family::logic:
            return logic(syntax);
        case Family::presence:
            return presence(syntax);
        case Family::choice:
            return choice(syntax);
        case Family::sum:
        case Family::product:
        case Family::unary:
        case Family::plain_function:
        case Family::power:
        case Family::root:
        case Family::order:
            return number_operation(syntax);
        }
        ISOHYDRIC_NEVER();
    }

    /// The checked node if it is of the wanted type; `taker` is what takes it, for the message.
    ExpressionPtr typed(const Syntax& syntax, Type wanted, std::string_view taker) {
        ExpressionPtr node = visit(syntax);
        if (!node || node->type == wanted) {
            return node;
        }
        report_.error("expression-type",
                      syntax.place,
                      fmt::format("{} takes {}; found {}, {}{}",
                                  taker,
                                  describe(wanted),
                                  brief(*node),
                                  describe(node->type),
                                  advice(wanted, node->type)));
        return nullptr;
    }

    /// All children, of one type; nothing if one is wrong, and every wrong one is reported.
    std::optional<std::vector<ExpressionPtr>> operands(const Syntax& syntax, Type type) {
        std::vector<ExpressionPtr> nodes;
        for (const Syntax& child : syntax.children) {
            if (ExpressionPtr node = typed(child, type, fmt::format("\"{}\"", syntax.text))) {
                nodes.push_back(std::move(node));
            }
        }
        return nodes.size() == syntax.children.size() ? std::optional(std::move(nodes))
                                                      : std::nullopt;
    }

    /// Conversion can bring a literal beyond the range of numbers.
    void check_literals(const Expression& root) {
        for_each_node(root, [this](const Expression& node) {
            if (!std::isfinite(node.number)) {
                report_.error("expression-number",
                              node.place,
                              fmt::format("in {}, the unit of evaluation, this number is too great",
                                          node.unit.code()));
            }
        });
    }

    // ---- leaves

    ExpressionPtr number(const Syntax& syntax) {
        auto node = made_from(syntax, Type::number);
        node->text = syntax.text;
        std::from_chars(syntax.text.data(), syntax.text.data() + syntax.text.size(), node->number);
        if (syntax.unit) {
            const diag::Result<units::Unit> unit = units::parse_unit(syntax.unit->code);
            if (!unit) {
                report_.error("expression-unit", syntax.unit->place, unit.error());
                return nullptr;
            }
            node->unit = node->written_unit = *unit;
        }
        return node;
    }

    static ExpressionPtr truth(const Syntax& syntax) {
        auto node = made_from(syntax, Type::truth);
        node->text = syntax.text;
        node->truth = syntax.text == "true";
        return node;
    }

    ExpressionPtr stray_text(const Syntax& syntax) {
        report_.error("expression-code",
                      syntax.place,
                      fmt::format("'{}' is a text; a text stands only beside = or != against a "
                                  "code: context.onset = 'chronic'",
                                  syntax.text));
        return nullptr;
    }

    ExpressionPtr name(const Syntax& syntax) {
        const std::optional<NamedSymbol> named = names_.find(syntax.path);
        if (!named) {
            unknown_name(syntax);
            return nullptr;
        }
        auto node = made_from(syntax, named->type);
        node->text = written_name(syntax.path);
        node->symbol = named->symbol;
        node->unit = named->unit;
        node->never_empty = named->never_empty;
        return node;
    }

    void unknown_name(const Syntax& syntax) {
        const std::string written = written_name(syntax.path);
        const std::vector<std::string> candidates = names_.candidates();
        // Without its backticks `raised-gap` reads as a difference; its first word is then unknown.
        const auto hyphenated =
            std::find_if(candidates.begin(), candidates.end(), [&](const std::string& candidate) {
                return candidate.starts_with("`" + written + "-");
            });
        report_.error("expression-unknown-name",
                      syntax.place,
                      fmt::format("there is no name {}{}",
                                  written,
                                  hyphenated == candidates.end()
                                      ? diag::did_you_mean(written, candidates)
                                      : "; a finding stands in backticks: " + *hyphenated));
    }

    // ---- truths

    ExpressionPtr logic(const Syntax& syntax) {
        std::optional<std::vector<ExpressionPtr>> children = operands(syntax, Type::truth);
        return children ? with_children(syntax, Type::truth, std::move(*children)) : nullptr;
    }

    ExpressionPtr presence(const Syntax& syntax) {
        ExpressionPtr value = visit(syntax.children[0]);
        if (!value) {
            return nullptr;
        }
        if (value->type == Type::code) {
            report_.error("expression-code",
                          syntax.place,
                          fmt::format("{} always has a value; compare it with one of its codes",
                                      value->text));
            return nullptr;
        }
        return with_children(syntax, Type::truth, {std::move(value)});
    }

    ExpressionPtr equality(const Syntax& syntax) {
        const Syntax& left = syntax.children[0];
        const Syntax& right = syntax.children[1];
        if (left.kind == NodeKind::code_literal && right.kind != NodeKind::code_literal) {
            return code_equality(syntax, right, left);
        }
        if (right.kind == NodeKind::code_literal && left.kind != NodeKind::code_literal) {
            return code_equality(syntax, left, right);
        }
        const ExpressionPtr first = visit(left);
        if (first && first->type == Type::number) {
            const ExpressionPtr second = typed(right, Type::number, "\"=\" behind a number");
            return second ? arithmetic_.comparison(syntax, first, second) : nullptr;
        }
        if (first && first->type == Type::code) {
            report_.error("expression-code",
                          right.place,
                          fmt::format("{} is compared with one of its codes only, as a text in "
                                      "quotes: context.onset = 'chronic'",
                                      first->text));
            return nullptr;
        }
        ExpressionPtr second = typed(right, Type::truth, "\"=\" behind a truth");
        return first && second ? with_children(syntax, Type::truth, {first, std::move(second)})
                               : nullptr;
    }

    ExpressionPtr code_equality(const Syntax& syntax, const Syntax& name, const Syntax& text) {
        const ExpressionPtr node = visit(name);
        if (!node) {
            return nullptr;
        }
        if (node->type != Type::code) {
            report_.error("expression-code",
                          text.place,
                          fmt::format("{} is {} and cannot be compared with the text '{}'",
                                      brief(*node),
                                      describe(node->type),
                                      text.text));
            return nullptr;
        }
        const std::span<const std::string_view> codes = names_.find(name.path)->codes;
        const auto code = std::find(codes.begin(), codes.end(), text.text);
        if (code == codes.end()) {
            unknown_code(*node, text, codes);
            return nullptr;
        }
        auto literal = made_from(text, Type::code);
        literal->text = text.text;
        literal->code = static_cast<std::uint32_t>(code - codes.begin());
        return with_children(syntax, Type::truth, {node, std::move(literal)});
    }

    void unknown_code(const Expression& name,
                      const Syntax& text,
                      std::span<const std::string_view> codes) {
        const std::vector<std::string> known(codes.begin(), codes.end());
        report_.error("expression-code",
                      text.place,
                      fmt::format("{} is never '{}'{}; its codes are {}",
                                  name.text,
                                  text.text,
                                  diag::did_you_mean(text.text, known),
                                  diag::join(known, ", ")));
    }

    // ---- numbers

    ExpressionPtr number_operation(const Syntax& syntax) {
        const std::optional<std::vector<ExpressionPtr>> children = operands(syntax, Type::number);
        return children ? arithmetic_.operation(syntax, *children) : nullptr;
    }

    ExpressionPtr choice(const Syntax& syntax) {
        if (wanted_.type != Type::number) {
            report_.error(
                "expression-iif",
                syntax.mark,
                "iif belongs in formulas only; write the condition with and, or, implies, "
                "or name the number as a quantity of its own");
            return nullptr;
        }
        const ExpressionPtr condition =
            typed(syntax.children[0], Type::truth, "the condition of iif");
        const ExpressionPtr first = typed(syntax.children[1], Type::number, "iif in a formula");
        const ExpressionPtr second = typed(syntax.children[2], Type::number, "iif in a formula");
        return condition && first && second ? arithmetic_.choice(syntax, condition, first, second)
                                            : nullptr;
    }

    static ExpressionPtr
    with_children(const Syntax& syntax, Type type, std::vector<ExpressionPtr> children) {
        auto node = made_from(syntax, type);
        node->children = std::move(children);
        return node;
    }

    const NameTable& names_;
    const Wanted& wanted_;
    Arithmetic arithmetic_;
    diag::Report& report_;
};

}  // namespace

ExpressionPtr
check(const Syntax& syntax, const NameTable& names, const Wanted& wanted, diag::Report& report) {
    const std::size_t errors_before = report.error_count();
    ExpressionPtr checked = Checker(names, wanted, report).run(syntax);
    return report.error_count() == errors_before ? checked : nullptr;
}

ExpressionPtr read_expression(const diag::Json& string_value,
                              const NameTable& names,
                              const Wanted& wanted,
                              diag::Report& report) {
    const std::optional<Syntax> syntax = parse_expression(string_value, report);
    return syntax ? check(*syntax, names, wanted, report) : nullptr;
}

}  // namespace isohydric::rule
