// Rule sets as files: one set, and the chain of sets that it extends.
#pragma once

#include "isohydric/diag/report.hpp"
#include "isohydric/rule/detail/documents.hpp"

#include <optional>
#include <string>
#include <vector>

namespace isohydric::rule::detail {

/// One line of `conventions`: the alternative chosen for a choice.
struct ChosenAlternative {
    Written choice;
    Written convention;
};

/// One set file.
struct SetFile {
    std::string path;
    diag::Place place;
    std::string id;
    std::string version;
    std::string title;
    std::string approved_role;  ///< empty unless the approval is complete
    std::string approved_date;
    std::optional<Written> extends;
    std::optional<Written> analytes;
    std::optional<Written> sources;
    std::vector<Written> files;
    std::vector<Written> replace;
    std::vector<Written> remove;
    std::vector<ChosenAlternative> conventions;
};

/// The set at `path` and all that it extends, the outermost parent first. Faults are reported; the chain then ends early.
[[nodiscard]] std::vector<SetFile>
read_set_chain(const std::string& path, Documents& documents, diag::Report& report);

}  // namespace isohydric::rule::detail
