// Objects taken apart by name and kind.
#include "isohydric/diag/json.hpp"

#include <doctest/doctest.h>

#include <string>
#include <vector>

#include "read_text.hpp"

namespace isohydric::diag {
namespace {

/// An object being read as an interval; the text must be JSON.
struct Interval {
    ReadText read;
    ObjectReader reader;

    explicit Interval(std::string text)
        : read(std::move(text)), reader(read.json.value(), read.report, "interval") {}

    [[nodiscard]] std::vector<std::string> ids() const {
        std::vector<std::string> result;
        for (const Diagnostic& each : read.report.diagnostics()) {
            result.push_back(each.id);
        }
        return result;
    }

    [[nodiscard]] const Diagnostic& only() const {
        REQUIRE(read.report.size() == 1);
        return read.report.diagnostics().front();
    }
};

}  // namespace

TEST_CASE("object reader: what is there in the right kind is given without a word") {
    Interval interval(
        R"({"of": "pH", "low": 7.35, "shipped": true, "for": ["a", "b"], "more": {}})");
    ObjectReader& reader = interval.reader;
    CHECK(reader.is_object());
    CHECK(reader.required_text("of") == "pH");
    CHECK(reader.required_number("low") == 7.35);
    CHECK(reader.required_bool("shipped") == true);
    CHECK(reader.required_texts("for") == std::vector<std::string>{"a", "b"});
    CHECK(reader.optional_text("of") == "pH");
    CHECK(reader.optional_number("low") == 7.35);
    CHECK(reader.optional_bool("shipped") == true);
    CHECK(reader.optional_texts("for")->size() == 2);
    REQUIRE(reader.required("more", Kind::object) != nullptr);
    CHECK(text_at(reader.required("more", Kind::object)->place()) == "{}");
    CHECK(reader.any("low")->kind() == Kind::number);
    reader.finish();
    CHECK(interval.read.report.size() == 0);
}

TEST_CASE("object reader: what is optional may be missing or null") {
    Interval interval(R"({"low": null})");
    CHECK_FALSE(interval.reader.optional_number("low"));
    CHECK_FALSE(interval.reader.optional_text("of"));
    CHECK_FALSE(interval.reader.optional_bool("shipped"));
    CHECK_FALSE(interval.reader.optional_texts("for"));
    CHECK(interval.reader.any("none") == nullptr);
    CHECK(interval.reader.any("low")->kind() == Kind::null);
    interval.reader.finish();
    CHECK(interval.read.report.size() == 0);
}

TEST_CASE("object reader: what is required and missing is reported at the object") {
    Interval interval("  {}");
    CHECK_FALSE(interval.reader.required_number("low"));
    CHECK(interval.only().id == "json-missing-key");
    CHECK(interval.only().message == "interval needs \"low\", a number");
    CHECK(interval.only().place.span == Span{2, 4});
}

TEST_CASE("object reader: another kind is reported at the value, required null included") {
    Interval interval(R"({"low": "7.35", "of": null, "high": [1]})");
    CHECK_FALSE(interval.reader.required_number("low"));
    CHECK_FALSE(interval.reader.required_text("of"));
    CHECK_FALSE(interval.reader.optional_bool("high"));
    const auto& all = interval.read.report.diagnostics();
    REQUIRE(all.size() == 3);
    CHECK(all[0].id == "json-wrong-kind");
    CHECK(all[0].message == "\"low\" of interval: expected a number, found a string");
    CHECK(text_at(all[0].place) == "\"7.35\"");
    CHECK(all[1].message == "\"of\" of interval: expected a string, found null");
    CHECK(all[2].message == "\"high\" of interval: expected true or false, found an array");
}

TEST_CASE("object reader: items that are no strings are reported one by one and left out") {
    Interval interval(R"({"for": ["a", 1, {}, "b"]})");
    CHECK(interval.reader.required_texts("for") == std::vector<std::string>{"a", "b"});
    const auto& all = interval.read.report.diagnostics();
    REQUIRE(all.size() == 2);
    CHECK(all[0].message == "an item of \"for\" of interval: expected a string, found a number");
    CHECK(text_at(all[1].place) == "{}");
}

TEST_CASE("object reader: members that nobody asked for are unknown; the nearest name is offered") {
    Interval interval(R"({"lwo": 1, "source": 2, "low": 3})");
    interval.reader.optional_number("low");
    interval.reader.optional_number("high");
    interval.reader.optional_number("low");
    interval.reader.finish();
    const auto& all = interval.read.report.diagnostics();
    REQUIRE(all.size() == 2);
    CHECK(all[0].id == "json-unknown-key");
    CHECK(all[0].message == "unknown name \"lwo\" in interval; did you mean \"low\"?");
    CHECK(text_at(all[0].place) == "\"lwo\"");
    CHECK(all[1].message == "unknown name \"source\" in interval; known are low, high");
}

TEST_CASE("object reader: a value that is no object is reported once, then all is silent") {
    Interval interval("[1]");
    CHECK_FALSE(interval.reader.is_object());
    CHECK(interval.only().message == "interval: expected an object, found an array");
    CHECK_FALSE(interval.reader.required_text("of"));
    CHECK(interval.reader.any("of") == nullptr);
    CHECK_FALSE(interval.reader.required_texts("for"));
    interval.reader.finish();
    CHECK(interval.ids() == std::vector<std::string>{"json-wrong-kind"});
}

TEST_CASE("object reader: a hundred thousand unknown names are all counted") {
    std::string text = "{\"low\": 1";
    for (int i = 0; i < 100'000; ++i) {
        text += ",\"lo" + std::to_string(i) + "\":0";
    }
    Interval interval(text + "}");
    interval.reader.required_number("low");
    interval.reader.finish();
    CHECK(interval.read.report.error_count() == 100'000);
}

}  // namespace isohydric::diag
