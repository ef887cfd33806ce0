#include "isohydric/diag/source.hpp"

#include "isohydric/diag/assert.hpp"

#include <algorithm>
#include <utility>

namespace isohydric::diag {

Source::Source(std::string name, std::string text)
    : name_(std::move(name)), text_(std::move(text)), line_begins_{0} {
    for (std::size_t at = text_.find('\n'); at != std::string::npos;
         at = text_.find('\n', at + 1)) {
        line_begins_.push_back(at + 1);
    }
}

Position Source::position(std::size_t offset) const {
    const std::size_t inside = std::min(offset, text_.size());
    const auto behind = std::upper_bound(line_begins_.begin(), line_begins_.end(), inside);
    const auto line = static_cast<std::size_t>(behind - line_begins_.begin());
    return {line, inside - line_begins_[line - 1] + 1};
}

std::size_t Source::line_begin(std::size_t line) const {
    ISOHYDRIC_ASSERT(line >= 1 && line <= line_begins_.size());
    return line_begins_[line - 1];
}

std::string_view Source::line(std::size_t line) const {
    const std::size_t begin = line_begin(line);
    const bool is_last = line == line_begins_.size();
    const std::size_t end = is_last ? text_.size() : line_begins_[line] - 1;
    std::string_view content = std::string_view(text_).substr(begin, end - begin);
    if (!is_last && content.ends_with('\r')) {
        content.remove_suffix(1);
    }
    return content;
}

std::shared_ptr<const Source> make_source(std::string name, std::string text) {
    return std::make_shared<const Source>(std::move(name), std::move(text));
}

}  // namespace isohydric::diag
