// Fuzz target: any bytes as a rule file of a small set that is otherwise sound. It must give a set or errors, every
// place within its file, and a set that is given must have a hash.
#include "isohydric/diag/assert.hpp"
#include "isohydric/diag/render.hpp"
#include "isohydric/rule/rule_set.hpp"

#include <cstddef>
#include <cstdint>
#include <fstream>
#include <map>
#include <sstream>
#include <string>
#include <vector>

namespace {

using namespace isohydric;

constexpr std::string_view k_set = R"({"id": "fuzz", "version": "1", "title": "t",
  "analytes": "analytes.json", "sources": "sources.json", "files": ["fuzz.json"]})";

std::string shipped(const std::string& path) {
    std::ifstream file(std::string(ISOHYDRIC_SOURCE_DIR) + "/rules/" + path, std::ios::binary);
    ISOHYDRIC_ASSERT(file.good());
    std::ostringstream text;
    text << file.rdbuf();
    return text.str();
}

const std::map<std::string, std::string>& tree() {
    static const std::map<std::string, std::string> files{
        {"set.json", std::string(k_set)},
        {"analytes.json", shipped("analytes.json")},
        {"sources.json", shipped("sources.json")}};
    return files;
}

std::vector<rule::ModelSignature> models() {
    return {{.id = "carbonicAcid.bicarbonate",
             .inputs = {{.name = "pH", .unit = "1", .low = 6, .high = 8},
                        {.name = "pCO2", .unit = "mm[Hg]", .low = 0, .high = 300}},
             .result = {.name = "HCO3", .unit = "mmol/L", .low = 0, .high = 100}}};
}

}  // namespace

extern "C" int LLVMFuzzerTestOneInput(const std::uint8_t* data, std::size_t size);

extern "C" int LLVMFuzzerTestOneInput(const std::uint8_t* data, std::size_t size) {
    const std::string text(data, data + size);
    const rule::FileReader files = [&text](const std::string& path) -> std::optional<std::string> {
        if (path == "fuzz.json" || path == "fuzz.cases.json") {
            return text;
        }
        const auto found = tree().find(path);
        return found == tree().end() ? std::nullopt : std::optional(found->second);
    };
    diag::Report report;
    const auto rules =
        rule::read_rule_set("set.json", files, models(), report, {.with_cases = size % 2 == 0});
    ISOHYDRIC_ASSERT((rules == nullptr) == report.has_errors());
    for (const diag::Diagnostic& diagnostic : report.diagnostics()) {
        ISOHYDRIC_ASSERT(diagnostic.place.source == nullptr ||
                         diagnostic.place.span.end <= diagnostic.place.source->text().size());
        ISOHYDRIC_ASSERT(!diag::render(diagnostic).empty());
    }
    ISOHYDRIC_ASSERT(rules == nullptr || rules->sha256.size() == 64);
    return 0;
}
