#include "isohydric/rule/detail/fields.hpp"

#include "isohydric/diag/text.hpp"

#include <charconv>
#include <chrono>

#include <fmt/format.h>
#include <fmt/ranges.h>

namespace isohydric::rule::detail {
namespace {

/// A number of exactly `digits.size()` decimal digits.
std::optional<int> digits_only(std::string_view digits) {
    int value = 0;
    const char* end = digits.data() + digits.size();
    const bool all_digits = digits.find_first_not_of("0123456789") == std::string_view::npos;
    const auto [stop, error] = std::from_chars(digits.data(), end, value);
    return all_digits && error == std::errc() && stop == end ? std::optional(value) : std::nullopt;
}

bool is_date(std::string_view text) {
    if (text.size() != 10 || text[4] != '-' || text[7] != '-') {
        return false;
    }
    const auto year = digits_only(text.substr(0, 4));
    const auto month = digits_only(text.substr(5, 2));
    const auto day = digits_only(text.substr(8, 2));
    return year && month && day &&
           std::chrono::year_month_day(std::chrono::year(*year),
                                       std::chrono::month(static_cast<unsigned>(*month)),
                                       std::chrono::day(static_cast<unsigned>(*day)))
               .ok();
}

}  // namespace

Written written(const diag::Json& string_value) {
    return {std::string(string_value.text()), string_value.place()};
}

std::optional<Written> read_written(diag::ObjectReader& reader, std::string_view name) {
    const diag::Json* value = reader.optional(name, diag::Kind::string);
    return value == nullptr ? std::nullopt : std::optional(written(*value));
}

std::span<const diag::Json> read_items(diag::ObjectReader& reader, std::string_view name) {
    const diag::Json* array = reader.optional(name, diag::Kind::array);
    return array == nullptr ? std::span<const diag::Json>() : array->items();
}

std::vector<Written>
read_list(diag::ObjectReader& reader, std::string_view name, diag::Report& report) {
    std::vector<Written> list;
    for (const diag::Json& item : read_items(reader, name)) {
        if (!diag::expect_kind(
                item, diag::Kind::string, fmt::format("each of \"{}\"", name), report)) {
            continue;
        }
        const auto first = std::ranges::find(list, item.text(), &Written::text);
        if (first == list.end()) {
            list.push_back(written(item));
            continue;
        }
        report
            .error("rule-repeated",
                   item.place(),
                   fmt::format("\"{}\" stands twice in \"{}\"; take one out", item.text(), name))
            .notes.push_back({"the first is here", first->place});
    }
    return list;
}

std::string checked_date(const diag::Json& string_value, diag::Report& report) {
    if (is_date(string_value.text())) {
        return std::string(string_value.text());
    }
    report.error("rule-date",
                 string_value.place(),
                 fmt::format("\"{}\" is no date; write year, month and day as in \"2026-12-01\"",
                             string_value.text()));
    return {};
}

std::optional<std::size_t> read_word(const Written& word,
                                     std::span<const std::string_view> words,
                                     std::string_view what,
                                     diag::Report& report) {
    const auto found = std::ranges::find(words, word.text);
    if (found != words.end()) {
        return static_cast<std::size_t>(found - words.begin());
    }
    report.error(
        "rule-word",
        word.place,
        fmt::format("\"{}\" is no {}; it is one of {}", word.text, what, fmt::join(words, ", ")));
    return std::nullopt;
}

const diag::Json* peek(const diag::Json& object, std::string_view name, diag::Kind kind) {
    if (object.kind() != diag::Kind::object) {
        return nullptr;
    }
    const diag::Json* member = object.find(name);
    return member != nullptr && member->kind() == kind ? member : nullptr;
}

std::span<const diag::Json> peek_items(const diag::Json& object, std::string_view name) {
    const diag::Json* array = peek(object, name, diag::Kind::array);
    return array == nullptr ? std::span<const diag::Json>() : array->items();
}

}  // namespace isohydric::rule::detail
