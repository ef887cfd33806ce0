// Writes every expression of a rule set in its number form, and what this engine makes of each on generated panels, for
// comparison with another FHIRPath engine: `expression_dump <rule folder> <set path> <panels>`.
//
// Lines of JSON. First `{"expressions": [{"id", "text"}]}`, then one line for each panel,
// `{"names": {name: value}, "results": [...]}`: numbers, truths or null for empty, names without a value left out; last
// `{"onLimit": n}`, how many comparisons were made between equal numbers.
#include "isohydric/diag/render.hpp"
#include "isohydric/engine/models.hpp"
#include "isohydric/engine/program.hpp"
#include "isohydric/num/rounding.hpp"
#include "isohydric/rule/number_form.hpp"
#include "isohydric/rule/walk.hpp"

#include <nlohmann/json.hpp>

#include <charconv>
#include <exception>
#include <fstream>
#include <iostream>
#include <map>
#include <sstream>
#include <string>

#include "reference/limit_panels.hpp"

namespace diag = isohydric::diag;
namespace engine = isohydric::engine;
namespace num = isohydric::num;
namespace panel = isohydric::panel;
namespace rule = isohydric::rule;
using isohydric::test::LimitPanels;
using nlohmann::ordered_json;

namespace {

constexpr std::size_t k_block_size = 256;

/// An expression of the rule set and what to call it.
struct Named {
    std::string id;
    rule::ExpressionPtr expression;
};

using Expressions = std::vector<Named>;

void add(Expressions& expressions, const std::string& id, const rule::ExpressionPtr& expression) {
    if (expression) {
        expressions.push_back({id, expression});
    }
}

void add_quantities(Expressions& expressions, const rule::RuleSet& rules) {
    for (const rule::Quantity& quantity : rules.quantities) {
        for (const rule::Alternative& alternative : quantity.alternatives) {
            add(expressions, quantity.head.id, alternative.formula);
        }
        if (quantity.model) {
            for (const rule::ExpressionPtr& input : quantity.model->inputs) {
                add(expressions, quantity.head.id, input);
            }
        }
    }
}

/// Every expression of every entry.
[[nodiscard]] Expressions expressions_of(const rule::RuleSet& rules) {
    Expressions expressions;
    add_quantities(expressions, rules);
    const auto add_conditions = [&expressions](const auto& entries) {
        for (const auto& entry : entries) {
            add(expressions, entry.head.id, entry.when);
        }
    };
    add_conditions(rules.conditions);
    add_conditions(rules.findings);
    add_conditions(rules.checks);
    add_conditions(rules.criticals);
    add_conditions(rules.explanations);
    for (const rule::Explanation& explanation : rules.explanations) {
        if (explanation.compensation) {
            add(expressions, explanation.head.id, explanation.compensation->low);
            add(expressions, explanation.head.id, explanation.compensation->high);
        }
    }
    for (const rule::Group& group : rules.groups) {
        add(expressions, group.head.id, group.domain);
    }
    for (const rule::Disorder& disorder : rules.disorders) {
        add(expressions, disorder.head.id, disorder.judged_when);
    }
    return expressions;
}

/// Every name of the expressions once, by its form in them.
[[nodiscard]] std::map<std::string, const rule::Expression*>
names_in(const Expressions& expressions) {
    std::map<std::string, const rule::Expression*> names;
    for (const Named& named : expressions) {
        rule::for_each_node(*named.expression, [&names](const rule::Expression& node) {
            if (node.kind == rule::NodeKind::name) {
                names.emplace(rule::number_form_name(node), &node);
            }
        });
    }
    return names;
}

/// One row of an evaluation as JSON.
class RowWriter {
  public:
    RowWriter(const engine::Program& program,
              const engine::Scratch& scratch,
              const panel::PanelBlock& block)
        : program_(program), scratch_(scratch), block_(block) {}

    [[nodiscard]] ordered_json value(const rule::Expression& expression, std::size_t row) const {
        if (expression.type == rule::Type::code) {
            return code(expression.symbol, row);
        }
        const engine::Slot slot = program_.node(expression).value();
        if (expression.type == rule::Type::number) {
            const auto number = scratch_.value(slot, row);
            return number ? ordered_json(*number) : ordered_json();
        }
        const engine::Truth truth = scratch_.truth(slot, row);
        return truth == engine::Truth::unknown ? ordered_json()
                                               : ordered_json(truth == engine::Truth::yes);
    }

