#include "isohydric/report/detail/text_layout.hpp"

#include <algorithm>

namespace isohydric::report {

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
    std::size_t words_on_line = 0;
    while (!text.empty()) {
        const std::size_t space = text.find(' ');
        const std::string_view word = text.substr(0, space);
        text = space == std::string_view::npos ? std::string_view() : text.substr(space + 1);
        if (words_on_line > 0 && current.size() + 1 + word.size() > width_) {
            line(current);
            current.assign(lead.size(), ' ');
            words_on_line = 0;
        }
        current += words_on_line > 0 ? " " : "";
        current += word;
        ++words_on_line;
    }
    line(current);
}

void TextLayout::table(const std::vector<std::vector<std::string>>& rows, std::string_view indent) {
    std::vector<std::size_t> widths;
    for (const std::vector<std::string>& row : rows) {
        widths.resize(std::max(widths.size(), row.size()));
        for (std::size_t i = 0; i < row.size(); ++i) {
            widths[i] = std::max(widths[i], row[i].size());
        }
    }
    for (const std::vector<std::string>& row : rows) {
        std::string text(indent);
        for (std::size_t i = 0; i < row.size(); ++i) {
            text += row[i];
            text.append(widths[i] - row[i].size() + 2, ' ');
        }
        line(text);
    }
}

}  // namespace isohydric::report
