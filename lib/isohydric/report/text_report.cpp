#include "isohydric/report/text_report.hpp"

#include "isohydric/engine/explain.hpp"
#include "isohydric/interpret/words.hpp"
#include "isohydric/report/caution.hpp"
#include "isohydric/report/detail/text_layout.hpp"

#include <algorithm>

#include <fmt/format.h>

namespace isohydric::report {

namespace {

using namespace isohydric::
    interpret;  // NOLINT(google-build-using-namespace): the results that this file prints

/// Writes one interpretation, section by section.
class TextWriter {
  public:
    TextWriter(const Interpretation& of, const TextOptions& options)
        : of_(of), full_(options.full), out_(options.width) {}

    std::string write() {
        out_.item("", caution());
        context();
        critical();
        panel();
        trust();
        reading();
        reasons();
        if (full_) {
            everything();
        }
        closing();
        out_.blank();
        out_.item("", caution());
        return out_.take();
    }

  private:
    void context();
    void critical();
    void panel();
    void trust();
    void reading();
    void reasons();
    void reason_block(std::string_view title,
                      const std::vector<engine::Reason>& because,
                      const std::vector<rule::Citation>& sources);
    void everything();
    void closing();

    [[nodiscard]] const rule::RuleSet& rules() const { return of_.program->rules(); }

    [[nodiscard]] std::string cited(const std::vector<rule::Citation>& sources) const;

