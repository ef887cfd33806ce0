// The members that entries of several kinds have in common.
#pragma once

#include "isohydric/diag/json.hpp"
#include "isohydric/rule/checker.hpp"
#include "isohydric/rule/detail/fields.hpp"
#include "isohydric/rule/rule_names.hpp"
#include "isohydric/rule/rule_set.hpp"

#include <cstdint>
#include <optional>
#include <string>
#include <string_view>
#include <vector>

namespace isohydric::rule::detail {

/// What a condition yields.
inline const Wanted k_wanted_truth{.type = Type::truth, .unit = std::nullopt};

/// What every reader of an entry needs: the rule set as declared, its names, and where to complain.
struct EntryContext {
    const RuleSet& rules;
    const RuleNames& names;
    diag::Report& report;
};

/// `id`, `source`, `reviewed` and `policy`.
[[nodiscard]] EntryHead read_head(diag::ObjectReader& reader, const EntryContext& context);

/// One citation or a list of them. Whether the bibliography has them is checked for whole files.
[[nodiscard]] std::vector<Citation> read_citations(const diag::Json& source, diag::Report& report);

/// The expression in a required member; null if it is missing or wrong.
[[nodiscard]] ExpressionPtr read_formula(diag::ObjectReader& reader,
                                         std::string_view name,
                                         const Wanted& wanted,
                                         const EntryContext& context);
/// The same for an optional member; null also where it is missing.
[[nodiscard]] ExpressionPtr read_optional_formula(diag::ObjectReader& reader,
                                                  std::string_view name,
                                                  const Wanted& wanted,
                                                  const EntryContext& context);
[[nodiscard]] ExpressionPtr
read_truth(diag::ObjectReader& reader, std::string_view name, const EntryContext& context);

/// A required sentence; a `{name}` in it that is no number is reported.
[[nodiscard]] std::string
read_sentence(diag::ObjectReader& reader, std::string_view name, const EntryContext& context);

/// The entry of that kind that a word refers to; reports one that is not there.
[[nodiscard]] std::optional<std::uint32_t>
refer(const Written& id, EntryKind kind, const EntryContext& context);

/// The entries that an optional list refers to.
[[nodiscard]] std::vector<std::uint32_t> read_references(diag::ObjectReader& reader,
                                                         std::string_view name,
                                                         EntryKind kind,
                                                         const EntryContext& context);

/// As `read_references`, sorted, of disorders that must be main ones.
[[nodiscard]] std::vector<std::uint32_t>
read_main_disorders(diag::ObjectReader& reader, std::string_view name, const EntryContext& context);

/// The required member `approach`.
[[nodiscard]] std::string read_approach(diag::ObjectReader& reader, const EntryContext& context);
[[nodiscard]] std::string checked_approach(const Written& approach, diag::Report& report);

/// An optional list of plain strings.
[[nodiscard]] std::vector<std::string>
read_texts(diag::ObjectReader& reader, std::string_view name, diag::Report& report);

}  // namespace isohydric::rule::detail
