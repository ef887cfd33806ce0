// Every model of lib/isohydric/chem under one name, with its inputs and their domains, for any
// number type: the published tables, the interval properties, the archetype and the driver of the
// reference check all walk this one list.
#pragma once

#include "isohydric/chem/domain.hpp"
#include "isohydric/num/number.hpp"

#include <span>
#include <string_view>
#include <vector>

namespace isohydric::chem::testing {

/// One argument of a model. A table's column of the same name feeds it.
struct Input {
    std::string_view name;
    Domain domain;
};

/// One function of the folder, its arguments in the order of `inputs`.
template <num::Number T>
struct Model {
    std::string_view name;
    std::vector<Input> inputs;
    T (*evaluate)(std::span<const T> x);
};

template <num::Number T>
using Models = std::vector<Model<T>>;

// Inputs that several models share.
inline constexpr Input k_ph{"ph", usual::k_ph};
inline constexpr Input k_solubility{"solubility_mmol_L_mmHg", usual::k_solubility_mmol_L_mmHg};
inline constexpr Input k_pk{"pk", usual::k_pk};
inline constexpr Input k_pco2{"pco2_mmHg", usual::k_pco2_mmHg};
inline constexpr Input k_pco2_kPa{"pco2_kPa", usual::k_pco2_kPa};
inline constexpr Input k_po2{"po2_mmHg", usual::k_po2_mmHg};
inline constexpr Input k_hco3{"hco3_mmol_L", usual::k_hco3_mmol_L};
inline constexpr Input k_tco2{"tco2_mmol_L", usual::k_hco3_mmol_L};
inline constexpr Input k_hydrogen_ion{"hydrogen_ion_nmol_L", usual::k_hydrogen_ion_nmol_L};
inline constexpr Input k_temperature{"temperature_degC", usual::k_temperature_degC};
inline constexpr Input k_ct_hb_g_dL{"ct_hb_g_dL", usual::k_ct_hb_g_dL};
inline constexpr Input k_ct_hb_mmol_L{"ct_hb_mmol_L", usual::k_ct_hb_mmol_L};
inline constexpr Input k_so2{"so2", usual::k_so2};
inline constexpr Input k_base_excess{"base_excess_mmol_L", usual::k_base_excess_mmol_L};

}  // namespace isohydric::chem::testing
