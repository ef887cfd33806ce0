// pO2 of the same blood at another temperature as NCCLS C12-A and CLSI C46 give it: Severinghaus's
// 1979 equation divided by a rounded ln 10.
#pragma once

#include "isohydric/chem/conditions.hpp"
#include "isohydric/num/interval.hpp"
#include "isohydric/num/number.hpp"

namespace isohydric::chem::po2_temperature_clsi {

/// Coefficients of the rational function (pO2 in mmHg), in the order of its print: log10 of pO2 per
/// degC. Measured. Unchecked: from memory; within 0.3 % of [@severinghaus1979, abstract] over ln
/// 10. Source: [@nccls1994, temperature] [@clsi2009, temperature].
inline constexpr double k_numerator = 5.49e-11;
inline constexpr double k_numerator_constant = 0.071;
inline constexpr double k_denominator = 9.72e-9;
inline constexpr double k_denominator_constant = 2.30;
inline constexpr double k_power = 3.88;

/// Change of log10 pO2 per degC. Domain: usual::k_po2_mmHg.
/// Source: [@nccls1994, temperature] [@clsi2009, temperature].
template <num::Number T>
[[nodiscard]] T log10_po2_per_degC(const T& po2_mmHg) {
    const T powered = num::pow(po2_mmHg, T(k_power));
    return (k_numerator * powered + k_numerator_constant) /
           (k_denominator * powered + k_denominator_constant);
}

/// pO2 at `temperature_degC`, mmHg. Domain: usual::k_po2_mmHg, usual::k_temperature_degC.
/// Source: [@nccls1994, temperature] [@clsi2009, temperature].
template <num::Number T>
[[nodiscard]] T po2_at_mmHg(const T& po2_37_mmHg, const T& temperature_degC) {
    return po2_37_mmHg * num::pow10(log10_po2_per_degC(po2_37_mmHg) *
                                    (temperature_degC - k_body_temperature_degC));
}

/// pO2 at 37 degC, mmHg: the inverse of po2_at_mmHg, found by iteration; one value for up to 17
/// degC of warming. Domain: usual::k_po2_mmHg, usual::k_temperature_degC. Largest relative error
/// 1e-14. Source: [@nccls1994, temperature] [@clsi2009, temperature].
[[nodiscard]] double po2_at_37_mmHg(double po2_mmHg, double temperature_degC);

/// The same for every member of the arguments.
[[nodiscard]] num::Interval po2_at_37_mmHg(const num::Interval& po2_mmHg,
                                           const num::Interval& temperature_degC);

}  // namespace isohydric::chem::po2_temperature_clsi
