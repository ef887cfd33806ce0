#include "isohydric/report/detail/text_layout.hpp"

#include <algorithm>

namespace isohydric::report {

namespace {

constexpr std::string_view k_between_cells = "  ";
constexpr std::size_t k_between_blocks = 4;

void pad(std::string& text, std::size_t columns) {
    const std::size_t has = columns_of(text);
    text.append(columns > has ? columns - has : 0, ' ');
}

std::vector<std::size_t> column_widths(const TextLayout::Rows& rows) {
    std::vector<std::size_t> widths;
    for (const std::vector<std::string>& row : rows) {
        widths.resize(std::max(widths.size(), row.size()));
        for (std::size_t i = 0; i < row.size(); ++i) {
            widths[i] = std::max(widths[i], columns_of(row[i]));
        }
    }
    return widths;
}

/// All cells but the last, each as wide as its column.
std::string leading_cells(const std::vector<std::string>& row,
                          const std::vector<std::size_t>& widths,
                          std::string_view indent) {
    std::string text(indent);
    std::size_t end = indent.size();
    for (std::size_t i = 0; i + 1 < row.size(); ++i) {
        end += widths[i] + k_between_cells.size();
        text += row[i];
        pad(text, end);
    }
    return text;
}

}  // namespace

std::size_t columns_of(std::string_view text) {
    return static_cast<std::size_t>(std::count_if(text.begin(), text.end(), [](char byte) {
        return (static_cast<unsigned char>(byte) & 0xC0U) != 0x80U;
    }));
}

std::string listed(const std::vector<std::string>& words, std::string_view separator) {
    std::string text;
    for (const std::string& word : words) {
        text += text.empty() ? std::string_view() : separator;
        text += word;
    }
    return text;
}

void TextLayout::line(std::string_view text) {
    const std::size_t end = text.find_last_not_of(' ');
    text_ += end == std::string_view::npos ? std::string_view() : text.substr(0, end + 1);
    text_ += '\n';
}

void TextLayout::blank() {
    text_ += '\n';
}

void TextLayout::heading(std::string_view text) {
    blank();
    line(text);
}

void TextLayout::item(std::string_view lead, std::string_view text) {
    std::string current(lead);
    const std::size_t indent = columns_of(lead);
    std::size_t words_on_line = 0;
    while (!text.empty()) {
        const std::size_t space = text.find(' ');
        const std::string_view word = text.substr(0, space);
        text = space == std::string_view::npos ? std::string_view() : text.substr(space + 1);
        if (words_on_line > 0 && columns_of(current) + 1 + columns_of(word) > width_) {
            line(current);
            current.assign(indent, ' ');
            words_on_line = 0;
        }
        current += words_on_line > 0 ? " " : "";
        current += word;
        ++words_on_line;
    }
    line(current);
}

void TextLayout::table(const Rows& rows, std::string_view indent) {
    const std::vector<std::size_t> widths = column_widths(rows);
    for (const std::vector<std::string>& row : rows) {
        item(leading_cells(row, widths, indent),
             row.empty() ? std::string_view() : std::string_view(row.back()));
    }
}

void TextLayout::table_side_by_side(const Rows& rows, std::string_view indent) {
    const std::vector<std::size_t> widths = column_widths(rows);
    std::vector<std::string> lines;
    std::size_t longest = 0;
    for (const std::vector<std::string>& row : rows) {
        lines.push_back(leading_cells(row, widths, {}) +
                        (row.empty() ? std::string() : row.back()));
        longest = std::max(longest, columns_of(lines.back()));
    }
    if (indent.size() + 2 * longest + k_between_blocks > width_) {
        table(rows, indent);
        return;
    }
    const std::size_t half = (lines.size() + 1) / 2;
    for (std::size_t i = 0; i < half; ++i) {
        std::string text(indent);
        text += lines[i];
        if (half + i < lines.size()) {
            pad(text, indent.size() + longest + k_between_blocks);
            text += lines[half + i];
        }
        line(text);
    }
}

}  // namespace isohydric::report
