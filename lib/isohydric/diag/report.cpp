#include "isohydric/diag/report.hpp"

#include <algorithm>
#include <utility>

namespace isohydric::diag {
namespace {

constexpr std::size_t k_most_kept = 10'000;

bool is_error(const Diagnostic& diagnostic) {
    return diagnostic.severity == Severity::error;
}

}  // namespace

Diagnostic& Report::add(Diagnostic diagnostic) {
    if (kept_.size() < k_most_kept) {
        return kept_.emplace_back(std::move(diagnostic));
    }
    ++counted_;
    if (is_error(diagnostic)) {
        ++counted_errors_;
    }
    last_counted_ = std::move(diagnostic);
    return last_counted_;
}

Diagnostic& Report::error(std::string id, Place place, std::string message) {
    return add({Severity::error, std::move(id), std::move(message), std::move(place), {}});
}

Diagnostic& Report::warning(std::string id, Place place, std::string message) {
    return add({Severity::warning, std::move(id), std::move(message), std::move(place), {}});
}

std::size_t Report::error_count() const {
    const auto kept_errors = std::count_if(kept_.begin(), kept_.end(), is_error);
    return static_cast<std::size_t>(kept_errors) + counted_errors_;
}

}  // namespace isohydric::diag
