// The form that every published base excess takes: a bicarbonate line through the reference state,
// weighted for the distribution between plasma and red cells. The models give the three numbers of
// the form.
#pragma once

#include "isohydric/chem/conditions.hpp"
#include "isohydric/num/number.hpp"

namespace isohydric::chem {

/// BE = weight [(HCO3 - reference) + buffer value (pH - 7.40)]. The reference bicarbonate is that
/// of its own (solubility, pK') at the reference state: use both together. Source:
/// [@lang2002, abstract].
template <num::Number T>
struct BaseExcessForm {
    T weight;
    T reference_hco3_mmol_L;
    /// Non-bicarbonate buffer value, mmol/L per unit of pH.
    T buffer_value_mmol_L;
};

/// Base excess, mmol/L: base that would be titrated to reach the reference state. 37 degC. Domain:
/// usual::k_ph, usual::k_hco3_mmol_L. Source: [@lang2002, abstract]
/// [@siggaard-andersen1995, abstract].
template <num::Number T>
[[nodiscard]] T
base_excess_mmol_L(const BaseExcessForm<T>& form, const T& ph, const T& hco3_mmol_L) {
    return form.weight * ((hco3_mmol_L - form.reference_hco3_mmol_L) +
                          form.buffer_value_mmol_L * (ph - k_reference_ph));
}

}  // namespace isohydric::chem
