#include "isohydric/rule/plain_text.hpp"

#include "isohydric/rule/detail/grammar.hpp"

#include <algorithm>
#include <array>
#include <string_view>
#include <utility>

namespace isohydric::rule {
namespace {

struct Text {
    std::string words;
    Level level;  // how tightly the words hold together
};

/// A factor that the checker put in has no digits of its own.
bool is_inserted_factor(const Expression& node) {
    return node.kind == NodeKind::number_literal && node.text.empty();
}

bool groups_only_left(NodeKind kind) {
    return kind == NodeKind::subtract || kind == NodeKind::divide ||
           kind == NodeKind::logical_implies;
}

class Printer {
  public:
    explicit Printer(const NameText& name_text) : name_text_(name_text) {}

    [[nodiscard]] Text print(const Expression& node) const {
        if (const OperatorInfo* const info = find_operator(node.kind)) {
            return operation(node, *info);
        }
        if (find_function(node.kind) != nullptr) {
            return function(node);
        }
        if (node.kind == NodeKind::negate) {
            return {"-" + at_least(Level::sign, *node.children[0]), Level::sign};
        }
        if (node.kind == NodeKind::iif) {
            return {"(if " + inner(node, 0) + " then " + inner(node, 1) + ", else " +
                        inner(node, 2) + ")",
                    Level::call};
        }
        return {leaf(node), Level::call};
    }

  private:
    [[nodiscard]] std::string leaf(const Expression& node) const {
        if (node.kind == NodeKind::name) {
            return name_text_(node);
        }
        if (node.kind == NodeKind::truth_literal) {
            return node.truth ? "yes" : "no";
        }
        const bool as_written = node.unit == node.written_unit || node.written_unit == units::one();
        return as_written ? node.text : node.text + " " + node.written_unit.code();
    }

    [[nodiscard]] std::string inner(const Expression& node, std::size_t child) const {
        return print(*node.children[child]).words;
    }

    /// The words of a child, in parentheses if they hold together less tightly than `level`.
    [[nodiscard]] std::string at_least(Level level, const Expression& child) const {
        Text text = print(child);
        return text.level < level ? "(" + text.words + ")" : std::move(text.words);
    }

    [[nodiscard]] Text operation(const Expression& node, const OperatorInfo& info) const {
        const Expression& left = *node.children[0];
        const Expression& right = *node.children[1];
        if (is_inserted_factor(right)) {
            return print(left);
        }
        const bool comparison = info.level == Level::equality || info.level == Level::inequality;
        const Level above = static_cast<Level>(static_cast<int>(info.level) + 1);
        const Level left_level = comparison ? above : info.level;
        const Level right_level = comparison || groups_only_left(node.kind) ? above : info.level;
        return {at_least(left_level, left) + " " + std::string(sign(node, info)) + " " +
                    at_least(right_level, right),
                info.level};
    }

    static std::string_view sign(const Expression& node, const OperatorInfo& info) {
        if (node.kind == NodeKind::multiply) {
            return "x";
        }
        if (node.children[0]->type == Type::code) {
            return node.kind == NodeKind::equal ? "is" : "is not";
        }
        return info.spelling;
    }

    [[nodiscard]] Text function(const Expression& node) const {
        const Expression& value = *node.children[0];
        if (family_of(node.kind) == Family::presence) {
            const bool given = node.kind == NodeKind::call_exists;
            return {at_least(Level::sum, value) + (given ? " is given" : " is missing"),
                    Level::equality};
        }
        if (node.kind == NodeKind::call_power) {
            return {at_least(Level::call, value) + "^" + at_least(Level::call, *node.children[1]),
                    Level::sign};
        }
        if (node.kind == NodeKind::call_abs) {
            return {"|" + inner(node, 0) + "|", Level::call};
        }
        if (node.kind == NodeKind::call_log) {
            return {"log(" + inner(node, 0) + ", base " + inner(node, 1) + ")", Level::call};
        }
        const std::string name(find_function(node.kind)->name);
        const std::string gap = node.kind == NodeKind::call_not ? " (" : "(";
        return {name + gap + inner(node, 0) + ")", Level::call};
    }

    const NameText& name_text_;
};

std::string_view behind_last_point(std::string_view text) {
    return text.substr(text.rfind('.') + 1);
}

}  // namespace

std::string plain_name(const Expression& name) {
    std::string text = name.text;
    std::erase(text, '`');
    const std::string_view last = behind_last_point(text);
    if (name.symbol.kind == SymbolKind::limit) {
        constexpr std::array<std::string_view, 3> k_parts{
            "lower limit of ", "mid-value of ", "upper limit of "};
        const std::size_t first = text.find('.') + 1;
        return std::string(k_parts.at(static_cast<std::size_t>(name.symbol.limit_part))) +
               text.substr(first, text.rfind('.') - first);
    }
    if (name.symbol.kind == SymbolKind::rounding) {
        return "rounding of " + std::string(last);
    }
    return name.symbol.kind == SymbolKind::context ? std::string(last) : text;
}

std::string plain_text(const Expression& expression, const NameText& name_text) {
    return Printer(name_text).print(expression).words;
}

}  // namespace isohydric::rule
