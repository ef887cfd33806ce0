// Report: what readers have to say about a text. Readers add to it and go on, so that one run tells of every fault.
#pragma once

#include "isohydric/diag/source.hpp"

#include <cstddef>
#include <deque>
#include <string>
#include <vector>

namespace isohydric::diag {

/// How bad it is. Only an error makes a result unusable.
enum class Severity { note, warning, error };

/// A remark on a diagnostic that points at another place.
struct Note {
    std::string message;
    Place place;
};

/// One message. `id` is kebab-case, stable, and has its row in rules/DIAGNOSTICS.md; `message` says what is wrong, what
/// was found and what to do, without a full stop.
struct Diagnostic {
    Severity severity = Severity::error;
    std::string id;
    std::string message;
    Place place;
    std::vector<Note> notes;
};

/// Gathers diagnostics in the order in which they were found.
class Report {
  public:
    /// Adds a diagnostic. The reference stays valid as long as the report, so that notes can be added to it.
    Diagnostic& add(Diagnostic diagnostic);
    Diagnostic& error(std::string id, Place place, std::string message);
    Diagnostic& warning(std::string id, Place place, std::string message);

    [[nodiscard]] bool has_errors() const;
    [[nodiscard]] std::size_t error_count() const;

    [[nodiscard]] const std::deque<Diagnostic>& diagnostics() const { return diagnostics_; }

  private:
    std::deque<Diagnostic> diagnostics_;
};

}  // namespace isohydric::diag
