// Ionization constant of water as IAPWS releases it: Bandura and Lvov's equation with the
// coefficients of the 2007 release and of the 2024 revision. A thermodynamic constant; not the
// concentration product of plasma.
#pragma once

#include "isohydric/chem/domain.hpp"
#include "isohydric/num/number.hpp"

namespace isohydric::chem::iapws_water_ionization {

/// Temperatures of the releases, K. Source: [@iapws-r11-07, range].
inline constexpr Domain k_temperature_K{273.15, 1073.15};

/// Densities of the releases, g/cm3. Source: [@iapws-r11-07, range].
inline constexpr Domain k_density_g_cm3{0.0, 1.25};

/// Coefficients of the hydration terms, in the order and units of the release.
struct Coefficients {
    double a0;  // unitless
    double a1;  // K
    double a2;  // K2 (g/cm3)^(-2/3)
    double b0;  // (g/cm3)^-1
    double b1;  // K (g/cm3)^-1
    double b2;  // (g/cm3)^-2
};

/// Release of 2007. Measured (fitted). Source: [@iapws-r11-07, table 1] [@bandura2006, equation].
inline constexpr Coefficients k_r11_07{.a0 = -0.864671,
                                       .a1 = 8659.19,
                                       .a2 = -22786.2,
                                       .b0 = 0.642044,
                                       .b1 = -56.8534,
                                       .b2 = -0.375754};

/// Revision of 2024. Measured (fitted). Source: [@iapws-r11-24, table 1] [@arcis2020, abstract].
inline constexpr Coefficients k_r11_24{.a0 = -0.702132,
                                       .a1 = 8681.05,
                                       .a2 = -24145.1,
                                       .b0 = 0.813876,
                                       .b1 = -51.4471,
                                       .b2 = -0.469920};

/// Hydration number of the ions. Defined. Source: [@iapws-r11-07, equation].
inline constexpr double k_hydration_number = 6.0;

/// Molar mass of water, kg/mol, as the release fixes it. Defined.
/// Source: [@iapws-r11-07, equation].
inline constexpr double k_molar_mass_kg_mol = 18.015268e-3;

/// Ideal-gas ionization: g0, g1 (K), g2 (K2), g3 (K3). Measured (fitted).
/// Source: [@iapws-r11-07, table 1].
inline constexpr double k_g0 = 6.141500e-1;
inline constexpr double k_g1 = 4.825133e4;
inline constexpr double k_g2 = -6.770793e4;
inline constexpr double k_g3 = 1.010210e7;

/// Power of the density in the exponent. Defined. Source: [@iapws-r11-07, equation].
inline constexpr double k_density_power = 2.0 / 3.0;

/// Negative decimal logarithm of the ionization constant, mol2/kg2. Domain: k_temperature_K,
/// k_density_g_cm3 above 0 (the limit at 0 is reached by any tiny density). Source:
/// [@iapws-r11-07, equation] [@iapws-r11-24, equation].
template <num::Number T>
[[nodiscard]] T pkw(const Coefficients& release, const T& temperature_K, const T& density_g_cm3) {
    const T inverse_K = 1.0 / temperature_K;
    const T exponent =
        release.a0 + inverse_K * (release.a1 + release.a2 * inverse_K *
                                                   num::pow(density_g_cm3, T(k_density_power)));
    const T q = density_g_cm3 * num::exp(exponent);
    const T linear = release.b0 + release.b1 * inverse_K + release.b2 * density_g_cm3;
    const T hydration = num::log10(1.0 + q) - q / (1.0 + q) * density_g_cm3 * linear;
    const T ideal_gas = k_g0 + inverse_K * (k_g1 + inverse_K * (k_g2 + inverse_K * k_g3));
    return ideal_gas - 2.0 * k_hydration_number * hydration +
           2.0 * num::log10(T(k_molar_mass_kg_mol));
}

}  // namespace isohydric::chem::iapws_water_ionization
