#include "isohydric/rule/canonical.hpp"

#include "isohydric/diag/assert.hpp"

#include <algorithm>
#include <array>
#include <charconv>
#include <cmath>
#include <system_error>
#include <vector>

#include <fmt/format.h>
#include <openssl/evp.h>

namespace isohydric::rule {
namespace {

// UTF-8 sorts by code point, UTF-16 puts the surrogates of U+10000 and above before U+E000. Giving the lead bytes EE and
// EF, which begin U+E000 to U+FFFF, a weight above all others makes the orders equal.
int utf16_weight(char c) {
    constexpr int k_lead_of_private_use = 0xEE;
    constexpr int k_lead_of_last_in_plane = 0xEF;
    constexpr int k_above_all = 0x100;
    const int byte = static_cast<unsigned char>(c);
    const bool raised = byte == k_lead_of_private_use || byte == k_lead_of_last_in_plane;
    return raised ? byte + k_above_all : byte;
}

bool before_in_utf16(std::string_view a, std::string_view b) {
    return std::ranges::lexicographical_compare(a, b, {}, utf16_weight, utf16_weight);
}

void append_object(std::string& out, const diag::Json& json, std::string_view leave_out) {
    std::vector<const diag::Member*> members;
    for (const diag::Member& member : json.members()) {
        if (leave_out.empty() || member.name != leave_out) {
            members.push_back(&member);
        }
    }
    std::ranges::sort(members, [](const diag::Member* a, const diag::Member* b) {
        return before_in_utf16(a->name, b->name);
    });
    out += '{';
    for (const diag::Member* member : members) {
        if (member != members.front()) {
            out += ',';
        }
        append_canonical(out, std::string_view(member->name));
        out += ':';
        append_canonical(out, member->value, leave_out);
    }
    out += '}';
}

void append_array(std::string& out, const diag::Json& json, std::string_view leave_out) {
    out += '[';
    for (const diag::Json& item : json.items()) {
        if (&item != &json.items().front()) {
            out += ',';
        }
        append_canonical(out, item, leave_out);
    }
    out += ']';
}

void append_escaped(std::string& out, char c) {
    switch (c) {
    case '"':
        out += "\\\"";
        return;
    case '\\':
        out += "\\\\";
        return;
    case '\b':
        out += "\\b";
        return;
    case '\f':
        out += "\\f";
        return;
    case '\n':
        out += "\\n";
        return;
    case '\r':
        out += "\\r";
        return;
    case '\t':
        out += "\\t";
        return;
    default:
        break;
    }
    const auto byte = static_cast<unsigned char>(c);
    if (byte < ' ') {
        fmt::format_to(std::back_inserter(out), "\\u{:04x}", byte);
    } else {
        out += c;
    }
}

/// Shortest digits that read back as the same double, and the power of ten of the point before them: 0.d1d2... x 10^point.
struct Digits {
    std::string digits;
    int point{};
};

Digits shortest_digits(double positive) {
    std::array<char, 32> buffer{};
    const auto [end, error] = std::to_chars(
        buffer.data(), buffer.data() + buffer.size(), positive, std::chars_format::scientific);
    ISOHYDRIC_ASSERT(error == std::errc());
    const std::string_view text(buffer.data(), static_cast<std::size_t>(end - buffer.data()));
    const std::size_t e = text.find('e');
    std::string_view exponent = text.substr(e + 1);
    if (exponent.starts_with('+')) {
        exponent.remove_prefix(1);
    }
    Digits result{std::string(text.substr(0, e)), 0};
    std::erase(result.digits, '.');
    std::from_chars(exponent.data(), exponent.data() + exponent.size(), result.point);
    ++result.point;
    return result;
}

}  // namespace

std::string canonical_number(double value) {
    constexpr int k_longest_integer = 21;
    constexpr int k_most_leading_zeros = 6;
    ISOHYDRIC_ASSERT(std::isfinite(value));
    if (value == 0) {
        return "0";
    }
    const std::string sign = value < 0 ? "-" : "";
    const auto [digits, point] = shortest_digits(std::abs(value));
    const int count = static_cast<int>(digits.size());
    const auto zeros = [](int n) {
        return std::string(static_cast<std::size_t>(n), '0');
    };
    if (count <= point && point <= k_longest_integer) {
        return sign + digits + zeros(point - count);
    }
    if (0 < point && point <= k_longest_integer) {
        const auto split = static_cast<std::size_t>(point);
        return sign + digits.substr(0, split) + "." + digits.substr(split);
    }
    if (-k_most_leading_zeros < point && point <= 0) {
        return sign + "0." + zeros(-point) + digits;
    }
    const std::string fraction = count == 1 ? "" : "." + digits.substr(1);
    return fmt::format("{}{}{}e{:+d}", sign, digits[0], fraction, point - 1);
}

void append_canonical(std::string& out, std::string_view text) {
    out += '"';
    for (const char c : text) {
        append_escaped(out, c);
    }
    out += '"';
}

void append_canonical(std::string& out, const diag::Json& json, std::string_view leave_out) {
    switch (json.kind()) {
    case diag::Kind::null:
        out += "null";
        break;
    case diag::Kind::boolean:
        out += json.as_bool() ? "true" : "false";
        break;
    case diag::Kind::number:
        out += canonical_number(json.number());
        break;
    case diag::Kind::string:
        append_canonical(out, json.text());
        break;
    case diag::Kind::array:
        append_array(out, json, leave_out);
        break;
    case diag::Kind::object:
        append_object(out, json, leave_out);
        break;
    }
}

std::string sha256_hex(std::string_view bytes) {
    std::array<unsigned char, EVP_MAX_MD_SIZE> hash{};
    unsigned int size = 0;
    const int done =
        EVP_Digest(bytes.data(), bytes.size(), hash.data(), &size, EVP_sha256(), nullptr);
    if (done != 1) {
        throw std::system_error(std::make_error_code(std::errc::not_supported),
                                "SHA-256 is not available from the cryptography library");
    }
    std::string hex;
    for (unsigned int i = 0; i < size; ++i) {
        fmt::format_to(std::back_inserter(hex), "{:02x}", hash.at(i));
    }
    return hex;
}

}  // namespace isohydric::rule
