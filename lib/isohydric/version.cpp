#include "isohydric/version.hpp"

namespace isohydric {

std::string_view version() {
    return ISOHYDRIC_VERSION;
}

}  // namespace isohydric