    const Interpretation& of_;
    bool full_;
    TextLayout out_;
    std::size_t reason_number_ = 0;
};

std::string
range_text(const std::optional<double>& low, const std::optional<double>& high, int decimals) {
    if (low && high) {
        return engine::printed(*low, decimals) + " to " + engine::printed(*high, decimals);
    }
    if (low) {
        return "from " + engine::printed(*low, decimals);
    }
    return high ? "up to " + engine::printed(*high, decimals) : std::string();
}

/// A value with as many digits as make "low" or "high" look true beside its limit.
std::string value_text(double value,
                       int decimals,
                       const std::optional<double>& low,
                       const std::optional<double>& high) {
    if (low && value < *low) {
        return engine::printed(value, decimals, low);
    }
    return high && value > *high ? engine::printed(value, decimals, high)
                                 : engine::printed(value, decimals);
}

std::string_view
side(double value, const std::optional<double>& low, const std::optional<double>& high) {
    if (low && value < *low) {
        return "low";
    }
    return high && value > *high ? "high" : "";
}

std::string TextWriter::cited(const std::vector<rule::Citation>& sources) const {
    std::string text;
    for (const rule::Citation& source : sources) {
        text += text.empty() ? "" : "; ";
        if (source.ref == "common-practice") {
            text += "common practice";
        } else {
            text += full_ ? std::string(rules().citation(source.ref)) : source.ref;
            text += source.at.empty() ? "" : ", " + source.at;
        }
        text += source.checked ? "" : " (unchecked)";
    }
    return text;
}

void TextWriter::context() {
    const panel::Context& given = of_.panel.context;
    std::string text =
        fmt::format("{} {}, {}",
                    panel::k_specimen_names[static_cast<std::size_t>(given.specimen)],
                    "specimen",
                    panel::k_population_names[static_cast<std::size_t>(given.population)]);
    if (given.altitude_m) {
        text += fmt::format(", altitude {} m", engine::printed(*given.altitude_m, 0));
    }
    text += given.onset == panel::StatedOnset::unknown
                ? ", onset not stated"
                : fmt::format(", onset {}",
                              panel::k_onset_names[static_cast<std::size_t>(given.onset)]);
    if (given.baseline_pco2_mmHg) {
        text +=
            fmt::format(", baseline pCO2 {} mmHg", engine::printed(*given.baseline_pco2_mmHg, 0));
    }
    if (!given.assumed.empty()) {
        std::string assumed;
        for (const std::string& item : given.assumed) {
            assumed += (assumed.empty() ? "" : ", ") + item;
        }
        out_.item("Assumed: ", assumed);
    }
    out_.item("Context: ", text);
    out_.item("Rules:   ",
              fmt::format("{} {}{}, sha256 {}",
                          rules().id,
                          rules().version,
                          rules().approved_role.empty() ? " (draft)"
                                                        : ", approved " + rules().approved_date,
                          full_ ? rules().sha256 : rules().sha256.substr(0, 12)));
}

void TextWriter::critical() {
    if (of_.critical.empty()) {
        return;
    }
    out_.heading("CRITICAL VALUES (a local list takes precedence)");
    for (const CriticalValue& value : of_.critical) {
        out_.item("  ! ", value.statement);
    }
}

void TextWriter::panel() {
    std::vector<std::vector<std::string>> rows;
    for (const AnalyteResult& result : of_.entered) {
        const panel::AnalyteInfo& info = (*rules().catalogue)[result.analyte];
        const panel::Entered& entered = *of_.panel[result.analyte];
        const bool censored = entered.censoring != panel::Censoring::none;
        rows.push_back(
            {std::string(panel::id_of(result.analyte)),
             censored ? entered.as_entered
                      : value_text(entered.value, info.decimals, result.low, result.high) +
                            (info.unit_text.empty() ? "" : " " + info.unit_text),
             std::string(censored ? "censored" : side(entered.value, result.low, result.high)),
             range_text(result.low, result.high, info.decimals),
             entered.as_entered + (entered.note.empty() ? "" : "; " + entered.note)});
    }
    out_.heading("Panel (value, against interval, as entered)");
    out_.table(rows, "  ");
    rows.clear();
    for (const QuantityResult& quantity : of_.quantities) {
        if (!quantity.value || quantity.from == "measured" || quantity.from == "as reported") {
            continue;
        }
        rows.push_back(
            {quantity.label,
             value_text(*quantity.value, quantity.decimals, quantity.low, quantity.high) +
                 (quantity.unit.empty() ? "" : " " + unit_words(quantity.unit)),
             std::string(side(*quantity.value, quantity.low, quantity.high)),
             range_text(quantity.low, quantity.high, quantity.decimals),
             quantity.from +
                 (quantity.interval_note.empty() ? "" : "; " + quantity.interval_note)});
    }
    if (!rows.empty()) {
        out_.heading("Calculated");
        out_.table(rows, "  ");
    }
}

void TextWriter::trust() {
    std::size_t passed = 0;
    std::size_t applied = 0;
    for (const CheckResult& check : of_.checks) {
        passed += check.outcome == Outcome::pass ? 1U : 0U;
        applied += check.outcome == Outcome::not_applicable ? 0U : 1U;
    }
    out_.heading(fmt::format(
        "Can the numbers be trusted: {} of {} checks that apply pass", passed, applied));
    for (const CheckResult& check : of_.checks) {
        if (check.outcome == Outcome::stop || check.outcome == Outcome::warn) {
            out_.item(check.outcome == Outcome::stop ? "  stop  " : "  warn  ", check.detail);
        }
    }
}

void TextWriter::reading() {
    out_.heading(of_.interpretable ? "Reading, then every other explanation that fits"
                                   : "Not interpretable");
    for (const std::string& sentence : of_.sentences) {
        out_.item("  ", sentence);
    }
}

void TextWriter::reason_block(std::string_view title,
                              const std::vector<engine::Reason>& because,
                              const std::vector<rule::Citation>& sources) {
    const std::string lead = fmt::format("  {:>2} ", ++reason_number_);
    out_.item(lead, title);
    for (const engine::Reason& reason : because) {
        if (full_ || reason.depth <= 1) {
            out_.item(std::string(lead.size() + 2 * static_cast<std::size_t>(reason.depth), ' '),
                      reason.text);
        }
    }
    out_.item(std::string(lead.size(), ' ') + "source: ", cited(sources));
}

void TextWriter::reasons() {
    out_.heading("Reasons");
    for (const ExplanationResult& explanation : of_.explanations) {
        reason_block(explanation.statement, explanation.because, explanation.sources);
        if (!full_) {
            break;
        }
    }
    for (const FindingResult& finding : of_.findings) {
        if (finding.state == Truth::yes && (full_ || !finding.asserts.empty())) {
            reason_block(finding.statement, finding.because, finding.sources);
        }
    }
}

std::string_view verdict_text(Verdict verdict) {
    return verdict == Verdict::yes       ? "yes"
           : verdict == Verdict::no      ? "no"
           : verdict == Verdict::unknown ? "unknown"
                                         : "-";
}

void TextWriter::everything() {
    out_.heading("Disorders by approach");
    std::vector<std::vector<std::string>> rows{{"", "bicarbonate", "base excess", "strong ion"}};
    for (const DisorderResult& disorder : of_.disorders) {
        rows.push_back({disorder.label,
                        std::string(verdict_text(disorder.bicarbonate)),
                        std::string(verdict_text(disorder.base_excess)),
                        std::string(verdict_text(disorder.strong_ion))});
    }
    out_.table(rows, "  ");
    out_.heading("Findings that are open, with what would decide them");
    for (const FindingResult& finding : of_.findings) {
        if (finding.state == Truth::unknown) {
            std::string needed;
            for (const std::string& analyte : finding.needs) {
                needed += (needed.empty() ? "" : ", ") + analyte;
            }
            out_.item("  ",
                      (finding.label.empty() ? finding.id : finding.label) +
                          (needed.empty() ? "" : ": needs " + needed));
        }
    }
    out_.heading("Checks");
    for (const CheckResult& check : of_.checks) {
        const std::string_view outcome = check.outcome == Outcome::pass   ? "pass"
                                         : check.outcome == Outcome::warn ? "warn"
                                         : check.outcome == Outcome::stop ? "stop"
                                                                          : "not applicable";
        out_.item("  ", fmt::format("{}: {}", check.id, outcome));
    }
}

void TextWriter::closing() {
    std::string wanted;
    for (const std::string& analyte : of_.would_help) {
        wanted += (wanted.empty() ? "" : ", ") + analyte;
    }
    if (!wanted.empty() || !of_.unchecked.empty()) {
        out_.blank();
    }
    if (!wanted.empty()) {
        out_.item("Would help: ", wanted);
    }
    if (!of_.unchecked.empty()) {
        std::string ids;
        for (const std::string& id : of_.unchecked) {
            ids += (ids.empty() ? "" : ", ") + id;
        }
        out_.item("",
                  fmt::format("{} of the values used {} not been checked against {} source{}",
                              of_.unchecked.size(),
                              of_.unchecked.size() == 1 ? "has" : "have",
                              of_.unchecked.size() == 1 ? "its" : "their",
                              full_ ? ": " + ids : "."));
    }
}

}  // namespace

std::string text_report(const Interpretation& interpretation, const TextOptions& options) {
    return TextWriter(interpretation, options).write();
}

}  // namespace isohydric::report
