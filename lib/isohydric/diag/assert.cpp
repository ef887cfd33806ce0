#include "isohydric/diag/assert.hpp"

#include <fmt/format.h>

namespace isohydric::diag {

void assertion_failed(const char* what, const char* file, int line) {
    throw InternalError(fmt::format("{}:{}: {}", file, line, what));
}

}  // namespace isohydric::diag
