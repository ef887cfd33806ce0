// Sentences of the rules: text with `{name}` places, which a value fills when the sentence is said.
#pragma once

#include <cstddef>
#include <string>
#include <string_view>
#include <vector>

namespace isohydric::rule {

/// A `{name}` or `{name:bare}` place; `[begin, end)` includes the braces.
struct SentencePlace {
    std::size_t begin{}, end{};
    std::string_view name;  ///< into the sentence
    bool bare = false;      ///< the number without its unit
};

/// The places of a sentence, as far as the first brace that has no partner.
struct SentencePlaces {
    std::vector<SentencePlace> places;
    std::size_t stray = std::string_view::npos;  ///< offset of that brace; npos if there is none
};

/// Finds the places of `sentence`, which must outlive the result.
[[nodiscard]] SentencePlaces find_places(std::string_view sentence);

}  // namespace isohydric::rule
