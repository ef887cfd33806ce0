// Lines of a text report: headings, hanging indents, columns.
#pragma once

#include <cstddef>
#include <string>
#include <string_view>
#include <utility>
#include <vector>

namespace isohydric::report {

/// How many columns a UTF-8 text takes: continuation bytes take none (`10 \xC2\xB5mol/L` takes 9).
[[nodiscard]] std::size_t columns_of(std::string_view text);

/// "a, b, c".
[[nodiscard]] std::string listed(const std::vector<std::string>& words,
                                 std::string_view separator = ", ");

/// Collects lines and breaks them at words so that none is longer than the width.
class TextLayout {
  public:
    explicit TextLayout(std::size_t width) : width_(width) {}

    using Rows = std::vector<std::vector<std::string>>;

    void blank();
    /// A heading on its own line, with an empty line before it.
    void heading(std::string_view text);
    /// `lead` then `text`; further lines are indented by the length of `lead`.
    void item(std::string_view lead, std::string_view text);
    /// Rows of cells, columns as wide as their widest cell, two spaces between. The last cell is broken at words.
    void table(const Rows& rows, std::string_view indent);
    /// The same rows in two blocks side by side, the first half to the left, if both fit in the width; else as table().
    void table_side_by_side(const Rows& rows, std::string_view indent);

    /// The lines so far; the layout is empty afterwards.
    [[nodiscard]] std::string take() { return std::exchange(text_, {}); }

  private:
    void line(std::string_view text);

    std::size_t width_;
    std::string text_;
};

}  // namespace isohydric::report
