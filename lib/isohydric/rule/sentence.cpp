#include "isohydric/rule/sentence.hpp"

namespace isohydric::rule {

SentencePlaces find_places(std::string_view sentence) {
    constexpr std::string_view k_bare = ":bare";
    SentencePlaces found;
    std::size_t at = sentence.find_first_of("{}");
    while (at != std::string_view::npos) {
        const std::size_t close = sentence.find_first_of("{}", at + 1);
        if (sentence[at] == '}' || close == std::string_view::npos || sentence[close] == '{') {
            found.stray = at;
            break;
        }
        SentencePlace place{at, close + 1, sentence.substr(at + 1, close - at - 1), false};
        if (place.name.ends_with(k_bare)) {
            place.name.remove_suffix(k_bare.size());
            place.bare = true;
        }
        found.places.push_back(place);
        at = sentence.find_first_of("{}", close + 1);
    }
    return found;
}

}  // namespace isohydric::rule
