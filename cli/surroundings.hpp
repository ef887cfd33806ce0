// What the program takes from its surroundings: where the rules are, what the site has set, whether a person is there.
// The only place that reads the environment.
#pragma once

#include "isohydric/diag/report.hpp"
#include "isohydric/panel/site_units.hpp"
#include "isohydric/rule/rule_set.hpp"

#include <memory>
#include <optional>
#include <string>

namespace isohydric::cli {

/// Exit codes of every command.
enum class Exit { done = 0, input_had_errors = 1, usage = 2, audit_found = 3, our_bug = 70 };

/// What a site has set once: options on the command line override it.
struct Site {
    std::string rules;  ///< path of a rule set, empty for the shipped one
    std::string units;  ///< `si`, `conventional` or a file, empty for none
};

/// Reads `path`, or without one the configuration file of the user, where there is one.
[[nodiscard]] std::optional<Site> read_site(const std::string& path, diag::Report& report);

/// The folder of shipped rules: beside the installed program, or in the source tree it was built from.
[[nodiscard]] std::string rule_folder();

/// The rule set at `path`, or the shipped default; errors go to the report.
[[nodiscard]] std::shared_ptr<const rule::RuleSet>
load_rules(const std::string& path, bool with_cases, diag::Report& report);

/// The units named by `--units` or the site; null pointer content if none. False after an error.
[[nodiscard]] bool load_units(const std::string& name,
                              const panel::Catalogue& catalogue,
                              std::optional<panel::SiteUnits>& units,
                              diag::Report& report);

/// Whether a person sits at both standard input and standard error.
[[nodiscard]] bool person_at_terminal();

/// Prints the diagnostics of a report to standard error.
void print_diagnostics(const diag::Report& report);

/// Writes to standard output; throws if that fails, so that output is never silently short.
void print(const std::string& text);

}  // namespace isohydric::cli
