// The spans of input over which the models of this folder are meant to be used. A model computes
// outside them too; the caller masks the result. Spans that a source states stand beside its model.
#pragma once

namespace isohydric::chem {

/// Closed span of one input, in the unit that the constant's name ends in.
struct Domain {
    double low;
    double high;

    /// Whether `value` lies in the span; false for NaN.
    [[nodiscard]] constexpr bool contains(double value) const {
        return low <= value && value <= high;
    }
};

/// Spans for inputs whose model's source states none: wider than blood in life, narrow enough that
/// no model leaves the range of double. Defined here, not measured.
namespace usual {

inline constexpr Domain k_ph{6.3, 8.0};
inline constexpr Domain k_pk{5.8, 6.4};
inline constexpr Domain k_so2{0.0, 1.0};
inline constexpr Domain k_solubility_mmol_L_mmHg{0.02, 0.05};
inline constexpr Domain k_pco2_mmHg{1.0, 300.0};
inline constexpr Domain k_pco2_kPa{0.1, 40.0};
inline constexpr Domain k_po2_mmHg{1.0, 800.0};
inline constexpr Domain k_hydrogen_ion_nmol_L{10.0, 501.0};
inline constexpr Domain k_hco3_mmol_L{0.5, 100.0};
inline constexpr Domain k_base_excess_mmol_L{-40.0, 40.0};
inline constexpr Domain k_ct_hb_g_dL{0.0, 29.0};
inline constexpr Domain k_ct_hb_mmol_L{0.0, 18.0};
inline constexpr Domain k_albumin_g_dL{0.0, 10.0};
inline constexpr Domain k_albumin_mmol_L{0.0, 1.5};
inline constexpr Domain k_globulin_g_L{0.0, 100.0};
inline constexpr Domain k_phosphate_mmol_L{0.0, 10.0};
inline constexpr Domain k_phosphate_mg_dL{0.0, 31.0};
inline constexpr Domain k_sodium_mmol_L{80.0, 220.0};
inline constexpr Domain k_potassium_mmol_L{1.0, 12.0};
inline constexpr Domain k_chloride_mmol_L{50.0, 180.0};
inline constexpr Domain k_lactate_mmol_L{0.0, 40.0};
inline constexpr Domain k_glucose_mmol_L{0.0, 150.0};
inline constexpr Domain k_glucose_mg_dL{0.0, 2700.0};
inline constexpr Domain k_urea_mmol_L{0.0, 120.0};
inline constexpr Domain k_urea_nitrogen_mg_dL{0.0, 340.0};
inline constexpr Domain k_ethanol_mmol_L{0.0, 200.0};
inline constexpr Domain k_ethanol_mg_dL{0.0, 920.0};
inline constexpr Domain k_temperature_degC{15.0, 45.0};

}  // namespace usual

}  // namespace isohydric::chem
