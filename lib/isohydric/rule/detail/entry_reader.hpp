// The second pass: reads an entry into its final form, everything that it refers to resolved. Faults are reported; what
// comes back is then incomplete and its rule set is not given out.
#pragma once

#include "isohydric/rule/detail/declarations.hpp"
#include "isohydric/rule/detail/entry_fields.hpp"

namespace isohydric::rule::detail {

/// Reads one declared entry and puts it in its place; of an alternative that is not chosen it only checks.
void read_entry(const Declared& declared, RuleSet& rules, const EntryContext& context);

// One reader a kind; `json` is the entry.
[[nodiscard]] Quantity read_quantity(const diag::Json& json, const EntryContext& context);
[[nodiscard]] Condition read_condition(const diag::Json& json, const EntryContext& context);
[[nodiscard]] Interval read_interval(const diag::Json& json, const EntryContext& context);
[[nodiscard]] Finding read_finding(const diag::Json& json, const EntryContext& context);
[[nodiscard]] Explanation read_explanation(const diag::Json& json, const EntryContext& context);
[[nodiscard]] Group read_group(const diag::Json& json, const EntryContext& context);
[[nodiscard]] Check read_check(const diag::Json& json, const EntryContext& context);
[[nodiscard]] Critical read_critical(const diag::Json& json, const EntryContext& context);
[[nodiscard]] Disorder read_disorder(const diag::Json& json, const EntryContext& context);
/// `declared` knows its choice and its members already.
[[nodiscard]] Convention
read_convention(const diag::Json& json, Convention declared, const EntryContext& context);

/// A table and the findings and checks of its rows, in the order of the rows.
struct TableRows {
    Table table;
    std::vector<Finding> findings;
    std::vector<Check> checks;
};

[[nodiscard]] TableRows read_table(const diag::Json& json, const EntryContext& context);

/// What findings and rows have beside their condition: label, unless, asserts, consider.
void read_statement(diag::ObjectReader& reader, Finding& finding, const EntryContext& context);

}  // namespace isohydric::rule::detail
