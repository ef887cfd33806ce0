#include "isohydric/report/text_report.hpp"

#include "isohydric/engine/explain.hpp"
#include "isohydric/report/caution.hpp"
#include "isohydric/report/detail/text_layout.hpp"
#include "isohydric/report/detail/value_tables.hpp"

#include <algorithm>
#include <set>

#include <fmt/format.h>

namespace isohydric::report {

namespace {

using namespace isohydric::
    interpret;  // NOLINT(google-build-using-namespace): the results that this file prints

constexpr std::size_t k_short_hash = 12;

/// Writes one interpretation, section by section.
class TextWriter {
  public:
    TextWriter(const Interpretation& of, const TextOptions& options)
        : of_(of), full_(options.full), out_(options.width) {}

    std::string write() {
        context();
        rule_set();
        critical();
        write_panel(of_, full_, out_);
        write_calculated(of_, full_, out_);
        trust();
        reading();
        reasons();
        if (full_) {
            everything();
        }
        closing();
        return out_.take();
    }

  private:
    void context();
    void rule_set();
    void critical();
    void trust();
    void reading();
    void reasons();
    void reason_block(std::string_view title,
                      const std::vector<engine::Reason>& because,
                      const std::vector<rule::Citation>& sources);
    void everything();
    void closing();

    [[nodiscard]] bool supports_reading(const FindingResult& finding) const;
    [[nodiscard]] std::vector<std::string> labels(const std::vector<std::string>& analytes) const;

    [[nodiscard]] const rule::RuleSet& rules() const { return of_.program->rules(); }

    [[nodiscard]] std::string cited(const std::vector<rule::Citation>& sources) const;

