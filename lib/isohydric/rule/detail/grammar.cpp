#include "isohydric/rule/detail/grammar.hpp"

#include "isohydric/diag/assert.hpp"

#include <algorithm>

namespace isohydric::rule {
namespace {

template <class Table, class Member, class Value>
auto find_in(const Table& table, Member member, const Value& value) -> decltype(table.data()) {
    const auto found = std::find_if(
        table.begin(), table.end(), [&](const auto& row) { return row.*member == value; });
    return found == table.end() ? nullptr : &*found;
}

constexpr std::array<std::string_view, 8> k_other_keywords{
    "true", "false", "div", "mod", "is", "as", "in", "contains"};

bool is_letter(char c) {
    return (c >= 'a' && c <= 'z') || (c >= 'A' && c <= 'Z') || c == '_';
}

bool is_word_character(char c) {
    return is_letter(c) || (c >= '0' && c <= '9');
}

}  // namespace

const OperatorInfo* find_operator(NodeKind kind) {
    return find_in(k_operators, &OperatorInfo::kind, kind);
}

const OperatorInfo* find_operator(std::string_view spelling) {
    return find_in(k_operators, &OperatorInfo::spelling, spelling);
}

const FunctionInfo* find_function(NodeKind kind) {
    return find_in(k_functions, &FunctionInfo::kind, kind);
}

const FunctionInfo* find_function(std::string_view name) {
    return find_in(k_functions, &FunctionInfo::name, name);
}

Family family_of(NodeKind kind) {
    switch (kind) {
    case NodeKind::number_literal:
        return Family::number_literal;
    case NodeKind::truth_literal:
        return Family::truth_literal;
    case NodeKind::code_literal:
        return Family::code_literal;
    case NodeKind::name:
        return Family::name;
    case NodeKind::add:
    case NodeKind::subtract:
        return Family::sum;
    case NodeKind::multiply:
    case NodeKind::divide:
        return Family::product;
    case NodeKind::negate:
    case NodeKind::call_abs:
        return Family::unary;
    case NodeKind::call_ln:
    case NodeKind::call_log:
    case NodeKind::call_exp:
        return Family::plain_function;
    case NodeKind::call_power:
        return Family::power;
    case NodeKind::call_sqrt:
        return Family::root;
    case NodeKind::less:
    case NodeKind::less_equal:
    case NodeKind::greater:
    case NodeKind::greater_equal:
        return Family::order;
    case NodeKind::equal:
    case NodeKind::not_equal:
        return Family::equality;
    case NodeKind::logical_and:
    case NodeKind::logical_or:
    case NodeKind::logical_xor:
    case NodeKind::logical_implies:
    case NodeKind::call_not:
        return Family::logic;
    case NodeKind::call_exists:
    case NodeKind::call_empty:
        return Family::presence;
    case NodeKind::iif:
        return Family::choice;
    }
    ISOHYDRIC_NEVER();
}

bool is_keyword(std::string_view word) {
    return find_operator(word) != nullptr ||
           std::find(k_other_keywords.begin(), k_other_keywords.end(), word) !=
               k_other_keywords.end();
}

bool is_plain_identifier(std::string_view text) {
    return !text.empty() && is_letter(text.front()) &&
           std::all_of(text.begin(), text.end(), is_word_character) && !is_keyword(text);
}

}  // namespace isohydric::rule
