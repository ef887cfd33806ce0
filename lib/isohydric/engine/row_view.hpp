// One row of an evaluation, with the words and digits in which a report gives its names.
#pragma once

#include "isohydric/engine/program.hpp"

#include <optional>
#include <string>

namespace isohydric::engine {

/// Reads values, truths, labels and digits. The program must have been compiled with keep_nodes.
class RowView {
  public:
    RowView(const Program& program, const Scratch& scratch, std::size_t row)
        : program_(program), scratch_(scratch), row_(row) {}

    [[nodiscard]] const rule::RuleSet& rules() const { return program_.rules(); }

    [[nodiscard]] Truth truth(const rule::Expression& expression) const;
    [[nodiscard]] std::optional<double> number(const rule::Expression& expression) const;

    /// The value of a number's name; none if it is missing or was not compiled.
    [[nodiscard]] std::optional<double> number(const rule::Symbol& symbol) const;
    /// The truth of a condition, a finding or `context.near`.
    [[nodiscard]] Truth truth(const rule::Symbol& symbol) const;

    /// Whether the name is that of a truth.
    [[nodiscard]] static bool is_truth(const rule::Symbol& symbol);

    /// The interval of that name that holds for the row, or null.
    [[nodiscard]] const rule::Interval* interval(std::uint32_t name) const;

    /// Which alternative of a quantity counts; none if it is missing or comes from a model.
    [[nodiscard]] const rule::Alternative* alternative(std::uint32_t quantity) const;

    /// "anion gap corrected", "upper limit of pH", "age".
    [[nodiscard]] std::string label(const rule::Symbol& symbol) const;
    /// The unit as people write it; empty for a bare number.
    [[nodiscard]] std::string unit(const rule::Symbol& symbol) const;
    /// Digits that show a value of that name: an analyte's decimals, and one more for a value that was given with more; a
    /// quantity's decimals; all digits of a limit or a number of the context.
    [[nodiscard]] int digits(const rule::Symbol& symbol, double value) const;
    /// Printed decimals of an analyte or quantity; none for other names, which are printed exactly.
    [[nodiscard]] std::optional<int> decimals(const rule::Symbol& symbol) const;
    /// The most decimals of the analytes and quantities in an expression; none if there are none.
    [[nodiscard]] std::optional<int> decimals(const rule::Expression& expression) const;

  private:
    const Program& program_;
    const Scratch& scratch_;
    std::size_t row_;
};

/// "yes", "no" or "unknown".
[[nodiscard]] std::string_view truth_text(Truth truth);

/// The fewest digits, from `least` to `most`, that give the number as it is at `most`.
[[nodiscard]] int digits_needed(double value, int least, int most);

/// At least `decimals` digits, and as many up to 8 as the number has: limits and literals are printed as they are.
[[nodiscard]] std::string exactly(double value, int decimals);

/// How many digits, from `decimals` up, it takes to tell `value` from `against`, or to print them alike if they count as
/// equal.
[[nodiscard]] int digits_apart(double value, int decimals, double against);

}  // namespace isohydric::engine
