// What must hold between the models whatever their constants: inverses, identities, intervals.
#include <doctest/doctest.h>

#include <cmath>
#include <random>

#include "chem/all_models.hpp"

namespace isohydric::chem::testing {
namespace {

/// Calls `check` with a few hundred points spread over two domains.
template <class Check>
void over(const Domain& first, const Domain& second, const Check& check) {
    constexpr int k_steps = 16;
    const auto point = [](const Domain& domain, int step) {
        return domain.low + (domain.high - domain.low) * step / k_steps;
    };
    for (int i = 0; i <= k_steps; ++i) {
        for (int j = 0; j <= k_steps; ++j) {
            check(point(first, i), point(second, j));
        }
    }
}

bool agree(double a, double b) {
    constexpr double k_relative = 1e-12;
    return std::abs(a - b) <= k_relative * std::max(std::abs(a), std::abs(b));
}

constexpr CarbonicAcid<double> k_pair{.solubility_mmol_L_mmHg = 0.0307, .pk = 6.095};

}  // namespace

TEST_CASE("carbonic acid: pH, pCO2 and bicarbonate each follow from the other two") {
    over(usual::k_ph, usual::k_pco2_mmHg, [](double ph, double pco2_mmHg) {
        const double hco3_mmol_L = carbonic_acid::bicarbonate_mmol_L(k_pair, ph, pco2_mmHg);
        CHECK(agree(carbonic_acid::ph(k_pair, pco2_mmHg, hco3_mmol_L), ph));
        CHECK(agree(carbonic_acid::pco2_mmHg(k_pair, ph, hco3_mmol_L), pco2_mmHg));
        CHECK(agree(
            severinghaus_1976::ph(pco2_mmHg, severinghaus_1976::bicarbonate_mmol_L(ph, pco2_mmHg)),
            ph));
        CHECK(agree(hydrogen_ion::ph(hydrogen_ion::hydrogen_ion_nmol_L(ph)), ph));
    });
    over(usual::k_ph, usual::k_pco2_kPa, [](double ph, double pco2_kPa) {
        CHECK(agree(
            christiansen_1981::ph(pco2_kPa, christiansen_1981::bicarbonate_mmol_L(ph, pco2_kPa)),
            ph));
        CHECK(agree(siggaard_andersen_1988::ph(
                        pco2_kPa, siggaard_andersen_1988::bicarbonate_mmol_L(ph, pco2_kPa)),
                    ph));
    });
}

TEST_CASE("kelman 1967: pH and bicarbonate are inverse at every temperature") {
    over(usual::k_ph, austin_1963::k_temperature_degC, [](double ph, double temperature_degC) {
        constexpr double k_pco2_mmHg = 45.0;
        const double hco3_mmol_L = carbonic_acid::bicarbonate_mmol_L(
            kelman_1967::constants(ph, temperature_degC), ph, k_pco2_mmHg);
        CHECK(agree(kelman_1967::ph(k_pco2_mmHg, hco3_mmol_L, temperature_degC), ph));
    });
}

TEST_CASE(
    "siggaard-andersen 1988: solubility at 30 over that at 37 degC is 1.159845, computed apart "
    "[@siggaard-andersen1988, temperature]") {
    using siggaard_andersen_1988::co2_solubility_mmol_L_kPa;
    CHECK(std::abs(co2_solubility_mmol_L_kPa(30.0) / co2_solubility_mmol_L_kPa(37.0) - 1.159845) <=
          5e-7);
}

TEST_CASE("water: neutral pH at 37 degC is half of the pKw 13.6207 computed apart, and falls with "
          "temperature [@iapws-r11-24, equation]") {
    CHECK(std::abs(2.0 * neutral_ph::at_temperature(37.0) - 13.6207) <= 5e-5);
    CHECK(neutral_ph::at_temperature(30.0) > neutral_ph::at_temperature(37.0));
}

TEST_CASE(
    "base excess: 0.9287 and 14.83 are the 1977 equation at 3.1 mmol/L haemoglobin, and a third of "
    "the blood's haemoglobin dilutes to it [@siggaard-andersen1977, equation]") {
    const auto rounded = kellum_2005::extracellular_fluid<double>();
    const auto derived = siggaard_andersen_1977::blood(3.1);
    CHECK(agree(rounded.weight, derived.weight));
    CHECK(agree(rounded.buffer_value_mmol_L, derived.buffer_value_mmol_L));
    CHECK(agree(siggaard_andersen_1977::extracellular_fluid(9.3).weight, derived.weight));
}

TEST_CASE("base excess: the plasma part of the later equation is 7.738, computed apart "
          "[@siggaard-andersen2006, equation]") {
    const auto form = siggaard_andersen_2006::blood<double>({0.0, 0.66, 28.0, 1.16});
    CHECK(std::abs(form.buffer_value_mmol_L - 7.738) <= 5e-4);
}

TEST_CASE("base excess: each reference bicarbonate is that of its own pair at pH 7.40 and pCO2 40 "
          "[@lang2002, abstract] [@kassirer1965, abstract]") {
    const auto at_reference = [](double solubility, double pk) {
        return carbonic_acid::bicarbonate_mmol_L(
            CarbonicAcid<double>{solubility, pk}, k_reference_ph, k_reference_pco2_mmHg);
    };
    CHECK(std::abs(at_reference(0.0301, 6.1) - siggaard_andersen_1960s::k_reference_hco3_mmol_L) <
          0.05);
    CHECK(
        std::abs(at_reference(lang_zander_2002::k_solubility_mmol_L_mmHg, lang_zander_2002::k_pk) -
                 lang_zander_2002::k_reference_hco3_mmol_L) < 0.005);
    CHECK(std::abs(at_reference(0.0306, 6.1) - siggaard_andersen_1977::k_reference_hco3_mmol_L) <
          0.05);
    CHECK(std::abs(at_reference(0.0307, 6.1) - siggaard_andersen_2006::k_reference_hco3_mmol_L) <
          0.05);
    CHECK(std::abs(at_reference(0.0307, 6.095) - clsi::k_reference_hco3_mmol_L) < 0.05);
}

TEST_CASE("base excess: pure CO2 moves that of blood more than that of extracellular fluid "
          "[@siggaard-andersen1995, abstract]") {
    // Blood in the body: CO2 from 40 to 60 mmHg at the buffer value of extracellular fluid.
    const auto ecf = clsi::extracellular_fluid<double>();
    const auto blood = clsi::blood(15.0);
    const double ph = 7.40 - 0.13;
    const double hco3_mmol_L = ecf.reference_hco3_mmol_L + ecf.buffer_value_mmol_L * 0.13;
    CHECK(std::abs(base_excess_mmol_L(ecf, ph, hco3_mmol_L)) < 1e-12);
    CHECK(base_excess_mmol_L(blood, ph, hco3_mmol_L) < -1.0);
}

TEST_CASE("standard bicarbonate: 10 mmol/L of acid takes it from 24 to about 16, so by 8 and "
          "not by 10 [@pmc9304040, standard bicarbonate]") {
    constexpr CarbonicAcid<double> k_classic{.solubility_mmol_L_mmHg = 0.0306, .pk = 6.1};
    const auto form = siggaard_andersen_1977::blood(9.3);
    const double before = standard_bicarbonate_mmol_L(form, k_classic, 0.0);
    const double after = standard_bicarbonate_mmol_L(form, k_classic, -10.0);
    CHECK(std::abs(before - after - 8.0) <= 0.5);
}

TEST_CASE("standard bicarbonate: has the base excess that it was found from "
          "[@jorgensen1957, definition]") {
    over(usual::k_base_excess_mmol_L, usual::k_ct_hb_mmol_L, [](double base_excess, double ct_hb) {
        const auto form = siggaard_andersen_1977::blood(ct_hb);
        const double hco3_mmol_L = standard_bicarbonate_mmol_L(form, k_pair, base_excess);
        const double ph = carbonic_acid::ph(k_pair, k_reference_pco2_mmHg, hco3_mmol_L);
        CHECK(std::abs(base_excess_mmol_L(form, ph, hco3_mmol_L) - base_excess) < 1e-11);
    });
}

TEST_CASE("standard bicarbonate: without an answer the interval is unbounded, never empty") {
    const BaseExcessForm<num::Interval> any_weight{
        .weight = {-1.0, 1.0}, .reference_hco3_mmol_L = 24.4, .buffer_value_mmol_L = 7.7};
    const CarbonicAcid<num::Interval> pair{.solubility_mmol_L_mmHg = 0.0306, .pk = 6.1};
    const num::Interval answer = standard_bicarbonate_mmol_L(any_weight, pair, num::Interval(5.0));
    CHECK(answer.lower() <= 0.0);
    CHECK(answer.upper() == std::numeric_limits<double>::infinity());
}

TEST_CASE("temperature: to 37 degC and back is where it began") {
    over(usual::k_ph, usual::k_temperature_degC, [](double ph, double temperature_degC) {
        const double at = temperature::ph_at(temperature::k_clsi, ph, temperature_degC);
        CHECK(agree(temperature::ph_at_37(temperature::k_clsi, at, temperature_degC), ph));
    });
    over(usual::k_po2_mmHg, usual::k_temperature_degC, [](double po2, double temperature_degC) {
        const double at = po2_temperature_clsi::po2_at_mmHg(po2, temperature_degC);
        CHECK(agree(po2_temperature_clsi::po2_at_37_mmHg(at, temperature_degC), po2));
    });
}

TEST_CASE("pO2 and temperature: the rational form is Severinghaus's equation over ln 10, rounded "
          "[@severinghaus1979, abstract]") {
    over(usual::k_po2_mmHg, usual::k_so2, [](double po2, double /*unused*/) {
        const double severinghaus = severinghaus_1979::ln_po2_per_degC(po2) / std::log(10.0);
        CHECK(std::abs(po2_temperature_clsi::log10_po2_per_degC(po2) / severinghaus - 1.0) < 3e-3);
    });
}

TEST_CASE("models: an interval of inputs encloses what doubles inside it give") {
    const Models<double> plain = all_models<double>();
    const Models<num::Interval> wide = all_models<num::Interval>();
    REQUIRE(plain.size() == wide.size());
    constexpr std::uint32_t k_seed = 1977;
    std::mt19937 random(k_seed);  // NOLINT(cert-msc51-cpp): the sample must repeat
    std::uniform_real_distribution<double> share(0.0, 1.0);
    for (std::size_t i = 0; i < plain.size(); ++i) {
        INFO(plain[i].name << ", seed " << k_seed);
        for (int sample = 0; sample < 200; ++sample) {
            std::vector<num::Interval> box;
            std::vector<double> inside;
            for (const Input& input : plain[i].inputs) {
                const double span = input.domain.high - input.domain.low;
                const double low = input.domain.low + 0.9 * span * share(random);
                const double width = 0.1 * span * share(random);
                box.emplace_back(low, low + width);
                inside.push_back(std::min(low + width * share(random), low + width));
            }
            CHECK(wide[i].evaluate(box).contains(plain[i].evaluate(inside)));
        }
    }
}

TEST_CASE("domain: both ends belong to it and NaN does not") {
    constexpr Domain k_domain{1.0, 2.0};
    static_assert(k_domain.contains(1.0) && k_domain.contains(2.0));
    static_assert(!k_domain.contains(0.9) && !k_domain.contains(2.1));
    CHECK_FALSE(k_domain.contains(std::numeric_limits<double>::quiet_NaN()));
}

}  // namespace isohydric::chem::testing
