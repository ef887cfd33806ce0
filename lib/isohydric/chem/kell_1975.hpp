// Density of air-free liquid water at one atmosphere, for models of water that ask for a density.
#pragma once

#include "isohydric/chem/domain.hpp"
#include "isohydric/num/number.hpp"

namespace isohydric::chem::kell_1975 {

/// Temperatures, degC. The equation holds to 150; above 100 the water is not at one atmosphere.
/// Source: [@kell1975, title].
inline constexpr Domain k_temperature_degC{0.0, 100.0};

/// Coefficients of the rational function, kg/m3 and degC. Measured (fitted). As general scientific
/// libraries carry them. Source: [@kell1975, equation 16].
inline constexpr double k_n0 = 999.83952;
inline constexpr double k_n1 = 16.945176;
inline constexpr double k_n2 = -7.9870401e-3;
inline constexpr double k_n3 = -46.170461e-6;
inline constexpr double k_n4 = 105.56302e-9;
inline constexpr double k_n5 = -280.54253e-12;
inline constexpr double k_d1 = 16.879850e-3;

/// kg/m3 in one g/cm3. Defined.
inline constexpr double k_kg_m3_per_g_cm3 = 1000.0;

/// Density, g/cm3. Domain: k_temperature_degC. Source: [@kell1975, equation 16].
template <num::Number T>
[[nodiscard]] T density_g_cm3(const T& temperature_degC) {
    const T& t = temperature_degC;
    const T numerator = k_n0 + t * (k_n1 + t * (k_n2 + t * (k_n3 + t * (k_n4 + t * k_n5))));
    return numerator / (1.0 + k_d1 * t) / k_kg_m3_per_g_cm3;
}

}  // namespace isohydric::chem::kell_1975
