// The first of two passes over the entries: every id gets its place in the rule set and every name its unit, so that the
// second pass can resolve whatever an entry refers to, in whatever order the files come.
#pragma once

#include "isohydric/diag/json.hpp"
#include "isohydric/diag/report.hpp"
#include "isohydric/rule/detail/drafts.hpp"
#include "isohydric/rule/rule_set.hpp"

#include <cstdint>
#include <map>
#include <string>
#include <vector>

namespace isohydric::rule::detail {

/// An entry that has its place and is still to be read.
struct Declared {
    EntryKind kind{};
    const diag::Json* json = nullptr;
    std::uint32_t index{};   ///< where it goes in the vector of its kind, if in force
    std::string convention;  ///< id of the convention that it belongs to, empty for none
    bool in_force = true;    ///< false: of a convention that is not chosen
};

/// The alternative chosen of each choice, by choice. Choices not made, or made of what does not exist, are reported.
using Chosen = std::map<std::string, std::string, std::less<>>;
[[nodiscard]] Chosen choose_conventions(const std::vector<SetFile>& chain,
                                        const std::vector<Draft>& drafts,
                                        diag::Report& report);

/// Fills `rules.by_id`, the interval names with their units, and a shell for every entry in force: head.id, and what its
/// name yields. Ids used twice and unreadable units are reported.
[[nodiscard]] std::vector<Declared> declare(const std::vector<Draft>& drafts,
                                            const Chosen& chosen,
                                            RuleSet& rules,
                                            diag::Report& report);

}  // namespace isohydric::rule::detail
