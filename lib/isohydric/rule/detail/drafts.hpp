// Entries as they stand in the files, before anything but their kind and id is looked at: on them sets are extended,
// replaced and cut down.
#pragma once

#include "isohydric/diag/json.hpp"
#include "isohydric/diag/report.hpp"
#include "isohydric/rule/detail/documents.hpp"
#include "isohydric/rule/detail/set_file.hpp"
#include "isohydric/rule/rule_set.hpp"

#include <cstddef>
#include <map>
#include <span>
#include <string>
#include <string_view>
#include <vector>

namespace isohydric::rule::detail {

/// An entry of a file.
struct Draft {
    EntryKind kind{};
    std::string id;
    const diag::Json* json = nullptr;

    [[nodiscard]] diag::Place id_place() const;
};

/// A rule file that was read, and which set of the chain named it.
struct RuleFile {
    const Document* document = nullptr;
    std::size_t level{};
};

/// What a chain of sets comes to.
struct Drafts {
    std::vector<Draft> entries;  ///< those that no later set replaced or removed
    std::vector<RuleFile> files;
    std::map<std::string, std::size_t, std::less<>>
        superseded;  ///< ids replaced or removed, with the number of the last set that did so
};

/// Reads all rule files of a chain, outermost parent first.
[[nodiscard]] Drafts
read_drafts(const std::vector<SetFile>& chain, Documents& documents, diag::Report& report);

/// The entries in the array `name` of an object (a file, or a convention), which are of that kind. An entry without a
/// well-formed id is reported and left out.
[[nodiscard]] std::vector<Draft>
read_draft_list(std::span<const diag::Json> items, EntryKind kind, diag::Report& report);

/// Reports an id that is not of the form its kind asks for.
bool check_id(const diag::Json& id, EntryKind kind, diag::Report& report);

}  // namespace isohydric::rule::detail
