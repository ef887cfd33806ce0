// A small table of names and the two ways to read an expression that these tests use: as a JSON string in a file, and
// with or without the checker.
#pragma once

#include "isohydric/diag/json.hpp"
#include "isohydric/panel/analyte.hpp"
#include "isohydric/rule/checker.hpp"
#include "isohydric/rule/number_form.hpp"
#include "isohydric/rule/plain_text.hpp"

#include <doctest/doctest.h>

#include <map>
#include <optional>
#include <string>
#include <string_view>
#include <vector>

namespace isohydric::rule::testing {

/// Analytes, one quantity, one condition, two findings, limits of pH, and the context.
class SmallTable : public NameTable {
  public:
    SmallTable() {
        number("pH", SymbolKind::analyte, "1");
        number("pCO2", SymbolKind::analyte, "mm[Hg]");
        number("pO2", SymbolKind::analyte, "mm[Hg]");
        number("Na", SymbolKind::analyte, "mmol/L");
        number("Cl", SymbolKind::analyte, "mmol/L");
        number("HCO3", SymbolKind::analyte, "mmol/L");
        number("albumin", SymbolKind::analyte, "g/L");
        number("sO2", SymbolKind::analyte, "%");
        number("temperature", SymbolKind::analyte, "Cel");
        number("area", SymbolKind::quantity, "m2");
        number("anionGap", SymbolKind::quantity, "mmol/L");
        number("pCO2kPa", SymbolKind::quantity, "kPa");
        number("rounding.Na", SymbolKind::rounding, "mmol/L");
        number("limits.pH.low", SymbolKind::limit, "1");
        number("limits.pH.high", SymbolKind::limit, "1");
        truth("lowGas", SymbolKind::condition);
        truth("`raised-gap`", SymbolKind::finding);
        truth("`gas.low`", SymbolKind::finding);
        names_.at("limits.pH.high").symbol.limit_part = LimitPart::high;
    }

    [[nodiscard]] std::optional<NamedSymbol>
    find(std::span<const std::string> path) const override {
        if (path.size() == 2 && path[0] == "context") {
            return find_context_item(path[1]);
        }
        const auto found = names_.find(written_name(path));
        return found == names_.end() ? std::nullopt : std::optional(found->second);
    }

    [[nodiscard]] std::vector<std::string> candidates() const override {
        std::vector<std::string> all{"context.specimen", "context.onset", "context.age"};
        for (const auto& [name, symbol] : names_) {
            all.push_back(name);
        }
        return all;
    }

  private:
    void number(const std::string& name, SymbolKind kind, std::string_view unit) {
        NamedSymbol named;
        named.symbol = {kind, static_cast<std::uint32_t>(names_.size()), {}};
        named.type = Type::number;
        named.unit = units::parse_unit(unit).value();
        names_.emplace(name, named);
    }

    void truth(const std::string& name, SymbolKind kind) {
        NamedSymbol named;
        named.symbol = {kind, static_cast<std::uint32_t>(names_.size()), {}};
        named.type = Type::truth;
        names_.emplace(name, named);
    }

    std::map<std::string, NamedSymbol> names_;
};

/// An expression as a JSON string that begins at the first column of a file.
class Text {
  public:
    explicit Text(const std::string& expression) {
        constexpr std::string_view k_special = "\"\\\t\n\r";
        constexpr std::string_view k_escapes = "\"\\tnr";
        std::string quoted = "\"";
        for (const char c : expression) {
            const std::size_t special = k_special.find(c);
            quoted += special == std::string_view::npos ? std::string{c}
                                                        : std::string{'\\', k_escapes[special]};
        }
        json_ = diag::read_json(diag::make_source("test.json", quoted + "\""), report);
        REQUIRE(json_.has_value());
    }

    [[nodiscard]] std::optional<Syntax> parse() { return parse_expression(*json_, report); }

    [[nodiscard]] ExpressionPtr read(const Wanted& wanted) {
        return read_expression(*json_, SmallTable(), wanted, report);
    }

    diag::Report report;

  private:
    std::optional<diag::Json> json_;
};

inline Wanted truth() {
    return {Type::truth, std::nullopt};
}

inline Wanted number(std::optional<std::string_view> unit = std::nullopt) {
    return {Type::number, unit ? std::optional(units::parse_unit(*unit).value()) : std::nullopt};
}

/// Every diagnostic as `line:column-column id`, columns counted in the file, the end column behind the last byte.
inline std::string ids(const diag::Report& report) {
    std::string text;
    for (const diag::Diagnostic& diagnostic : report.diagnostics()) {
        const diag::Place& place = diagnostic.place;
        REQUIRE(place.source != nullptr);
        const diag::Position begin = place.source->position(place.span.begin);
        const diag::Position end = place.source->position(place.span.end);
        text += (text.empty() ? "" : "; ") + std::to_string(begin.line) + ":" +
                std::to_string(begin.column) + "-" + std::to_string(end.column) + " " +
                diagnostic.id;
    }
    return text;
}

/// The number form of a correct expression, or its diagnostics.
inline std::string form(const std::string& expression, const Wanted& wanted) {
    Text text(expression);
    const ExpressionPtr read = text.read(wanted);
    return read ? number_form(*read) : ids(text.report);
}

/// The diagnostics of a wrong expression; empty if it is right.
inline std::string faults(const std::string& expression, const Wanted& wanted) {
    Text text(expression);
    const ExpressionPtr read = text.read(wanted);
    CHECK((read == nullptr) == text.report.has_errors());
    return ids(text.report);
}

/// The first message about a wrong expression.
inline std::string message(const std::string& expression, const Wanted& wanted) {
    Text text(expression);
    CHECK(text.read(wanted) == nullptr);
    REQUIRE(text.report.has_errors());
    return text.report.diagnostics().front().message;
}

}  // namespace isohydric::rule::testing
