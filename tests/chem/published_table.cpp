#include "chem/published_table.hpp"

#include <charconv>
#include <fstream>
#include <stdexcept>

namespace isohydric::chem::testing {
namespace {

std::vector<std::string> split_cells(const std::string& line) {
    std::vector<std::string> cells(1);
    for (const char character : line) {
        if (character == ',') {
            cells.emplace_back();
        } else {
            cells.back() += character;
        }
    }
    return cells;
}

PublishedRow row_of(const std::vector<std::string>& header, const std::string& line, int number) {
    const std::vector<std::string> cells = split_cells(line);
    if (cells.size() != header.size()) {
        throw std::runtime_error("row of another length than the header: " + line);
    }
    PublishedRow row{.line = number, .cells = {}};
    for (std::size_t column = 0; column < header.size(); ++column) {
        row.cells.emplace(header[column], cells[column]);
    }
    return row;
}

}  // namespace

const std::string& PublishedRow::text(std::string_view column) const {
    const auto cell = cells.find(column);
    if (cell == cells.end() || cell->second.empty()) {
        throw std::runtime_error("no value in column " + std::string(column));
    }
    return cell->second;
}

double PublishedRow::number(std::string_view column) const {
    const std::string& cell = text(column);
    const char* end = cell.data() + cell.size();
    double value = 0.0;
    const auto [stop, error] = std::from_chars(cell.data(), end, value);
    if (error != std::errc{} || stop != end) {
        throw std::runtime_error("not a number: " + cell);
    }
    return value;
}

PublishedTable read_published_table(const std::filesystem::path& path) {
    std::ifstream file(path);
    PublishedTable table;
    std::vector<std::string> header;
    std::string line;
    for (int number = 1; std::getline(file, line); ++number) {
        if (line.starts_with("# ")) {
            table.citation += line.substr(1);
        } else if (header.empty()) {
            header = split_cells(line);
        } else {
            table.rows.push_back(row_of(header, line, number));
        }
    }
    if (table.citation.find("[@") == std::string::npos &&
        table.citation.find("common practice") == std::string::npos) {
        throw std::runtime_error("no citation at the head of " + path.string());
    }
    if (table.rows.empty()) {
        throw std::runtime_error("no rows in " + path.string());
    }
    return table;
}

double half_unit_of_last_digit(std::string_view printed) {
    const std::size_t point = printed.find('.');
    double unit = 1.0;
    if (point != std::string_view::npos) {
        for (std::size_t digit = point + 1; digit < printed.size(); ++digit) {
            unit /= 10.0;
        }
    }
    return unit / 2.0;
}

}  // namespace isohydric::chem::testing
