// Random soup of tokens: whatever is thrown at the reader, it answers with an expression or with placed errors.
#include <array>
#include <random>

#include "rule/expression_fixture.hpp"

namespace isohydric::rule::testing {
namespace {

constexpr std::array<std::string_view, 58> k_pieces{"pH",
                                                    "pCO2",
                                                    "Na",
                                                    "pCO2kPa",
                                                    "temperature",
                                                    "lowGas",
                                                    "`raised-gap`",
                                                    "limits.pH.low",
                                                    "context.onset",
                                                    "context.near",
                                                    "context.age",
                                                    "area",
                                                    "1",
                                                    "7.35",
                                                    "45 'mm[Hg]'",
                                                    "6 'kPa'",
                                                    "140 'mmol/L'",
                                                    "37 'Cel'",
                                                    "'chronic'",
                                                    "'",
                                                    "`",
                                                    "+",
                                                    "-",
                                                    "*",
                                                    "/",
                                                    "=",
                                                    "!=",
                                                    "<",
                                                    "<=",
                                                    ">",
                                                    ">=",
                                                    "and",
                                                    "or",
                                                    "xor",
                                                    "implies",
                                                    "(",
                                                    ")",
                                                    "(",
                                                    ")",
                                                    ",",
                                                    ".",
                                                    ".abs()",
                                                    ".not()",
                                                    ".exists()",
                                                    ".empty()",
                                                    ".power(2)",
                                                    ".power(",
                                                    ".sqrt()",
                                                    ".ln()",
                                                    ".log(10)",
                                                    "iif(",
                                                    "true",
                                                    "==",
                                                    "&&",
                                                    "%",
                                                    "\xE2\x89\xA4",
                                                    "\xFF",
                                                    "\\"};

std::string soup(std::mt19937& random, bool spaced) {
    std::string text;
    const std::size_t length = 1 + random() % 24;
    for (std::size_t i = 0; i < length; ++i) {
        text += k_pieces[random() % k_pieces.size()];
        text += spaced ? " " : "";
    }
    return text;
}

}  // namespace

TEST_CASE("soup: random tokens give an expression or placed errors, never a crash") {
    std::mt19937 random(20261201);
    const SmallTable table;
    int understood = 0;
    for (int i = 0; i < 20000; ++i) {
        const std::string text = soup(random, i % 4 != 0);
        CAPTURE(i);
        CAPTURE(text);
        const auto source = diag::make_source("soup", text);
        diag::Report report;
        const std::optional<Syntax> syntax = parse_expression(text, locator_in(source), report);
        REQUIRE(syntax.has_value() == !report.has_errors());
        for (const Wanted& wanted : {truth(), number(), number("mm[Hg]")}) {
            diag::Report checks;
            const ExpressionPtr read = syntax ? check(*syntax, table, wanted, checks) : nullptr;
            REQUIRE((syntax && !read) == checks.has_errors());
            understood += read ? 1 : 0;
            for (const diag::Diagnostic& diagnostic : checks.diagnostics()) {
                REQUIRE(diagnostic.place.span.end <= text.size());
            }
            if (read) {
                REQUIRE_FALSE(number_form(*read).empty());
                REQUIRE_FALSE(plain_text(*read).empty());
            }
        }
        for (const diag::Diagnostic& diagnostic : report.diagnostics()) {
            REQUIRE(diagnostic.place.span.begin <= diagnostic.place.span.end);
            REQUIRE(diagnostic.place.span.end <= text.size());
        }
    }
    // The soup must reach the checker and the printers, or it shows nothing.
    CHECK(understood > 100);
}

}  // namespace isohydric::rule::testing
