// Reference intervals: which one holds for each row, and its limits.
#include "isohydric/engine/operations.hpp"

#include <algorithm>
#include <limits>

namespace isohydric::engine {

namespace {

constexpr std::int32_t k_no_interval = -1;

/// The context of the rows of a block, as far as intervals ask for it.
struct RowContexts {
    const std::uint8_t* specimens;
    const std::uint8_t* populations;
    const panel::NumberColumn& ages;
    const panel::NumberColumn& altitudes;

    explicit RowContexts(const panel::PanelBlock& block)
        : specimens(block.context_code(panel::ContextItem::specimen).data()),
          populations(block.context_code(panel::ContextItem::population).data()),
          ages(block.context_number(panel::ContextItem::age)),
          altitudes(block.context_number(panel::ContextItem::altitude)) {}
};

/// One bit for each code that is listed; all bits for an empty list.
template <typename Code>
[[nodiscard]] std::uint32_t code_set(const std::vector<Code>& codes) {
    std::uint32_t set = 0;
    for (const Code code : codes) {
        set |= std::uint32_t{1} << static_cast<unsigned>(code);
    }
    return codes.empty() ? ~std::uint32_t{0} : set;
}

/// A range with its open ends made infinite.
struct ClosedRange {
    double from;
    double below;

    explicit ClosedRange(const rule::Range& range)
        : from(range.from.value_or(-std::numeric_limits<double>::infinity())),
          below(range.below.value_or(std::numeric_limits<double>::infinity())) {}

    [[nodiscard]] bool holds(double value) const { return (value >= from) & (value < below); }
};

/// Writes `index` to the rows whose context `interval` is for. A missing age fits no age criterion; a missing altitude is
/// 0 m, which is the value under the mask.
void claim_rows(const rule::Interval& interval,
                std::int32_t index,
                const RowContexts& rows,
                std::int32_t* __restrict out,
                std::size_t row_count) {
    const std::uint32_t specimens = code_set(interval.specimens);
    const std::uint32_t populations = code_set(interval.populations);
    const ClosedRange age(interval.age_a);
    const ClosedRange altitude(interval.altitude_m);
    const bool any_age = !interval.age_a.from && !interval.age_a.below;
    for (std::size_t row = 0; row < row_count; ++row) {
        const bool codes_fit =
            ((specimens >> rows.specimens[row]) & (populations >> rows.populations[row]) & 1U) != 0;
        const bool age_fits =
            any_age || (rows.ages.missing[row] == 0 && age.holds(rows.ages.values[row]));
        const bool fits = codes_fit && age_fits && altitude.holds(rows.altitudes.values[row]);
        out[row] = fits ? index : out[row];
    }
}

[[nodiscard]] const std::optional<double>& limit_of(const rule::Interval& interval,
                                                    rule::LimitPart part) {
    if (part == rule::LimitPart::low) {
        return interval.low;
    }
    return part == rule::LimitPart::mid ? interval.mid : interval.high;
}

}  // namespace

void op::select_interval(const Operation& operation, const Columns& columns) {
    const RowContexts rows(columns.block());
    std::int32_t* out = columns.indices_out(operation.result);
    std::fill_n(out, columns.rows(), k_no_interval);
    const std::vector<rule::Interval>& intervals = columns.rules().intervals;
    // Last to first, so that the first that holds stays.
    for (std::size_t index = intervals.size(); index-- > 0;) {
        if (intervals[index].name == operation.argument) {
            claim_rows(
                intervals[index], static_cast<std::int32_t>(index), rows, out, columns.rows());
        }
    }
}

void op::load_limit(const Operation& operation, const Columns& columns) {
    const std::int32_t* chosen = columns.indices(operation.operands[0]);
    const NumbersOut out = columns.numbers_out(operation.result);
    const std::vector<rule::Interval>& intervals = columns.rules().intervals;
    const auto part = static_cast<rule::LimitPart>(operation.part);
    const std::size_t rows = columns.rows();
    for (std::size_t row = 0; row < rows; ++row) {
        std::optional<double> limit;
        if (chosen[row] != k_no_interval) {
            limit = limit_of(intervals[static_cast<std::size_t>(chosen[row])], part);
        }
        out.values[row] = limit.value_or(0.0);
        out.missing[row] = limit ? 0 : 1;
    }
}

}  // namespace isohydric::engine
