// Report: what readers have to say about a text. Readers add to it and go on, so that one run tells
// of every fault.
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

/// One message. `id` is kebab-case, stable, and has its row in rules/DIAGNOSTICS.md; `message` says
/// what is wrong, what was found and what to do, without a full stop.
struct Diagnostic {
    Severity severity = Severity::error;
    std::string id;
    std::string message;
    Place place;
    std::vector<Note> notes;
};

/// Gathers diagnostics in the order in which they were found. The first 10,000 are kept and the
/// rest only counted, so that a hostile text cannot fill the memory.
class Report {
  public:
    /// Adds a diagnostic. The reference stays valid as long as the report, so that notes can be
    /// added to it; of a diagnostic that is only counted it is valid until the next one is added.
    Diagnostic& add(Diagnostic diagnostic);
    Diagnostic& error(std::string id, Place place, std::string message);
    Diagnostic& warning(std::string id, Place place, std::string message);

    [[nodiscard]] bool has_errors() const { return error_count() > 0; }

    /// Number of errors, those that are only counted included.
    [[nodiscard]] std::size_t error_count() const;

    /// Number of all diagnostics, those that are only counted included.
    [[nodiscard]] std::size_t size() const { return kept_.size() + counted_; }

    /// The kept diagnostics.
    [[nodiscard]] const std::deque<Diagnostic>& diagnostics() const { return kept_; }

  private:
    std::deque<Diagnostic> kept_;
    Diagnostic last_counted_;
    std::size_t counted_ = 0;
    std::size_t counted_errors_ = 0;
};

}  // namespace isohydric::diag
