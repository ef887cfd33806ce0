// Says why an expression has the value it has: the comparison with the values put in, down to what was measured.
#pragma once

#include "isohydric/engine/program.hpp"

#include <string>
#include <vector>

namespace isohydric::engine {

/// One line of a reason: "anion gap corrected 27.4 > 12.0 (upper limit)", with the sources of the entries it used.
struct Reason {
    std::string text;
    int depth = 0;  ///< 0: the finding's own condition; deeper: what a quantity was computed from
    std::vector<rule::Citation> sources;
};

/// The comparisons that decide `expression` in `row`, then one line for each quantity in them: its formula with values.
[[nodiscard]] std::vector<Reason> explain(const Program& program,
                                          const Scratch& scratch,
                                          std::size_t row,
                                          const rule::Expression& expression);

/// Analytes that are missing in `row` and on which an unknown `expression` hangs, in catalogue order.
[[nodiscard]] std::vector<panel::Analyte> needs(const Program& program,
                                                const Scratch& scratch,
                                                std::size_t row,
                                                const rule::Expression& expression);

/// Fills the {name} places of a template with values, units and as many digits as make a printed comparison look true.
/// `{name}` prints value and unit, `{name:bare}` the number only.
[[nodiscard]] std::string
fill(const Program& program, const Scratch& scratch, std::size_t row, std::string_view text);

/// A number as a report prints it: `decimals` digits, more where a comparison with `against` would look false.
[[nodiscard]] std::string printed(double value, int decimals, std::optional<double> against = {});

}  // namespace isohydric::engine
