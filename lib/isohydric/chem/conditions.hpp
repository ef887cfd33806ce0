// The conditions that acid-base quantities are referred to. Defined ones, used by more than one
// model.
#pragma once

namespace isohydric::chem {

/// Temperature of the definition of base excess, and of every quantity that names no other.
/// Defined. Source: [@siggaard-andersen1995, abstract].
inline constexpr double k_body_temperature_degC = 37.0;

/// pH of the definition of base excess. Defined. Source: [@siggaard-andersen1995, abstract].
inline constexpr double k_reference_ph = 7.40;

/// pCO2 of the definition of base excess, mmHg. Defined. Source:
/// [@siggaard-andersen1995, abstract].
inline constexpr double k_reference_pco2_mmHg = 40.0;

/// Kelvin temperature of 0 degC. Defined by the scale itself.
inline constexpr double k_zero_celsius_K = 273.15;

}  // namespace isohydric::chem
