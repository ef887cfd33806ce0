// The JSON tree: what it holds, and where in the text every value and name stands.
#include "isohydric/diag/assert.hpp"
#include "isohydric/diag/json.hpp"

#include <doctest/doctest.h>

#include <algorithm>
#include <string>

#include "read_text.hpp"

namespace isohydric::diag {
namespace {

const Json& member(const Json& object, std::string_view name) {
    const Json* found = object.find(name);
    REQUIRE(found != nullptr);
    return *found;
}

bool equal(const Json& left, const Json& right) {
    if (left.kind() != right.kind()) {
        return false;
    }
    switch (left.kind()) {
    case Kind::null:
        return true;
    case Kind::boolean:
        return left.as_bool() == right.as_bool();
    case Kind::number:
        return left.number() == right.number() && left.text() == right.text();
    case Kind::string:
        return left.text() == right.text();
    case Kind::array:
        return std::equal(left.items().begin(),
                          left.items().end(),
                          right.items().begin(),
                          right.items().end(),
                          equal);
    case Kind::object:
        return std::equal(left.members().begin(),
                          left.members().end(),
                          right.members().begin(),
                          right.members().end(),
                          [](const Member& one, const Member& other) {
                              return one.name == other.name && equal(one.value, other.value);
                          });
    }
    return false;
}

/// Whether the text behind every value and name, read alone, is that value or name again.
bool same_when_read_alone(const Json& value) {
    const ReadText alone{std::string(text_at(value.place()))};
    if (!alone.json || !equal(value, *alone.json)) {
        return false;
    }
    if (value.kind() == Kind::array) {
        return std::all_of(value.items().begin(), value.items().end(), same_when_read_alone);
    }
    if (value.kind() != Kind::object) {
        return true;
    }
    return std::all_of(value.members().begin(), value.members().end(), [](const Member& each) {
        const ReadText name{std::string(text_at(each.name_place))};
        return name.json && name.json->text() == each.name && same_when_read_alone(each.value);
    });
}

constexpr std::string_view k_everything = " {\n\t"
                                          R"("null": null , "yes":true,"no" : false,
  "numbers": [0, -0, 12, -7.40, 1e2 ,2E+2, 0.50e-3,18446744073709551615,-9223372036854775808, 123456789012345678901234567890],
  "caf\u00e9\n": ["", "a\"b\\", "\ud834\udd1e \u20ac \u00b5 \u0041", "{[,:]}" ],
  "nested": {"a": [[], {}, [ ], { }, [[1,[2]],{"b":{"c":null}}]]}
}
)";

}  // namespace

TEST_CASE("json: every kind of value is read with its content") {
    const ReadText read{std::string(k_everything)};
    REQUIRE(read.json);
    CHECK(read.report.size() == 0);
    const Json& root = *read.json;
    CHECK(root.kind() == Kind::object);
    CHECK(root.members().size() == 6);
    CHECK(member(root, "null").kind() == Kind::null);
    CHECK(member(root, "yes").as_bool());
    CHECK_FALSE(member(root, "no").as_bool());
    const auto& texts = member(root, "caf\xC3\xA9\n").items();
    CHECK(texts[0].text().empty());
    CHECK(texts[1].text() == "a\"b\\");
    CHECK(texts[2].text() == "\xF0\x9D\x84\x9E \xE2\x82\xAC \xC2\xB5 A");
    CHECK(texts[3].text() == "{[,:]}");
    CHECK(member(root, "nested").find("none") == nullptr);
}

TEST_CASE("json: numbers keep their digits, and are the nearest double") {
    const ReadText read{std::string(k_everything)};
    REQUIRE(read.json);
    const auto& numbers = member(*read.json, "numbers").items();
    REQUIRE(numbers.size() == 10);
    CHECK(numbers[0].number() == 0.0);
    CHECK(numbers[1].text() == "-0");
    CHECK(numbers[3].text() == "-7.40");
    CHECK(numbers[3].number() == -7.4);
    CHECK(numbers[3].decimals() == 2);
    CHECK(numbers[4].number() == 100.0);
    CHECK(numbers[4].decimals() == 0);
    CHECK(numbers[5].text() == "2E+2");
    CHECK(numbers[6].decimals() == 2);
    CHECK(numbers[6].number() == 0.0005);
    CHECK(numbers[7].number() == 18446744073709551616.0);
    CHECK(numbers[8].number() == -9223372036854775808.0);
    CHECK(numbers[9].number() == 123456789012345678901234567890.0);
}

