// Canonical JSON, the hash, and what changes it.
#include "isohydric/diag/json.hpp"
#include "isohydric/diag/render.hpp"
#include "isohydric/rule/canonical.hpp"

#include <doctest/doctest.h>

#include "rule/rule_tree.hpp"

using namespace isohydric;

namespace {

std::string canonical(const std::string& text, std::string_view leave_out = {}) {
    diag::Report report;
    const auto json = diag::read_json(diag::make_source("x", text), report);
    INFO(diag::render(report));
    REQUIRE(json.has_value());
    std::string out;
    rule::append_canonical(out, *json, leave_out);
    return out;
}

std::string hash_of(const test::RuleTree& tree) {
    const test::Reading reading = test::read(tree);
    INFO(diag::render(reading.report));
    REQUIRE(reading.rules != nullptr);
    return reading.rules->sha256;
}

void replace(std::string& text, std::string_view from, std::string_view to) {
    const std::size_t at = text.find(from);
    REQUIRE(at != std::string::npos);
    text.replace(at, from.size(), to);
}

}  // namespace

TEST_CASE("canonical JSON: the worked example [@rfc8785, section 3.2.2 and 3.2.3]") {
    CHECK(canonical(R"({
       "numbers": [333333333.33333329, 1E30, 4.50, 2e-3, 0.000000000000000000000000001],
       "string": "\u20ac$\u000F\u000aA'\u0042\u0022\u005c\\\"\/",
       "literals": [null, true, false]
     })") ==
          "{\"literals\":[null,true,false],\"numbers\":[333333333.3333333,1e+30,4.5,0.002,1e-27],"
          "\"string\":\"\xE2\x82\xAC$\\u000f\\nA'B\\\"\\\\\\\\\\\"/\"}");
}

TEST_CASE("canonical JSON: members sort by UTF-16 code units [@rfc8785, section 3.2.3]") {
    const std::string sorted = canonical(R"({
       "\u20ac": "Euro Sign", "\r": "Carriage Return", "\ufb33": "Hebrew Letter Dalet With Dagesh", "1": "One",
       "\ud83d\ude00": "Emoji: Grinning Face", "\u0080": "Control", "\u00f6": "Latin Small Letter O With Diaeresis"})");
    std::size_t before = 0;
    for (const char* value : {"Carriage", "One", "Control", "Latin", "Euro", "Emoji", "Hebrew"}) {
        CAPTURE(value);
        const std::size_t at = sorted.find(value);
        CHECK(at != std::string::npos);
        CHECK(at > before);
        before = at;
    }
}

TEST_CASE("canonical JSON: numbers as ECMAScript prints them [@rfc8785, appendix B]") {
    CHECK(rule::canonical_number(0.0) == "0");
    CHECK(rule::canonical_number(-0.0) == "0");
    CHECK(rule::canonical_number(5e-324) == "5e-324");
    CHECK(rule::canonical_number(-5e-324) == "-5e-324");
    CHECK(rule::canonical_number(1.7976931348623157e+308) == "1.7976931348623157e+308");
    CHECK(rule::canonical_number(9007199254740992.0) == "9007199254740992");
    CHECK(rule::canonical_number(-9007199254740992.0) == "-9007199254740992");
    CHECK(rule::canonical_number(295147905179352830000.0) == "295147905179352830000");
    CHECK(rule::canonical_number(9.999999999999997e22) == "9.999999999999997e+22");
    CHECK(rule::canonical_number(1e+23) == "1e+23");
    CHECK(rule::canonical_number(1.0000000000000001e+23) == "1.0000000000000001e+23");
    CHECK(rule::canonical_number(999999999999999700000.0) == "999999999999999700000");
    CHECK(rule::canonical_number(1e+21) == "1e+21");
    CHECK(rule::canonical_number(9.999999999999997e-7) == "9.999999999999997e-7");
    CHECK(rule::canonical_number(0.000001) == "0.000001");
    CHECK(rule::canonical_number(333333333.3333332) == "333333333.3333332");
    CHECK(rule::canonical_number(-0.0000033333333333333333) == "-0.0000033333333333333333");
    CHECK(rule::canonical_number(1424953923781206.2) == "1424953923781206.2");
}

