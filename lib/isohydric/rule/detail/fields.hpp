// Small readers that entries, sets and cases share: strings with places, lists, dates, words of a fixed list.
#pragma once

#include "isohydric/diag/json.hpp"
#include "isohydric/diag/report.hpp"
#include "isohydric/rule/detail/documents.hpp"

#include <algorithm>
#include <optional>
#include <span>
#include <string>
#include <string_view>
#include <vector>

namespace isohydric::rule::detail {

/// A JSON string as text and place.
[[nodiscard]] Written written(const diag::Json& string_value);

/// An optional member that is a string.
[[nodiscard]] std::optional<Written> read_written(diag::ObjectReader& reader,
                                                  std::string_view name);

/// An optional member that is an array of strings; empty where it is missing. A repeated string is an error.
[[nodiscard]] std::vector<Written>
read_list(diag::ObjectReader& reader, std::string_view name, diag::Report& report);

/// The items of an optional member that is an array; empty where it is missing.
[[nodiscard]] std::span<const diag::Json> read_items(diag::ObjectReader& reader,
                                                     std::string_view name);

/// The date if it is a calendar date written as 2026-12-01 [@rfc3339, section 5.6]; else reports it and gives nothing.
[[nodiscard]] std::string checked_date(const diag::Json& string_value, diag::Report& report);

/// Which of `words` it is; reports any other. `what` names it in the message.
[[nodiscard]] std::optional<std::size_t> read_word(const Written& word,
                                                   std::span<const std::string_view> words,
                                                   std::string_view what,
                                                   diag::Report& report);

/// A member of an object without asking for it: what the first look at an entry needs. Null if it is of another kind.
[[nodiscard]] const diag::Json*
peek(const diag::Json& object, std::string_view name, diag::Kind kind);

/// The items of a member that is an array; empty where there is none.
[[nodiscard]] std::span<const diag::Json> peek_items(const diag::Json& object,
                                                     std::string_view name);

}  // namespace isohydric::rule::detail
