// The commands: each adds its options to the parser and runs when chosen.
#pragma once

#include <CLI/CLI.hpp>

#include <functional>

#include "cli/surroundings.hpp"

namespace isohydric::cli {

/// Runs the chosen command.
using Action = std::function<Exit()>;

void add_check_command(CLI::App& app, Action& chosen);
void add_rules_command(CLI::App& app, Action& chosen);

}  // namespace isohydric::cli
