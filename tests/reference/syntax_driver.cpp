// Reads one expression a line and prints its syntax tree, or `refused` and the ids of the diagnostics. For
// syntax_against_fhirpath.mjs.
#include "isohydric/rule/parser.hpp"

#include <iostream>
#include <string>

#include "rule/syntax_tree.hpp"

int main() {
    using namespace isohydric;
    for (std::string line; std::getline(std::cin, line);) {
        diag::Report report;
        const auto locate = rule::locator_in(diag::make_source("line", line));
        if (const auto syntax = rule::parse_expression(line, locate, report)) {
            std::cout << rule::testing::tree_of(*syntax) << '\n';
            continue;
        }
        std::cout << "refused";
        for (const diag::Diagnostic& diagnostic : report.diagnostics()) {
            std::cout << ' ' << diagnostic.id;
        }
        std::cout << '\n';
    }
}
