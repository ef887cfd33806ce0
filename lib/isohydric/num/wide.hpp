// A number held as the sum of two doubles, about 77 significant bits, for the inside of exp and log.
// The first half keeps at most 26 significant bits, so a product of two first halves is exact in a
// double without a fused multiply-add. No branch and no table: loops over it vectorise.
#pragma once

#ifdef __FAST_MATH__
#error "isohydric needs IEEE arithmetic as written: build without -ffast-math"
#endif

#include <bit>
#include <cstdint>

namespace isohydric::num {

/// The unevaluated sum `hi + lo`; `hi` has at most 26 significant bits, `lo` is what it leaves.
struct Wide {
    double hi;
    double lo;

    /// The nearest double.
    [[nodiscard]] double rounded() const { return hi + lo; }
};

/// `x` cut to its first 26 significant bits, towards zero.
[[nodiscard, gnu::always_inline]] inline double first_26_bits(double x) {
    constexpr std::uint64_t k_kept = ~((std::uint64_t{1} << 27) - 1);
    return std::bit_cast<double>(std::bit_cast<std::uint64_t>(x) & k_kept);
}

/// `x` as a Wide, exactly; `x` finite.
[[nodiscard, gnu::always_inline]] inline Wide split(double x) {
    const double hi = first_26_bits(x);
    return {hi, x - hi};
}

/// The sum of `large` and a correction `small` that is below it in magnitude.
[[nodiscard, gnu::always_inline]] inline Wide join(double large, double small) {
    const double hi = first_26_bits(large + small);
    return {hi, (large - hi) + small};
}

/// The sum of two numbers of which the first is zero or not below the second in magnitude.
[[nodiscard, gnu::always_inline]] inline Wide add_smaller(Wide larger, Wide smaller) {
    const double sum = larger.hi + smaller.hi;
    const double lost = (larger.hi - sum) + smaller.hi;
    return join(sum, lost + (larger.lo + smaller.lo));
}

/// The product, to about 2^-76 of its size.
[[nodiscard, gnu::always_inline]] inline Wide operator*(Wide a, Wide b) {
    return join(a.hi * b.hi, a.hi * b.lo + (a.lo * b.hi + a.lo * b.lo));
}

}  // namespace isohydric::num
