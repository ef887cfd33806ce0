// Files as texts: one file, and the tree of rule files.
#pragma once

#include "isohydric/diag/result.hpp"
#include "isohydric/diag/source.hpp"
#include "isohydric/rule/rule_set.hpp"

#include <memory>
#include <string>

namespace isohydric::io {

/// The whole text of a file, at most 64 MiB; the error says why it could not be read.
[[nodiscard]] diag::Result<std::string> read_file(const std::string& path);

/// The same as a source for diagnostics.
[[nodiscard]] diag::Result<std::shared_ptr<const diag::Source>>
read_source(const std::string& path);

/// Reads rule files below `root`; paths that begin with `/`, `./` or `../` are read as they are.
[[nodiscard]] rule::FileReader rule_tree(std::string root);

}  // namespace isohydric::io
