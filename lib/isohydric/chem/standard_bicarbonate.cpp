#include "isohydric/chem/standard_bicarbonate.hpp"

#include "isohydric/chem/conditions.hpp"
#include "isohydric/chem/detail/increasing_root.hpp"

#include <numbers>

namespace isohydric::chem {
namespace {

/// pH that holds every root over the domain of the base excess. Defined.
constexpr Domain k_ph_bracket{0.0, 14.0};

/// By how much the bicarbonate line of `form` at the reference pCO2 exceeds a base excess, as a
/// function of pH. It increases, because bicarbonate and buffer line both do.
template <num::Number T>
auto excess_at_reference_pco2(const BaseExcessForm<T>& form,
                              const CarbonicAcid<T>& constants,
                              const T& base_excess_mmol_L) {
    return [&form, &constants, target = base_excess_mmol_L / form.weight](const T& ph) {
        const T hco3_mmol_L =
            carbonic_acid::bicarbonate_mmol_L(constants, ph, T(k_reference_pco2_mmHg));
        const T line = form.buffer_value_mmol_L * (ph - k_reference_ph);
        return detail::ValueAndSlope<T>{
            .value = hco3_mmol_L - form.reference_hco3_mmol_L + line - target,
            .slope = std::numbers::ln10 * hco3_mmol_L + form.buffer_value_mmol_L};
    };
}

}  // namespace

double standard_bicarbonate_mmol_L(const BaseExcessForm<double>& form,
                                   const CarbonicAcid<double>& constants,
                                   double base_excess_mmol_L) {
    const double ph = detail::increasing_root(
        excess_at_reference_pco2(form, constants, base_excess_mmol_L), k_ph_bracket);
    return carbonic_acid::bicarbonate_mmol_L(constants, ph, k_reference_pco2_mmHg);
}

num::Interval standard_bicarbonate_mmol_L(const BaseExcessForm<num::Interval>& form,
                                          const CarbonicAcid<num::Interval>& constants,
                                          const num::Interval& base_excess_mmol_L) {
    const num::Interval ph = detail::increasing_root_enclosure(
        excess_at_reference_pco2(form, constants, base_excess_mmol_L), k_ph_bracket);
    return carbonic_acid::bicarbonate_mmol_L(constants, ph, num::Interval(k_reference_pco2_mmHg));
}

}  // namespace isohydric::chem
