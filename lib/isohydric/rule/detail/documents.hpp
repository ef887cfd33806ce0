// The JSON files of one rule set: each is read once and kept, since everything read later points into it.
#pragma once

#include "isohydric/diag/json.hpp"
#include "isohydric/diag/report.hpp"
#include "isohydric/rule/rule_set.hpp"

#include <deque>
#include <memory>
#include <string>
#include <string_view>

namespace isohydric::rule::detail {

/// A string of a file with its place.
struct Written {
    std::string text;
    diag::Place place;
};

/// One file.
struct Document {
    std::string path;
    std::shared_ptr<const diag::Source> source;
    diag::Json json;
};

/// Reads files and keeps them.
class Documents {
  public:
    Documents(const FileReader& files, diag::Report& report) : files_(files), report_(report) {}

    /// The file that the set at `set_path` calls `wanted`. One that is missing or not JSON is reported, and null.
    const Document* read(const Written& wanted, std::string_view set_path);

    /// As `read`, but a file that does not exist is no fault.
    const Document* read_if_present(const std::string& path);

  private:
    [[nodiscard]] const Document* kept(std::string_view path) const;
    const Document* keep(const std::string& path, std::string text);

    const FileReader& files_;
    diag::Report& report_;
    std::deque<Document> documents_;
};

}  // namespace isohydric::rule::detail
