// Christiansen's bicarbonate of plasma, whose pK' falls 0.050 per unit of pH. Read in Mentel's
// dissertation, which quotes it; not traced to the first print.
#pragma once

#include "isohydric/num/number.hpp"

namespace isohydric::chem::christiansen_1981 {

/// Solubility of CO2, mmol/L/kPa. Measured. Source: [@christiansen1981, equation] in
/// [@mentel, appendix].
inline constexpr double k_solubility_mmol_L_kPa = 0.23;

/// pH at which bicarbonate equals dissolved CO2. Measured.
/// Source: [@christiansen1981, equation] in [@mentel, appendix].
inline constexpr double k_pk = 6.161;

/// Units of pH per factor of ten in bicarbonate. Measured.
/// Source: [@christiansen1981, equation] in [@mentel, appendix].
inline constexpr double k_ph_per_decade = 0.9524;

/// Bicarbonate, mmol/L, 37 degC. Domain: usual::k_ph, usual::k_pco2_kPa.
/// Source: [@christiansen1981, equation] in [@mentel, appendix].
template <num::Number T>
[[nodiscard]] T bicarbonate_mmol_L(const T& ph, const T& pco2_kPa) {
    return k_solubility_mmol_L_kPa * pco2_kPa * num::pow10((ph - k_pk) / k_ph_per_decade);
}

/// pH, 37 degC: the same relation solved for pH. Domain: usual::k_pco2_kPa, usual::k_hco3_mmol_L.
/// Source: [@christiansen1981, equation] in [@mentel, appendix].
template <num::Number T>
[[nodiscard]] T ph(const T& pco2_kPa, const T& hco3_mmol_L) {
    return k_pk + k_ph_per_decade * num::log10(hco3_mmol_L / (k_solubility_mmol_L_kPa * pco2_kPa));
}

}  // namespace isohydric::chem::christiansen_1981
