// Sentences with their values, and numbers as reports print them.
#include "isohydric/engine/explain.hpp"
#include "isohydric/engine/row_view.hpp"
#include "isohydric/num/rounding.hpp"
#include "isohydric/rule/rule_names.hpp"
#include "isohydric/rule/sentence.hpp"

#include <algorithm>

namespace isohydric::engine {

namespace {

/// A place of a sentence with what goes into it.
struct Filling {
    rule::SentencePlace place;
    rule::Symbol symbol;
    std::optional<double> value;
    std::string unit;
};

[[nodiscard]] std::vector<Filling> find_fillings(const RowView& view, std::string_view text) {
    const rule::RuleNames names(view.rules());
    std::vector<Filling> fillings;
    for (const rule::SentencePlace& place : rule::find_places(text).places) {
        const std::optional<rule::NamedSymbol> meant = names.find(place.name);
        if (!meant || meant->type == rule::Type::code) {
            continue;
        }
        const bool is_number = meant->type == rule::Type::number;
        fillings.push_back({place,
                            meant->symbol,
                            is_number ? view.number(meant->symbol) : std::nullopt,
                            view.unit(meant->symbol)});
    }
    return fillings;
}

/// The numbers that a reader may compare with this one: others of its unit in the sentence, and its own limits.
[[nodiscard]] std::vector<double>
rivals(const RowView& view, const Filling& filling, const std::vector<Filling>& all) {
    std::vector<double> numbers;
    for (const Filling& other : all) {
        if (other.value && other.unit == filling.unit && other.symbol != filling.symbol) {
            numbers.push_back(*other.value);
        }
    }
    if (filling.symbol.kind != rule::SymbolKind::quantity) {
        return numbers;
    }
    const std::string& name = view.rules().quantities[filling.symbol.index].interval;
    const auto name_index = view.rules().find_interval_name(name);
    const rule::Interval* interval = name_index ? view.interval(*name_index) : nullptr;
    for (const auto limit : {&rule::Interval::low, &rule::Interval::high}) {
        if (interval != nullptr && interval->*limit) {
            numbers.push_back(*(interval->*limit));
        }
    }
    return numbers;
}

[[nodiscard]] std::string
number_text(const RowView& view, const Filling& filling, const std::vector<Filling>& all) {
    const int least = view.digits(filling.symbol, *filling.value);
    int digits = least;
    for (const double rival : rivals(view, filling, all)) {
        digits = std::max(digits, digits_apart(*filling.value, least, rival));
    }
    return num::format_decimals(*filling.value, digits);
}

[[nodiscard]] std::string
filling_text(const RowView& view, const Filling& filling, const std::vector<Filling>& all) {
    if (RowView::is_truth(filling.symbol)) {
        return std::string(truth_text(view.truth(filling.symbol)));
    }
    if (!filling.value) {
        return "unknown";
    }
    const bool with_unit = !filling.place.bare && !filling.unit.empty();
    return number_text(view, filling, all) + (with_unit ? " " + filling.unit : "");
}

}  // namespace

std::string
fill(const Program& program, const Scratch& scratch, std::size_t row, std::string_view text) {
    const RowView view(program, scratch, row);
    const std::vector<Filling> fillings = find_fillings(view, text);
    std::string filled;
    std::size_t done = 0;
    for (const Filling& filling : fillings) {
        filled += text.substr(done, filling.place.begin - done);
        filled += filling_text(view, filling, fillings);
        done = filling.place.end;
    }
    filled += text.substr(done);
    return filled;
}

std::string printed(double value, int decimals, std::optional<double> against) {
    return num::format_decimals(value,
                                against ? digits_apart(value, decimals, *against) : decimals);
}

}  // namespace isohydric::engine
