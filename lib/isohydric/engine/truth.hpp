// Three-valued logic as FHIRPath defines it: empty is `unknown` [@hl7-fhirpath, section 6.5].
#pragma once

#include <algorithm>
#include <cstdint>

namespace isohydric::engine {

/// A truth that may be unknown. The order of the values makes `and` and `or` a comparison and a maximum.
enum class Truth : std::uint8_t { no, yes, unknown };

[[nodiscard]] constexpr Truth truth_of(bool holds) {
    return holds ? Truth::yes : Truth::no;
}

[[nodiscard]] constexpr Truth not_of(Truth a) {
    return a == Truth::unknown ? a : truth_of(a == Truth::no);
}

/// No if either is no, else unknown if either is unknown.
[[nodiscard]] constexpr Truth and_of(Truth a, Truth b) {
    return a == Truth::no || b == Truth::no ? Truth::no : std::max(a, b);
}

/// Yes if either is yes, else unknown if either is unknown.
[[nodiscard]] constexpr Truth or_of(Truth a, Truth b) {
    return a == Truth::yes || b == Truth::yes ? Truth::yes : std::max(a, b);
}

/// Unknown if either is unknown.
[[nodiscard]] constexpr Truth xor_of(Truth a, Truth b) {
    return a == Truth::unknown || b == Truth::unknown ? Truth::unknown : truth_of(a != b);
}

}  // namespace isohydric::engine
