#include "cli/surroundings.hpp"

#include "isohydric/diag/json.hpp"
#include "isohydric/diag/render.hpp"
#include "isohydric/engine/models.hpp"
#include "isohydric/io/files.hpp"

#include <cerrno>
#include <cstdio>
#include <cstdlib>
#include <filesystem>
#include <stdexcept>
#include <system_error>

#include <unistd.h>

namespace isohydric::cli {

namespace {

std::string environment(const char* name) {
    const char* value =
        std::getenv(name);  // NOLINT(concurrency-mt-unsafe): read before any thread starts
    return value == nullptr ? std::string() : std::string(value);
}

/// $XDG_CONFIG_HOME/isohydric/site.json, else ~/.config/isohydric/site.json; empty where there is none.
std::string user_configuration() {
    std::string base = environment("XDG_CONFIG_HOME");
    if (base.empty() && !environment("HOME").empty()) {
        base = environment("HOME") + "/.config";
    }
    const std::string path = base + "/isohydric/site.json";
    std::error_code problem;
    return !base.empty() && std::filesystem::exists(path, problem) ? path : std::string();
}

/// A path in a site file is relative to that file.
std::string beside(const std::string& site_path, const std::string& path) {
    const std::filesystem::path given(path);
    return given.is_absolute() ? path
                               : (std::filesystem::absolute(site_path).parent_path() / given)
                                     .lexically_normal()
                                     .string();
}

/// A set outside the shipped tree must be recognisable as a path of its own.
std::string as_set_path(const std::string& path) {
    return path.starts_with('/') ? path
                                 : std::filesystem::absolute(path).lexically_normal().string();
}

}  // namespace

std::optional<Site> read_site(const std::string& path, diag::Report& report) {
    const std::string file = path.empty() ? user_configuration() : path;
    if (file.empty()) {
        return Site{};
    }
    const auto source = io::read_source(file);
    if (!source) {
        report.error("site-file", {}, source.error());
        return std::nullopt;
    }
    const std::optional<diag::Json> document = diag::read_json(*source, report);
    if (!document) {
        return std::nullopt;
    }
    diag::ObjectReader reader(*document, report, "site file");
    Site site;
    if (const std::optional<std::string> rules = reader.optional_text("rules")) {
        site.rules = beside(file, *rules);
    }
    if (const std::optional<std::string> units = reader.optional_text("units")) {
        site.units = *units == "si" || *units == "conventional" ? *units : beside(file, *units);
    }
    reader.finish();
    return report.has_errors() ? std::nullopt : std::optional<Site>(site);
}

std::string rule_folder() {
    std::error_code problem;
    const std::filesystem::path program = std::filesystem::read_symlink("/proc/self/exe", problem);
    const std::filesystem::path installed =
        program.parent_path().parent_path() / "share/isohydric/rules";
    return !problem && std::filesystem::exists(installed / "sets/default.json", problem)
               ? installed.string()
               : ISOHYDRIC_SOURCE_RULES;
}

std::shared_ptr<const rule::RuleSet>
load_rules(const std::string& path, bool with_cases, diag::Report& report) {
    return rule::read_rule_set(path.empty() ? "sets/default.json" : as_set_path(path),
                               io::rule_tree(rule_folder()),
                               engine::model_signatures(),
                               report,
                               {.with_cases = with_cases});
}

bool load_units(const std::string& name,
                const panel::Catalogue& catalogue,
                std::optional<panel::SiteUnits>& units,
                diag::Report& report) {
    if (name.empty()) {
        return true;
    }
    units = panel::SiteUnits::preset(name, catalogue);
    if (units) {
        return true;
    }
    const auto source = io::read_source(name);
    if (!source) {
        report.error("site-units", {}, "units are si, conventional or a file: " + source.error());
        return false;
    }
    units = panel::read_site_units(*source, catalogue, report);
    return units.has_value();
}

bool person_at_terminal() {
    return isatty(STDIN_FILENO) == 1 && isatty(STDERR_FILENO) == 1;
}

void print_diagnostics(const diag::Report& report) {
    const std::string text = diag::render(report);
    std::fwrite(text.data(), 1, text.size(), stderr);
}

void print(const std::string& text) {
    errno = 0;
    if (std::fwrite(text.data(), 1, text.size(), stdout) != text.size() ||
        std::fflush(stdout) != 0) {
        throw std::runtime_error("standard output cannot be written: " +
                                 std::generic_category().message(errno));
    }
}

}  // namespace isohydric::cli