TEST_CASE("hash: SHA-256 of the published messages [@fips180-4, test vectors]") {
    CHECK(rule::sha256_hex("abc") ==
          "ba7816bf8f01cfea414140de5dae2223b00361a396177a9cb410ff61f20015ad");
    CHECK(rule::sha256_hex("") ==
          "e3b0c44298fc1c149afbf4c8996fb92427ae41e4649b934ca495991b7852b855");
    CHECK(rule::sha256_hex("abcdbcdecdefdefgefghfghighijhijkijkljklmklmnlmnomnopnopq") ==
          "248d6a61d20638b8e5c026930c3e6039a33ce45964ff2167f6ecedd419db06c1");
}

TEST_CASE("hash: of the canonical form, which anybody can remake") {
    const test::Reading reading = test::read(test::base_tree());
    REQUIRE(reading.rules != nullptr);
    CHECK(reading.rules->sha256 == rule::sha256_hex(reading.rules->canonical));
    CHECK(canonical(reading.rules->canonical) == reading.rules->canonical);
    CHECK(reading.rules->canonical.find("reviewed") == std::string::npos);
}

TEST_CASE("hash: white space, order of files and members, review dates, names and approval do not "
          "change it") {
    const std::string hash = hash_of(test::base_tree());
    test::RuleTree tree = test::base_tree();
    tree["base.json"].insert(1, "\n\n   ");
    CHECK(hash_of(tree) == hash);
    tree = test::base_tree();
    replace(tree["set.json"], R"("base.json", "rules.json")", R"("rules.json", "base.json")");
    CHECK(hash_of(tree) == hash);
    tree = test::base_tree();
    replace(tree["base.json"], "\"low\": 4, \"high\": 12", "\"high\": 12.0, \"low\": 4e0");
    CHECK(hash_of(tree) == hash);
    tree = test::base_tree();
    replace(tree["base.json"], "2026-12-01", "2025-01-31");
    CHECK(hash_of(tree) == hash);
    tree = test::base_tree();
    replace(
        tree["set.json"], R"("role": "", "date": "")", R"("role": "head", "date": "2026-12-01")");
    replace(tree["set.json"], R"("version": "1")", R"("version": "2")");
    CHECK(hash_of(tree) == hash);
    tree = test::base_tree();
    tree["rules.cases.json"] = R"([{"id": "a", "panel": {}, "expect": {}}])";
    CHECK(hash_of(tree) == hash);
    tree = test::base_tree();
    tree["sources.json"].insert(1, R"({"id": "uncited1999", "type": "book", "title": "t"},)");
    CHECK(hash_of(tree) == hash);
}

TEST_CASE("hash: every number, word, choice and cited source changes it") {
    const std::string hash = hash_of(test::base_tree());
    const auto changed = [&](const std::string& file, std::string_view from, std::string_view to) {
        CAPTURE(from);
        test::RuleTree tree = test::base_tree();
        replace(tree[file], from, to);
        CHECK(hash_of(tree) != hash);
    };
    changed("base.json", "\"high\": 12", "\"high\": 12.000001");
    changed("base.json", "38 'mm[Hg]'", "39 'mm[Hg]'");
    changed("base.json", "\"decimals\": 1", "\"decimals\": 2");
    changed("base.json", "gap {gap}", "the gap {gap}");
    changed("base.json", "Na - Cl - TCO2", "Na - Cl - (TCO2)");
    changed("base.json", "common-practice\"", "known2001\", \"at\": \"p. 1\"");
    changed("analytes.json", "\"decimals\": 2", "\"decimals\": 3");
}

TEST_CASE("hash: each JSON number of the files changes it") {
    const std::string hash = hash_of(test::base_tree());
    const std::string text = test::base_tree()["base.json"];
    int numbers = 0;
    for (std::size_t at = text.find("\": "); at != std::string::npos;
         at = text.find("\": ", at + 1)) {
        const std::size_t digit = at + 3;
        if (text[digit] < '0' || text[digit] > '8') {
            continue;
        }
        CAPTURE(digit);
        test::RuleTree tree = test::base_tree();
        ++tree["base.json"][digit];
        CHECK(hash_of(tree) != hash);
        ++numbers;
    }
    CHECK(numbers == 4);  // two counts of decimals, a low and a high limit
}
