#include "cli/prompts.hpp"

#include <array>
#include <cstdio>
#include <iostream>

#include <fmt/format.h>

namespace isohydric::cli {

namespace {

using panel::Analyte;

/// The order in which analysers and laboratories print them.
constexpr std::array k_asked{Analyte::ph,
                             Analyte::pco2,
                             Analyte::hco3,
                             Analyte::po2,
                             Analyte::na,
                             Analyte::k,
                             Analyte::cl,
                             Analyte::tco2,
                             Analyte::albumin,
                             Analyte::lactate,
                             Analyte::bhb,
                             Analyte::glucose,
                             Analyte::phosphate,
                             Analyte::ica,
                             Analyte::mg};

std::string question(const panel::AnalyteInfo& info) {
    std::string units;
    for (const panel::CustomaryUnit& unit : info.customary) {
        units += (units.empty() ? "" : " or ") +
                 (unit.ucum == "mm[Hg]" ? std::string("mmHg") : unit.ucum);
    }
    return fmt::format("{} [{:g} to {:g}{}{}]: ",
                       info.label,
                       info.plausible.low,
                       info.plausible.high,
                       info.unit_text.empty() ? "" : " " + info.unit_text,
                       info.customary.size() > 1 ? "; " + units : "");
}

bool answer(const std::string& text, std::string& line) {
    std::fputs(text.c_str(), stderr);
    std::fflush(stderr);
    return static_cast<bool>(std::getline(std::cin, line)) && line != ".";
}

}  // namespace

std::vector<std::pair<std::string, std::string>> ask_for_panel(const panel::Catalogue& catalogue) {
    std::fputs("Values with units as printed; empty skips, a single point ends.\n", stderr);
    std::vector<std::pair<std::string, std::string>> given;
    std::string line;
    if (answer("specimen [arterial, venous, central-venous, mixed-venous, capillary, "
               "cord-arterial, cord-venous]: ",
               line)) {
        if (!line.empty()) {
            given.emplace_back("specimen", line);
        }
    }
    for (const Analyte analyte : k_asked) {
        if (!answer(question(catalogue[analyte]), line)) {
            break;
        }
        if (!line.empty()) {
            given.emplace_back(std::string(panel::id_of(analyte)), line);
        }
    }
    return given;
}

}  // namespace isohydric::cli
