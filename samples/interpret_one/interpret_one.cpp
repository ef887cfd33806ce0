// Interprets one panel with the installed rules and prints what the bicarbonate, base-excess and strong-ion
// approaches say of it, one sentence a line.
#include <iostream>
#include <memory>
#include <optional>
#include <string>

#include <isohydric/diag/render.hpp>
#include <isohydric/engine/models.hpp>
#include <isohydric/interpret/interpreter.hpp>
#include <isohydric/io/files.hpp>
#include <isohydric/panel/reading.hpp>
#include <isohydric/report/caution.hpp>
#include <isohydric/rule/rule_set.hpp>

using namespace isohydric;

namespace {

std::optional<panel::Panel> read_panel(const panel::Catalogue& catalogue, diag::Report& report) {
    panel::PanelReader reader(catalogue, nullptr, report);
    reader.set_context("specimen", "arterial", {});
    reader.add("pH", "7.21", {});
    reader.add("pCO2", "3.9 kPa", {});
    reader.add("Na", "138", {});
    reader.add("Cl", "98", {});
    reader.add("albumin", "2.1 g/dL", {});
    reader.add("lactate", "6.2 mmol/L", {});
    return reader.finish();
}

}  // namespace

int main() {
    diag::Report report;
    const std::shared_ptr<const rule::RuleSet> rules = rule::read_rule_set(
        "sets/default.json", io::rule_tree(RULES), engine::model_signatures(), report);
    const std::optional<panel::Panel> panel =
        rules ? read_panel(*rules->catalogue, report) : std::nullopt;
    std::cerr << diag::render(report);
    if (!panel) {
        return 1;
    }
    interpret::Interpreter interpreter(std::make_shared<const engine::Program>(rules));
    std::cout << report::caution() << '\n';
    for (const std::string& sentence : interpreter.interpret(*panel).sentences) {
        std::cout << sentence << '\n';
    }
    std::cout << report::caution() << '\n';
}