    /// Comparisons in the expression between numbers that count as equal.
    [[nodiscard]] std::size_t on_limit(const rule::Expression& expression, std::size_t row) const {
        std::size_t count = 0;
        rule::for_each_node(expression, [&](const rule::Expression& node) {
            if (node.type != rule::Type::truth || node.children.size() != 2 ||
                node.children[0]->type != rule::Type::number) {
                return;
            }
            const auto left = scratch_.value(program_.node(*node.children[0]).value(), row);
            const auto right = scratch_.value(program_.node(*node.children[1]).value(), row);
            if (left && right && num::compare_at_8_decimals(*left, *right) == 0) {
                ++count;
            }
        });
        return count;
    }

  private:
    [[nodiscard]] std::string code(const rule::Symbol& item, std::size_t row) const {
        const auto which = static_cast<panel::ContextItem>(item.index);
        const std::uint8_t number = block_.context_code(which)[row];
        if (which == panel::ContextItem::specimen) {
            return std::string(panel::k_specimen_names.at(number));
        }
        return std::string(which == panel::ContextItem::population
                               ? panel::k_population_names.at(number)
                               : panel::k_onset_names.at(number));
    }

    const engine::Program& program_;
    const engine::Scratch& scratch_;
    const panel::PanelBlock& block_;
};

[[nodiscard]] std::shared_ptr<const rule::RuleSet> read_rules(const std::string& folder,
                                                              const std::string& set_path) {
    const rule::FileReader files = [&](const std::string& path) -> std::optional<std::string> {
        std::ifstream file(path.starts_with('/') ? path : folder + "/" + path, std::ios::binary);
        if (!file) {
            return std::nullopt;
        }
        std::ostringstream text;
        text << file.rdbuf();
        return text.str();
    };
    diag::Report report;
    auto rules = rule::read_rule_set(set_path, files, engine::model_signatures(), report);
    if (!rules) {
        std::cerr << diag::render(report);
    }
    return rules;
}

void write_expressions(const Expressions& expressions) {
    ordered_json list = ordered_json::array();
    for (const Named& named : expressions) {
        list.push_back({{"id", named.id}, {"text", rule::number_form(*named.expression)}});
    }
    std::cout << ordered_json{{"expressions", std::move(list)}}.dump() << '\n';
}

void write_rows(const std::shared_ptr<const rule::RuleSet>& rules,
                const Expressions& expressions,
                std::size_t panels) {
    const engine::Program program(rules);
    engine::Scratch scratch(program, k_block_size);
    panel::PanelBlock block(k_block_size);
    const RowWriter writer(program, scratch, block);
    const auto names = names_in(expressions);
    LimitPanels generated(*rules);
    std::size_t on_limit = 0;
    for (std::size_t done = 0; done < panels; done += block.size()) {
        block.clear();
        while (block.size() < std::min(k_block_size, panels - done)) {
            const bool near = block.size() % 2 == 0;
            block.push(generated.next(), near);
        }
        engine::evaluate(program, block, scratch);
        for (std::size_t row = 0; row < block.size(); ++row) {
            ordered_json values = ordered_json::object();
            for (const auto& [name, node] : names) {
                ordered_json value = writer.value(*node, row);
                if (!value.is_null()) {
                    values[name] = std::move(value);
                }
            }
            ordered_json results = ordered_json::array();
            for (const Named& named : expressions) {
                results.push_back(writer.value(*named.expression, row));
                on_limit += writer.on_limit(*named.expression, row);
            }
            std::cout << ordered_json{{"names", std::move(values)}, {"results", std::move(results)}}
                             .dump()
                      << '\n';
        }
    }
    std::cout << ordered_json{{"onLimit", on_limit}}.dump() << '\n';
}

int run(const std::vector<std::string>& arguments) {
    if (arguments.size() != 4) {
        std::cerr << "usage: expression_dump <rule folder> <set path> <panels>\n";
        return 2;
    }
    std::size_t panels = 0;
    const std::string& count = arguments[3];
    if (std::from_chars(count.data(), count.data() + count.size(), panels).ec != std::errc{}) {
        std::cerr << "not a number of panels: " << count << '\n';
        return 2;
    }
    const auto rules = read_rules(arguments[1], arguments[2]);
    if (!rules) {
        return 1;
    }
    const Expressions expressions = expressions_of(*rules);
    write_expressions(expressions);
    write_rows(rules, expressions, panels);
    return 0;
}

}  // namespace

int main(int argc, char** argv) {
    try {
        return run({argv, argv + argc});
    } catch (const std::exception& error) {
        std::cerr << error.what() << '\n';
        return 1;
    }
}
