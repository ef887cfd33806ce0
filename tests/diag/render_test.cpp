// How diagnostics look: every expected text below was written by hand from the shape that
// render.hpp states.
#include "isohydric/diag/render.hpp"

#include <doctest/doctest.h>

#include <string>

namespace isohydric::diag {
namespace {

/// The excerpt below the head line of an error at a span of a text.
std::string excerpt(const std::string& text, Span span) {
    const Diagnostic diagnostic{Severity::error, "x", "m", {make_source("f", text), span}, {}};
    const std::string all = render(diagnostic);
    return all.substr(all.find('\n') + 1);
}

}  // namespace

TEST_CASE("render: head, source line, caret with tildes, notes in the same shape") {
    const auto source = make_source("gap.json", "{\n  \"low\": 3,\n  \"low\": 4\n}\n");
    Diagnostic diagnostic{Severity::error, "json-duplicate-key", "twice", {source, {16, 21}}, {}};
    diagnostic.notes.push_back({"here first", {source, {4, 9}}});
    CHECK(render(diagnostic) == "gap.json:3:3: error: twice [json-duplicate-key]\n"
                                "  \"low\": 4\n"
                                "  ^~~~~\n"
                                "gap.json:2:3: note: here first\n"
                                "  \"low\": 3,\n"
                                "  ^~~~~\n");
}

TEST_CASE("render: without a place there is no place and no source line") {
    CHECK(render(Diagnostic{Severity::warning, "odd", "odd thing", {}, {}}) ==
          "warning: odd thing [odd]\n");
    Diagnostic remark{Severity::note, "", "remark", {}, {}};
    remark.notes.push_back({"more", {}});
    CHECK(render(remark) == "note: remark\nnote: more\n");
    CHECK(render(Place{}).empty());
}

TEST_CASE("render: tabs stay tabs before the caret, so that it stands below its character") {
    CHECK(excerpt("\ta\tbc", {3, 5}) == "\ta\tbc\n\t \t^~\n");
    CHECK(excerpt("a\tb", {1, 3}) == "a\tb\n ^\t~\n");
    CHECK(excerpt("ab\tc", {0, 4}) == "ab\tc\n^~~\t~\n");
}

TEST_CASE("render: a character of several bytes takes one column") {
    CHECK(excerpt("\xC3\xA9\xE2\x82\xAC x", {6, 7}) == "\xC3\xA9\xE2\x82\xAC x\n   ^\n");
    CHECK(excerpt("\xC3\xA9\xE2\x82\xAC x", {2, 5}) == "\xC3\xA9\xE2\x82\xAC x\n ^\n");
    CHECK(excerpt("\xC3\xA9\xE2\x82\xAC x", {3, 7}) ==
          "\xC3\xA9\xE2\x82\xAC x\n ^~~\n");  // begins inside
}

TEST_CASE("render: controls, invisible characters and bytes that are not UTF-8 are shown in "
          "hexadecimal") {
    CHECK(excerpt(std::string("a\x01\xFF\0b", 5), {4, 5}) == "a\\x01\\xFF\\x00b\n             ^\n");
    CHECK(excerpt("a\x1B[2Jb", {1, 2}) == "a\\x1B[2Jb\n ^~~~\n");
    CHECK(printable("a\tb\n\x7F") == "a\\x09b\\x0A\\x7F");
    CHECK(printable("\xC2\x9B"
                    "1") == "\\xC2\\x9B1");                 // a control of two bytes
    CHECK(printable("\xE2\x80\x8B") == "\\xE2\\x80\\x8B");  // zero width space
    const std::string right_to_left{'\xE2', '\x80', '\xAE'};
    CHECK(printable(right_to_left) == "\\xE2\\x80\\xAE");
    CHECK(printable("\xEF\xBB\xBF"
                    "1") == "\\xEF\\xBB\\xBF"
                            "1");  // byte order mark
    CHECK(printable("\xC2\xB5mol \xE2\x88\x92") == "\xC2\xB5mol \xE2\x88\x92");
    CHECK(printable("\xC2") == "\\xC2");
}

TEST_CASE("render: message and name cannot smuggle lines or terminal controls in") {
    const auto source = make_source("a\nb", "x");
    const Diagnostic diagnostic{Severity::error, "id", "un\x1B[31m\nknown", {source, {0, 1}}, {}};
    CHECK(render(diagnostic) == "a\\x0Ab:1:1: error: un\\x1B[31m\\x0Aknown [id]\nx\n^\n");
}

TEST_CASE("render: a span of several lines is cut at the end of its first line") {
    CHECK(excerpt("ab\ncd", {1, 5}) == "ab\n ^\n");
    CHECK(excerpt("abc\r\ncd", {1, 7}) == "abc\n ^~\n");
}

TEST_CASE("render: an empty span, a line end and the end of the text have a caret") {
    CHECK(excerpt("abc", {1, 1}) == "abc\n ^\n");
    CHECK(excerpt("abc", {3, 3}) == "abc\n   ^\n");
    CHECK(excerpt("abc", {99, 120}) == "abc\n   ^\n");
    CHECK(excerpt("abc\r\nd", {4, 5}) == "abc\n   ^\n");
    CHECK(excerpt("abc", {2, 1}) == "abc\n  ^\n");
}

TEST_CASE("render: a blank line is not shown") {
    CHECK(excerpt("", {0, 0}).empty());
    CHECK(excerpt("a\n  \n", {3, 3}).empty());
}

TEST_CASE("render: a long line is shown around the caret") {
    const std::string begin(1000, 'b');
    const std::string end(1000, 'e');
    const std::string before(60, 'b');
    const std::string after(59, 'e');
    CHECK(excerpt(begin + "X" + end, {1000, 1001}) ==
          "..." + before + "X" + after + "...\n" + std::string(63, ' ') + "^\n");
    CHECK(excerpt(begin, {0, 1000}) ==
          std::string(120, 'b') + "...\n^" + std::string(119, '~') + "\n");
    CHECK(excerpt(begin, {1000, 1000}) ==
          "..." + std::string(120, 'b') + "\n" + std::string(123, ' ') + "^\n");
}

TEST_CASE("render: the window of a long line cuts no character in two") {
    std::string text;
    for (int i = 0; i < 200; ++i) {
        text += "\xE2\x82\xAC";
    }
    for (std::size_t at = 0; at <= text.size(); ++at) {
        CHECK(excerpt(text, {at, at}).find("\\x") == std::string::npos);
    }
}

TEST_CASE("render: a line of eight million bytes costs no more than its window") {
    CHECK(excerpt(std::string(8'000'000, '\x80'), {4'000'000, 5'000'000}).size() < 1200);
}

TEST_CASE("render: a report shows a hundred and counts the rest") {
    Report report;
    for (int i = 0; i < 99; ++i) {
        report.error("e", {}, "m");
    }
    report.warning("w", {}, "m");
    CHECK(render(report).find("not shown") == std::string::npos);
    report.warning("w", {}, "m");
    report.error("late", {}, "m");
    const std::string text = render(report);
    CHECK(text.ends_with("warning: m [w]\n2 more not shown, 1 of them errors\n"));
    CHECK(render(Report()).empty());
}

}  // namespace isohydric::diag
