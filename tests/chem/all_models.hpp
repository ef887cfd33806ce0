// The whole list of models.hpp, and the part of it that asks no comparison of its number type.
#pragma once

#include <initializer_list>

#include "chem/models.hpp"
#include "chem/models_base_excess.hpp"
#include "chem/models_carbonic_acid.hpp"
#include "chem/models_osmolality.hpp"
#include "chem/models_temperature.hpp"
#include "chem/models_water.hpp"

namespace isohydric::chem::testing {

template <num::Number T>
Models<T> joined(std::initializer_list<Models<T>> parts) {
    Models<T> all;
    for (const Models<T>& part : parts) {
        all.insert(all.end(), part.begin(), part.end());
    }
    return all;
}

/// Models in closed form: any number type.
template <num::Number T>
Models<T> closed_form_models() {
    return joined<T>({carbonic_acid_models<T>(),
                      carbonic_acid_by_ph_models<T>(),
                      carbonic_acid_by_temperature_models<T>(),
                      water_models<T>(),
                      siggaard_andersen_models<T>(),
                      base_excess_models<T>(),
                      base_excess_of_gas_models<T>(),
                      osmolality_models<T>(),
                      osmolality_by_parts_models<T>(),
                      ph_temperature_models<T>(),
                      gas_temperature_models<T>()});
}

/// All models: double and Interval.
template <num::Number T>
Models<T> all_models() {
    return joined<T>(
        {closed_form_models<T>(), standard_bicarbonate_models<T>(), po2_at_37_models<T>()});
}

}  // namespace isohydric::chem::testing
