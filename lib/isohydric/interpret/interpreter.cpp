#include "isohydric/interpret/interpreter.hpp"

#include "isohydric/interpret/detail/assemble.hpp"

#include <cstdint>
#include <utility>
#include <vector>

namespace isohydric::interpret {

namespace {

/// What the stop checks that hold say of the panel.
struct Stopped {
    std::vector<std::uint32_t> analytes;  ///< in contradiction
    bool everything = false;              ///< a check that names no analyte doubts the whole panel
};

Stopped stopped_by(const Evaluation& evaluation) {
    Stopped stopped;
    const rule::RuleSet& rules = evaluation.rules();
    for (std::uint32_t i = 0; i < rules.checks.size(); ++i) {
        const rule::Check& check = rules.checks[i];
        if (check.stops && evaluation.truth(evaluation.program().check(i)) == Truth::yes) {
            stopped.everything = stopped.everything || check.contradicts.empty();
            stopped.analytes.insert(
                stopped.analytes.end(), check.contradicts.begin(), check.contradicts.end());
        }
    }
    return stopped;
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
    const Stopped stopped = stopped_by(evaluation);
    const Contradicted contradicted(program_->rules(), stopped.analytes);
    Interpretation result;
    result.program = program_;
    result.panel = panel;
    result.checks = check_results(evaluation);
    result.interpretable = !stopped.everything && !contradicted.any_explanation();
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
