#include "harness/shipped_rules.hpp"

#include "isohydric/diag/render.hpp"
#include "isohydric/engine/models.hpp"
#include "isohydric/interpret/interpreter.hpp"
#include "isohydric/io/files.hpp"
#include "isohydric/panel/reading.hpp"

#include <doctest/doctest.h>

#include <algorithm>

namespace isohydric::harness {

namespace {

template <class List, class Id>
const auto& member(const List& list, const std::string& wanted, Id id) {
    const auto found = std::find_if(
        list.begin(), list.end(), [&](const auto& item) { return id(item) == wanted; });
    REQUIRE_MESSAGE(found != list.end(), wanted);
    return *found;
}

}  // namespace

std::shared_ptr<const rule::RuleSet> shipped_rules() {
    static const std::shared_ptr<const rule::RuleSet> rules = [] {
        diag::Report report;
        auto read = rule::read_rule_set("sets/default.json",
                                        io::rule_tree(ISOHYDRIC_SOURCE_DIR "/rules"),
                                        engine::model_signatures(),
                                        report);
        REQUIRE_MESSAGE(read, diag::render(report));
        return read;
    }();
    return rules;
}

std::shared_ptr<const engine::Program> shipped_program() {
    static const auto program = std::make_shared<const engine::Program>(shipped_rules());
    return program;
}

panel::Panel make_panel(Texts values, Texts context) {
    diag::Report report;
    panel::PanelReader reader(*shipped_program()->rules().catalogue, nullptr, report);
    for (const auto& [name, text] : values) {
        reader.add(name, text, {});
    }
    for (const auto& [item, text] : context) {
        reader.set_context(item, text, {});
    }
    const std::optional<panel::Panel> panel = reader.finish();
    REQUIRE_MESSAGE(panel, diag::render(report));
    return *panel;
}

interpret::Interpretation interpreted(const panel::Panel& panel) {
    interpret::Interpreter interpreter(shipped_program());
    return interpreter.interpret(panel);
}

interpret::Interpretation interpreted(Texts values, Texts context) {
    return interpreted(make_panel(values, context));
}

const interpret::CheckResult& check_of(const interpret::Interpretation& result,
                                       const std::string& id) {
    return member(result.checks, id, [](const auto& item) { return item.id; });
}

const interpret::FindingResult& finding_of(const interpret::Interpretation& result,
                                           const std::string& id) {
    return member(result.findings, id, [](const auto& item) { return item.id; });
}

const interpret::QuantityResult& quantity_of(const interpret::Interpretation& result,
                                             const std::string& name) {
    return member(result.quantities, name, [](const auto& item) { return item.name; });
}

const interpret::DisorderResult& disorder_of(const interpret::Interpretation& result,
                                             const std::string& id) {
    return member(result.disorders, id, [](const auto& item) { return item.id; });
}

std::vector<std::string> explanation_sets(const interpret::Interpretation& result) {
    std::vector<std::string> sets;
    for (const interpret::ExplanationResult& explanation : result.explanations) {
        std::vector<std::string> mains;
        for (const std::string& id : explanation.disorders) {
            if (id.starts_with("metabolic-") || id.starts_with("respiratory-")) {
                mains.push_back(id);
            }
        }
        std::sort(mains.begin(), mains.end());
        std::string set;
        for (const std::string& id : mains) {
            set += (set.empty() ? "" : "+") + id;
        }
        sets.push_back(set.empty() ? "none" : set);
    }
    return sets;
}

}  // namespace isohydric::harness
