// Wires: options to commands, commands to exit codes, our own mistakes to exit 70.
#include "isohydric/diag/assert.hpp"
#include "isohydric/report/caution.hpp"
#include "isohydric/version.hpp"

#include <CLI/CLI.hpp>
#include <spdlog/sinks/stdout_sinks.h>
#include <spdlog/spdlog.h>

#include <cstdio>
#include <exception>
#include <memory>

#include "cli/commands.hpp"

namespace {

using isohydric::cli::Exit;
using isohydric::report::with_caution;

/// What goes wrong on the command line is said on standard error; help that nobody asked for, too.
int usage_error(const std::string& text) {
    std::fputs(text.c_str(), stderr);
    return static_cast<int>(Exit::usage);
}

int run(int argc, char** argv) {
    CLI::App app("Interprets blood-gas and electrolyte panels from rules that a laboratory can "
                 "read and change.");
    app.name("isohydric");
    app.set_version_flag("--version", "isohydric " + std::string(isohydric::version()));
    app.require_subcommand(1);
    isohydric::cli::Action chosen;
    isohydric::cli::add_check_command(app, chosen);
    isohydric::cli::add_rules_command(app, chosen);
    try {
        app.parse(argc, argv);
    } catch (const CLI::CallForHelp&) {
        isohydric::cli::print(with_caution(app.help()));
        return static_cast<int>(Exit::done);
    } catch (const CLI::Success& version) {
        isohydric::cli::print(with_caution(version.what()));
        return static_cast<int>(Exit::done);
    } catch (const CLI::RequiredError&) {
        // A command is missing, its panel, or its id: its help says what can stand there.
        std::string unknown;
        for (const std::string& word : app.remaining()) {
            unknown += "isohydric: there is no command \"" + word + "\"\n\n";
        }
        return usage_error(unknown + with_caution(app.help()));
    } catch (const CLI::ParseError& error) {
        return usage_error(std::string("isohydric: ") + error.what() +
                           "\nisohydric --help tells what can be written.\n");
    }
    return static_cast<int>(chosen());
}

}  // namespace

int main(int argc, char** argv) {
    try {
        spdlog::set_default_logger(std::make_shared<spdlog::logger>(
            "isohydric", std::make_shared<spdlog::sinks::stderr_sink_st>()));
        spdlog::set_pattern("isohydric: %l: %v");
        return run(argc, argv);
    } catch (const isohydric::diag::InternalError& error) {
        spdlog::critical("a mistake of ours, please report it: {}", error.what());
        return static_cast<int>(Exit::our_bug);
    } catch (const std::exception& error) {
        spdlog::error("{}", error.what());
        return static_cast<int>(Exit::input_had_errors);
    }
}
