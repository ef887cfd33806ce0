// Reads JSON texts, one a line in hexadecimal, and writes for each what read_json made of it, as
// one line of JSON, for json_against_node.mjs to compare.
#include "isohydric/diag/json.hpp"

#include <bit>
#include <charconv>
#include <cstdint>
#include <iostream>
#include <string>
#include <string_view>
#include <utility>

#include <fmt/format.h>

namespace isohydric::diag {
namespace {

std::string hex(std::string_view bytes) {
    std::string result = "\"";
    for (const char each : bytes) {
        result += fmt::format("{:02x}", static_cast<unsigned char>(each));
    }
    return result + '"';
}

std::string unhex(std::string_view digits) {
    std::string result;
    for (std::size_t at = 0; at + 1 < digits.size(); at += 2) {
        unsigned value = 0;
        std::from_chars(digits.data() + at, digits.data() + at + 2, value, 16);
        result.push_back(static_cast<char>(static_cast<unsigned char>(value)));
    }
    return result;
}

std::string at_place(const Place& place) {
    const Span span = place.span;
    return hex(std::string_view(place.source->text()).substr(span.begin, span.end - span.begin));
}

std::string value_as_json(const Json& value);

std::string content_as_json(const Json& value) {
    std::string list;
    switch (value.kind()) {
    case Kind::null:
        return "null";
    case Kind::boolean:
        return value.as_bool() ? "true" : "false";
    case Kind::number:
        return fmt::format("\"{:016x}\"", std::bit_cast<std::uint64_t>(value.number()));
    case Kind::string:
        return hex(value.text());
    case Kind::array:
        for (const Json& item : value.items()) {
            list += (list.empty() ? "" : ",") + value_as_json(item);
        }
        return '[' + list + ']';
    case Kind::object:
        for (const Member& member : value.members()) {
            list += list.empty() ? "" : ",";
            list += fmt::format("[{},{},{}]",
                                hex(member.name),
                                at_place(member.name_place),
                                value_as_json(member.value));
        }
        return '[' + list + ']';
    }
    return "null";
}

/// `[kind, characters at the place, content]`.
std::string value_as_json(const Json& value) {
    return fmt::format(
        R"(["{}",{},{}])", describe(value.kind()), at_place(value.place()), content_as_json(value));
}

/// The answer to one text.
std::string answer(std::string text) {
    Report report;
    const auto json = read_json(make_source("input", std::move(text)), report);
    std::string ids;
    for (const Diagnostic& each : report.diagnostics()) {
        ids += fmt::format("{}\"{}\"", ids.empty() ? "" : ",", each.id);
    }
    return fmt::format(
        "{{\"errors\":[{}],\"value\":{}}}\n", ids, json ? value_as_json(*json) : "null");
}

}  // namespace
}  // namespace isohydric::diag

int main() {
    std::string line;
    while (std::getline(std::cin, line)) {
        std::cout << isohydric::diag::answer(isohydric::diag::unhex(line));
    }
    return 0;
}
