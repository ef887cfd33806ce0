#include "isohydric/report/json_report.hpp"

#include "isohydric/interpret/words.hpp"
#include "isohydric/report/caution.hpp"
#include "isohydric/version.hpp"

#include <nlohmann/json.hpp>

namespace isohydric::report {

namespace {

using Json = nlohmann::ordered_json;
using namespace isohydric::
    interpret;  // NOLINT(google-build-using-namespace): the results that this file writes

template <class T>
Json or_null(const std::optional<T>& value) {
    return value ? Json(*value) : Json(nullptr);
}

Json text_or_null(const std::string& text) {
    return text.empty() ? Json(nullptr) : Json(text);
}

Json source(const Interpretation& of, const std::vector<rule::Citation>& citations) {
    Json list = Json::array();
    for (const rule::Citation& citation : citations) {
        Json item{{"ref", citation.ref},
                  {"at", text_or_null(citation.at)},
                  {"checked", citation.checked}};
        if (citation.ref != "common-practice") {
            item["citation"] = of.program->rules().citation(citation.ref);
        }
        if (!citation.note.empty()) {
            item["note"] = citation.note;
        }
        list.push_back(std::move(item));
    }
    return list;
}

std::string_view word(Outcome outcome) {
    switch (outcome) {
    case Outcome::pass:
        return "pass";
    case Outcome::warn:
        return "warn";
    case Outcome::stop:
        return "stop";
    case Outcome::not_applicable:
        return "not-applicable";
    }
    return {};
}

std::string_view word(Truth truth) {
    return truth == Truth::yes ? "yes" : truth == Truth::no ? "no" : "unknown";
}

std::string_view word(Verdict verdict) {
    switch (verdict) {
    case Verdict::yes:
        return "yes";
    case Verdict::no:
        return "no";
    case Verdict::unknown:
        return "unknown";
    case Verdict::silent:
        return "-";
    }
    return {};
}

std::string_view word(Fit fit) {
    return fit == Fit::fits ? "fits" : fit == Fit::early ? "early" : "near";
}

std::string_view word(BandState state) {
    return state == BandState::within ? "within" : state == BandState::above ? "above" : "below";
}

Json rules(const rule::RuleSet& set) {
    Json approved = nullptr;
    if (!set.approved_role.empty()) {
        approved = {{"role", set.approved_role}, {"date", set.approved_date}};
    }
    return {
        {"id", set.id}, {"version", set.version}, {"sha256", set.sha256}, {"approved", approved}};
}

Json panel_values(const Interpretation& of) {
    Json values = Json::object();
    for (std::size_t i = 0; i < panel::k_analyte_count; ++i) {
        const std::optional<panel::Entered>& entered = of.panel.values[i];
        if (!entered) {
            continue;
        }
        const panel::AnalyteInfo& info = of.program->rules().catalogue->analytes[i];
        Json value{{"value", entered->value},
                   {"unit", info.unit.code()},
                   {"as_entered", entered->as_entered}};
        if (entered->censoring != panel::Censoring::none) {
            value["censored"] = entered->censoring == panel::Censoring::below ? "below" : "above";
        }
        if (!entered->note.empty()) {
            value["note"] = entered->note;
        }
        values[std::string(panel::k_analyte_ids[i])] = std::move(value);
    }
    return values;
}

Json context(const panel::Context& given) {
    return {{"specimen", panel::k_specimen_names[static_cast<std::size_t>(given.specimen)]},
            {"population", panel::k_population_names[static_cast<std::size_t>(given.population)]},
            {"onset", panel::k_onset_names[static_cast<std::size_t>(given.onset)]},
            {"age_a", or_null(given.age_a)},
            {"altitude_m", or_null(given.altitude_m)},
            {"baseline_pCO2_mmHg", or_null(given.baseline_pco2_mmHg)},
            {"baseline_HCO3_mmol_L", or_null(given.baseline_hco3_mmol_L)},
            {"assumed", given.assumed}};
}

Json checks(const Interpretation& of) {
    Json list = Json::array();
    for (const CheckResult& check : of.checks) {
        list.push_back({{"id", check.id},
                        {"outcome", word(check.outcome)},
                        {"detail", text_or_null(check.detail)}});
    }
    return list;
}

Json critical(const Interpretation& of) {
    Json list = Json::array();
    for (const CriticalValue& value : of.critical) {
        list.push_back({{"id", value.id},
                        {"statement", value.statement},
                        {"value", value.value},
                        {"unit", value.unit},
                        {"source", source(of, value.sources)}});
    }
    return list;
}

Json quantities(const Interpretation& of) {
    Json values = Json::object();
    for (const QuantityResult& quantity : of.quantities) {
        Json value{{"value", or_null(quantity.value)},
                   {"unit", quantity.unit},
                   {"low", or_null(quantity.low)},
                   {"high", or_null(quantity.high)},
                   {"from", text_or_null(quantity.from)},
                   {"source", source(of, quantity.sources)}};
        if (!quantity.interval_note.empty()) {
            value["interval_note"] = quantity.interval_note;
        }
        values[quantity.name] = std::move(value);
    }
    return values;
}

Json because(const std::vector<engine::Reason>& reasons) {
    Json list = Json::array();
    for (const engine::Reason& reason : reasons) {
        list.push_back(reason.text);
    }
    return list;
}

Json findings(const Interpretation& of) {
    Json list = Json::array();
    for (const FindingResult& finding : of.findings) {
        list.push_back({{"id", finding.id},
                        {"approach", finding.approach},
                        {"state", word(finding.state)},
                        {"asserts", finding.asserts},
                        {"statement", text_or_null(finding.statement)},
                        {"because", because(finding.because)},
                        {"needs", finding.needs},
                        {"consider", finding.consider},
                        {"repeatability", or_null(finding.repeatability)},
                        {"source", source(of, finding.sources)}});
    }
    return list;
}

Json disorders(const Interpretation& of) {
    Json list = Json::array();
    for (const DisorderResult& disorder : of.disorders) {
        list.push_back({{"id", disorder.id},
                        {"bicarbonate", word(disorder.bicarbonate)},
                        {"base_excess", word(disorder.base_excess)},
                        {"strong_ion", word(disorder.strong_ion)},
                        {"repeatability", or_null(disorder.repeatability)}});
    }
    return list;
}

Json compensation(const std::optional<CompensationResult>& band) {
    if (!band) {
        return nullptr;
    }
    return {{"quantity", band->quantity},
            {"state", word(band->state)},
            {"measured", band->measured},
            {"expected_low", band->expected_low},
            {"expected_high", band->expected_high},
            {"unit", band->unit},
            {"from", band->from}};
}

Json explanations(const Interpretation& of) {
    Json list = Json::array();
    for (const ExplanationResult& explanation : of.explanations) {
        Json variants = Json::array();
        for (const rule::Onset onset : explanation.onsets) {
            variants.push_back(onset == rule::Onset::none ? Json(nullptr) : Json(onset_id(onset)));
        }
        list.push_back({{"id", explanation.id},
                        {"disorders", explanation.disorders},
                        {"onset", variants.front()},
                        {"onset_variants", variants},
                        {"fit", word(explanation.fit)},
                        {"miss", or_null(explanation.miss)},
                        {"compensation", compensation(explanation.compensation)},
                        {"statement", explanation.statement},
                        {"because", because(explanation.because)},
                        {"repeatability", or_null(explanation.repeatability)},
                        {"source", source(of, explanation.sources)}});
    }
    return list;
}

}  // namespace

std::string json_report(const Interpretation& interpretation, int indent) {
    const Json document{{"caution", caution()},
                        {"format", "isohydric.interpretation/1"},
                        {"engine", version()},
                        {"rules", rules(interpretation.program->rules())},
                        {"panel", panel_values(interpretation)},
                        {"context", context(interpretation.panel.context)},
                        {"checks", checks(interpretation)},
                        {"interpretable", interpretation.interpretable},
                        {"critical", critical(interpretation)},
                        {"quantities", quantities(interpretation)},
                        {"findings", findings(interpretation)},
                        {"disorders", disorders(interpretation)},
                        {"explanations", explanations(interpretation)},
                        {"interpretation", interpretation.sentences},
                        {"would_help", interpretation.would_help},
                        {"unchecked", interpretation.unchecked},
                        {"caution_end", caution()}};
    return document.dump(indent) + "\n";
}

}  // namespace isohydric::report
