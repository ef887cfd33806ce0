// A rule tree in memory, for tests of the rule reader.
#pragma once

#include "isohydric/diag/report.hpp"
#include "isohydric/rule/rule_set.hpp"

#include <cstddef>
#include <map>
#include <memory>
#include <string>
#include <string_view>

namespace isohydric::test {

/// Paths and texts of files.
using RuleTree = std::map<std::string, std::string>;

/// What the reader made of a tree.
struct Reading {
    std::shared_ptr<const rule::RuleSet> rules;
    diag::Report report;

    [[nodiscard]] bool has(std::string_view diagnostic_id) const;
    /// `path:line:column id` of every diagnostic, a line each.
    [[nodiscard]] std::string summary() const;
};

/// A set `set.json` of the files `base.json` (two main disorders, a kind, three quantities, a finding, an interval) and
/// `rules.json` (empty), with the shipped analytes.
[[nodiscard]] RuleTree base_tree();

/// `base_tree()` with `rules.json` of that text, in which `$H` stands for a source and a review date.
[[nodiscard]] RuleTree tree_with(std::string_view rules);

/// Replaces `$H`.
[[nodiscard]] std::string with_heads(std::string_view text);

/// Reads `set_path` of the tree. One model is known: `double.it` with the input `x` in kPa, giving mm[Hg].
[[nodiscard]] Reading read(const RuleTree& tree,
                           const std::string& set_path = "set.json",
                           const rule::ReadOptions& options = {});

/// Checks that reading the tree gives a diagnostic of that id exactly where `@@` stands in one of its files, and that
/// the set is not given out. The mark is taken out before reading.
void check_complaint(RuleTree tree,
                     std::string_view diagnostic_id,
                     const rule::ReadOptions& options = {});

/// The same for a `rules.json`.
void check_complaint_in_rules(std::string_view rules, std::string_view diagnostic_id);

}  // namespace isohydric::test
