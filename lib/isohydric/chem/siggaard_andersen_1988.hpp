// Siggaard-Andersen's 1988 carbonic acid of plasma: pK' that falls as carbonate forms, and the
// log-linear dependence of solubility and pK' on temperature.
#pragma once

#include "isohydric/chem/conditions.hpp"
#include "isohydric/chem/domain.hpp"
#include "isohydric/num/number.hpp"

namespace isohydric::chem::siggaard_andersen_1988 {

/// pK' of plasma far below the pK of carbonate, 37 degC. Measured. Unchecked: from memory.
/// Source: [@siggaard-andersen1988, plasma pK'].
inline constexpr double k_pk_acid_limit = 6.125;

/// pH at which the carbonate term doubles the acid one, 37 degC. Measured. Unchecked: from memory.
/// Source: [@siggaard-andersen1988, plasma pK'].
inline constexpr double k_carbonate_ph = 8.7;

/// Solubility of CO2 in plasma, mmol/L/kPa, 37 degC. Measured. As general physiology libraries
/// carry it. Source: [@siggaard-andersen1988, plasma solubility].
inline constexpr double k_solubility_mmol_L_kPa = 0.230;

/// log10 of the solubility per degC. Measured. As general physiology libraries carry it.
/// Source: [@siggaard-andersen1988, temperature].
inline constexpr double k_log10_solubility_per_degC = -0.0092;

/// pK' of plasma at pH 7.40 that the temperature term starts from. Measured. As general physiology
/// libraries carry it. Source: [@siggaard-andersen1988, temperature].
inline constexpr double k_pk_37 = 6.1;

/// pK' per degC. Measured. As general physiology libraries carry it.
/// Source: [@siggaard-andersen1988, temperature].
inline constexpr double k_pk_per_degC = -0.0026;

/// pK' of plasma by pH, 37 degC. Domain: usual::k_ph.
/// Source: [@siggaard-andersen1988, plasma pK']. Unchecked: from memory.
template <num::Number T>
[[nodiscard]] T pk(const T& ph) {
    return k_pk_acid_limit - num::log10(1.0 + num::pow10(ph - k_carbonate_ph));
}

/// Bicarbonate, mmol/L, 37 degC. Domain: usual::k_ph, usual::k_pco2_kPa.
/// Source: [@siggaard-andersen1988, plasma pK' and solubility]. Unchecked: from memory.
template <num::Number T>
[[nodiscard]] T bicarbonate_mmol_L(const T& ph, const T& pco2_kPa) {
    return k_solubility_mmol_L_kPa * pco2_kPa * num::pow10(ph - pk(ph));
}

/// pH, 37 degC: the same relation solved for pH, a quadratic in 10^pH.
/// Domain: usual::k_pco2_kPa, usual::k_hco3_mmol_L.
/// Source: [@siggaard-andersen1988, plasma pK' and solubility]. Unchecked: from memory.
template <num::Number T>
[[nodiscard]] T ph(const T& pco2_kPa, const T& hco3_mmol_L) {
    const T without_carbonate =
        k_pk_acid_limit + num::log10(hco3_mmol_L / (k_solubility_mmol_L_kPa * pco2_kPa));
    const T carbonate = num::pow10(without_carbonate - k_carbonate_ph);
    return without_carbonate - num::log10((1.0 + num::sqrt(1.0 + 4.0 * carbonate)) / 2.0);
}

/// Solubility of CO2 in plasma by temperature, mmol/L/kPa. Domain: usual::k_temperature_degC.
/// Source: [@siggaard-andersen1988, temperature].
template <num::Number T>
[[nodiscard]] T co2_solubility_mmol_L_kPa(const T& temperature_degC) {
    return k_solubility_mmol_L_kPa *
           num::pow10(k_log10_solubility_per_degC * (temperature_degC - k_body_temperature_degC));
}

/// pK' of plasma at pH 7.40 by temperature. Domain: usual::k_temperature_degC.
/// Source: [@siggaard-andersen1988, temperature].
template <num::Number T>
[[nodiscard]] T pk_at_temperature(const T& temperature_degC) {
    return k_pk_37 + k_pk_per_degC * (temperature_degC - k_body_temperature_degC);
}

}  // namespace isohydric::chem::siggaard_andersen_1988
