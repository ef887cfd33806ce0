#include "rule/rule_tree.hpp"

#include "isohydric/diag/render.hpp"

#include <doctest/doctest.h>

#include <algorithm>
#include <fstream>
#include <set>
#include <sstream>

#include <fmt/format.h>

namespace isohydric::test {
namespace {

constexpr std::string_view k_head =
    R"("source": {"ref": "common-practice"}, "reviewed": "2026-12-01")";
constexpr std::string_view k_mark = "@@";

constexpr std::string_view k_set = R"({
  "id": "test", "version": "1", "title": "for tests", "extends": null,
  "analytes": "analytes.json", "sources": "sources.json",
  "files": ["base.json", "rules.json"],
  "conventions": {}, "replace": [], "remove": [], "approved": {"role": "", "date": ""}
})";

constexpr std::string_view k_base = R"json({
  "disorders": [
    {"id": "metabolic-acidosis", "label": "metabolic acidosis", "main": true, "approaches": ["bicarbonate"], $H},
    {"id": "metabolic-alkalosis", "label": "metabolic alkalosis", "main": true, "approaches": ["bicarbonate"], $H},
    {"id": "lactic-acidosis", "label": "lactic acidosis", "kindOf": "metabolic-acidosis", "approaches": ["bicarbonate"], $H}
  ],
  "quantities": [
    {"id": "gap", "label": "anion gap", "unit": "mmol/L", "decimals": 1, "formula": "Na - Cl - TCO2", $H},
    {"id": "pressure38", "label": "pressure", "unit": "mm[Hg]", "decimals": 0, "formula": "38 'mm[Hg]'", $H}
  ],
  "conditions": [{"id": "hasNa", "when": "Na.exists()", $H}],
  "findings": [
    {"id": "raised-gap", "approach": "bicarbonate", "label": "raised gap", "when": "gap > limits.gap.high",
     "states": "gap {gap}", "asserts": ["lactic-acidosis"], $H}
  ],
  "intervals": [{"id": "gap-limits", "of": "gap", "unit": "mmol/L", "low": 4, "high": 12, $H}]
})json";

std::string read_file(const std::string& path) {
    std::ifstream file(path, std::ios::binary);
    REQUIRE_MESSAGE(file.good(), path);
    std::ostringstream text;
    text << file.rdbuf();
    return text.str();
}

std::string replace_all(std::string text, std::string_view from, std::string_view to) {
    for (std::size_t at = text.find(from); at != std::string::npos; at = text.find(from, at)) {
        text.replace(at, from.size(), to);
        at += to.size();
    }
    return text;
}

// The shipped analytes cite sources; the bibliography of these tests holds just those keys, and one more.
std::string bibliography_for(const std::string& analytes) {
    constexpr std::string_view k_before = "\"ref\": \"";
    std::set<std::string> keys{"known2001"};
    for (std::size_t at = analytes.find(k_before); at != std::string::npos;
         at = analytes.find(k_before, at + 1)) {
        const std::size_t begin = at + k_before.size();
        keys.insert(analytes.substr(begin, analytes.find('"', begin) - begin));
    }
    keys.erase("common-practice");
    std::string items;
    for (const std::string& key : keys) {
        items +=
            fmt::format("{}{{\"id\": \"{}\", \"type\": \"article-journal\", \"title\": \"{}\"}}",
                        items.empty() ? "" : ",\n",
                        key,
                        key);
    }
    return "[" + items + "]";
}

/// Line and column of a byte, counted here and not by the code under test.
diag::Position position_in(std::string_view text, std::size_t offset) {
    const std::string_view before = text.substr(0, offset);
    const std::size_t line_begin = before.rfind('\n') + 1;  // 0 if there is no line feed
    return {1 + static_cast<std::size_t>(std::ranges::count(before, '\n')),
            1 + before.size() - line_begin};
}

}  // namespace

bool Reading::has(std::string_view diagnostic_id) const {
    return std::ranges::any_of(report.diagnostics(), [&](const diag::Diagnostic& diagnostic) {
        return diagnostic.id == diagnostic_id;
    });
}

std::string Reading::summary() const {
    std::string lines;
    for (const diag::Diagnostic& diagnostic : report.diagnostics()) {
        lines += fmt::format("{} {}\n", diag::render(diagnostic.place), diagnostic.id);
    }
    return lines;
}

std::string with_heads(std::string_view text) {
    return replace_all(std::string(text), "$H", k_head);
}

RuleTree base_tree() {
    static const std::string analytes =
        read_file(std::string(ISOHYDRIC_SOURCE_DIR) + "/rules/analytes.json");
    return {{"set.json", std::string(k_set)},
            {"analytes.json", analytes},
            {"sources.json", bibliography_for(analytes)},
            {"base.json", with_heads(k_base)},
            {"rules.json", "{}"}};
}

RuleTree tree_with(std::string_view rules) {
    RuleTree tree = base_tree();
    tree["rules.json"] = with_heads(rules);
    return tree;
}

Reading read(const RuleTree& tree, const std::string& set_path, const rule::ReadOptions& options) {
    static const std::vector<rule::ModelSignature> models{
        {.id = "double.it",
         .inputs = {{.name = "x", .unit = "kPa", .low = 0, .high = 100}},
         .result = {.name = "result", .unit = "mm[Hg]", .low = 0, .high = 1000}}};
    const rule::FileReader files = [&tree](const std::string& path) -> std::optional<std::string> {
        const auto found = tree.find(path);
        return found == tree.end() ? std::nullopt : std::optional(found->second);
    };
    Reading reading;
    reading.rules = rule::read_rule_set(set_path, files, models, reading.report, options);
    CHECK((reading.rules == nullptr) == reading.report.has_errors());
    return reading;
}

void check_complaint(RuleTree tree,
                     std::string_view diagnostic_id,
                     const rule::ReadOptions& options) {
    std::string wanted;
    for (auto& [path, text] : tree) {
        if (const std::size_t mark = text.find(k_mark); mark != std::string::npos) {
            text.erase(mark, k_mark.size());
            const auto [line, column] = position_in(text, mark);
            wanted = fmt::format("{}:{}:{} {}\n", path, line, column, diagnostic_id);
        }
    }
    REQUIRE(!wanted.empty());
    const Reading reading = read(tree, "set.json", options);
    INFO("wanted: " << wanted << "found:\n" << diag::render(reading.report));
    CHECK(reading.rules == nullptr);
    CHECK(reading.summary().find(wanted) != std::string::npos);
}

void check_complaint_in_rules(std::string_view rules, std::string_view diagnostic_id) {
    check_complaint(tree_with(rules), diagnostic_id);
}

}  // namespace isohydric::test
