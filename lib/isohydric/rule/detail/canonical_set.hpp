// The canonical form of a resolved rule set: entries in force, chosen conventions, cited sources and analytes, as JSON in
// RFC 8785 form, so that anybody can remake it, and its hash, from the files alone.
#pragma once

#include "isohydric/rule/detail/bibliography.hpp"
#include "isohydric/rule/detail/declarations.hpp"
#include "isohydric/rule/detail/drafts.hpp"

#include <string>
#include <vector>

namespace isohydric::rule::detail {

/// `{"analytes": [..], "conventions": {choice: id}, "entries": [{"entry": {..}, "kind": ".."}], "sources": [..]}`: analytes,
/// entries and sources sorted by id; conventions that are not chosen, sources that nothing cites, and every `reviewed`
/// left out. Name, version and approval of the set are not part of it: what is approved is a hash.
[[nodiscard]] std::string canonical_set(const std::vector<Draft>& entries,
                                        const Chosen& chosen,
                                        const diag::Json& analytes,
                                        const std::vector<CslItem>& bibliography);

}  // namespace isohydric::rule::detail
