// Lines and columns of a text, and the report that gathers messages about it.
#include "isohydric/diag/assert.hpp"
#include "isohydric/diag/report.hpp"
#include "isohydric/diag/source.hpp"

#include <doctest/doctest.h>

#include <string>

namespace isohydric::diag {

TEST_CASE("source: positions count lines and columns from 1, columns in bytes") {
    const auto source = make_source("a.json", "one\ntw\xC3\xB6!\n\nend");
    CHECK(source->position(0) == Position{1, 1});
    CHECK(source->position(3) == Position{1, 4});  // the line feed belongs to the line it ends
    CHECK(source->position(4) == Position{2, 1});
    CHECK(source->position(8) == Position{2, 5});  // behind the two bytes of the umlaut
    CHECK(source->position(10) == Position{3, 1});
    CHECK(source->position(11) == Position{4, 1});
    CHECK(source->position(14) == Position{4, 4});
    CHECK(source->position(1000) == Position{4, 4});
    CHECK(source->line_count() == 4);
    CHECK(source->line(2) == "tw\xC3\xB6!");
    CHECK(source->line(3).empty());
    CHECK(source->line(4) == "end");
}

TEST_CASE("source: CR LF ends a line as LF does, a lone CR does not") {
    const auto source = make_source("a.json", "one\r\nt\rwo\r\n");
    CHECK(source->line_count() == 3);
    CHECK(source->line(1) == "one");
    CHECK(source->line(2) == "t\rwo");
    CHECK(source->line(3).empty());
    CHECK(source->position(5) == Position{2, 1});
}

TEST_CASE("source: every offset lies in the line that its position names") {
    const std::string text = "\n\na\r\n\xFFz\n\n\n  {}";
    const auto source = make_source("a.json", text);
    for (std::size_t offset = 0; offset <= text.size(); ++offset) {
        const Position position = source->position(offset);
        CHECK(source->line_begin(position.line) + position.column - 1 == offset);
        const auto before = text.substr(source->line_begin(position.line), position.column - 1);
        CHECK(before.find('\n') == std::string::npos);
    }
}

TEST_CASE("source: an empty text has one empty line") {
    const auto source = make_source("", "");
    CHECK(source->line_count() == 1);
    CHECK(source->line(1).empty());
    CHECK(source->position(0) == Position{1, 1});
    CHECK_THROWS_AS((void)source->line(0), InternalError);
    CHECK_THROWS_AS((void)source->line(2), InternalError);
}

TEST_CASE("place: without a source it is unknown") {
    CHECK_FALSE(Place{});
    CHECK(Place{make_source("a", "b"), {0, 1}});
}

TEST_CASE("report: only errors count as errors") {
    Report report;
    CHECK_FALSE(report.has_errors());
    report.warning("odd", {}, "odd");
    report.add({Severity::note, "", "remark", {}, {}});
    CHECK_FALSE(report.has_errors());
    report.error("bad", {}, "bad");
    CHECK(report.has_errors());
    CHECK(report.error_count() == 1);
    CHECK(report.size() == 3);
}

TEST_CASE("report: references to diagnostics stay valid while others are added") {
    Report report;
    Diagnostic& first = report.error("first", {}, "first");
    for (int i = 0; i < 5000; ++i) {
        report.error("more", {}, "more");
    }
    first.notes.push_back({"late", {}});
    CHECK(report.diagnostics().front().notes.size() == 1);
}

TEST_CASE("report: the first 10,000 are kept and all are counted") {
    Report report;
    for (int i = 0; i < 10'000; ++i) {
        report.warning("odd", {}, "odd");
    }
    report.error("bad", {}, "bad").notes.push_back({"its note", {}});
    report.warning("odd", {}, "odd");
    CHECK(report.diagnostics().size() == 10'000);
    CHECK(report.size() == 10'002);
    CHECK(report.error_count() == 1);
    CHECK(report.has_errors());
}

}  // namespace isohydric::diag
