#include "isohydric/interpret/interpreter.hpp"

#include "isohydric/interpret/detail/assemble.hpp"

#include <algorithm>
#include <utility>

namespace isohydric::interpret {

namespace {

std::vector<std::uint32_t> contradicted_analytes(const Evaluation& evaluation) {
    std::vector<std::uint32_t> analytes;
    const rule::RuleSet& rules = evaluation.rules();
    for (std::uint32_t i = 0; i < rules.checks.size(); ++i) {
        const rule::Check& check = rules.checks[i];
        if (check.stops && evaluation.truth(evaluation.program().check(i)) == Truth::yes) {
            analytes.insert(analytes.end(), check.contradicts.begin(), check.contradicts.end());
        }
    }
    return analytes;
}

}  // namespace

Interpreter::Interpreter(std::shared_ptr<const engine::Program> program)
    : program_(std::move(program)), block_(2), scratch_(*program_, 2) {}

Interpretation Interpreter::interpret(const panel::Panel& panel) {
    block_.clear();
    block_.push(panel);
    block_.push(panel, true);
    engine::evaluate(*program_, block_, scratch_);

    const Evaluation evaluation(*program_, scratch_, panel);
    const Contradicted contradicted(program_->rules(), contradicted_analytes(evaluation));
    Interpretation result;
    result.program = program_;
    result.panel = panel;
    result.checks = check_results(evaluation);
    result.interpretable =
        std::none_of(result.checks.begin(), result.checks.end(), [](const CheckResult& check) {
            return check.outcome == Outcome::stop;
        });
    result.critical = critical_values(evaluation);
    result.entered = analyte_results(evaluation);
    result.quantities = quantity_results(evaluation, contradicted);
    result.findings = finding_results(evaluation, contradicted);
    if (result.interpretable) {
        result.explanations = explanation_results(evaluation);
    }
    result.disorders = disorder_results(result, evaluation);
    result.sentences = sentences(result, evaluation);
    result.would_help = would_help(result, evaluation);
    result.unchecked = unchecked_ids(result, evaluation);
    return result;
}

}  // namespace isohydric::interpret
