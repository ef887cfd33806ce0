#include "isohydric/interpret/case_runner.hpp"

#include "isohydric/panel/block.hpp"
#include "isohydric/panel/reading.hpp"
#include "isohydric/units/quantity_text.hpp"

#include <cmath>
#include <optional>
#include <string>

#include <fmt/format.h>

namespace isohydric::interpret {

namespace {

using rule::EntryKind;

std::optional<engine::Slot> truth_slot(const engine::Program& program,
                                       const rule::EntryRef& entry) {
    switch (entry.kind) {
    case EntryKind::condition:
        return program.condition(entry.index);
    case EntryKind::finding:
        return program.finding(entry.index);
    case EntryKind::check:
        return program.check(entry.index);
    case EntryKind::critical:
        return program.critical(entry.index);
    case EntryKind::explanation:
        return program.explanation(entry.index);
    case EntryKind::quantity:
    case EntryKind::interval:
    case EntryKind::table:
    case EntryKind::group:
    case EntryKind::disorder:
    case EntryKind::convention:
        break;
    }
    return std::nullopt;
}

std::string_view word(engine::Truth truth) {
    return truth == engine::Truth::yes ? "yes" : truth == engine::Truth::no ? "no" : "unknown";
}

/// What the entry gave, if it is not what was expected; a sentence for the message.
std::optional<std::string> number_missed(const std::string& expected,
                                         const std::optional<double>& found) {
    if (expected == "unknown") {
        return found ? std::optional(fmt::format("{:g}", *found)) : std::nullopt;
    }
    const auto number = units::parse_number(expected);
    if (!number) {
        return fmt::format("\"{}\", which is no number", expected);
    }
    if (!found) {
        return std::string("unknown");
    }
    const double tolerance = 0.5 * std::pow(10.0, -number->decimals) * (1 + 1e-9);
    return std::fabs(*found - number->value) <= tolerance
               ? std::nullopt
               : std::optional(fmt::format("{:.6g}", *found));
}

class CaseRunner {
  public:
    CaseRunner(const engine::Program& program, diag::Report& report)
        : program_(program), report_(report), block_(1), scratch_(program, 1) {}

    void run(const rule::Case& wanted, CaseCounts& counts) {
        panel::PanelReader reader(*program_.rules().catalogue, nullptr, report_);
        for (const auto& [name, text] : wanted.panel) {
            reader.add(name, text, wanted.place);
        }
        for (const auto& [item, text] : wanted.context) {
            reader.set_context(item, text, wanted.place);
        }
        ++counts.cases;
        counts.expectations += wanted.expect.size();
        const std::optional<panel::Panel> panel = reader.finish();
        if (!panel) {
            counts.failed += wanted.expect.size();
            return;
        }
        block_.clear();
        block_.push(*panel);
        engine::evaluate(program_, block_, scratch_);
        for (const rule::Case::Expectation& expectation : wanted.expect) {
            if (const std::optional<std::string> found = missed(expectation)) {
                ++counts.failed;
                report_.error("case-failed",
                              expectation.place,
                              fmt::format("case {}: {} is {}, expected {}",
                                          wanted.id,
                                          expectation.entry,
                                          *found,
                                          expectation.value));
            }
        }
    }

  private:
    [[nodiscard]] std::optional<std::string>
    missed(const rule::Case::Expectation& expectation) const {
        const std::optional<rule::EntryRef> entry = program_.rules().find(expectation.entry);
        if (!entry) {
            return std::string("not in this rule set");
        }
        if (entry->kind == EntryKind::quantity) {
            const std::optional<engine::Slot> slot = program_.quantity(entry->index);
            return number_missed(expectation.value, slot ? scratch_.value(*slot, 0) : std::nullopt);
        }
        const std::optional<engine::Slot> slot = truth_slot(program_, *entry);
        const std::string_view found =
            slot ? word(scratch_.truth(*slot, 0)) : "nothing that can be expected";
        return found == expectation.value ? std::nullopt : std::optional(std::string(found));
    }

    const engine::Program& program_;
    diag::Report& report_;
    panel::PanelBlock block_;
    engine::Scratch scratch_;
};

}  // namespace

CaseCounts run_cases(const std::shared_ptr<const engine::Program>& program, diag::Report& report) {
    CaseCounts counts;
    CaseRunner runner(*program, report);
    for (const rule::Case& wanted : program->rules().cases) {
        runner.run(wanted, counts);
    }
    return counts;
}

}  // namespace isohydric::interpret
