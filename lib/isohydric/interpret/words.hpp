// The few words that sentences and reports share.
#pragma once

#include "isohydric/rule/entries.hpp"

#include <string>
#include <string_view>
#include <vector>

namespace isohydric::interpret {

/// "no disorder", or the ids in words, joined: "metabolic acidosis (high anion gap) with respiratory acidosis".
[[nodiscard]] std::string disorder_words(const std::vector<std::string>& ids);
/// ", acute" / ", acute or chronic"; empty without an onset.
[[nodiscard]] std::string onset_words(const std::vector<rule::Onset>& onsets);
/// A UCUM code as people write it: `mm[Hg]` is "mmHg".
[[nodiscard]] std::string unit_words(std::string_view ucum);
/// With a capital first letter, unless the first word is a symbol such as pH or pCO2.
[[nodiscard]] std::string capitalised(std::string text);
[[nodiscard]] std::string_view onset_id(rule::Onset onset);

}  // namespace isohydric::interpret
