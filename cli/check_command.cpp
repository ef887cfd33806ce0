// isohydric check: one panel in, one interpretation out.
#include "isohydric/diag/json.hpp"
#include "isohydric/engine/program.hpp"
#include "isohydric/interpret/interpreter.hpp"
#include "isohydric/io/files.hpp"
#include "isohydric/io/json_panel.hpp"
#include "isohydric/panel/reading.hpp"
#include "isohydric/report/json_report.hpp"
#include "isohydric/report/text_report.hpp"

#include <array>
#include <iostream>
#include <iterator>
#include <map>
#include <memory>
#include <string>
#include <vector>

#include "cli/commands.hpp"
#include "cli/prompts.hpp"
#include <fmt/format.h>

namespace isohydric::cli {

namespace {

struct CheckOptions {
    std::vector<std::string> items;              ///< name=value, or one file, or `-`
    std::map<std::string, std::string> context;  ///< by the names that PanelReader takes
    std::string rules, units, site;
    std::string format = "text";
    bool full = false;
};

/// Name, what stands behind it, help.
struct ContextOption {
    const char *name, *type, *help;
};

constexpr std::array k_context_options{
    ContextOption{"specimen",
                  "SPECIMEN",
                  "arterial, venous, central-venous, mixed-venous, capillary, cord-arterial or "
                  "cord-venous (default for a gas: arterial)"},
    ContextOption{"population",
                  "POPULATION",
                  "adult, child, neonate, pregnancy-1, pregnancy-2 or pregnancy-3 (default: by "
                  "age, else adult)"},
    ContextOption{"age", "AGE", "with its unit: 15min, 6h, 3d, 2mo, 4y"},
    ContextOption{"altitude", "METRES", "where the patient lives, in metres"},
    ContextOption{"onset", "ONSET", "of the respiratory disorder: acute, chronic or unknown"},
    ContextOption{"baseline-pCO2", "VALUE", "known usual pCO2 of a chronic retainer"},
    ContextOption{"baseline-HCO3", "VALUE", "known usual bicarbonate"}};

/// The arguments as one source text, so that a message can point at the argument.
class Arguments {
  public:
    explicit Arguments(const std::vector<std::string>& items) {
        std::string text;
        for (const std::string& item : items) {
            begins_.push_back(text.size() + (text.empty() ? 0 : 1));
            text += (text.empty() ? "" : " ") + item;
        }
        source_ = diag::make_source("arguments", text);
    }

    [[nodiscard]] diag::Place place(std::size_t item, std::size_t length) const {
        return {source_, {begins_[item], begins_[item] + length}};
    }

