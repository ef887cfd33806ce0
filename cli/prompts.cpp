#include "cli/prompts.hpp"

#include "isohydric/panel/reading.hpp"

#include <algorithm>
#include <array>
#include <cstdio>
#include <iostream>
#include <utility>
#include <vector>

#include "cli/surroundings.hpp"
#include <fmt/format.h>

namespace isohydric::cli {

namespace {

using panel::Analyte;

/// The order in which analysers and laboratories print them.
constexpr std::array k_asked{Analyte::ph,
                             Analyte::pco2,
                             Analyte::hco3,
                             Analyte::po2,
                             Analyte::na,
                             Analyte::k,
                             Analyte::cl,
                             Analyte::tco2,
                             Analyte::albumin,
                             Analyte::lactate,
                             Analyte::bhb,
                             Analyte::glucose,
                             Analyte::phosphate,
                             Analyte::ica,
                             Analyte::mg};

constexpr const char* k_introduction =
    "Type each value as it is printed, with its unit: 3.9 kPa, 2.1 g/dL, 138.\n"
    "Enter alone leaves a value out. A single point, or Ctrl-D, ends the questions.\n\n";

/// "pCO2, 8 to 150 mmHg (mmHg or kPa): ".
std::string question(const panel::AnalyteInfo& info) {
    std::vector<std::string> units;
    for (const panel::CustomaryUnit& unit : info.customary) {
        if (unit.variant.empty() && !unit.spoken().empty()) {
            units.push_back(unit.spoken());
        }
    }
    std::string choice;
    for (std::size_t i = 0; i < units.size() && units.size() > 1; ++i) {
        choice += i == 0 ? "" : i + 1 == units.size() ? " or " : ", ";
        choice += units[i];
    }
    const std::string name =
        info.label == info.id() ? info.label : fmt::format("{} ({})", info.label, info.id());
    return fmt::format("{}, usually {:g} to {:g}{}{}: ",
                       name,
                       info.plausible.low,
                       info.plausible.high,
                       info.unit_text.empty() ? "" : " " + info.unit_text,
                       choice.empty() ? "" : "; " + choice);
}

template <std::size_t n>
std::string choices(const std::array<std::string_view, n>& names, std::string_view left_out) {
    std::string text;
    for (const std::string_view name : names) {
        if (name != left_out) {
            text += text.empty() ? "" : ", ";
            text += name;
        }
    }
    return text;
}

/// The questions and the answers so far; every answer is read together with those before it.
class Dialogue {
  public:
    Dialogue(const panel::Catalogue& catalogue,
             const panel::SiteUnits* units,
             const std::map<std::string, std::string>& context)
        : catalogue_(catalogue), units_(units) {
        for (const auto& [name, text] : context) {
            if (!text.empty()) {
                answers_.push_back({name, text, true});
            }
        }
    }

    void ask_context(const std::string& name, const std::string& text) {
        const bool known = std::any_of(answers_.begin(), answers_.end(), [&](const Answer& answer) {
            return answer.name == name;
        });
        if (!known) {
            ask(text, {name, {}, true});
        }
    }

    void ask_value(Analyte analyte) {
        ask(question(catalogue_[analyte]), {std::string(panel::id_of(analyte)), {}, false});
    }

    [[nodiscard]] bool ended() const { return ended_; }

    [[nodiscard]] bool has(std::string_view value) const {
        return std::any_of(answers_.begin(), answers_.end(), [&](const Answer& answer) {
            return !answer.is_context && (value.empty() || answer.name == value);
        });
    }

    /// The panel of all answers; what is wrong with them goes to the report.
    [[nodiscard]] std::optional<panel::Panel> read(diag::Report& report) const {
        panel::PanelReader reader(catalogue_, units_, report);
        for (const Answer& answer : answers_) {
            const diag::Place place{diag::make_source(answer.name, answer.text),
                                    {0, answer.text.size()}};
            if (answer.is_context) {
                reader.set_context(answer.name, answer.text, place);
            } else {
                reader.add(answer.name, answer.text, place);
            }
        }
        return reader.finish();
    }

  private:
    struct Answer {
        std::string name, text;
        bool is_context = false;
    };

    /// Asks until the answer can be read, is empty, or ends the questions.
    void ask(const std::string& text, Answer answer) {
        while (!ended_) {
            std::fputs(text.c_str(), stderr);
            if (!std::getline(std::cin, answer.text)) {
                std::fputs("\n", stderr);
                ended_ = true;
                return;
            }
            if (answer.text == ".") {
                ended_ = true;
                return;
            }
            if (answer.text.find_first_not_of(" \t\r") == std::string::npos) {
                return;
            }
            answers_.push_back(answer);
            diag::Report report;
            if (read(report)) {
                return;
            }
            print_diagnostics(report);
            answers_.pop_back();
        }
    }

    const panel::Catalogue& catalogue_;
    const panel::SiteUnits* units_;
    std::vector<Answer> answers_;
    bool ended_ = false;
};

}  // namespace

std::optional<panel::Panel> ask_for_panel(const panel::Catalogue& catalogue,
                                          const panel::SiteUnits* units,
                                          const std::map<std::string, std::string>& context) {
    Dialogue dialogue(catalogue, units, context);
    diag::Report report;
    if (!dialogue.read(report)) {  // what the command line says of the context
        print_diagnostics(report);
        return std::nullopt;
    }
    std::fputs(k_introduction, stderr);
    dialogue.ask_context("specimen",
                         fmt::format("Specimen of the gas: {} [arterial]: ",
                                     choices(panel::k_specimen_names, "not-stated")));
    for (const Analyte analyte : k_asked) {
        dialogue.ask_value(analyte);
    }
    if (!dialogue.ended() && dialogue.has("pCO2")) {
        dialogue.ask_context("onset",
                             fmt::format("Onset of a respiratory disorder: {} [unknown]: ",
                                         choices(panel::k_onset_names, "unknown")));
    }
    if (!dialogue.has({})) {
        std::fputs("No value was given, so there is nothing to interpret.\n", stderr);
        return std::nullopt;
    }
    return dialogue.read(report);
}

}  // namespace isohydric::cli
