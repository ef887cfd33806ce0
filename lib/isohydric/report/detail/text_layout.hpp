// Lines of a text report: headings, hanging indents, columns.
#pragma once

#include <cstddef>
#include <string>
#include <string_view>
#include <vector>

namespace isohydric::report {

/// Collects lines and breaks them at words so that none is longer than the width.
class TextLayout {
  public:
    explicit TextLayout(std::size_t width) : width_(width) {}

    void blank();
    /// A heading on its own line, with an empty line before it.
    void heading(std::string_view text);
    /// `lead` then `text`; further lines are indented by the length of `lead`.
    void item(std::string_view lead, std::string_view text);
    /// Rows of cells, columns as wide as their widest cell, two spaces between.
    void table(const std::vector<std::vector<std::string>>& rows, std::string_view indent);

    [[nodiscard]] std::string take() { return std::move(text_); }

  private:
    void line(std::string_view text);

    std::size_t width_;
    std::string text_;
};

}  // namespace isohydric::report
