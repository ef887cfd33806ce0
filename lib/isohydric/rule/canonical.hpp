// The canonical form of JSON and its hash: what makes two readings of the same rules the same, byte for byte.
#pragma once

#include "isohydric/diag/json.hpp"

#include <string>
#include <string_view>

namespace isohydric::rule {

/// Appends the RFC 8785 form of `json` [@rfc8785, section 3.2]: members sorted by the UTF-16 code units of their names,
/// no white space, numbers as ECMAScript prints them. Members called `leave_out` are left out at every depth; an empty name
/// leaves out nothing.
void append_canonical(std::string& out, const diag::Json& json, std::string_view leave_out = {});

/// Appends a JSON string in canonical form.
void append_canonical(std::string& out, std::string_view text);

/// A finite number as ECMAScript prints it [@ecma262, Number::toString]: `1e-7`, `0.001`, `100`, `1e+21`.
[[nodiscard]] std::string canonical_number(double value);

/// SHA-256 [@fips180-4, section 6.2] in lower-case hexadecimal.
[[nodiscard]] std::string sha256_hex(std::string_view bytes);

}  // namespace isohydric::rule
