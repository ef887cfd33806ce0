// Interval arithmetic for proofs: every result encloses all values that its operands allow, and also
// whatever the same formula gives in doubles for members of its operands. Bounds are widened to the
// neighbouring doubles instead of switching the rounding mode.
#pragma once

#include <cstdint>

namespace isohydric::num {

/// What a comparison of intervals says of every pair of members: none, all, or some.
enum class Certainty : std::uint8_t { no, yes, maybe };

/// All real numbers from `lower()` to `upper()`; an infinite bound means unbounded.
/// Never NaN, never empty. A function outside its whole domain gives the whole line.
class Interval {
  public:
    /// The one number; NaN gives the whole line.
    // NOLINTNEXTLINE(google-explicit-constructor): formulas mix intervals with plain constants.
    Interval(double value) : Interval(value, value) {}

    /// From `lower` to `upper`; NaN or bounds in the wrong order give the whole line.
    Interval(double lower, double upper);

    [[nodiscard]] double lower() const { return lower_; }

    [[nodiscard]] double upper() const { return upper_; }

    /// Whether the number is a member.
    [[nodiscard]] bool contains(double value) const { return lower_ <= value && value <= upper_; }

    [[nodiscard]] static Interval whole_line();

    friend Interval operator+(const Interval& a, const Interval& b);
    friend Interval operator-(const Interval& a, const Interval& b);
    friend Interval operator*(const Interval& a, const Interval& b);
    /// The whole line if `b` contains 0.
    friend Interval operator/(const Interval& a, const Interval& b);
    friend Interval operator-(const Interval& a);

  private:
    double lower_;
    double upper_;
};

[[nodiscard]] Interval abs(const Interval& x);
/// Of the members that are not negative.
[[nodiscard]] Interval sqrt(const Interval& x);
[[nodiscard]] Interval exp(const Interval& x);
[[nodiscard]] Interval pow10(const Interval& x);
/// Of the positive members.
[[nodiscard]] Interval log(const Interval& x);
/// Of the positive members.
[[nodiscard]] Interval log10(const Interval& x);
/// Of the members of `x` that are not negative.
[[nodiscard]] Interval pow(const Interval& x, const Interval& y);

/// Exactly from rounded bound to rounded bound, as the rounding never decreases.
[[nodiscard]] Interval round_to_8_decimals(const Interval& x);

/// Whether a < b, <=, = for the members; `yes` and `no` hold for every pair.
[[nodiscard]] Certainty is_less(const Interval& a, const Interval& b);
[[nodiscard]] Certainty is_at_most(const Interval& a, const Interval& b);
[[nodiscard]] Certainty is_equal(const Interval& a, const Interval& b);

}  // namespace isohydric::num
