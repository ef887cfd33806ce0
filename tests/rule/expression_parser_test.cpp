// Precedence, places and messages of the parser.
#include "rule/expression_fixture.hpp"
#include "rule/syntax_tree.hpp"

namespace isohydric::rule::testing {
namespace {

/// What the parser makes of an expression, without the checker, or its diagnostics.
std::string tree(const std::string& expression) {
    Text text(expression);
    const std::optional<Syntax> parsed = text.parse();
    return parsed ? tree_of(*parsed) : ids(text.report);
}

}  // namespace

TEST_CASE(
    "parser: products bind tighter than sums, sums than comparisons [@hl7-fhirpath, grammar]") {
    CHECK(tree("a + b * c") == "(+ a (* b c))");
    CHECK(tree("a * b + c") == "(+ (* a b) c)");
    CHECK(tree("a - b < c * d") == "(< (- a b) (* c d))");
    CHECK(tree("a < b / c + d") == "(< a (+ (/ b c) d))");
}

TEST_CASE("parser: inequality binds tighter than equality [@hl7-fhirpath, grammar]") {
    CHECK(tree("a < b = c > d") == "(= (< a b) (> c d))");
    CHECK(tree("a = b >= c") == "(= a (>= b c))");
    CHECK(tree("a != b <= c") == "(!= a (<= b c))");
}

TEST_CASE("parser: and binds tighter than or and xor, those tighter than implies "
          "[@hl7-fhirpath, grammar]") {
    CHECK(tree("a or b and c") == "(or a (and b c))");
    CHECK(tree("a xor b and c") == "(xor a (and b c))");
    CHECK(tree("a implies b or c") == "(implies a (or b c))");
    CHECK(tree("a or b implies c") == "(implies (or a b) c)");
    CHECK(tree("a = b and c") == "(and (= a b) c)");
}

TEST_CASE(
    "parser: operators of one level group to the left, implies too [@hl7-fhirpath, grammar]") {
    CHECK(tree("a - b - c") == "(- (- a b) c)");
    CHECK(tree("a / b * c") == "(* (/ a b) c)");
    CHECK(tree("a - b + c") == "(+ (- a b) c)");
    CHECK(tree("a or b xor c") == "(xor (or a b) c)");
    CHECK(tree("a implies b implies c") == "(implies (implies a b) c)");
}

TEST_CASE("parser: a sign binds tighter than a product and looser than a point "
          "[@hl7-fhirpath, grammar]") {
    CHECK(tree("-a * b") == "(* (- a) b)");
    CHECK(tree("a - -b") == "(- a (- b))");
    CHECK(tree("--a") == "(- (- a))");
    CHECK(tree("-limits.pH.low") == "(- limits.pH.low)");
}

TEST_CASE("parser: calls chain to the right of a point") {
    CHECK(tree("(a + b).abs().power(2)") == "(power (abs (+ a b)) 2)");
    CHECK(tree("10.power(a - b)") == "(power 10 (- a b))");
    CHECK(tree("iif(a.exists(), b, c + 1)") == "(iif (exists a) b (+ c 1))");
    CHECK(tree("limits.pH.low.exists()") == "(exists limits.pH.low)");
}

TEST_CASE("parser: names in backticks may hold any character") {
    CHECK(tree("`raised-gap` and a") == "(and `raised-gap` a)");
    CHECK(tree("`gas.low`") == "`gas.low`");
    CHECK(tree("`and`") == "`and`");
    // A delimited identifier is the same name as a plain one [@hl7-fhirpath, identifiers].
    CHECK(tree("`Na`") == "Na");
}

TEST_CASE("parser: white space and line ends between tokens do not matter") {
    CHECK(tree("a+b*c") == tree("  a  +\tb\n*\r\n c "));
}

TEST_CASE("parser: a number may be followed by a point and a name, not by a bare point") {
    CHECK(tree("1.5.abs()") == "(abs 1.5)");
    CHECK(tree("007.50") == "007.50");
    CHECK(tree("5.") == "1:4-4 expression-syntax");
    CHECK(tree(".5") == "1:2-3 expression-syntax");
    CHECK(tree("1.2.3") == "1:6-7 expression-syntax");
    CHECK(message(".5", number()) == "found \".\" where a value belongs; write 0.5");
    CHECK(message("0,5", number()) == "found \",\" after a value; write decimals with a point");
}

TEST_CASE("parser: what FHIRPath has and the rule language has not is named") {
    CHECK(tree("a & b") == "1:4-5 expression-not-supported");
    CHECK(tree("a | b") == "1:4-5 expression-not-supported");
    CHECK(tree("a ~ b") == "1:4-5 expression-not-supported");
    CHECK(tree("a !~ b") == "1:4-6 expression-not-supported");
    CHECK(tree("a div b") == "1:4-7 expression-not-supported");
    CHECK(tree("a mod b") == "1:4-7 expression-not-supported");
    CHECK(tree("a in b") == "1:4-6 expression-not-supported");
    CHECK(tree("a contains b") == "1:4-12 expression-not-supported");
    CHECK(tree("a is Quantity") == "1:4-6 expression-not-supported");
    CHECK(tree("a as Quantity") == "1:4-6 expression-not-supported");
    CHECK(tree("%age") == "1:2-3 expression-not-supported");
    CHECK(tree("a = {}") == "1:6-8 expression-not-supported");
    CHECK(tree("a[0]") == "1:3-4 expression-not-supported; 1:5-6 expression-not-supported");
    CHECK(tree("$this") == "1:2-3 expression-not-supported");
    CHECK(tree("@2020") == "1:2-3 expression-not-supported");
    CHECK(tree("a // b") == "1:4-6 expression-not-supported");
    CHECK(tree("a.where(b)") == "1:4-9 expression-not-supported");
    CHECK(tree("a.round(1)") == "1:4-9 expression-not-supported");
    CHECK(tree("4 days") == "1:4-8 expression-syntax");
    CHECK(message("4 days", number()) ==
          "found \"days\" after a value; write the time in UCUM, in quotes: 28 'd', 18 'a'");
}

TEST_CASE("parser: operators of other languages are read as meant, and reported") {
    CHECK(tree("a == b") == "1:4-6 expression-operator");
    CHECK(tree("a && b || c") == "1:4-6 expression-operator; 1:9-11 expression-operator");
    CHECK(tree("a <> b") == "1:4-6 expression-operator");
    CHECK(tree("a =< b") == "1:4-6 expression-operator");
    CHECK(tree("a AND b") == "1:4-7 expression-operator");
    CHECK(tree("a \xE2\x89\xA4 b") == "1:4-7 expression-operator");
    CHECK(tree("!a") == "1:2-3 expression-not-supported");
    CHECK(tree("not a") == "1:2-5 expression-syntax");
    CHECK(tree("a ^ 2") == "1:4-5 expression-not-supported");
    CHECK(message("a == b", truth()) == "found \"==\"; FHIRPath compares with a single =");
}

TEST_CASE("parser: several faults of one expression are reported in one run") {
    CHECK(tree("a == b && c.logg(2) and d.abs(1)") ==
          "1:4-6 expression-operator; 1:9-11 expression-operator; "
          "1:14-18 expression-unknown-function; 1:28-31 expression-arguments");
}

TEST_CASE("parser: chained comparisons are refused with what to write") {
    CHECK(tree("a < b < c") == "1:8-9 expression-chained-comparison");
    CHECK(tree("a = b = c") == "1:8-9 expression-chained-comparison");
    CHECK(tree("a < b <= c > d") ==
          "1:8-10 expression-chained-comparison; 1:13-14 expression-chained-comparison");
    CHECK(tree("(a = b) = c") == "(= (= a b) c)");
}

TEST_CASE("parser: a minus before a call needs parentheses") {
    CHECK(tree("-a.abs()") == "1:2-3 expression-unary-minus");
    CHECK(tree("-(a).abs()") == "1:2-3 expression-unary-minus");
    CHECK(tree("-1.power(2)") == "1:2-3 expression-unary-minus");
    CHECK(tree("b - a.abs()") == "(- b (abs a))");
    CHECK(tree("-(a.abs())") == "(- (abs a))");
    CHECK(tree("(-a).abs()") == "(abs (- a))");
    CHECK(tree("-iif(a, b, c)") == "(- (iif a b c))");
}

TEST_CASE("parser: functions, their names and their arguments") {
    CHECK(message("a.sqr()", number()) ==
          "there is no function \"sqr\"; did you mean \"sqrt\"?; known are iif, not, abs, ln, log, "
          "exp, power, sqrt, exists, empty");
    CHECK(message("a.power()", number()) == "power takes 1 argument; found 0");
    CHECK(message("iif(a, b)", number()) == "iif takes 3 arguments; found 2");
    CHECK(tree("a.log(2, 3)") == "1:4-7 expression-arguments");
    CHECK(tree("abs(a)") == "1:2-5 expression-syntax");
    CHECK(tree("a.iif(b, c)") == "1:4-7 expression-syntax");
    CHECK(tree("max(a, b)") == "1:2-5 expression-unknown-function");
    CHECK(tree("iif(a, b, )") == "1:12-13 expression-syntax");
}

TEST_CASE("parser: a place inside a JSON string is that of the file, escapes included") {
    // In the file: "`x` = \"a\" and" ; each escaped quote takes two bytes.
    CHECK(tree("`x` = \"a\" and") == "1:8-10 expression-operator; 1:17-17 expression-syntax");
    diag::Report report;
    const auto json = diag::read_json(
        diag::make_source("r.json", "{\n  \"when\": \"pH \\u003c 7.2 ? 1\"\n}"), report);
    REQUIRE(json.has_value());
    CHECK_FALSE(parse_expression(*json->find("when"), report).has_value());
    CHECK(ids(report) == "2:26-27 expression-character");
}

TEST_CASE("parser: what is open at the end is pointed at") {
    CHECK(tree("a = 'chronic") == "1:6-14 expression-unterminated");
    CHECK(tree("`raised-gap") == "1:2-13 expression-unterminated");
    Text text("(a + b");
    CHECK_FALSE(text.parse().has_value());
    CHECK(ids(text.report) == "1:8-8 expression-syntax");
    REQUIRE(text.report.diagnostics().front().notes.size() == 1);
    CHECK(text.report.diagnostics().front().notes[0].place.span.begin == 1);
    CHECK(tree("a + b)") == "1:7-8 expression-syntax");
    CHECK(tree("") == "1:2-2 expression-syntax");
    CHECK(tree("a +") == "1:5-5 expression-syntax");
    CHECK(tree("a b") == "1:4-5 expression-syntax");
    CHECK(tree("()") == "1:3-4 expression-syntax");
}

TEST_CASE("parser: units belong in quotes behind a number") {
    CHECK(tree("45 mmHg") == "1:5-9 expression-syntax");
    CHECK(tree("5mmol") == "1:2-7 expression-number");
    CHECK(tree("1e3") == "1:2-5 expression-number");
    CHECK(tree("a 'mmol/L'") == "1:4-12 expression-syntax");
    CHECK(tree("'a\\'b'") == "1:4-7 expression-escape");
    CHECK(tree(std::string(31, '1')) == "1:2-33 expression-number");
}

TEST_CASE("parser: depth and length are bounded") {
    const auto nested = [](int depth) {
        return std::string(static_cast<std::size_t>(depth), '(') + "a" +
               std::string(static_cast<std::size_t>(depth), ')');
    };
    const auto chain = [](std::size_t terms) {
        std::string text = "a";
        for (std::size_t i = 1; i < terms; ++i) {
            text += "+a";
        }
        return text;
    };
    CHECK(tree(nested(128)) == "a");
    CHECK(tree(nested(129)) == "1:130-131 expression-too-deep");
    CHECK(tree(std::string(2000, '-') + "a") == "1:130-131 expression-too-deep");
    CHECK(tree(chain(128)).size() > 128);
    CHECK(tree(chain(129)) == "1:257-258 expression-too-deep");
    CHECK(tree(std::string(4001, ' ')) == "1:2-4003 expression-too-long");
}

}  // namespace isohydric::rule::testing
