// UTF-8, the nearest word, and the small helpers.
#include "isohydric/diag/text.hpp"

#include <doctest/doctest.h>

#include <array>
#include <string>
#include <vector>

namespace isohydric::diag {
namespace {

char byte(std::uint32_t value) {
    return static_cast<char>(static_cast<unsigned char>(value));
}

/// Encodes by the bit pattern of RFC 3629, section 3, with a given number of bytes (1 to 4),
/// well-formed or not.
std::string encode(std::uint32_t code_point, std::size_t length) {
    constexpr std::array<std::uint32_t, 5> k_lead{0, 0x00, 0xC0, 0xE0, 0xF0};
    std::string result(length, '\0');
    for (std::size_t i = length - 1; i > 0; --i) {
        result[i] = byte(0x80U | (code_point & 0x3FU));
        code_point >>= 6U;
    }
    result[0] = byte(k_lead[length] | code_point);
    return result;
}

std::size_t shortest_length(std::uint32_t code_point) {
    return code_point < 0x80 ? 1 : code_point < 0x800 ? 2 : code_point < 0x10000 ? 3 : 4;
}

const std::vector<std::string> k_names{"pCO2", "pO2", "HCO3", "albumin", "lactate", "Na", "K"};

}  // namespace

TEST_CASE("utf-8: a code point is well-formed in its shortest form unless it is a surrogate "
          "[@rfc3629, section 3]") {
    std::size_t wrong = 0;
    for (std::uint32_t code_point = 0; code_point < 0x200000; ++code_point) {
        const bool is_scalar =
            code_point <= 0x10FFFF && (code_point < 0xD800 || code_point > 0xDFFF);
        for (std::size_t length = shortest_length(code_point); length <= 4; ++length) {
            const bool is_well_formed = is_scalar && length == shortest_length(code_point);
            const std::size_t expected = is_well_formed ? length : 0;
            wrong += utf8_sequence_length(encode(code_point, length) + "z") == expected ? 0U : 1U;
        }
    }
    CHECK(wrong == 0);
}

TEST_CASE("utf-8: C0, C1 and F5 to FF never occur [@rfc3629, section 3]") {
    for (const std::uint32_t lead : {0xC0U, 0xC1U, 0xF5U, 0xF8U, 0xFEU, 0xFFU}) {
        CHECK_FALSE(is_valid_utf8(std::string(1, byte(lead)) + "\x80\x80\x80"));
    }
}

TEST_CASE("utf-8: the first bad byte is found; a sequence cut short is bad from its lead") {
    CHECK(is_valid_utf8(""));
    CHECK(is_valid_utf8("a\xC3\xA9\xE2\x82\xAC\xF0\x9D\x84\x9E"));
    CHECK(first_invalid_utf8("ab\x80") == 2);
    CHECK(first_invalid_utf8("a\xC3\xA9\xE2\x82") == 3);
    CHECK(first_invalid_utf8("a\xF0\x9D\x84") == 1);
    CHECK(first_invalid_utf8("\xC3\x28") == 0);
    CHECK_FALSE(first_invalid_utf8(std::string_view("a\0b", 3)).has_value());
}

TEST_CASE("nearest: one slip of each sort is near") {
    CHECK(nearest("albumim", k_names) == "albumin");   // replaced
    CHECK(nearest("abumin", k_names) == "albumin");    // left out
    CHECK(nearest("albummin", k_names) == "albumin");  // put in
    CHECK(nearest("ablumin", k_names) == "albumin");   // swapped
    CHECK(nearest("ALBUMIN", k_names) == "albumin");   // case
}

TEST_CASE("nearest: a third of the length, at most three, is near enough") {
    CHECK(nearest("pc2", k_names) == "pCO2");
    CHECK(nearest("x", k_names).empty());
    CHECK(nearest("ca", k_names).empty());
    CHECK(nearest("na", k_names) == "Na");
    CHECK(nearest("lattt", k_names).empty());  // 3 steps of 5 letters
    const std::vector<std::string> word{"abcdefghijkl"};
    CHECK(nearest("xyzdefghijkl", word) == word[0]);     // 3 of 12
    CHECK(nearest("wxyzefghijkl", word).empty());        // 4 of 12
    CHECK(nearest("abcdefghijkl123", word) == word[0]);  // 3 longer
    CHECK(nearest("abcdefghi", word) == word[0]);        // 3 shorter
}

TEST_CASE("nearest: of equally near words the first wins, a nearer one always") {
    const std::vector<std::string> words{"baton", "batin", "batan"};
    CHECK(nearest("batun", words) == "baton");
    CHECK(nearest("batan", words) == "batan");
}

TEST_CASE("nearest: nothing to choose from, empty and enormous words give nothing") {
    CHECK(nearest("pH", std::span<const std::string>()).empty());
    CHECK(nearest("", k_names).empty());
    CHECK(nearest(std::string(8'000'000, 'a'), k_names).empty());
    CHECK(nearest("abc", std::vector<std::string>{""}).empty());
    const std::array<std::string_view, 2> views{"low", "high"};
    CHECK(nearest("hihg", views) == "high");
}

TEST_CASE("did you mean: the tail of a message, or nothing") {
    CHECK(did_you_mean("lactat", k_names) == "; did you mean \"lactate\"?");
    CHECK(did_you_mean("glucose", k_names).empty());
}

TEST_CASE("text: trim, lower, join") {
    CHECK(trim(" \t a b\r\n") == "a b");
    CHECK(trim(" \n ").empty());
    CHECK(trim("").empty());
    CHECK(lower("PaCO2 \xC3\x84Z[@") == "paco2 \xC3\x84z[@");
    CHECK(join(k_names, ", ") == "pCO2, pO2, HCO3, albumin, lactate, Na, K");
    CHECK(join({}, ", ").empty());
}

}  // namespace isohydric::diag
