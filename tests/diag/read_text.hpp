// What the tests of the JSON reader share: reading a text from memory, and the text behind a place.
#pragma once

#include "isohydric/diag/json.hpp"

#include <optional>
#include <string>
#include <string_view>
#include <utility>

namespace isohydric::diag {

/// A text as the reader saw it.
struct ReadText {
    Report report;
    std::optional<Json> json;

    explicit ReadText(std::string text)
        : json(read_json(make_source("input.json", std::move(text)), report)) {}
};

/// The characters that a place covers.
inline std::string_view text_at(const Place& place) {
    return std::string_view(place.source->text())
        .substr(place.span.begin, place.span.end - place.span.begin);
}

}  // namespace isohydric::diag
