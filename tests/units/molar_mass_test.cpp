// Molar masses against values that others print.
#include "isohydric/diag/assert.hpp"
#include "isohydric/units/molar_mass.hpp"

#include <doctest/doctest.h>

#include <cmath>
#include <string_view>

namespace units = isohydric::units;
using units::Unit;

namespace {

Unit unit(std::string_view code) {
    return units::parse_unit(code).value();
}

/// mmol/L in 1 mg/dL.
double millimoles_per_litre(std::string_view substance) {
    const double mass_g_mol = units::molar_mass_g_mol(substance).value();
    return units::factor_by_molar_mass(unit("mg/dL"), unit("mmol/L"), mass_g_mol).value();
}

bool within(double value, double expected, double relative) {
    return std::abs(value - expected) <= relative * std::abs(expected);
}

}  // namespace

TEST_CASE("molar mass: formulas give printed values [@nlm-flowsheet-units, column R]") {
    CHECK(std::abs(units::k_glucose_g_mol - 180.156) < 0.0005);
    CHECK(std::abs(units::k_ethanol_g_mol - 46.07) < 0.005);
    CHECK(std::abs(units::k_calcium_g_mol - 40.078) < 0.0005);
    CHECK(std::abs(units::k_magnesium_g_mol - 24.3) < 0.05);
    CHECK(std::abs(units::k_phosphorus_g_mol - 30.974) < 0.0005);
    CHECK(std::abs(units::k_urea_nitrogen_g_mol - 28) < 0.5);
    CHECK(within(units::k_creatinine_g_mol, 113.1179, 2e-5));  // from other atomic weights
}

TEST_CASE("molar mass: factors within 0.3 % [@regenstrief-unit-equations-2017, equations]") {
    CHECK(within(millimoles_per_litre("calcium"), 1 / 4.008, 0.003));
    CHECK(within(millimoles_per_litre("creatinine"), 0.1 / 1.131, 0.003));
    CHECK(within(millimoles_per_litre("glucose"), 1 / 18.02, 0.003));
    CHECK(within(millimoles_per_litre("magnesium"), 1 / 2.431, 0.003));
    CHECK(within(millimoles_per_litre("phosphorus"), 1 / 3.097, 0.003));
    CHECK(within(millimoles_per_litre("ethanol"), 1 / 4.607, 0.003));
}

TEST_CASE("molar mass: lactate takes the customary 9.008 mg/dL per mmol/L, common practice") {
    CHECK(std::abs(1 / millimoles_per_litre("lactate") - 9.008) < 0.0005);
}

TEST_CASE("molar mass: urea is 60.06 and nitrogen 28.01 of it, common practice") {
    CHECK(std::abs(units::k_urea_g_mol - 60.06) < 0.005);
    CHECK(std::abs(units::k_urea_nitrogen_g_mol - 28.01) < 0.005);
    CHECK(std::abs(units::k_beta_hydroxybutyrate_g_mol - 104.105) < 0.001);
}

TEST_CASE("molar mass: 1 g/dL of haemoglobin is 0.62063 mmol/L of monomer [@pmc3934467, table 1]") {
    const auto factor = units::factor_by_molar_mass(
        unit("g/dL"), unit("mmol/L"), units::k_haemoglobin_monomer_g_mol);
    CHECK(within(factor.value(), 0.62063, 2e-4));
    CHECK(units::k_haemoglobin_tetramer_g_mol == 4 * units::k_haemoglobin_monomer_g_mol);
}

TEST_CASE("molar mass: the way back is the inverse, and the dimension decides the direction") {
    const double there =
        units::factor_by_molar_mass(unit("g/L"), unit("umol/L"), units::k_albumin_g_mol).value();
    const double back =
        units::factor_by_molar_mass(unit("umol/L"), unit("g/L"), units::k_albumin_g_mol).value();
    CHECK(within(there, 1e6 / 66500, 1e-15));
    CHECK(within(there * back, 1, 1e-15));
    CHECK(units::factor_by_molar_mass(unit("g"), unit("mol"), 2).value() == 0.5);
}

TEST_CASE("molar mass: none for what does not differ by mass per amount, or is unknown") {
    CHECK_FALSE(units::factor_by_molar_mass(unit("mg/dL"), unit("mg/L"), 180).has_value());
    CHECK_FALSE(units::factor_by_molar_mass(unit("mg/kg"), unit("mmol/L"), 180).has_value());
    CHECK_FALSE(units::molar_mass_g_mol("phlogiston").has_value());
    for (const units::Substance& substance : units::k_substances) {
        CHECK(units::molar_mass_g_mol(substance.name) == substance.molar_mass_g_mol);
    }
}