  private:
    std::vector<std::size_t> begins_;
    std::shared_ptr<const diag::Source> source_;
};

void read_document(const std::string& name,
                   std::string text,
                   panel::PanelReader& reader,
                   diag::Report& report) {
    const std::optional<diag::Json> document =
        diag::read_json(diag::make_source(name, std::move(text)), report);
    if (document) {
        io::read_json_panel(*document, reader, report);
    }
}

void read_items(const std::vector<std::string>& items,
                panel::PanelReader& reader,
                diag::Report& report) {
    const Arguments arguments(items);
    for (std::size_t i = 0; i < items.size(); ++i) {
        const std::string& item = items[i];
        const std::size_t equals = item.find('=');
        if (equals != std::string::npos) {
            reader.add(
                item.substr(0, equals), item.substr(equals + 1), arguments.place(i, item.size()));
        } else if (item == "-") {
            read_document("standard input",
                          std::string{std::istreambuf_iterator<char>(std::cin), {}},
                          reader,
                          report);
        } else if (diag::Result<std::string> text = io::read_file(item)) {
            read_document(item, std::move(*text), reader, report);
        } else {
            report.error("check-argument",
                         arguments.place(i, item.size()),
                         fmt::format("\"{}\" is neither name=value nor a file that can be read "
                                     "({}); write for example pH=7.32",
                                     item,
                                     text.error()));
        }
    }
}

/// A gas whose specimen was not stated is read as arterial, and the report says so; chemistry needs no specimen.
void assume_specimen(panel::Panel& panel) {
    const bool gas = panel[panel::Analyte::ph] || panel[panel::Analyte::pco2];
    if (gas && panel.context.specimen == panel::Specimen::not_stated) {
        panel.context.specimen = panel::Specimen::arterial;
        panel.context.assumed.insert(panel.context.assumed.begin(), "specimen: arterial");
    }
}

std::optional<panel::Panel> read_panel(const CheckOptions& options,
                                       const panel::Catalogue& catalogue,
                                       const panel::SiteUnits* units,
                                       diag::Report& report) {
    if (options.items.empty()) {
        return ask_for_panel(catalogue, units, options.context);
    }
    panel::PanelReader reader(catalogue, units, report);
    for (const auto& [name, text] : options.context) {
        if (!text.empty()) {
            reader.set_context(
                name, text, {diag::make_source("--" + name, text), {0, text.size()}});
        }
    }
    read_items(options.items, reader, report);
    std::optional<panel::Panel> panel = reader.finish();
    return report.has_errors() ? std::nullopt : std::move(panel);
}

Exit check(const CheckOptions& options) {
    diag::Report report;
    const std::optional<Site> site = read_site(options.site, report);
    const std::shared_ptr<const rule::RuleSet> rules =
        site ? load_rules(options.rules.empty() ? site->rules : options.rules, false, report)
             : nullptr;
    std::optional<panel::SiteUnits> units;
    std::optional<panel::Panel> panel;
    if (rules && load_units(options.units.empty() ? site->units : options.units,
                            *rules->catalogue,
                            units,
                            report)) {
        panel = read_panel(options, *rules->catalogue, units ? &*units : nullptr, report);
    }
    print_diagnostics(report);
    if (!panel) {
        return Exit::input_had_errors;
    }
    assume_specimen(*panel);
    interpret::Interpreter interpreter(std::make_shared<const engine::Program>(rules));
    const interpret::Interpretation result = interpreter.interpret(*panel);
    print(options.format == "json" ? report::json_report(result)
                                   : report::text_report(result, {.full = options.full}));
    return result.interpretable ? Exit::done : Exit::input_had_errors;
}

}  // namespace

void add_check_command(CLI::App& app, Action& chosen) {
    auto options = std::make_shared<CheckOptions>();
    CLI::App* command = app.add_subcommand(
        "check", "Interpret one panel: name=value ..., a JSON file, or - for standard input");
    command
        ->add_option("panel",
                     options->items,
                     "pH=7.21 pCO2=3.9kPa Na=138 ..., a JSON file, or - for standard input; "
                     "without one, on a terminal, it asks")
        ->type_name("NAME=VALUE");
    const auto add = [&](const std::string& name,
                         std::string& value,
                         const std::string& type,
                         const std::string& help) {
        return command->add_option("--" + name, value, help)->type_name(type);
    };
    for (const auto& [name, type, help] : k_context_options) {
        add(name, options->context[name], type, help);
    }
    add("rules", options->rules, "SET", "a rule set of your own (default: the shipped one)");
    add("units", options->units, "si|conventional|FILE", "units of numbers written without one");
    add("site", options->site, "FILE", "site file, which names rule set and units");
    CLI::Validator format = CLI::IsMember({"text", "json"});
    format.description("");  // the type says it already
    add("format", options->format, "text|json", "how the result is written")->check(format);
    command->add_flag("--full", options->full, "every check, finding, disorder and reason");
    command->callback([options, &chosen] {
        if (options->items.empty() && !person_at_terminal()) {
            throw CLI::RequiredError("panel");
        }
        chosen = [options] {
            return check(*options);
        };
    });
}

}  // namespace isohydric::cli
