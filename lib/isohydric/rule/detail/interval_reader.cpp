// Reads intervals: limits, and the context in which they hold.
#include "isohydric/rule/detail/entry_reader.hpp"
#include "isohydric/rule/detail/units_of.hpp"

#include <fmt/format.h>

namespace isohydric::rule::detail {
namespace {

template <class Code, std::size_t Count>
std::vector<Code> read_codes(diag::ObjectReader& reader,
                             const char* name,
                             const std::array<std::string_view, Count>& words,
                             diag::Report& report) {
    std::vector<Code> codes;
    for (const Written& word : read_list(reader, name, report)) {
        if (const auto code = read_word(word, words, name, report)) {
            codes.push_back(static_cast<Code>(*code));
        }
    }
    return codes;
}

/// `{"from": "28 d", "below": "18 a"}`, both ends converted to `unit`.
Range read_range(const diag::Json& json, const char* unit, diag::Report& report) {
    const auto wanted = units::parse_unit(unit);
    ISOHYDRIC_ASSERT(wanted.has_value());
    diag::ObjectReader reader(json, report, "range");
    Range range;
    if (const diag::Json* from = reader.optional("from", diag::Kind::string)) {
        range.from = read_quantity_text(*from, *wanted, report);
    }
    if (const diag::Json* below = reader.optional("below", diag::Kind::string)) {
        range.below = read_quantity_text(*below, *wanted, report);
    }
    reader.finish();
    if (range.from && range.below && *range.from >= *range.below) {
        report.error("rule-interval-order",
                     json.place(),
                     "nothing lies in this range: \"from\" is not less than \"below\"");
    }
    return range;
}

void read_where(const diag::Json& json, Interval& interval, const EntryContext& context) {
    diag::ObjectReader reader(json, context.report, "context of an interval");
    interval.specimens =
        read_codes<panel::Specimen>(reader, "specimen", panel::k_specimen_names, context.report);
    interval.populations = read_codes<panel::Population>(
        reader, "population", panel::k_population_names, context.report);
    if (const diag::Json* age = reader.optional("age", diag::Kind::object)) {
        interval.age_a = read_range(*age, "a", context.report);
        interval.needs_age = true;
    }
    if (const diag::Json* altitude = reader.optional("altitude", diag::Kind::object)) {
        interval.altitude_m = read_range(*altitude, "m", context.report);
    }
    reader.finish();
}

void check_limits(const Interval& interval, const EntryContext& context) {
    if (!interval.low && !interval.mid && !interval.high) {
        context.report.error("rule-interval-empty",
                             interval.head.place,
                             fmt::format("\"{}\" has no limit; give \"low\", \"mid\" or \"high\"",
                                         interval.head.id));
    }
    const auto falls = [](std::optional<double> a, std::optional<double> b) {
        return a && b && *a > *b;
    };
    const bool no_width = interval.low && interval.high && *interval.low >= *interval.high;
    if (falls(interval.low, interval.mid) || falls(interval.mid, interval.high) || no_width) {
        context.report.error("rule-interval-order",
                             interval.head.place,
                             fmt::format("the limits of \"{}\" are out of order; low, mid and high "
                                         "must rise",
                                         interval.head.id));
    }
}

}  // namespace

Interval read_interval(const diag::Json& json, const EntryContext& context) {
    diag::ObjectReader reader(json, context.report, "interval");
    Interval interval;
    interval.head = read_head(reader, context);
    reader.required_text("unit");
    if (const auto of = reader.required_text("of")) {
        interval.name = context.rules.find_interval_name(*of).value_or(0);
    }
    interval.low = reader.optional_number("low");
    interval.mid = reader.optional_number("mid");
    interval.high = reader.optional_number("high");
    if (const diag::Json* where = reader.optional("for", diag::Kind::object)) {
        read_where(*where, interval, context);
    }
    interval.shipped_default = reader.optional_bool("shippedLimit").value_or(false);
    interval.shown_as = reader.optional_text("shownAs").value_or("");
    reader.finish();
    check_limits(interval, context);
    return interval;
}

}  // namespace isohydric::rule::detail
