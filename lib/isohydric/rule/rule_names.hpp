// The names of a rule set, for whoever reads expressions against it: the rule reader itself, sentences, and expressions
// that a user types.
#pragma once

#include "isohydric/rule/names.hpp"
#include "isohydric/rule/rule_set.hpp"

#include <cstdint>
#include <set>

namespace isohydric::rule {

/// Analytes, roundings, quantities, conditions, findings, limits and the context. The rule set must outlive it.
class RuleNames : public NameTable {
  public:
    explicit RuleNames(const RuleSet& rules) : rules_(rules) {}

    [[nodiscard]] std::optional<NamedSymbol> find(std::span<const std::string> path) const override;
    [[nodiscard]] std::vector<std::string> candidates() const override;

    /// A name as sentences write it, parts joined by points: `anionGap`, `limits.pH.low`.
    [[nodiscard]] std::optional<NamedSymbol> find(std::string_view dotted) const;

  private:
    [[nodiscard]] std::optional<NamedSymbol> find_single(std::string_view name) const;
    [[nodiscard]] std::optional<NamedSymbol> find_limit(std::string_view name,
                                                        std::string_view part) const;
    [[nodiscard]] std::optional<NamedSymbol> find_rounding(std::string_view analyte_id) const;

    /// Whether a condition that has been read can never be empty; `open` holds those being asked about.
    [[nodiscard]] bool never_empty(std::uint32_t condition, std::set<std::uint32_t>& open) const;

    const RuleSet& rules_;
};

}  // namespace isohydric::rule
