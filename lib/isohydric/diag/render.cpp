#include "isohydric/diag/render.hpp"

#include "isohydric/diag/assert.hpp"
#include "isohydric/diag/text.hpp"

#include <algorithm>
#include <array>
#include <cstdint>

#include <fmt/format.h>

namespace isohydric::diag {
namespace {

constexpr std::size_t k_most_shown = 100;
constexpr std::size_t k_window_bytes = 120;

/// What one character of a source line becomes on the screen.
struct Cell {
    std::size_t bytes;
    std::string shown;
    std::size_t columns;
};

/// A range of code points, both ends included.
struct CodePoints {
    std::uint32_t first;
    std::uint32_t last;
};

/// Characters that would not be seen, or would disturb what is seen: controls, joiners, marks of
/// direction and of byte order.
constexpr std::array<CodePoints, 6> k_invisible{{
    {0x0000, 0x001F},
    {0x007F, 0x009F},
    {0x200B, 0x200F},
    {0x2028, 0x202E},
    {0x2060, 0x206F},
    {0xFEFF, 0xFEFF},
}};

/// The code point of one well-formed UTF-8 sequence [@rfc3629, section 3].
std::uint32_t code_point(std::string_view sequence) {
    const std::uint32_t lead = static_cast<unsigned char>(sequence[0]);
    std::uint32_t result = sequence.size() == 1 ? lead : lead & (0x7FU >> sequence.size());
    for (const char tail : sequence.substr(1)) {
        result = (result << 6U) | (static_cast<unsigned char>(tail) & 0x3FU);
    }
    return result;
}

bool is_invisible(std::string_view sequence) {
    const std::uint32_t code = code_point(sequence);
    return std::any_of(k_invisible.begin(), k_invisible.end(), [&](const CodePoints& range) {
        return range.first <= code && code <= range.last;
    });
}

/// The cell at the front of `rest`, which is not empty.
Cell next_cell(std::string_view rest) {
    const std::size_t length = utf8_sequence_length(rest);
    const std::string_view sequence = rest.substr(0, length);
    if (length > 0 && !is_invisible(sequence)) {
        return {length, std::string(sequence), 1};
    }
    return {1, fmt::format("\\x{:02X}", static_cast<unsigned char>(rest[0])), 4};
}

bool is_inside_character(std::string_view line, std::size_t at) {
    return at < line.size() && (static_cast<unsigned char>(line[at]) & 0xC0U) == 0x80;
}

/// The nearest start of a character at or before `at`; bytes that are not UTF-8 are left alone.
std::size_t character_begin(std::string_view line, std::size_t at) {
    for (std::size_t back = 0; back < 4 && back <= at; ++back) {
        if (!is_inside_character(line, at - back)) {
            return at - back;
        }
    }
    return at;
}

/// The part of a line that is shown: all of a short one, and what lies around the caret of a long
/// one.
Span window(std::string_view line, std::size_t caret) {
    if (line.size() <= k_window_bytes) {
        return {0, line.size()};
    }
    const std::size_t wanted = caret - std::min(caret, k_window_bytes / 2);
    const std::size_t begin = std::min(wanted, line.size() - k_window_bytes);
    return {character_begin(line, begin), character_begin(line, begin + k_window_bytes)};
}

/// What stands below one cell: nothing before the span, the caret at its begin, tildes under the
/// rest.
std::string mark(const Cell& cell, bool is_tab, std::size_t at, Span span) {
    if (at + cell.bytes <= span.begin) {
        return is_tab ? "\t" : std::string(cell.columns, ' ');
    }
    if (at >= span.end && at > span.begin) {
        return {};
    }
    std::string result(is_tab ? 1 : cell.columns, '~');
    if (at <= span.begin) {
        result.front() = '^';
    }
    return is_tab ? result + '\t' : result;
}

/// The source line and the line with the caret; nothing for a blank line.
std::string excerpt(const Place& place) {
    const Source& source = *place.source;
    const Position position = source.position(place.span.begin);
    const std::string_view line = source.line(position.line);
    if (trim(line).empty()) {
        return {};
    }
    const std::size_t line_begin = source.line_begin(position.line);
    const std::size_t caret = std::min(position.column - 1, line.size());
    const std::size_t end = std::max(place.span.end, line_begin) - line_begin;
    const Span span{caret, std::min(end, line.size())};
    const Span shown = window(line, caret);

    std::string text = shown.begin > 0 ? "..." : "";
    std::string marks(text.size(), ' ');
    for (std::size_t at = shown.begin; at < shown.end;) {
        const bool is_tab = line[at] == '\t';
        const Cell cell = is_tab ? Cell{1, "\t", 1} : next_cell(line.substr(at, shown.end - at));
        text += cell.shown;
        marks += mark(cell, is_tab, at, span);
        at += cell.bytes;
    }
    text += shown.end < line.size() ? "..." : "";
    if (caret >= shown.end) {
        marks += '^';
    }
    marks.erase(marks.find_last_not_of(" \t") + 1);
    return text + '\n' + marks + '\n';
}

std::string_view word(Severity severity) {
    switch (severity) {
    case Severity::note:
        return "note";
    case Severity::warning:
        return "warning";
    case Severity::error:
        return "error";
    }
    ISOHYDRIC_NEVER();
}

std::string entry(const Place& place, Severity severity, std::string_view message) {
    const std::string where = place ? render(place) + ": " : "";
    const std::string head = fmt::format("{}{}: {}\n", where, word(severity), message);
    return place ? head + excerpt(place) : head;
}

}  // namespace

std::string printable(std::string_view text) {
    std::string result;
    for (std::size_t at = 0; at < text.size();) {
        const Cell cell = next_cell(text.substr(at));
        result += cell.shown;
        at += cell.bytes;
    }
    return result;
}

std::string render(const Place& place) {
    if (!place) {
        return {};
    }
    const Position position = place.source->position(place.span.begin);
    return fmt::format("{}:{}:{}", printable(place.source->name()), position.line, position.column);
}

std::string render(const Diagnostic& diagnostic) {
    std::string message = printable(diagnostic.message);
    if (!diagnostic.id.empty()) {
        message += fmt::format(" [{}]", diagnostic.id);
    }
    std::string result = entry(diagnostic.place, diagnostic.severity, message);
    for (const Note& note : diagnostic.notes) {
        result += entry(note.place, Severity::note, printable(note.message));
    }
    return result;
}

std::string render(const Report& report) {
    std::string result;
    std::size_t shown = 0;
    std::size_t errors_shown = 0;
    for (const Diagnostic& diagnostic : report.diagnostics()) {
        if (shown == k_most_shown) {
            break;
        }
        result += render(diagnostic);
        ++shown;
        errors_shown += diagnostic.severity == Severity::error ? 1 : 0;
    }
    if (shown < report.size()) {
        result += fmt::format("{} more not shown, {} of them errors\n",
                              report.size() - shown,
                              report.error_count() - errors_shown);
    }
    return result;
}

}  // namespace isohydric::diag
