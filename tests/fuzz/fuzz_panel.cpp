// Fuzz target: any bytes as a panel, a JSON document where they begin with a brace, else lines of `name=value` and
// `--item=value`. It must give errors whose places lie within the text, or a panel that can be interpreted and reported.
#include "isohydric/diag/assert.hpp"
#include "isohydric/diag/render.hpp"
#include "isohydric/engine/models.hpp"
#include "isohydric/interpret/interpreter.hpp"
#include "isohydric/io/files.hpp"
#include "isohydric/io/json_panel.hpp"
#include "isohydric/report/caution.hpp"
#include "isohydric/report/json_report.hpp"
#include "isohydric/report/text_report.hpp"

#include <cstddef>
#include <cstdint>
#include <memory>
#include <string>
#include <string_view>

namespace {

using namespace isohydric;

std::shared_ptr<const engine::Program> shipped_program() {
    diag::Report report;
    const auto rules = rule::read_rule_set("sets/default.json",
                                           io::rule_tree(ISOHYDRIC_SOURCE_DIR "/rules"),
                                           engine::model_signatures(),
                                           report);
    ISOHYDRIC_ASSERT(rules != nullptr);
    return std::make_shared<const engine::Program>(rules);
}

void read_lines(const std::shared_ptr<const diag::Source>& source, panel::PanelReader& reader) {
    for (std::size_t number = 1; number <= source->line_count(); ++number) {
        const std::string_view line = source->line(number);
        const std::size_t equals = line.find('=');
        if (equals == std::string_view::npos) {
            continue;
        }
        const std::size_t begin = source->line_begin(number);
        const diag::Place place{source, {begin + equals + 1, begin + line.size()}};
        if (line.starts_with("--")) {
            reader.set_context(line.substr(2, equals - 2), line.substr(equals + 1), place);
        } else {
            reader.add(line.substr(0, equals), line.substr(equals + 1), place);
        }
    }
}

void check_places(const diag::Report& report, std::size_t size) {
    for (const diag::Diagnostic& diagnostic : report.diagnostics()) {
        ISOHYDRIC_ASSERT(diagnostic.place.span.end <= size);
        ISOHYDRIC_ASSERT(!diag::render(diagnostic).empty());
    }
}

void check_reports(const interpret::Interpretation& result) {
    ISOHYDRIC_ASSERT(!report::text_report(result).empty());
    ISOHYDRIC_ASSERT(!report::text_report(result, {.full = true}).empty());
    diag::Report complaints;
    const auto document =
        diag::read_json(diag::make_source("report", report::json_report(result)), complaints);
    ISOHYDRIC_ASSERT(document && !complaints.has_errors());
    const auto& members = document->members();
    ISOHYDRIC_ASSERT(members.front().value.text() == report::caution());
    ISOHYDRIC_ASSERT(members.back().value.text() == report::caution());
}

}  // namespace

extern "C" int LLVMFuzzerTestOneInput(const std::uint8_t* data, std::size_t size);

extern "C" int LLVMFuzzerTestOneInput(const std::uint8_t* data, std::size_t size) {
    static const std::shared_ptr<const engine::Program> program = shipped_program();
    static interpret::Interpreter interpreter(program);
    const auto source = diag::make_source("fuzz", std::string(data, data + size));
    diag::Report report;
    panel::PanelReader reader(*program->rules().catalogue, nullptr, report);
    if (source->text().starts_with('{')) {
        if (const auto document = diag::read_json(source, report)) {
            io::read_json_panel(*document, reader, report);
        }
    } else {
        read_lines(source, reader);
    }
    const std::optional<panel::Panel> panel = reader.finish();
    ISOHYDRIC_ASSERT(panel || report.has_errors());
    check_places(report, size);
    if (panel && !report.has_errors()) {
        check_reports(interpreter.interpret(*panel));
    }
    return 0;
}
