// A table of tests/published: a citation, a header, and rows of one check each.
#pragma once

#include <filesystem>
#include <map>
#include <string>
#include <string_view>
#include <vector>

namespace isohydric::chem::testing {

/// One check: a model's inputs and the value expected of it.
struct PublishedRow {
    int line = 0;
    std::map<std::string, std::string, std::less<>> cells;

    /// The text of a cell that must be there and not empty; throws std::runtime_error otherwise.
    [[nodiscard]] const std::string& text(std::string_view column) const;

    /// The number in a cell; throws std::runtime_error where there is none.
    [[nodiscard]] double number(std::string_view column) const;
};

struct PublishedTable {
    std::string citation;
    std::vector<PublishedRow> rows;
};

/// Reads a table. Throws std::runtime_error where the file cannot be read, does not begin with a
/// citation, has a row of another length than its header, or has no row.
[[nodiscard]] PublishedTable read_published_table(const std::filesystem::path& path);

/// Half a unit of the last printed digit of a decimal number.
[[nodiscard]] double half_unit_of_last_digit(std::string_view printed);

}  // namespace isohydric::chem::testing
