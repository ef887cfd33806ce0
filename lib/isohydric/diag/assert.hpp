// Assertions for our own mistakes: they throw in every build, so that a wrong program says so
// instead of answering.
#pragma once

#include <stdexcept>

namespace isohydric::diag {

/// A fault of this program, not of its input; `what()` reads `file:line: condition`.
class InternalError : public std::logic_error {
  public:
    using std::logic_error::logic_error;
};

/// Throws InternalError. Called by the macros below only.
[[noreturn]] void assertion_failed(const char* what, const char* file, int line);

}  // namespace isohydric::diag

/// Throws diag::InternalError unless `condition` holds.
#define ISOHYDRIC_ASSERT(condition)                                                                \
    ((condition) ? static_cast<void>(0)                                                            \
                 : ::isohydric::diag::assertion_failed(#condition, __FILE__, __LINE__))

/// Marks a point that no input can reach; throws diag::InternalError.
#define ISOHYDRIC_NEVER() ::isohydric::diag::assertion_failed("never reached", __FILE__, __LINE__)