    const Interpretation& of_;
    bool full_;
    TextLayout out_;
    std::size_t reason_number_ = 0;
    std::set<std::string> told_;  ///< lines of reasons that a first screen need not repeat
};

std::string TextWriter::cited(const std::vector<rule::Citation>& sources) const {
    std::string text;
    for (const rule::Citation& source : sources) {
        text += text.empty() ? "" : "; ";
        if (source.ref == "common-practice") {
            text += "common practice";
        } else {
            text += full_ ? std::string(rules().citation(source.ref)) : source.ref;
            text += full_ && !source.at.empty() ? ", " + source.at : "";
        }
        text += source.checked ? "" : " (unchecked)";
    }
    return text;
}

std::string age_text(double age_a) {
    constexpr double k_days_a = 365.25;
    constexpr double k_short_a = 2.0 / 12;
    return age_a < k_short_a ? fmt::format("{} days old", engine::printed(age_a * k_days_a, 0))
                             : fmt::format("{:.3g} years old", age_a);
}

/// Specimen, population and the rest in one line; what was assumed says so beside it.
void TextWriter::context() {
    const panel::Context& given = of_.panel.context;
    const bool gas = of_.panel[panel::Analyte::ph] || of_.panel[panel::Analyte::pco2];
    std::vector<std::string> parts;
    const auto add = [&](std::string text, std::string_view item) {
        const std::string prefix = std::string(item) + ": ";
        const bool assumed =
            !item.empty() &&
            std::any_of(given.assumed.begin(), given.assumed.end(), [&](const std::string& entry) {
                return entry.starts_with(prefix);
            });
        parts.push_back(std::move(text) + (assumed ? " (assumed)" : ""));
    };
    add(given.specimen == panel::Specimen::not_stated
            ? "not stated"
            : std::string(panel::k_specimen_names[static_cast<std::size_t>(given.specimen)]),
        "specimen");
    add(std::string(panel::k_population_names[static_cast<std::size_t>(given.population)]),
        "population");
    if (given.age_a) {
        add(age_text(*given.age_a), "age");
    }
    if (given.altitude_m) {
        add(fmt::format("altitude {} m", engine::printed(*given.altitude_m, 0)), "altitude");
    }
    if (given.onset != panel::StatedOnset::unknown) {
        add(fmt::format("onset {}", panel::k_onset_names[static_cast<std::size_t>(given.onset)]),
            {});
    } else if (gas) {
        add("onset not stated", {});
    }
    if (given.baseline_pco2_mmHg) {
        add(fmt::format("usual pCO2 {} mmHg", engine::printed(*given.baseline_pco2_mmHg, 0)), {});
    }
    if (given.baseline_hco3_mmol_L) {
        add(fmt::format("usual bicarbonate {} mmol/L",
                        engine::printed(*given.baseline_hco3_mmol_L, 1)),
            {});
    }
    out_.item("Specimen: ", listed(parts));
}

void TextWriter::rule_set() {
    out_.item("Rules: ",
              fmt::format("{} {}{}, sha256 {}",
                          rules().id,
                          rules().version,
                          rules().approved_role.empty() ? " (draft)"
                                                        : ", approved " + rules().approved_date,
                          full_ ? rules().sha256 : rules().sha256.substr(0, k_short_hash)));
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

/// What stops an interpretation is its first sentence, and not repeated here.
void TextWriter::trust() {
    std::size_t passed = 0;
    std::size_t applied = 0;
    for (const CheckResult& check : of_.checks) {
        passed += check.outcome == Outcome::pass ? 1U : 0U;
        applied += check.outcome == Outcome::not_applicable ? 0U : 1U;
    }
    out_.heading(fmt::format(
        "Can the numbers be trusted? {} of the {} checks that apply pass.", passed, applied));
    for (const CheckResult& check : of_.checks) {
        if (check.outcome == Outcome::warn) {
            out_.item("  doubt: ", check.detail);
        }
    }
}

void TextWriter::reading() {
    out_.heading("Interpretation");
    for (const std::string& sentence : of_.sentences) {
        out_.item("  ", sentence);
    }
}

/// Whether a line compares numbers, rather than to say what is given or missing.
bool compares(const engine::Reason& reason) {
    return reason.depth == 0 && reason.text.find_first_of("<>=") != std::string::npos;
}

/// One numbered reason; on the first screen only its comparisons, each once.
void TextWriter::reason_block(std::string_view title,
                              const std::vector<engine::Reason>& because,
                              const std::vector<rule::Citation>& sources) {
    const std::string lead = fmt::format("  {:>2} ", ++reason_number_);
    if (!full_ && because.empty()) {
        out_.item(lead, fmt::format("{} [{}]", title, cited(sources)));
        return;
    }
    out_.item(lead, title);
    for (const engine::Reason& reason : because) {
        if (full_ || (compares(reason) && told_.insert(reason.text).second)) {
            out_.item(std::string(lead.size() + 2 * static_cast<std::size_t>(reason.depth), ' '),
                      reason.text);
        }
    }
    out_.item(std::string(lead.size(), ' ') + "source: ", cited(sources));
}

/// In full every explanation and finding; else the reading, and the findings that name its kinds.
void TextWriter::reasons() {
    const auto wanted = [&](const FindingResult& finding) {
        return finding.state == Truth::yes && (full_ || supports_reading(finding));
    };
    if (of_.explanations.empty() &&
        std::none_of(of_.findings.begin(), of_.findings.end(), wanted)) {
        return;
    }
    out_.heading("Reasons");
    for (const ExplanationResult& explanation : of_.explanations) {
        if (full_ || &explanation == &of_.explanations.front()) {
            reason_block(explanation.statement, explanation.because, explanation.sources);
        }
    }
    for (const FindingResult& finding : of_.findings) {
        if (wanted(finding)) {
            // On the first screen its sentence, which has values and limit, is enough.
            reason_block(finding.statement,
                         full_ ? finding.because : std::vector<engine::Reason>{},
                         finding.sources);
            if (!finding.consider.empty()) {
                out_.item("     commonly considered: ", listed(finding.consider, "; "));
            }
        }
    }
}

/// Whether a finding asserts a disorder that the reading names.
bool TextWriter::supports_reading(const FindingResult& finding) const {
    if (of_.explanations.empty()) {
        return !finding.asserts.empty();
    }
    const std::vector<std::string>& named = of_.explanations.front().disorders;
    return std::any_of(
        finding.asserts.begin(), finding.asserts.end(), [&](const std::string& disorder) {
            return std::find(named.begin(), named.end(), disorder) != named.end();
        });
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
            const std::string needed = listed(labels(finding.needs));
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

/// Analytes by the names that people use.
std::vector<std::string> TextWriter::labels(const std::vector<std::string>& analytes) const {
    std::vector<std::string> words;
    for (const std::string& id : analytes) {
        const std::optional<panel::Analyte> analyte = panel::analyte_of(id);
        words.push_back(analyte ? (*rules().catalogue)[*analyte].label : id);
    }
    return words;
}

void TextWriter::closing() {
    out_.blank();
    if (!of_.would_help.empty()) {
        out_.item("Would help: ", listed(labels(of_.would_help)));
    }
    if (!of_.unchecked.empty()) {
        out_.item("",
                  fmt::format("{} not checked against {}: {}",
                              of_.unchecked.size() == 1 ? "A rule in use holds a value"
                                                        : "Rules in use hold values",
                              of_.unchecked.size() == 1 ? "its source" : "their sources",
                              listed(of_.unchecked)));
    }
    if (!full_) {
        out_.item("", "--full gives every formula, check and finding.");
    }
}

}  // namespace

std::string text_report(const Interpretation& interpretation, const TextOptions& options) {
    return with_caution(TextWriter(interpretation, options).write(), options.width);
}

}  // namespace isohydric::report
