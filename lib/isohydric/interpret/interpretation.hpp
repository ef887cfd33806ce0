// The result of interpreting one panel: plain data in the order in which a report gives it.
#pragma once

#include "isohydric/engine/explain.hpp"
#include "isohydric/engine/program.hpp"
#include "isohydric/panel/panel.hpp"

#include <cstdint>
#include <memory>
#include <optional>
#include <string>
#include <vector>

namespace isohydric::interpret {

using engine::Truth;

enum class Outcome : std::uint8_t { pass, warn, stop, not_applicable };

struct CheckResult {
    std::string id;
    Outcome outcome{};
    std::string detail;  ///< the sentence, if it warns or stops
    std::vector<rule::Citation> sources;
};

struct CriticalValue {
    std::string id;
    std::string statement;
    double value{};
    std::string unit;
    int decimals{};
    std::vector<rule::Citation> sources;
};

/// An entered value with the interval of its context.
struct AnalyteResult {
    panel::Analyte analyte{};
    std::optional<double> low, high;
    std::string interval_note;
};

struct QuantityResult {
    std::string name;
    std::string label;
    std::optional<double> value;
    std::string unit;
    int decimals{};
    std::optional<double> low, high;
    std::string
        interval_note;  ///< "arterial interval used", "shipped limit, not your laboratory's"
    std::string from;   ///< which alternative, or the formula
    std::vector<rule::Citation> sources;
};

struct FindingResult {
    std::string id;
    std::string label;
    std::string approach;
    Truth state{};
    std::vector<std::string> asserts;
    std::string statement;
    std::vector<engine::Reason> because;
    std::vector<std::string> needs;
    std::vector<std::string> consider;
    std::optional<double> repeatability;
    std::vector<rule::Citation> sources;
    bool shipped_limit =
        false;  ///< rests on a limit that belongs to an analyser method and was not replaced
};

/// What an approach says of a disorder; `silent` where it cannot speak of it.
enum class Verdict : std::uint8_t { no, yes, unknown, silent };

struct DisorderResult {
    std::string id;
    std::string label;
    Verdict bicarbonate = Verdict::silent;
    Verdict base_excess = Verdict::silent;
    Verdict strong_ion = Verdict::silent;
    std::optional<double> repeatability;
};

enum class Fit : std::uint8_t { fits, early, near };
enum class BandState : std::uint8_t { within, above, below };

struct CompensationResult {
    std::string quantity;
    BandState state{};
    double measured{}, expected_low{}, expected_high{};
    std::string unit;
    int decimals{};
    std::string from;
};

struct ExplanationResult {
    std::string id;                      ///< of the entry, first of those merged
    std::vector<std::string> disorders;  ///< main disorders, then kinds
    std::vector<rule::Onset> onsets;     ///< onset variants of one set are one explanation
    Fit fit{};
    std::optional<double> miss;  ///< near: distance outside its band
    std::string miss_unit;
    std::optional<CompensationResult> compensation;
    std::string statement;
    std::vector<engine::Reason> because;
    std::vector<rule::Citation> sources;
    bool unchecked = false;
    std::optional<double> repeatability;
};

struct Interpretation {
    std::shared_ptr<const engine::Program> program;  ///< with the rule set that was in force
    panel::Panel panel;
    std::vector<AnalyteResult> entered;
    std::vector<CheckResult> checks;
    bool interpretable = true;
    std::vector<CriticalValue> critical;
    std::vector<QuantityResult> quantities;
    std::vector<FindingResult> findings;
    std::vector<DisorderResult> disorders;
    std::vector<ExplanationResult> explanations;
    std::vector<std::string> sentences;
    std::vector<std::string> would_help;
    std::vector<std::string> unchecked;
};

}  // namespace isohydric::interpret
