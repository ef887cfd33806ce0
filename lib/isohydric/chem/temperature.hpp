// pH and pCO2 of the same blood, closed from air, at another temperature, and back to 37 degC.
#pragma once

#include "isohydric/chem/conditions.hpp"
#include "isohydric/num/number.hpp"

namespace isohydric::chem::temperature {

/// How pH falls with temperature.
struct PhSlope {
    double per_degC;     // at pH 7.40
    double per_degC_ph;  // more per unit of pH above 7.40
};

/// Rosenthal's constant slope. Measured. Unchecked: from memory. Source: [@rosenthal1948, slope].
inline constexpr PhSlope k_rosenthal{.per_degC = 0.0147, .per_degC_ph = 0.0};

/// Slope that depends on pH. Measured. Unchecked: from memory.
/// Source: [@nccls1994, temperature] [@clsi2009, temperature].
inline constexpr PhSlope k_clsi{.per_degC = 0.0147, .per_degC_ph = 0.0065};

/// The same with the other rounding of the slope that texts print. Common practice. Unchecked: from
/// memory.
inline constexpr PhSlope k_clsi_0146{.per_degC = 0.0146, .per_degC_ph = 0.0065};

/// log10 of pCO2 per degC, measured over 18 degC. Source: [@nunn1965, abstract].
inline constexpr double k_pco2_nunn = 0.019;

/// log10 of pCO2 per degC, computed from solubility and pK'. Source: [@bradley1956, abstract].
inline constexpr double k_pco2_bradley = 0.0185;

/// log10 of pCO2 per degC: the highest in use, which follows from the steepest solubility law.
/// Common practice.
inline constexpr double k_pco2_steep = 0.021;

/// pH at `temperature_degC` of blood whose pH at 37 degC is `ph_37`.
/// Domain: usual::k_ph, usual::k_temperature_degC. Source: that of the slope.
template <num::Number T>
[[nodiscard]] T ph_at(const PhSlope& slope, const T& ph_37, const T& temperature_degC) {
    const T warming_degC = temperature_degC - k_body_temperature_degC;
    return ph_37 - (slope.per_degC + slope.per_degC_ph * (ph_37 - k_reference_ph)) * warming_degC;
}

/// pH at 37 degC of blood whose pH at `temperature_degC` is `ph`: the inverse of ph_at.
/// Domain: usual::k_ph, usual::k_temperature_degC. Source: that of the slope.
template <num::Number T>
[[nodiscard]] T ph_at_37(const PhSlope& slope, const T& ph, const T& temperature_degC) {
    const T warming_degC = temperature_degC - k_body_temperature_degC;
    return k_reference_ph + (ph - k_reference_ph + slope.per_degC * warming_degC) /
                                (1.0 - slope.per_degC_ph * warming_degC);
}

/// pCO2 at `temperature_degC`, mmHg. `coefficient` is one of those above.
/// Domain: usual::k_pco2_mmHg, usual::k_temperature_degC. Source: that of the coefficient.
template <num::Number T>
[[nodiscard]] T pco2_at_mmHg(double coefficient, const T& pco2_37_mmHg, const T& temperature_degC) {
    return pco2_37_mmHg * num::pow10(coefficient * (temperature_degC - k_body_temperature_degC));
}

/// pCO2 at 37 degC, mmHg: the inverse of pco2_at_mmHg.
/// Domain: usual::k_pco2_mmHg, usual::k_temperature_degC. Source: that of the coefficient.
template <num::Number T>
[[nodiscard]] T pco2_at_37_mmHg(double coefficient, const T& pco2_mmHg, const T& temperature_degC) {
    return pco2_mmHg * num::pow10(coefficient * (k_body_temperature_degC - temperature_degC));
}

}  // namespace isohydric::chem::temperature
