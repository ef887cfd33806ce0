// The bibliography, CSL-JSON, and the citations that point into it.
#pragma once

#include "isohydric/diag/json.hpp"
#include "isohydric/diag/report.hpp"
#include "isohydric/rule/rule_set.hpp"

#include <set>
#include <string>
#include <vector>

namespace isohydric::rule::detail {

/// An item with the JSON that it was read from.
struct CslItem {
    BibliographyItem item;
    const diag::Json* json = nullptr;
};

/// Adds the items of one bibliography file. An id used twice is reported.
void read_bibliography(const diag::Json& file, std::vector<CslItem>& items, diag::Report& report);

using Refs = std::set<std::string, std::less<>>;

/// Adds the keys of every citation below `json` to `refs`; `common-practice` is none.
void collect_refs(const diag::Json& json, Refs& refs);

/// Reports every citation below `json` whose key is not in `known`.
void check_refs(const diag::Json& json, const Refs& known, diag::Report& report);

}  // namespace isohydric::rule::detail
