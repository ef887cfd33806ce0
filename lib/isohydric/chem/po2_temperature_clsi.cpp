#include "isohydric/chem/po2_temperature_clsi.hpp"

#include "isohydric/chem/detail/increasing_root.hpp"

#include <numbers>

namespace isohydric::chem::po2_temperature_clsi {
namespace {

/// log10 of pO2 in mmHg that holds every root over the domain. Defined.
constexpr Domain k_log10_po2_bracket{-2.0, 5.0};

/// By how much log10 of the pO2 that follows from one at 37 degC exceeds a given one, as a function
/// of log10 of that at 37 degC. It increases where the warming is less than 17 degC.
template <num::Number T>
auto excess_over(const T& po2_mmHg, const T& temperature_degC) {
    return [log10_po2 = num::log10(po2_mmHg),
            warming_degC = T(temperature_degC - k_body_temperature_degC)](const T& log10_po2_37) {
        const T powered = num::pow10(k_power * log10_po2_37);
        const T denominator = k_denominator * powered + k_denominator_constant;
        const T coefficient = (k_numerator * powered + k_numerator_constant) / denominator;
        constexpr double k_determinant =
            k_numerator * k_denominator_constant - k_numerator_constant * k_denominator;
        const T coefficient_slope =
            k_power * std::numbers::ln10 * k_determinant * powered / (denominator * denominator);
        return detail::ValueAndSlope<T>{.value =
                                            log10_po2_37 + coefficient * warming_degC - log10_po2,
                                        .slope = 1.0 + coefficient_slope * warming_degC};
    };
}

}  // namespace

double po2_at_37_mmHg(double po2_mmHg, double temperature_degC) {
    return num::pow10(
        detail::increasing_root(excess_over(po2_mmHg, temperature_degC), k_log10_po2_bracket));
}

num::Interval po2_at_37_mmHg(const num::Interval& po2_mmHg, const num::Interval& temperature_degC) {
    return num::pow10(detail::increasing_root_enclosure(excess_over(po2_mmHg, temperature_degC),
                                                        k_log10_po2_bracket));
}

}  // namespace isohydric::chem::po2_temperature_clsi
