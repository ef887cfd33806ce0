#include "isohydric/rule/detail/syntax_advice.hpp"

#include "isohydric/diag/text.hpp"

#include <algorithm>
#include <array>
#include <string_view>
#include <vector>

#include <fmt/format.h>

namespace isohydric::rule {
namespace {

// Operators and functions of FHIRPath that the rule language leaves out, for messages.
struct LeftOut {
    std::string_view word;
    std::string_view advice;
};

constexpr std::array k_left_out_operators{
    LeftOut{"div", "divide with /"},
    LeftOut{"mod", "there is no remainder"},
    LeftOut{"in", "compare with = and join with or"},
    LeftOut{"contains", "compare with = and join with or"},
    LeftOut{"is", "types are fixed by the names"},
    LeftOut{"as", "types are fixed by the names"},
};

constexpr std::array<std::string_view, 41> k_left_out_functions{
    "all",        "allTrue", "allFalse",  "anyFalse", "anyTrue",     "as",         "ceiling",
    "children",   "combine", "contains",  "count",    "descendants", "distinct",   "endsWith",
    "exclude",    "first",   "floor",     "hasValue", "indexOf",     "intersect",  "is",
    "isDistinct", "last",    "length",    "matches",  "now",         "ofType",     "repeat",
    "replace",    "round",   "select",    "single",   "skip",        "startsWith", "substring",
    "tail",       "take",    "toDecimal", "truncate", "union",       "where"};

constexpr std::array<std::string_view, 16> k_calendar_words{"year",
                                                            "years",
                                                            "month",
                                                            "months",
                                                            "week",
                                                            "weeks",
                                                            "day",
                                                            "days",
                                                            "hour",
                                                            "hours",
                                                            "minute",
                                                            "minutes",
                                                            "second",
                                                            "seconds",
                                                            "millisecond",
                                                            "milliseconds"};

template <class Table>
bool contains(const Table& table, std::string_view word) {
    return std::find(table.begin(), table.end(), word) != table.end();
}

std::string advice_after_value(const TokenCursor& cursor) {
    const Token& token = cursor.peek();
    const bool behind_number = cursor.last().kind == TokenKind::number;
    if (behind_number && token.kind == TokenKind::identifier) {
        return contains(k_calendar_words, token.text)
                   ? "write the time in UCUM, in quotes: 28 'd', 18 'a'"
                   : "write the unit in UCUM, in quotes: 45 'mm[Hg]'";
    }
    if (behind_number && cursor.at_symbol(",")) {
        return "write decimals with a point";
    }
    if (token.kind == TokenKind::text) {
        return "a unit belongs behind a number only";
    }
    if (cursor.at_end()) {
        return "write \")\"";
    }
    return cursor.at_symbol(")") ? "there is no open parenthesis that it closes"
                                 : "write an operator such as + or and between values";
}

}  // namespace

std::string no_value_message(const TokenCursor& cursor) {
    const std::string found =
        fmt::format("found {} where a value belongs", describe(cursor.peek()));
    if (cursor.at_symbol("+")) {
        return found + "; leave the plus sign out";
    }
    if (cursor.at_symbol(".") && cursor.ahead(1).kind == TokenKind::number) {
        return found + fmt::format("; write 0.{}", cursor.ahead(1).text);
    }
    return found + "; write a number, a name or a parenthesis";
}

diag::Diagnostic& report_after_value(const TokenCursor& cursor, diag::Report& report) {
    const Token& token = cursor.peek();
    const auto* const left_out = std::find_if(
        k_left_out_operators.begin(), k_left_out_operators.end(), [&token](const LeftOut& row) {
            return token.kind == TokenKind::identifier && row.word == token.text;
        });
    if (left_out != k_left_out_operators.end()) {
        return report.error("expression-not-supported",
                            cursor.place(token),
                            fmt::format("FHIRPath's \"{}\" is not part of the rule language; {}",
                                        left_out->word,
                                        left_out->advice));
    }
    return report.error(
        "expression-syntax",
        cursor.place(token),
        fmt::format("found {} after a value; {}", describe(token), advice_after_value(cursor)));
}

void report_unknown_function(const Token& name, const TokenCursor& cursor, diag::Report& report) {
    if (contains(k_left_out_functions, name.text)) {
        report.error("expression-not-supported",
                     cursor.place(name),
                     fmt::format("FHIRPath's {}() is not part of the rule language", name.text));
        return;
    }
    if (name.text == "iif") {
        report.error("expression-syntax",
                     cursor.place(name),
                     "iif is called on no value: iif(condition, a, b)");
        return;
    }
    std::vector<std::string> known{"iif"};
    for (const FunctionInfo& info : k_functions) {
        known.emplace_back(info.name);
    }
    report.error("expression-unknown-function",
                 cursor.place(name),
                 fmt::format("there is no function \"{}\"{}; known are {}",
                             name.text,
                             diag::did_you_mean(name.text, known),
                             diag::join(known, ", ")));
}

}  // namespace isohydric::rule
