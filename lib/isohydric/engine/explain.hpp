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

// All of these need a program that was compiled with keep_nodes.

/// The comparisons that decide `expression` in `row`, then one line for each quantity in them: its formula with values.
/// Of parts joined by `and` or `or` those are given that make it what it is; every comparison is written as it is true.
[[nodiscard]] std::vector<Reason> explain(const Program& program,
                                          const Scratch& scratch,
                                          std::size_t row,
                                          const rule::Expression& expression);

/// The same for an entry by its name: a finding with the findings that take precedence, a condition, or a quantity with
/// what it was computed from.
[[nodiscard]] std::vector<Reason>
explain(const Program& program, const Scratch& scratch, std::size_t row, const rule::Symbol& name);

/// Analytes that are missing in `row` and on which an unknown `expression` hangs, in catalogue order. Of a quantity's
/// alternatives it is those of the one that lacks fewest. Empty where nothing is unknown, or where no analyte would help.
[[nodiscard]] std::vector<panel::Analyte> needs(const Program& program,
                                                const Scratch& scratch,
                                                std::size_t row,
                                                const rule::Expression& expression);

/// The same for an entry by its name; for a finding with the findings that take precedence.
[[nodiscard]] std::vector<panel::Analyte>
needs(const Program& program, const Scratch& scratch, std::size_t row, const rule::Symbol& name);

/// Fills the {name} places of a template with values, units and as many digits as make a printed comparison look true:
/// two values of one unit in a sentence, or a value and the limits of its interval, look different if they are.
/// `{name}` prints value and unit, `{name:bare}` the number only; a missing value is "unknown".
[[nodiscard]] std::string
fill(const Program& program, const Scratch& scratch, std::size_t row, std::string_view text);

/// A number as a report prints it: `decimals` digits, more (up to 8) where a comparison with `against` would look false.
[[nodiscard]] std::string printed(double value, int decimals, std::optional<double> against = {});

/// A UCUM code as people write it: `mm[Hg]` is "mmHg"; empty for `1`.
[[nodiscard]] std::string unit_text(std::string_view ucum);

}  // namespace isohydric::engine