TEST_CASE("json: names and values know their places") {
    const ReadText read{std::string(k_everything)};
    REQUIRE(read.json);
    const auto& members = read.json->members();
    CHECK(text_at(read.json->place()) == k_everything.substr(1, k_everything.size() - 2));
    CHECK(text_at(members[0].name_place) == "\"null\"");
    CHECK(text_at(members[0].value.place()) == "null");
    CHECK(text_at(members[1].value.place()) == "true");
    CHECK(text_at(members[2].value.place()) == "false");
    CHECK(text_at(members[3].value.items()[6].place()) == "0.50e-3");
    CHECK(text_at(members[4].name_place) == R"("caf\u00e9\n")");
    CHECK(text_at(members[4].value.items()[1].place()) == R"("a\"b\\")");
    const Place place = members[5].value.place();
    CHECK(place.source->position(place.span.begin) == Position{5, 13});
}

TEST_CASE("json: the characters of any value, read alone, are that value again") {
    const ReadText read{std::string(k_everything)};
    REQUIRE(read.json);
    CHECK(same_when_read_alone(*read.json));
}

TEST_CASE("json: scalars may stand alone; a place outlives the source's maker") {
    for (const std::string text : {"0", "-1.5", "\"a\"", "true", "null"}) {
        const ReadText read{"\n " + text + "\r\n\t"};
        REQUIRE(read.json);
        CHECK(text_at(read.json->place()) == text);
        CHECK(read.json->place().span == Span{2, 2 + text.size()});
    }
}

TEST_CASE("json: asking for what a kind does not have is an internal error") {
    const ReadText read{"[1, \"a\"]"};
    REQUIRE(read.json);
    CHECK_THROWS_AS((void)read.json->as_bool(), InternalError);
    CHECK_THROWS_AS((void)read.json->text(), InternalError);
    CHECK_THROWS_AS((void)read.json->number(), InternalError);
    CHECK_THROWS_AS((void)read.json->members(), InternalError);
    CHECK_THROWS_AS((void)read.json->find("a"), InternalError);
    CHECK_THROWS_AS((void)read.json->items()[0].items(), InternalError);
    CHECK_THROWS_AS((void)read.json->items()[1].decimals(), InternalError);
    CHECK_THROWS_AS((void)string_place(read.json->items()[0], 0, 1), InternalError);
    CHECK(Json().kind() == Kind::null);
    CHECK_FALSE(Json().place());
}

TEST_CASE("string place: any part of a string, read alone between quotes, is that part again") {
    const ReadText read{R"(  "a\"\\\/\b\f\n\r\t\u0041\u00e9\u20AC\uD834\udd1ezé€𝄞!" )"};
    REQUIRE(read.json);
    const std::string content(read.json->text());
    const auto is_boundary = [&](std::size_t at) {
        return at == content.size() || (static_cast<unsigned char>(content[at]) & 0xC0U) != 0x80U;
    };
    std::size_t checked = 0;
    for (std::size_t begin = 0; begin <= content.size(); ++begin) {
        for (std::size_t end = begin; end <= content.size(); ++end) {
            if (!is_boundary(begin) || !is_boundary(end)) {
                continue;
            }
            const Place place = string_place(*read.json, begin, end);
            const ReadText part{'"' + std::string(text_at(place)) + '"'};
            REQUIRE(part.json);
            REQUIRE(part.json->text() == content.substr(begin, end - begin));
            ++checked;
        }
    }
    CHECK(checked == 19 * 20 / 2);
}

TEST_CASE("string place: inside a character of several bytes it means the whole escape") {
    const ReadText read{R"("x\u20ACy")"};
    REQUIRE(read.json);
    CHECK(text_at(string_place(*read.json, 2, 3)) == R"(\u20AC)");
    CHECK(text_at(string_place(*read.json, 1, 2)) == R"(\u20AC)");
    CHECK(text_at(string_place(*read.json, 0, 2)) == R"(x\u20AC)");
}

TEST_CASE("string place: offsets behind the string mean its end, inside the quotes") {
    const ReadText read{R"("ab")"};
    REQUIRE(read.json);
    CHECK(string_place(*read.json, 2, 2).span == Span{3, 3});
    CHECK(string_place(*read.json, 1, 99).span == Span{2, 3});
    CHECK(string_place(*read.json, 99, 120).span == Span{3, 3});
    CHECK(string_place(*read.json, 1, 0).span == Span{2, 2});
}

}  // namespace isohydric::diag
