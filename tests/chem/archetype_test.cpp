// Every closed-form model compiles with the poorest number type that num::Number allows.
#include "chem/archetype.hpp"

// After the archetype.
#include <doctest/doctest.h>

#include "chem/all_models.hpp"

namespace isohydric::chem::testing {

static_assert(num::Number<num::Archetype>);

TEST_CASE("models: the archetype gives the bits that double gives") {
    const Models<num::Archetype> poor = closed_form_models<num::Archetype>();
    const Models<double> plain = closed_form_models<double>();
    REQUIRE(poor.size() == plain.size());
    for (std::size_t i = 0; i < plain.size(); ++i) {
        INFO(plain[i].name);
        std::vector<double> x;
        for (const Input& input : plain[i].inputs) {
            x.push_back(input.domain.low + (input.domain.high - input.domain.low) / 3.0);
        }
        const std::vector<num::Archetype> wrapped(x.begin(), x.end());
        CHECK(poor[i].evaluate(wrapped).reveal() == plain[i].evaluate(x));
    }
}

}  // namespace isohydric::chem::testing
