// What the checker asks about names: the interface to whoever knows analytes, quantities, limits and the rest.
#pragma once

#include "isohydric/rule/expression.hpp"

#include <optional>
#include <span>
#include <string>
#include <string_view>
#include <vector>

namespace isohydric::rule {

/// What a name means.
struct NamedSymbol {
    Symbol symbol;
    Type type{};
    units::Unit unit = units::one();  ///< of a number: the unit in which its value is held
    std::span<const std::string_view>
        codes;                 ///< of a code: the words of its enumeration, by number
    bool never_empty = false;  ///< context codes and `context.near`
};

/// Resolves names. A path is the name's parts without backticks: `{"Na"}`, `{"raised-gap"}`, `{"limits", "pH", "low"}`.
class NameTable {
  public:
    NameTable() = default;
    NameTable(const NameTable&) = delete;
    NameTable(NameTable&&) = delete;
    NameTable& operator=(const NameTable&) = delete;
    NameTable& operator=(NameTable&&) = delete;
    virtual ~NameTable() = default;

    [[nodiscard]] virtual std::optional<NamedSymbol>
    find(std::span<const std::string> path) const = 0;
    /// Every name as `written_name` writes it, for "did you mean".
    [[nodiscard]] virtual std::vector<std::string> candidates() const = 0;
};

/// A path as an expression writes it: parts joined by points, in backticks where they are no plain identifiers.
[[nodiscard]] std::string written_name(std::span<const std::string> path);

/// What `context.<item>` means, for every NameTable to share.
[[nodiscard]] std::optional<NamedSymbol> find_context_item(std::string_view item);

}  // namespace isohydric::rule
