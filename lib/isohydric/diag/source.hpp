// Source text and places in it. Everything that was read keeps its place, so that a message written
// much later can still point at file, line and column.
#pragma once

#include <cstddef>
#include <memory>
#include <string>
#include <string_view>
#include <vector>

namespace isohydric::diag {

/// A range of bytes `[begin, end)` in a source text; offsets count from 0.
struct Span {
    std::size_t begin = 0;
    std::size_t end = 0;

    friend bool operator==(const Span&, const Span&) = default;
};

/// Line and column, both counted from 1; columns count bytes.
struct Position {
    std::size_t line = 1;
    std::size_t column = 1;

    friend bool operator==(const Position&, const Position&) = default;
};

/// A named text that knows its lines. Lines end in LF or CR LF; the end mark belongs to no line.
class Source {
  public:
    Source(std::string name, std::string text);

    /// What messages call the text: a file name, or `<standard input>`.
    [[nodiscard]] const std::string& name() const { return name_; }

    [[nodiscard]] const std::string& text() const { return text_; }

    /// Position of a byte; an offset behind the text means its end.
    [[nodiscard]] Position position(std::size_t offset) const;

    /// Offset of the first byte of a line; `line` lies in `1..line_count()`.
    [[nodiscard]] std::size_t line_begin(std::size_t line) const;

    /// A line without its end mark; `line` lies in `1..line_count()`.
    [[nodiscard]] std::string_view line(std::size_t line) const;

    /// Number of lines; at least 1, and one more than the number of LFs.
    [[nodiscard]] std::size_t line_count() const { return line_begins_.size(); }

  private:
    std::string name_;
    std::string text_;
    std::vector<std::size_t> line_begins_;
};

/// Makes a source that every place in it keeps alive.
[[nodiscard]] std::shared_ptr<const Source> make_source(std::string name, std::string text);

/// A span of one source. Without a source no place is known.
struct Place {
    std::shared_ptr<const Source> source = nullptr;
    Span span = {};

    /// Whether the place is known.
    explicit operator bool() const { return source != nullptr; }
};

}  // namespace isohydric::diag
