// Fuzz target: any bytes as an expression. It must give an expression or errors whose places lie within the text, and a
// correct expression must survive both printers.
#include "isohydric/diag/assert.hpp"
#include "isohydric/diag/render.hpp"
#include "isohydric/rule/checker.hpp"
#include "isohydric/rule/number_form.hpp"
#include "isohydric/rule/plain_text.hpp"

#include <cstddef>
#include <cstdint>
#include <iterator>
#include <string>
#include <string_view>

namespace {

using namespace isohydric;

/// Every name of one part is a number, whose unit hangs on its first letter; of two parts, the context or a truth.
class AnyName : public rule::NameTable {
  public:
    [[nodiscard]] std::optional<rule::NamedSymbol>
    find(std::span<const std::string> path) const override {
        if (path.size() == 2) {
            return path[0] == "context" ? rule::find_context_item(path[1]) : truth();
        }
        constexpr std::string_view k_units[] = {"1", "mm[Hg]", "kPa", "mmol/L", "Cel", "%", "m2"};
        const std::size_t letter = path[0].empty() ? 0 : static_cast<unsigned char>(path[0][0]);
        rule::NamedSymbol named;
        named.symbol = {rule::SymbolKind::quantity, static_cast<std::uint32_t>(letter), {}};
        named.type = rule::Type::number;
        named.unit = units::parse_unit(k_units[letter % std::size(k_units)]).value();
        return named;
    }

    [[nodiscard]] std::vector<std::string> candidates() const override { return {"a", "b.c"}; }

  private:
    static rule::NamedSymbol truth() {
        rule::NamedSymbol named;
        named.symbol = {rule::SymbolKind::condition, 0, {}};
        named.type = rule::Type::truth;
        return named;
    }
};

void read(const rule::Syntax& syntax, const rule::Wanted& wanted, std::size_t size) {
    diag::Report report;
    const rule::ExpressionPtr expression = rule::check(syntax, AnyName(), wanted, report);
    ISOHYDRIC_ASSERT((expression == nullptr) == report.has_errors());
    for (const diag::Diagnostic& diagnostic : report.diagnostics()) {
        ISOHYDRIC_ASSERT(diagnostic.place.span.end <= size);
    }
    if (expression) {
        ISOHYDRIC_ASSERT(!rule::number_form(*expression).empty());
        ISOHYDRIC_ASSERT(!rule::plain_text(*expression).empty());
    }
}

}  // namespace

extern "C" int LLVMFuzzerTestOneInput(const std::uint8_t* data, std::size_t size);

extern "C" int LLVMFuzzerTestOneInput(const std::uint8_t* data, std::size_t size) {
    const std::string text(data, data + size);
    const auto source = diag::make_source("fuzz", text);
    diag::Report report;
    const std::optional<rule::Syntax> syntax =
        rule::parse_expression(text, rule::locator_in(source), report);
    ISOHYDRIC_ASSERT(syntax.has_value() == !report.has_errors());
    for (const diag::Diagnostic& diagnostic : report.diagnostics()) {
        ISOHYDRIC_ASSERT(diagnostic.place.span.end <= size);
        ISOHYDRIC_ASSERT(!diag::render(diagnostic).empty());
    }
    if (syntax) {
        read(*syntax, {rule::Type::truth, std::nullopt}, size);
        read(*syntax, {rule::Type::number, std::nullopt}, size);
        read(*syntax, {rule::Type::number, units::parse_unit("mm[Hg]").value()}, size);
    }
    return 0;
}
