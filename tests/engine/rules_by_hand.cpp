#include "engine/rules_by_hand.hpp"

#include "isohydric/engine/models.hpp"
#include "isohydric/panel/catalogue.hpp"
#include "isohydric/rule/checker.hpp"
#include "isohydric/rule/lexer.hpp"
#include "isohydric/rule/parser.hpp"
#include "isohydric/rule/rule_names.hpp"

#include <algorithm>
#include <fstream>
#include <sstream>
#include <stdexcept>

namespace isohydric::test {

namespace {

[[nodiscard]] std::string first_message(const diag::Report& report) {
    return report.diagnostics().empty() ? "no message" : report.diagnostics().front().message;
}

[[nodiscard]] std::shared_ptr<const panel::Catalogue> shipped_catalogue() {
    const std::string path = ISOHYDRIC_SOURCE_DIR "/rules/analytes.json";
    std::ostringstream text;
    text << std::ifstream(path).rdbuf();
    diag::Report report;
    auto catalogue = panel::read_catalogue(diag::make_source(path, text.str()), report);
    if (!catalogue) {
        throw std::runtime_error(first_message(report));
    }
    return catalogue;
}

}  // namespace

RulesByHand::RulesByHand() : set_(std::make_shared<rule::RuleSet>()) {
    static const std::shared_ptr<const panel::Catalogue> k_catalogue = shipped_catalogue();
    set_->catalogue = k_catalogue;
    const auto models = engine::model_signatures();
    set_->models.assign(models.begin(), models.end());
}

rule::ExpressionPtr RulesByHand::expression(const std::string& text,
                                            rule::Type type,
                                            const std::optional<std::string>& unit) {
    diag::Report report;
    const auto source = diag::make_source("test", text);
    const auto syntax = rule::parse_expression(text, rule::locator_in(source), report);
    rule::Wanted wanted{type, {}};
    if (unit) {
        wanted.unit = units::parse_unit(*unit).value();
    }
    rule::ExpressionPtr checked;
    if (syntax) {
        checked = rule::check(*syntax, rule::RuleNames(*set_), wanted, report);
    }
    if (!checked) {
        throw std::runtime_error(text + ": " + first_message(report));
    }
    return checked;
}

std::uint32_t
RulesByHand::add(rule::Quantity quantity, const std::string& id, const std::string& unit) {
    const auto index = static_cast<std::uint32_t>(set_->quantities.size());
    quantity.head.id = id;
    quantity.label = id;
    quantity.unit = units::parse_unit(unit).value();
    quantity.decimals = 1;
    set_->quantities.push_back(std::move(quantity));
    set_->by_id[id] = {rule::EntryKind::quantity, index};
    return index;
}

std::uint32_t
RulesByHand::quantity(const std::string& id, const std::string& formula, const std::string& unit) {
    return first_of(id, {{"", formula}}, unit);
}

std::uint32_t
RulesByHand::first_of(const std::string& id,
                      const std::vector<std::pair<std::string, std::string>>& from_and_formula,
                      const std::string& unit) {
    rule::Quantity quantity;
    for (const auto& [from, formula] : from_and_formula) {
        quantity.alternatives.push_back({from, expression(formula, rule::Type::number, unit)});
    }
    return add(std::move(quantity), id, unit);
}

std::uint32_t RulesByHand::model(const std::string& id,
                                 const std::string& model_id,
                                 const std::vector<std::string>& inputs,
                                 const std::string& unit) {
    const auto found = std::find_if(
        set_->models.begin(), set_->models.end(), [&](const rule::ModelSignature& signature) {
            return signature.id == model_id;
        });
    rule::ModelCall call;
    call.model = static_cast<std::uint32_t>(found - set_->models.begin());
    for (std::size_t input = 0; input < inputs.size(); ++input) {
        call.inputs.push_back(
            expression(inputs[input], rule::Type::number, found->inputs.at(input).unit));
    }
    rule::Quantity quantity;
    quantity.model = std::move(call);
    return add(std::move(quantity), id, unit);
}

std::uint32_t RulesByHand::condition(const std::string& id, const std::string& when) {
    const auto index = static_cast<std::uint32_t>(set_->conditions.size());
    rule::Condition condition;
    condition.head.id = id;
    condition.when = expression(when, rule::Type::truth);
    set_->conditions.push_back(std::move(condition));
    set_->by_id[id] = {rule::EntryKind::condition, index};
    return index;
}

std::uint32_t RulesByHand::finding(const std::string& id,
                                   const std::string& when,
                                   const std::vector<std::uint32_t>& unless) {
    const auto index = static_cast<std::uint32_t>(set_->findings.size());
    rule::Finding finding;
    finding.head.id = id;
    finding.label = id;
    finding.when = expression(when, rule::Type::truth);
    finding.unless = unless;
    set_->findings.push_back(std::move(finding));
    set_->by_id[id] = {rule::EntryKind::finding, index};
    return index;
}

rule::Interval& RulesByHand::interval(const std::string& name,
                                      const std::string& unit,
                                      std::optional<double> low,
                                      std::optional<double> high) {
    auto name_index = set_->find_interval_name(name);
    if (!name_index) {
        name_index = static_cast<std::uint32_t>(set_->interval_names.size());
        set_->interval_names.push_back(name);
        set_->interval_units.push_back(units::parse_unit(unit).value());
    }
    rule::Interval interval;
    interval.head.id = name + "-" + std::to_string(set_->intervals.size());
    interval.name = *name_index;
    interval.low = low;
    interval.high = high;
    set_->intervals.push_back(std::move(interval));
    return set_->intervals.back();
}

panel::Panel panel_of(std::initializer_list<std::pair<panel::Analyte, double>> values) {
    constexpr double k_half_digit = 0.05;
    panel::Panel panel;
    for (const auto& [analyte, value] : values) {
        panel::Entered entered;
        entered.value = value;
        entered.half_digit = k_half_digit;
        panel[analyte] = entered;
    }
    return panel;
}

panel::PanelBlock block_of(const std::vector<panel::Panel>& panels) {
    panel::PanelBlock block(panels.size());
    for (const panel::Panel& panel : panels) {
        block.push(panel);
    }
    return block;
}

}  // namespace isohydric::test
