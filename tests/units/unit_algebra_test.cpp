// Products and powers of units, as the checker of expressions forms them.
#include "isohydric/units/unit.hpp"

#include <doctest/doctest.h>

#include <array>
#include <limits>
#include <string_view>

namespace units = isohydric::units;
using units::Dimension;
using units::Unit;

namespace {

Unit unit(std::string_view code) {
    return units::parse_unit(code).value();
}

}  // namespace

TEST_CASE("dimension: exponents add, subtract and multiply") {
    constexpr Dimension k_pressure{.length = -1, .mass = 1, .time = -2};
    constexpr Dimension k_area{.length = 2};
    CHECK(units::multiply(k_pressure, k_area) == Dimension{.length = 1, .mass = 1, .time = -2});
    CHECK(units::divide(k_pressure, k_area) == Dimension{.length = -3, .mass = 1, .time = -2});
    CHECK(units::power(k_pressure, -2) == Dimension{.length = 2, .mass = -2, .time = 4});
    CHECK(units::divide(k_pressure, k_pressure) == Dimension{});
}

TEST_CASE("algebra: a coefficient times what it stands before is the result's unit") {
    const Unit pressure = unit("mm[Hg].L/mmol") * unit("mmol/L");
    CHECK(pressure == unit("mm[Hg]"));
    CHECK(pressure.code() == "mm[Hg]");
    const Unit concentration = unit("mmol/L/mm[Hg]") * unit("mm[Hg]");
    CHECK(concentration == unit("mmol/L"));
    CHECK(concentration.code() == "mmol/L");
}

TEST_CASE("algebra: units that differ keep their scales") {
    const Unit charge = unit("mmol/g") * unit("g/L");
    CHECK(charge == unit("mmol/L"));
    CHECK(unit("mmol/L") * unit("L/mol") == unit("[ppth]"));
    CHECK(unit("kPa") / unit("mm[Hg]") != units::one());
    CHECK(units::factor_between(unit("g/dL") / unit("g/L"), units::one()) == 10);
    CHECK(unit("meq/L") / unit("mmol/L") == units::one());
}

TEST_CASE("algebra: what cancels leaves 1, what is left of a quotient is written with /") {
    CHECK((unit("mmol/L") / unit("mmol/L")).code() == "1");
    CHECK((units::one() / unit("mmol/L")).code() == "L/mmol");
    CHECK((units::one() / unit("L")).code() == "/L");
    CHECK((unit("mmol") / unit("L") / unit("s")).code() == "mmol/L/s");
}

TEST_CASE("algebra: times and over 1 leave a unit as it is") {
    for (const std::string_view code : {"mosm/kg{H2O}", "Cel", "[pH]", "%"}) {
        const Unit some = unit(code);
        CHECK((some * units::one()).code() == code);
        CHECK((units::one() * some).code() == code);
        CHECK((some / units::one()).code() == code);
        CHECK((some * units::one()).has_offset() == some.has_offset());
    }
}

TEST_CASE("algebra: annotations and [pH] are dropped, degrees lose their zero point") {
    CHECK((unit("mosm/kg{H2O}") * unit("kg")).code() == "mosm");
    CHECK((unit("mmol/L") / unit("[pH]")).code() == "mmol/L");
    const Unit per_degree = unit("mmol/L") / unit("Cel");
    CHECK_FALSE(per_degree.has_offset());
    CHECK(per_degree == unit("mmol/L/K"));
    CHECK(per_degree * unit("Cel") == unit("mmol/L"));
}

TEST_CASE("algebra: powers") {
    CHECK(units::power(unit("mmol/L"), 2).code() == "mmol2/L2");
    CHECK(units::power(unit("mmol/L"), -1) == unit("L/mmol"));
    CHECK(units::power(unit("mmol/L"), 0) == units::one());
    CHECK(units::power(unit("mm[Hg]"), 2) / unit("mm[Hg]") == unit("mm[Hg]"));
    CHECK(units::power(unit("%"), 2) == unit("10*-4"));
    CHECK(units::power(unit("Cel"), 1).has_offset());
}

TEST_CASE("algebra: written codes are read as the same unit") {
    constexpr std::array k_codes{
        "mmol/L", "mm[Hg]", "g/dL", "%", "10*-3", "/L", "kPa.L/mmol", "m2"};
    for (const char* left : k_codes) {
        for (const char* right : k_codes) {
            for (const Unit& made : {unit(left) * unit(right),
                                     unit(left) / unit(right),
                                     units::power(unit(left), 3) * unit(right)}) {
                CAPTURE(made.code());
                CHECK(unit(made.code()) == made);
                CHECK(unit(made.code()).factor() == made.factor());
            }
        }
    }
}

TEST_CASE("algebra: beyond all reason a unit is out of range, and good for nothing") {
    Unit grown = unit("m[Hg]");
    for (int i = 0; i < 40; ++i) {
        grown = units::power(grown, 9);
    }
    for (const Unit& beyond : {grown,
                               units::power(unit("m"), 1001),
                               units::power(unit("m"), std::numeric_limits<int>::min()),
                               units::power(unit("km"), 100),
                               grown / grown,
                               units::one() / grown,
                               units::power(grown, 0)}) {
        CHECK_FALSE(beyond.in_range());
        CHECK_FALSE(units::commensurable(beyond, beyond));
        CHECK_FALSE(units::commensurable(beyond, units::one()));
        CHECK_FALSE(beyond.dimension() == Dimension{});
        CHECK_FALSE(beyond == beyond);
    }
    CHECK(units::power(unit("m"), 40).in_range());
    CHECK(units::power(units::one(), 100000) == units::one());
}
