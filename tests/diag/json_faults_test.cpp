// What the JSON reader refuses, where it points and what it says. Which texts are JSON is checked
// against another parser in tests/reference/json_against_node.mjs; here it is places and words.
#include "isohydric/diag/render.hpp"

#include <doctest/doctest.h>

#include <ctime>
#include <string>
#include <vector>

#include "read_text.hpp"

namespace isohydric::diag {

using namespace std::string_literals;

namespace {

/// A text, what its only error covers, and a part of the message.
struct Fault {
    std::string text;
    std::string id;
    Span span;
    std::string says;
};

void check(const Fault& fault) {
    CAPTURE(fault.text);
    const ReadText read(fault.text);
    CHECK_FALSE(read.json.has_value());
    REQUIRE(read.report.size() == 1);
    const Diagnostic& found = read.report.diagnostics().front();
    CHECK(found.severity == Severity::error);
    CHECK(found.id == fault.id);
    CHECK(found.place.span == fault.span);
    CAPTURE(found.message);
    CHECK(found.message.find(fault.says) != std::string::npos);
}

std::string repeated(std::string_view piece, std::size_t times) {
    std::string result;
    for (std::size_t i = 0; i < times; ++i) {
        result += piece;
    }
    return result;
}

}  // namespace

TEST_CASE("json faults: structure") {
    const std::vector<Fault> faults{
        {"", "json-syntax", {0, 0}, "the text is empty"},
        {" \n", "json-syntax", {2, 2}, "the text is empty"},
        {"{\"a\":1,}", "json-syntax", {7, 8}, "remove the comma before it"},
        {"[1,]", "json-syntax", {3, 4}, "remove the comma before it"},
        {"[1,,2]", "json-syntax", {3, 4}, "expected a value, found ','"},
        {"{\"a\" 1}", "json-syntax", {5, 6}, "expected ':'"},
        {"{\"a\":}", "json-syntax", {5, 6}, "expected a value, found '}'"},
        {"{\"a\":1 \"b\":2}", "json-syntax", {7, 8}, "expected ',' or '}', found a string"},
        {"[1 2]", "json-syntax", {3, 4}, "expected ',' or ']', found '2'"},
        {"[1}", "json-syntax", {2, 3}, "expected ',' or ']', found '}'"},
        {"{,}", "json-syntax", {1, 2}, "expected a name in double quotes or '}'"},
        {"{a:1}", "json-syntax", {1, 2}, "put the name in double quotes"},
        {"{\"a\":1, b:1}", "json-syntax", {8, 9}, "put the name in double quotes"},
        {"{'a':1}", "json-syntax", {1, 2}, "in double quotes"},
        {"{1:1}", "json-syntax", {1, 2}, "put the name in double quotes"},
        {"[1] 2", "json-syntax", {4, 5}, "expected the end of the text, found '2'"},
        {"{} \"a\"", "json-syntax", {3, 4}, "expected the end of the text, found a string"},
        {"// a\n[]", "json-syntax", {0, 1}, "no comments"},
        {"[1 # a\n]", "json-syntax", {3, 4}, "no comments"},
    };
    for (const Fault& fault : faults) {
        check(fault);
    }
}

TEST_CASE("json faults: words and numbers") {
    const std::vector<Fault> faults{
        {"[NaN]", "json-syntax", {1, 4}, "JSON has no such number"},
        {"{\"a\": Infinity}", "json-syntax", {6, 14}, "JSON has no such number"},
        {"[-Infinity]", "json-syntax", {1, 10}, "JSON has no such number"},
        {"[1, inf]", "json-syntax", {4, 7}, "JSON has no such number"},
        {"True", "json-syntax", {0, 4}, "write true in lower case"},
        {"[FALSE]", "json-syntax", {1, 6}, "write false in lower case"},
        {"[None]", "json-syntax", {1, 5}, "write null"},
        {"[arterial]", "json-syntax", {1, 9}, "text stands in double quotes"},
        {"[nul]", "json-syntax", {1, 4}, "found 'nul'"},
        {"[+1]", "json-syntax", {1, 3}, "no plus sign"},
        {"[.5]", "json-syntax", {1, 3}, "a digit before its point"},
        {"[-.5]", "json-syntax", {1, 4}, "a digit before its point"},
        {"[5.]", "json-syntax", {1, 3}, "numbers are written like"},
        {"[-]", "json-syntax", {1, 2}, "numbers are written like"},
        {"[1e]", "json-syntax", {1, 3}, "numbers are written like"},
        {"[007]", "json-syntax", {2, 4}, "no leading zeros"},
        {"[0x1F]", "json-syntax", {2, 5}, "found 'x1F'"},
        {"[7,21]7", "json-syntax", {6, 7}, "expected the end of the text"},
        {"[1e999]", "json-number-range", {1, 6}, "too large"},
        {"[1, -1e400]", "json-number-range", {4, 10}, "too large"},
    };
    for (const Fault& fault : faults) {
        check(fault);
    }
}

TEST_CASE("json faults: strings and bytes") {
    const std::vector<Fault> faults{
        {"[\"abc", "json-syntax", {1, 5}, "not closed"},
        {"[\"abc\\\"]", "json-syntax", {1, 8}, "not closed"},
        {"[\"a\nb\"]", "json-syntax", {1, 3}, "not closed on its line"},
        {"[\"a\tb\"]", "json-syntax", {3, 4}, "\\u0009"},
        {"[\"a\0b\"]"s, "json-syntax", {3, 4}, "\\u0000"},
        {"[\"a\\qb\"]", "json-syntax", {3, 4}, "no such escape"},
        {"[\"\\u12G4\"]", "json-syntax", {2, 4}, "four hexadecimal digits"},
        {"[\"\\u+123\"]", "json-syntax", {2, 4}, "four hexadecimal digits"},
        {"[\"\\ud800\"]", "json-syntax", {2, 8}, "surrogate"},
        {"[\"\\ud800\\u0041\"]", "json-syntax", {2, 8}, "surrogate"},
        {"[\"\\udc00\"]", "json-syntax", {2, 8}, "surrogate"},
        {"[\"a\xFF\"]", "json-not-utf8", {3, 4}, "\\xFF"},
        {"[\"\xED\xA0\x80\"]", "json-not-utf8", {2, 3}, "\\xED"},
        {"[1]\0"s, "json-syntax", {3, 4}, "expected the end of the text"},
        {"[1,\0 2]"s, "json-syntax", {3, 4}, "expected a value"},
        {"\0"s, "json-syntax", {0, 1}, "expected a value"},
        {"[\x01]", "json-syntax", {1, 2}, "expected a value"},
        {"[\xC3\xA9]", "json-syntax", {1, 3}, "found '\xC3\xA9'"},
    };
    for (const Fault& fault : faults) {
        check(fault);
    }
}

TEST_CASE("json faults: what is not closed is shown in a note") {
    const ReadText read("{\"a\": {\"b\": [1, 2");
    CHECK_FALSE(read.json);
    REQUIRE(read.report.size() == 1);
    const Diagnostic& found = read.report.diagnostics().front();
    CHECK(found.place.span == Span{17, 17});
    REQUIRE(found.notes.size() == 1);
    CHECK(found.notes[0].place.span == Span{12, 13});
    CHECK(found.notes[0].message == "an array that begins here is not closed");
}

TEST_CASE("json faults: a byte order mark is an error, and what follows is still read") {
    const ReadText read("\xEF\xBB\xBF{\"a\": 1, \"a\": 2}");
    REQUIRE(read.json);
    CHECK(text_at(read.json->members()[1].value.place()) == "2");
    REQUIRE(read.report.error_count() == 2);
    CHECK(read.report.diagnostics()[0].id == "json-syntax");
    CHECK(read.report.diagnostics()[0].place.span == Span{0, 3});
    CHECK(read.report.diagnostics()[1].id == "json-duplicate-key");
    CHECK_FALSE(ReadText("\xEF\xBB\xBF\xEF\xBB\xBF[]").json);
}

TEST_CASE("json faults: each repeated name is an error with a note at the first, and the tree is "
          "still given") {
    const ReadText read(R"({"a": 1, "b": {"x": 1, "\u0078": 2}, "a": 2, "a": 3})");
    REQUIRE(read.json);
    REQUIRE(read.report.error_count() == 3);
    const auto& all = read.report.diagnostics();
    CHECK(all[0].id == "json-duplicate-key");
    CHECK(text_at(all[0].place) == R"("\u0078")");
    CHECK(all[0].notes[0].place.span == Span{15, 18});
    CHECK(all[1].place.span.begin == 37);
    CHECK(all[2].place.span.begin == 45);
    CHECK(all[2].notes[0].place.span == Span{1, 4});
    CHECK(read.json->find("a")->number() == 1.0);
}

TEST_CASE("json faults: the same name in different objects, or in another case, is no repetition") {
    const ReadText read(R"([{"a": {"a": 1}, "A": 1}, {"a": 2}])");
    CHECK(read.report.size() == 0);
}

TEST_CASE("json limits: one hundred levels are read, one hundred and one are not") {
    CHECK(ReadText(repeated("[", 100) + repeated("]", 100)).json.has_value());
    CHECK(ReadText(repeated("{\"a\":", 100) + "1" + repeated("}", 100)).json.has_value());
    check({repeated("[", 101) + repeated("]", 101), "json-too-deep", {100, 101}, "100"});
    check({repeated("[", 10'000'000), "json-too-deep", {100, 101}, "100"});
}

TEST_CASE("json limits: many names, all different or all the same, take no quadratic time") {
    constexpr int k_names = 200'000;
    std::string text = "{\"x\":0";
    for (int i = 0; i < k_names; ++i) {
        text += ",\"name" + std::to_string(i) + "\":0,\"x\":0";
    }
    const std::clock_t begin = std::clock();
    const ReadText read(text + "}");
    const double processor_s = static_cast<double>(std::clock() - begin) / CLOCKS_PER_SEC;
    CHECK(read.report.error_count() == k_names);
    CHECK(render(read.report).size() < 100'000);
    CHECK(processor_s < 20);  // compared pair by pair it is 8e10 comparisons
}

TEST_CASE("json limits: ten million bytes of text, of numbers, of faults") {
    const ReadText string('"' + repeated("a", 10'000'000) + '"');
    REQUIRE(string.json);
    CHECK(string.json->text().size() == 10'000'000);
    const ReadText numbers('[' + repeated("0,", 5'000'000) + "0]");
    REQUIRE(numbers.json);
    CHECK(numbers.json->items().size() == 5'000'001);
    CHECK(numbers.json->items().back().place().span == Span{10'000'001, 10'000'002});
    const ReadText open("[\"" + repeated("\\", 10'000'000));
    CHECK(render(open.report).size() < 1000);
    const ReadText word(repeated("x", 10'000'000));
    CHECK(render(word.report).size() < 1000);
    static_assert(sizeof(Json) <= 80);
}

}  // namespace isohydric::diag
