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
    const std::string near = diag::nearest(options.id, report::names_to_show(*rules));
    diag::Report report;
    report.error("rules-unknown-id",
                 {},
                 fmt::format("no entry or choice \"{}\" in {}; {}",
                             options.id,
                             rules->id,
                             near.empty() ? "isohydric rules list names all"
                                          : "did you mean " + near + "?"));
    print_diagnostics(report);
    return Exit::input_had_errors;
}

std::string counted(std::size_t count, std::string_view one, std::string_view many) {
    return fmt::format("{} {}", count, count == 1 ? one : many);
}

std::string summary(const rule::RuleSet& rules, const interpret::CaseCounts& counts) {
    return fmt::format("{} {}: {}, {} with {}, {} not met",
                       rules.id,
                       rules.version,
                       counted(rules.by_id.size(), "entry", "entries"),
                       counted(counts.cases, "case", "cases"),
                       counted(counts.expectations, "expectation", "expectations"),
                       counts.failed);
}

Exit lint(const RulesOptions& options) {
    diag::Report report;
    const std::shared_ptr<const rule::RuleSet> rules = load_rules(options.rules, true, report);
    std::string text;
    if (rules) {
        const interpret::CaseCounts counts =
            interpret::run_cases(std::make_shared<const engine::Program>(rules), report);
        text = summary(*rules, counts) + "\n";
    }
    print_diagnostics(report);
    const std::size_t found = report.diagnostics().size();
    text += found == 0 ? "Nothing found.\n"
                       : counted(found, "thing", "things") + " found, each said above.\n";
    print(report::with_caution(text));
    return found == 0 ? Exit::done : Exit::audit_found;
}

}  // namespace

void add_rules_command(CLI::App& app, Action& chosen) {
    auto options = std::make_shared<RulesOptions>();
    CLI::App* command = app.add_subcommand("rules", "Read, show and check rule sets");
    command->require_subcommand(1);
    const auto add =
        [&](const std::string& name, const std::string& help, Exit (*run)(const RulesOptions&)) {
            CLI::App* sub = command->add_subcommand(name, help);
            sub->callback([options, run, &chosen] {
                chosen = [options, run] {
                    return run(*options);
                };
            });
            return sub;
        };
    const auto add_set = [&](CLI::App* sub) {
        return sub
            ->add_option(
                "--rules", options->rules, "a rule set of your own (default: the shipped one)")
            ->type_name("SET");
    };
    CLI::App* lister = add("list", "All entries by kind, a line each", list);
    add_set(lister);
    lister->add_option("--kind", options->kind, "only entries of this kind")
        ->check(CLI::IsMember(report::kind_names()))
        ->type_name("KIND");
    CLI::App* shower =
        add("show", "One entry or choice: formula, units, sources, alternatives", show);
    add_set(shower);
    shower->add_option("id", options->id, "id of an entry, or name of a choice")
        ->type_name("ID")
        ->required();
    CLI::App* linter = add(
        "lint", "Read everything, run the cases, say what is wrong (exit 3 if anything is)", lint);
    add_set(linter);
    linter->add_option("set", options->rules, "the same as --rules")
        ->type_name("SET")
        ->excludes("--rules");
}

}  // namespace isohydric::cli
