// Entries of a rule set to operations.
#include "isohydric/engine/compiler.hpp"

#include "isohydric/diag/assert.hpp"
#include "isohydric/engine/models.hpp"
#include "isohydric/engine/reuse.hpp"
#include "isohydric/rule/rule_names.hpp"
#include "isohydric/rule/sentence.hpp"
#include "isohydric/units/unit.hpp"

#include <algorithm>

namespace isohydric::engine {

namespace {

/// The selected indices of one kind of entry, all of them if everything is wanted.
[[nodiscard]] std::vector<std::uint32_t>
chosen(const Selection& selection, const std::vector<std::uint32_t>& listed, std::size_t count) {
    if (!selection.everything) {
        return listed;
    }
    std::vector<std::uint32_t> all(count);
    for (std::uint32_t index = 0; index < count; ++index) {
        all[index] = index;
    }
    return all;
}

/// Empties the slots of entries that are not in `listed`.
void keep_only(std::vector<std::optional<Slot>>& slots, const std::vector<std::uint32_t>& listed) {
    for (std::uint32_t index = 0; index < slots.size(); ++index) {
        if (std::find(listed.begin(), listed.end(), index) == listed.end()) {
            slots[index].reset();
        }
    }
}

}  // namespace

Compiler::Compiler(Program& program, const Selection& selection)
    : program_(program), rules_(program.rules()), selection_(selection), emitter_(rules_) {
    program_.quantities_.resize(rules_.quantities.size());
    program_.alternatives_.resize(rules_.quantities.size());
    program_.conditions_.resize(rules_.conditions.size());
    program_.findings_.resize(rules_.findings.size());
    program_.checks_.resize(rules_.checks.size());
    program_.criticals_.resize(rules_.criticals.size());
    program_.explanations_.resize(rules_.explanations.size());
    program_.bands_.resize(rules_.explanations.size());
    program_.intervals_.resize(rules_.interval_names.size());
}

void Compiler::compile() {
    for (const auto index : chosen(selection_, selection_.quantities, rules_.quantities.size())) {
        quantity(index);
    }
    for (const auto index : chosen(selection_, selection_.conditions, rules_.conditions.size())) {
        condition(index);
    }
    for (const auto index : chosen(selection_, selection_.findings, rules_.findings.size())) {
        compile_finding(index);
    }
    for (const auto index : chosen(selection_, selection_.checks, rules_.checks.size())) {
        compile_check(index);
    }
    for (const auto index : chosen(selection_, selection_.criticals, rules_.criticals.size())) {
        compile_critical(index);
    }
    for (const auto index :
         chosen(selection_, selection_.explanations, rules_.explanations.size())) {
        compile_explanation(index);
    }
    if (selection_.everything) {
        compile_bystanders();
    }
    program_.slots_ = emitter_.slots();
    program_.operations_ = emitter_.take();
    if (!selection_.keep_nodes) {
        forget_unselected();
    }
}

/// What belongs to everything and hangs on no entry with a state of its own.
void Compiler::compile_bystanders() {
    for (const rule::Group& group : rules_.groups) {
        if (group.domain) {
            expression(*group.domain);
        }
    }
    for (const rule::Disorder& disorder : rules_.disorders) {
        if (disorder.judged_when) {
            expression(*disorder.judged_when);
        }
    }
    // Entered values are shown against their intervals, whether or not an entry asks for these.
    for (std::uint32_t name_index = 0; name_index < rules_.interval_names.size(); ++name_index) {
        interval(name_index);
    }
}

void Compiler::compile_finding(std::uint32_t index) {
    finding(index);
    compile_sentence(rules_.findings[index].states);
}

void Compiler::compile_check(std::uint32_t index) {
    const rule::Check& check = rules_.checks[index];
    program_.checks_[index] = expression(*check.when);
    compile_sentence(check.states);
}

void Compiler::compile_critical(std::uint32_t index) {
    const rule::Critical& critical = rules_.criticals[index];
    program_.criticals_[index] = expression(*critical.when);
    name(critical.value);
    compile_sentence(critical.states);
}

void Compiler::compile_explanation(std::uint32_t index) {
    const rule::Explanation& explanation = rules_.explanations[index];
    program_.explanations_[index] = expression(*explanation.when);
    if (explanation.compensation) {
        quantity(explanation.compensation->quantity);
        program_.bands_[index] = BandSlots{expression(*explanation.compensation->low),
                                           expression(*explanation.compensation->high)};
    }
    compile_sentence(explanation.states);
    compile_sentence(explanation.early_states);
    if (explanation.early_when && selection_.keep_nodes) {
        expression(*explanation.early_when);
    }
}

void Compiler::compile_sentence(std::string_view sentence) {
    if (!selection_.keep_nodes) {
        return;
    }
    const rule::RuleNames names(rules_);
    for (const rule::SentencePlace& place : rule::find_places(sentence).places) {
        const std::optional<rule::NamedSymbol> meant = names.find(place.name);
        if (meant && meant->type != rule::Type::code) {
            name(meant->symbol);
        }
    }
}

/// Without nodes only the columns of selected entries are outputs; the others are used again.
void Compiler::forget_unselected() {
    program_.nodes_.clear();
    program_.names_.clear();
    for (std::vector<Slot>& alternatives : program_.alternatives_) {
        alternatives.clear();
    }
    if (!selection_.everything) {
        keep_only(program_.quantities_, selection_.quantities);
        keep_only(program_.conditions_, selection_.conditions);
        keep_only(program_.findings_, selection_.findings);
    }
    std::vector<Slot*> outputs;
    for (auto* table : {&program_.quantities_,
                        &program_.conditions_,
                        &program_.findings_,
                        &program_.checks_,
                        &program_.criticals_,
                        &program_.explanations_,
                        &program_.intervals_}) {
        for (std::optional<Slot>& slot : *table) {
            if (slot) {
                outputs.push_back(&*slot);
            }
        }
    }
    for (std::optional<BandSlots>& band : program_.bands_) {
        if (band) {
            outputs.push_back(&band->low);
            outputs.push_back(&band->high);
        }
    }
    program_.slots_ = reuse_columns(program_.operations_, outputs);
}

Slot Compiler::quantity(std::uint32_t index) {
    if (const std::optional<Slot> known = program_.quantities_[index]) {
        return *known;
    }
    const rule::Quantity& entry = rules_.quantities[index];
    const Slot slot = entry.model ? model_result(entry) : first_present(index);
    if (const auto name_index = rules_.find_interval_name(entry.interval)) {
        interval(*name_index);
    }
    program_.quantities_[index] = slot;
    return slot;
}

Slot Compiler::first_present(std::uint32_t index) {
    std::vector<Slot>& slots = program_.alternatives_[index];
    for (const rule::Alternative& alternative : rules_.quantities[index].alternatives) {
        slots.push_back(expression(*alternative.formula));
    }
    if (slots.size() == 1) {
        return slots.front();
    }
    return emitter_.emit(
        {.code = OpCode::first_number, .result = {SlotKind::number}, .operands = slots});
}

/// The model's result in the unit of the quantity.
Slot Compiler::model_result(const rule::Quantity& quantity) {
    const std::uint32_t model = quantity.model->model;
    const rule::ModelSignature& signature = model_signatures()[model];
    ISOHYDRIC_ASSERT(rules_.models.at(model).id == signature.id);
    Operation operation{.code = OpCode::model, .result = {SlotKind::number}, .argument = model};
    for (const rule::ExpressionPtr& input : quantity.model->inputs) {
        operation.operands.push_back(expression(*input));
    }
    const Slot result = emitter_.emit(std::move(operation));
    const auto unit = units::parse_unit(signature.result.unit);
    ISOHYDRIC_ASSERT(unit.has_value());
    const double factor = units::factor_between(*unit, quantity.unit);
    if (factor == 1.0) {
        return result;
    }
    return emitter_.emit({.code = OpCode::multiply,
                          .result = {SlotKind::number},
                          .operands = {emitter_.number(factor), result}});
}

Slot Compiler::condition(std::uint32_t index) {
    if (!program_.conditions_[index]) {
        program_.conditions_[index] = expression(*rules_.conditions[index].when);
    }
    return *program_.conditions_[index];
}

/// Its own condition, and none of those that take precedence.
Slot Compiler::finding(std::uint32_t index) {
    if (const std::optional<Slot> known = program_.findings_[index]) {
        return *known;
    }
    const rule::Finding& entry = rules_.findings[index];
    Slot slot = expression(*entry.when);
    if (!entry.unless.empty()) {
        Slot any = emitter_.truth(false);
        for (const std::uint32_t exception : entry.unless) {
            any = either(any, finding(exception));
        }
        slot = both(slot, negation(any));
    }
    program_.findings_[index] = slot;
    return slot;
}

Slot Compiler::interval(std::uint32_t name_index) {
    if (!program_.intervals_[name_index]) {
        program_.intervals_[name_index] = emitter_.emit(
            {.code = OpCode::select_interval, .result = {SlotKind::index}, .argument = name_index});
    }
    return *program_.intervals_[name_index];
}

Slot Compiler::name(const rule::Symbol& symbol) {
    const Slot slot = name_value(symbol);
    program_.names_.emplace(symbol, slot);
    return slot;
}

Slot Compiler::name_value(const rule::Symbol& symbol) {
    switch (symbol.kind) {
    case rule::SymbolKind::analyte:
        return emitter_.emit(
            {.code = OpCode::load_analyte, .result = {SlotKind::number}, .argument = symbol.index});
    case rule::SymbolKind::rounding:
        return emitter_.emit({.code = OpCode::load_rounding,
                              .result = {SlotKind::number},
                              .argument = symbol.index});
    case rule::SymbolKind::quantity:
        return quantity(symbol.index);
    case rule::SymbolKind::condition:
        return condition(symbol.index);
    case rule::SymbolKind::finding:
        return finding(symbol.index);
    case rule::SymbolKind::limit:
        return emitter_.emit({.code = OpCode::load_limit,
                              .result = {SlotKind::number},
                              .operands = {interval(symbol.index)},
                              .part = static_cast<std::uint32_t>(symbol.limit_part)});
    case rule::SymbolKind::context:
        return context_item(static_cast<panel::ContextItem>(symbol.index));
    }
    ISOHYDRIC_NEVER();
}

Slot Compiler::context_item(panel::ContextItem item) {
    if (item == panel::ContextItem::near) {
        return emitter_.emit({.code = OpCode::load_near, .result = {SlotKind::truth}});
    }
    return emitter_.emit({.code = OpCode::load_context,
                          .result = {SlotKind::number},
                          .argument = static_cast<std::uint32_t>(item)});
}

}  // namespace isohydric::engine
