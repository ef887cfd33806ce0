// The atoms of UCUM that this library knows, and how prefixes join them.
#pragma once

#include "isohydric/units/unit.hpp"

#include <optional>
#include <string_view>

namespace isohydric::units::detail {

/// Whether an atom takes a prefix, and whether it may be part of a product.
enum class AtomKind { plain, metric, alone };

struct Atom {
    Scale scale;
    AtomKind kind = AtomKind::plain;
};

/// The atom of a code without its exponent: `mol`, `mmol`, `m[Hg]`, `10*`. None if it is not known.
[[nodiscard]] std::optional<Atom> find_atom(std::string_view text);

/// A power of ten. Exact up to 22.
[[nodiscard]] double power_of_ten(int exponent);

}  // namespace isohydric::units::detail
