// The shipped list of analytes, and one panel read from names and texts.
#pragma once

#include "isohydric/diag/render.hpp"
#include "isohydric/panel/reading.hpp"

#include <doctest/doctest.h>

#include <fstream>
#include <iterator>
#include <memory>
#include <optional>
#include <string>
#include <utility>
#include <vector>

#include <fmt/format.h>

namespace isohydric::panel::testing {

inline std::string shipped_text() {
    std::ifstream file(ISOHYDRIC_SOURCE_DIR "/rules/analytes.json");
    REQUIRE(file.good());
    return {std::istreambuf_iterator<char>(file), {}};
}

inline const Catalogue& shipped() {
    static const std::shared_ptr<const Catalogue> catalogue = [] {
        diag::Report report;
        auto read = read_catalogue(diag::make_source("analytes.json", shipped_text()), report);
        INFO(diag::render(report));
        REQUIRE(read != nullptr);
        return read;
    }();
    return *catalogue;
}

using Texts = std::vector<std::pair<std::string, std::string>>;
using Words = std::vector<std::string>;

/// What became of a panel. `report` has a place for each value: its own small source.
struct Outcome {
    std::optional<Panel> panel;
    diag::Report report;

    [[nodiscard]] std::string messages() const { return diag::render(report); }

    [[nodiscard]] bool has(std::string_view id) const {
        for (const diag::Diagnostic& diagnostic : report.diagnostics()) {
            if (diagnostic.id == id) {
                return true;
            }
        }
        return false;
    }

    [[nodiscard]] bool says(std::string_view words) const {
        return messages().find(words) != std::string::npos;
    }
};

inline Outcome read(const Texts& values,
                    const Texts& context = {},
                    const SiteUnits* site = nullptr,
                    units::DecimalMark mark = units::DecimalMark::point_or_comma) {
    Outcome outcome;
    PanelReader reader(shipped(), site, outcome.report, mark);
    const auto place = [](const std::string& name, const std::string& text) {
        return diag::Place{diag::make_source("values", name + "=" + text),
                           {0, name.size() + 1 + text.size()}};
    };
    for (const auto& [name, text] : values) {
        reader.add(name, text, place(name, text));
    }
    for (const auto& [item, text] : context) {
        reader.set_context(item, text, place(item, text));
    }
    outcome.panel = reader.finish();
    return outcome;
}

/// The one value of a panel that must be readable.
inline Entered read_one(const std::string& name, const std::string& text) {
    const Outcome outcome = read({{name, text}});
    INFO(name, "=", text, "\n", outcome.messages());
    REQUIRE(outcome.panel.has_value());
    return outcome.panel->values[index_of(shipped().find(name)->analyte)].value();
}

/// Whether `value` is the printed decimal, within half a unit of its last digit.
inline bool prints_as(double value, double printed, int decimals) {
    double half = 0.5;
    for (int i = 0; i < decimals; ++i) {
        half /= 10;
    }
    return value >= printed - half && value <= printed + half;
}

}  // namespace isohydric::panel::testing
