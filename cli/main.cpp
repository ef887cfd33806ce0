// Wires: options to commands, commands to exit codes, our own mistakes to exit 70.
#include "isohydric/diag/assert.hpp"
#include "isohydric/report/caution.hpp"
#include "isohydric/version.hpp"

#include <CLI/CLI.hpp>
#include <spdlog/sinks/stdout_sinks.h>
#include <spdlog/spdlog.h>

#include <exception>
#include <memory>

#include "cli/commands.hpp"

namespace {

using isohydric::cli::Exit;

int run(int argc, char** argv) {
    CLI::App app("Interprets blood-gas and electrolyte panels from rules that a laboratory can "
                 "read and change.");
    app.name("isohydric");
    app.footer(std::string(isohydric::report::caution()));
    app.set_version_flag("--version", std::string(isohydric::version()));
    app.require_subcommand(1);
    isohydric::cli::Action chosen;
    isohydric::cli::add_check_command(app, chosen);
    isohydric::cli::add_rules_command(app, chosen);
    try {
        app.parse(argc, argv);
    } catch (const CLI::ParseError& error) {
        const bool asked = error.get_exit_code() == static_cast<int>(CLI::ExitCodes::Success);
        app.exit(error);
        return static_cast<int>(asked ? Exit::done : Exit::usage);
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
