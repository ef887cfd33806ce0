#include "isohydric/rule/number_form.hpp"

#include "isohydric/diag/assert.hpp"
#include "isohydric/rule/detail/grammar.hpp"

#include <array>
#include <charconv>
#include <string_view>

namespace isohydric::rule {
namespace {

/// The shortest digits that read back as the same number; FHIRPath knows no exponents.
std::string digits(double number) {
    std::array<char, 400> buffer{};  // a double has at most 325 characters in this form
    const std::to_chars_result result = std::to_chars(
        buffer.data(), buffer.data() + buffer.size(), number, std::chars_format::fixed);
    ISOHYDRIC_ASSERT(result.ec == std::errc{});
    return {buffer.data(), result.ptr};
}

std::string arguments(const Expression& expression, std::size_t first) {
    std::string list;
    for (std::size_t i = first; i < expression.children.size(); ++i) {
        list += i == first ? "" : ", ";
        list += number_form(*expression.children[i]);
    }
    return "(" + list + ")";
}

std::string literal(const Expression& expression) {
    if (expression.kind == NodeKind::truth_literal) {
        return expression.truth ? "true" : "false";
    }
    if (expression.kind == NodeKind::code_literal) {
        return "'" + expression.text + "'";
    }
    const std::string number = digits(expression.number);
    return expression.number < 0 ? "(" + number + ")" : number;
}

}  // namespace

std::string number_form(const Expression& expression) {
    if (const OperatorInfo* const info = find_operator(expression.kind)) {
        return "(" + number_form(*expression.children[0]) + " " + std::string(info->spelling) +
               " " + number_form(*expression.children[1]) + ")";
    }
    if (const FunctionInfo* const info = find_function(expression.kind)) {
        return number_form(*expression.children[0]) + "." + std::string(info->name) +
               arguments(expression, 1);
    }
    if (expression.kind == NodeKind::negate) {
        const bool literal_below = expression.children[0]->kind == NodeKind::number_literal;
        return (literal_below ? "(-" : "(0 - ") + number_form(*expression.children[0]) + ")";
    }
    if (expression.kind == NodeKind::iif) {
        return "iif" + arguments(expression, 0);
    }
    return expression.kind == NodeKind::name ? number_form_name(expression) : literal(expression);
}

std::string number_form_name(const Expression& name) {
    std::string made = "v_";
    for (const char c : name.text) {
        if (c == '`') {
            continue;
        }
        made += c == '-' ? "__" : std::string(1, c == '.' ? '_' : c);
    }
    return made;
}

}  // namespace isohydric::rule
