// Reads one rule set from a folder and prints what the reader has to say, for tests that compare the reader with
// something outside of this program: `read_rules [--canonical] <folder> <set path>`.
#include "isohydric/diag/render.hpp"
#include "isohydric/engine/models.hpp"
#include "isohydric/rule/rule_set.hpp"

#include <fstream>
#include <iostream>
#include <sstream>
#include <string>

#include <fmt/format.h>

using namespace isohydric;

namespace {

rule::FileReader files_below(const std::string& folder) {
    return [folder](const std::string& path) -> std::optional<std::string> {
        std::ifstream file(path.starts_with('/') ? path : folder + "/" + path, std::ios::binary);
        if (!file) {
            return std::nullopt;
        }
        std::ostringstream text;
        text << file.rdbuf();
        return text.str();
    };
}

}  // namespace

int main(int argc, char** argv) {
    const bool canonical = argc == 4 && std::string(argv[1]) == "--canonical";
    if (argc != (canonical ? 4 : 3)) {
        std::cerr << "usage: read_rules [--canonical] <folder> <set path>\n";
        return 2;
    }
    diag::Report report;
    const auto rules = rule::read_rule_set(argv[argc - 1],
                                           files_below(argv[argc - 2]),
                                           engine::model_signatures(),
                                           report,
                                           {.with_cases = true});
    std::cerr << diag::render(report);
    if (rules == nullptr) {
        return 1;
    }
    std::cout << (canonical ? rules->canonical : rules->sha256 + "\n");
    return 0;
}
