#include "isohydric/interpret/words.hpp"

#include <algorithm>
#include <array>
#include <cctype>

namespace isohydric::interpret {

namespace {

std::string spaced(std::string id) {
    std::replace(id.begin(), id.end(), '-', ' ');
    return id;
}

std::string joined(const std::vector<std::string>& words, std::string_view last_link) {
    std::string text;
    for (std::size_t i = 0; i < words.size(); ++i) {
        if (i > 0) {
            text += i + 1 == words.size() ? last_link : std::string_view(", ");
        }
        text += words[i];
    }
    return text;
}

bool is_kind(std::string_view id) {
    return id != "metabolic-acidosis" && id != "metabolic-alkalosis" &&
           id != "respiratory-acidosis" && id != "respiratory-alkalosis";
}

/// `high-anion-gap-acidosis` inside brackets after its main disorder: "high anion gap".
std::string kind_words(std::string id) {
    constexpr std::string_view ending = "-acidosis";
    if (id.size() > ending.size() &&
        std::string_view(id).substr(id.size() - ending.size()) == ending) {
        id.resize(id.size() - ending.size());
    }
    return spaced(std::move(id));
}

}  // namespace

std::string disorder_words(const std::vector<std::string>& ids) {
    if (ids.empty()) {
        return "no disorder";
    }
    std::vector<std::string> kinds;
    for (const std::string& id : ids) {
        if (is_kind(id)) {
            kinds.push_back(kind_words(id));
        }
    }
    std::vector<std::string> mains;
    for (const std::string& id : ids) {
        if (!is_kind(id)) {
            mains.push_back(spaced(id) + (id == "metabolic-acidosis" && !kinds.empty()
                                              ? " (" + joined(kinds, ", ") + ")"
                                              : ""));
        }
    }
    return joined(mains, " with ");
}

std::string_view onset_id(rule::Onset onset) {
    constexpr std::array<std::string_view, 5> ids{
        "", "acute", "chronic", "acute-on-chronic", "baseline"};
    return ids[static_cast<std::size_t>(onset)];
}

std::string onset_words(const std::vector<rule::Onset>& onsets) {
    std::vector<std::string> words;
    for (const rule::Onset onset : onsets) {
        if (onset != rule::Onset::none) {
            words.emplace_back(onset == rule::Onset::baseline ? "at the stated baseline"
                                                              : std::string(onset_id(onset)));
        }
    }
    return words.empty() ? std::string() : ", " + joined(words, " or ");
}

std::string unit_words(std::string_view ucum) {
    if (ucum == "mm[Hg]") {
        return "mmHg";
    }
    if (ucum == "1") {
        return "";
    }
    return std::string(ucum);
}

std::string capitalised(std::string text) {
    const bool symbol = text.size() > 1 && std::isupper(static_cast<unsigned char>(text[1])) != 0;
    if (!text.empty() && !symbol) {
        text[0] = static_cast<char>(std::toupper(static_cast<unsigned char>(text[0])));
    }
    return text;
}

}  // namespace isohydric::interpret
