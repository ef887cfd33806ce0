// Standard bicarbonate by its definition: the bicarbonate of the same blood, oxygenated, at pCO2 40
// mmHg. Found from any base-excess form, so that it agrees with that form; the polynomials do not.
#pragma once

#include "isohydric/chem/base_excess.hpp"
#include "isohydric/chem/carbonic_acid.hpp"
#include "isohydric/num/interval.hpp"

namespace isohydric::chem {

/// Standard bicarbonate, mmol/L, 37 degC, of blood whose base excess after the oxygen term of its
/// form is `base_excess_mmol_L`. Domain: usual::k_base_excess_mmol_L; the form's weight and buffer
/// value above 0. Largest relative error 1e-14. Source: [@jorgensen1957, definition].
[[nodiscard]] double standard_bicarbonate_mmol_L(const BaseExcessForm<double>& form,
                                                 const CarbonicAcid<double>& constants,
                                                 double base_excess_mmol_L);

/// The same for every member of the arguments.
[[nodiscard]] num::Interval
standard_bicarbonate_mmol_L(const BaseExcessForm<num::Interval>& form,
                            const CarbonicAcid<num::Interval>& constants,
                            const num::Interval& base_excess_mmol_L);

}  // namespace isohydric::chem
