// isohydric rules list | show | lint: the rules as people read them, and whether they are sound.
#include "isohydric/diag/text.hpp"
#include "isohydric/engine/program.hpp"
#include "isohydric/interpret/case_runner.hpp"
#include "isohydric/report/caution.hpp"
#include "isohydric/report/rule_report.hpp"

#include <memory>
#include <string>

#include "cli/commands.hpp"
#include <fmt/format.h>

namespace isohydric::cli {

namespace {

struct RulesOptions {
    std::string rules;
    std::string kind;
    std::string id;
};

std::shared_ptr<const rule::RuleSet> load_and_complain(const std::string& path) {
    diag::Report report;
    std::shared_ptr<const rule::RuleSet> rules = load_rules(path, false, report);
    print_diagnostics(report);
    return rules;
}

Exit list(const RulesOptions& options) {
    const std::shared_ptr<const rule::RuleSet> rules = load_and_complain(options.rules);
    if (!rules) {
        return Exit::input_had_errors;
    }
    print(report::list_rules(*rules, options.kind));
    return Exit::done;
}

Exit show(const RulesOptions& options) {
    const std::shared_ptr<const rule::RuleSet> rules = load_and_complain(options.rules);
    if (!rules) {
        return Exit::input_had_errors;
    }
    if (const std::optional<std::string> page = report::show_rule(*rules, options.id)) {
        print(*page);
        return Exit::done;
    }
    std::vector<std::string> ids;
    for (const auto& entry : rules->by_id) {
        ids.push_back(entry.first);
    }
    const std::string near = diag::nearest(options.id, ids);
    diag::Report report;
    report.error(
        "rules-unknown-id",
        {},
        fmt::format("no entry \"{}\" in {}{}",
                    options.id,
                    rules->id,
                    near.empty() ? "; see isohydric rules list" : "; did you mean " + near + "?"));
    print_diagnostics(report);
    return Exit::input_had_errors;
}

Exit lint(const RulesOptions& options) {
    diag::Report report;
    const std::shared_ptr<const rule::RuleSet> rules = load_rules(options.rules, true, report);
    interpret::CaseCounts counts;
    if (rules) {
        counts = interpret::run_cases(std::make_shared<const engine::Program>(rules), report);
    }
    print_diagnostics(report);
    print(fmt::format(
        "{}\n\n{}{}\n\n{}\n",
        report::caution(),
        rules ? fmt::format("{} {}: {} entries, {} cases with {} expectations, {} not met; ",
                            rules->id,
                            rules->version,
                            rules->by_id.size(),
                            counts.cases,
                            counts.expectations,
                            counts.failed)
              : std::string(),
        report.diagnostics().empty() ? std::string("nothing found")
                                     : fmt::format("{} found", report.diagnostics().size()),
        report::caution()));
    return report.diagnostics().empty() ? Exit::done : Exit::audit_found;
}

}  // namespace

void add_rules_command(CLI::App& app, Action& chosen) {
    auto options = std::make_shared<RulesOptions>();
    CLI::App* command = app.add_subcommand("rules", "Read, show and check rule sets");
    command->require_subcommand(1);
    const auto add =
        [&](const std::string& name, const std::string& help, Exit (*run)(const RulesOptions&)) {
            CLI::App* sub = command->add_subcommand(name, help);
            sub->add_option("--rules", options->rules, "rule set (default: the shipped one)");
            sub->callback([options, run, &chosen] {
                chosen = [options, run] {
                    return run(*options);
                };
            });
            return sub;
        };
    add("list", "All entries, a line each", list)
        ->add_option("--kind", options->kind, "only entries of this kind");
    add("show", "One entry: expression, units, sources, alternatives", show)
        ->add_option("id", options->id, "id of the entry")
        ->required();
    add("lint", "Read everything, run the cases, say what is wrong (exit 3 if anything is)", lint);
}

}  // namespace isohydric::cli
