// The register of chemistry models: ports, domains, masks, and the published tables once more, through the register.
#include "isohydric/engine/models.hpp"
#include "isohydric/units/unit.hpp"

#include <doctest/doctest.h>

#include <algorithm>
#include <cmath>
#include <set>

#include "chem/published_table.hpp"
#include "engine/evaluated.hpp"
#include "engine/published_models.hpp"

namespace chem = isohydric::chem;
namespace engine = isohydric::engine;
namespace panel = isohydric::panel;
namespace rule = isohydric::rule;
namespace test = isohydric::test;
namespace units = isohydric::units;

namespace {

std::uint32_t index_of(std::string_view id) {
    const auto signatures = engine::model_signatures();
    const auto found = std::find_if(signatures.begin(),
                                    signatures.end(),
                                    [id](const auto& signature) { return signature.id == id; });
    REQUIRE_MESSAGE(found != signatures.end(), "no model " << id);
    return static_cast<std::uint32_t>(found - signatures.begin());
}

/// One model in one row.
std::optional<double> evaluate(std::uint32_t model,
                               const std::vector<double>& inputs,
                               const std::vector<std::uint8_t>& masks) {
    std::vector<const double*> values;
    std::vector<const std::uint8_t*> missing;
    for (std::size_t input = 0; input < inputs.size(); ++input) {
        values.push_back(&inputs[input]);
        missing.push_back(&masks[input]);
    }
    double result = -1.0;
    std::uint8_t result_missing = 2;
    engine::evaluate_model(model, {values, missing, &result, &result_missing, 1});
    CHECK(result_missing <= 1);
    if (result_missing != 0) {
        CHECK(result == 0.0);
        return std::nullopt;
    }
    return result;
}

std::optional<double> evaluate(std::uint32_t model, const std::vector<double>& inputs) {
    return evaluate(model, inputs, std::vector<std::uint8_t>(inputs.size(), 0));
}

std::vector<double> middles(const rule::ModelSignature& signature) {
    std::vector<double> inputs;
    for (const rule::ModelPort& port : signature.inputs) {
        inputs.push_back((port.low + port.high) / 2.0);
    }
    return inputs;
}

/// Rows of a published table that speak of the model; rows outside its domains are left out.
std::size_t check_table(const test::PublishedModel& published) {
    const auto table =
        chem::testing::read_published_table(std::string(ISOHYDRIC_SOURCE_DIR "/tests/published/") +
                                            std::string(published.table) + ".csv");
    std::size_t checked = 0;
    for (const auto& row : table.rows) {
        if (row.text("model") != published.model) {
            continue;
        }
        std::vector<double> inputs;
        for (const std::string_view column : published.columns) {
            inputs.push_back(row.number(column));
        }
        const auto actual = evaluate(index_of(published.id), inputs);
        if (!actual) {
            continue;
        }
        const double tolerance = chem::testing::half_unit_of_last_digit(row.text("expected"));
        INFO(published.id << ", line " << row.line << ": " << *actual);
        CHECK(std::abs(*actual - row.number("expected")) <= tolerance);
        ++checked;
    }
    return checked;
}

}  // namespace

TEST_CASE("models: ids are unique, units are UCUM, domains are not empty") {
    std::set<std::string> ids;
    for (const rule::ModelSignature& signature : engine::model_signatures()) {
        INFO(signature.id);
        CHECK(ids.insert(signature.id).second);
        CHECK(units::parse_unit(signature.result.unit).has_value());
        CHECK_FALSE(signature.inputs.empty());
        std::set<std::string> names;
        for (const rule::ModelPort& port : signature.inputs) {
            CHECK(names.insert(port.name).second);
            CHECK(units::parse_unit(port.unit).has_value());
            CHECK(port.low < port.high);
        }
    }
}

TEST_CASE("models: published values through the register [the citation heads each table]") {
    for (const test::PublishedModel& published : test::published_models()) {
        if (!published.table.empty()) {
            INFO(published.id);
            CHECK(check_table(published) > 0);
        }
    }
}

TEST_CASE("models: every registered model is in the list of published ones, or said to have none") {
    std::set<std::string_view> listed;
    for (const test::PublishedModel& published : test::published_models()) {
        CHECK(listed.insert(published.id).second);
    }
    for (const rule::ModelSignature& signature : engine::model_signatures()) {
        CHECK_MESSAGE(listed.contains(signature.id), signature.id);
    }
    CHECK(listed.size() == engine::model_signatures().size());
}

TEST_CASE("models: ends of a domain are inside, the next numbers outside") {
    for (std::uint32_t model = 0; model < engine::model_signatures().size(); ++model) {
        const rule::ModelSignature& signature = engine::model_signatures()[model];
        INFO(signature.id);
        CHECK(evaluate(model, middles(signature)).has_value());
        for (std::size_t input = 0; input < signature.inputs.size(); ++input) {
            const rule::ModelPort& port = signature.inputs[input];
            std::vector<double> inputs = middles(signature);
            inputs[input] = std::nextafter(port.low, -INFINITY);
            CHECK_FALSE(evaluate(model, inputs));
            inputs[input] = std::nextafter(port.high, INFINITY);
            CHECK_FALSE(evaluate(model, inputs));
            inputs[input] = port.high;
            CHECK(evaluate(model, inputs).has_value());
        }
    }
}

TEST_CASE("models: a missing input gives a missing result") {
    for (std::uint32_t model = 0; model < engine::model_signatures().size(); ++model) {
        const rule::ModelSignature& signature = engine::model_signatures()[model];
        INFO(signature.id);
        for (std::size_t input = 0; input < signature.inputs.size(); ++input) {
            std::vector<std::uint8_t> masks(signature.inputs.size(), 0);
            masks[input] = 1;
            std::vector<double> inputs = middles(signature);
            inputs[input] = 0.0;
            CHECK_FALSE(evaluate(model, inputs, masks));
        }
    }
}

TEST_CASE("models: inputs and result are converted to the units of the rules") {
    test::RulesByHand rules;
    // 5.3328954966 kPa is 40 mmHg; solubility and pK' as bare literals of their units.
    const auto hco3 = rules.model("hco3",
                                  "carbonicAcid.bicarbonate",
                                  {"pHmeasured", "pCO2measured", "0.0307 'mmol/L/mm[Hg]'", "6.1"},
                                  "umol/L");
    const test::Evaluated evaluated(
        rules, {test::panel_of({{panel::Analyte::ph, 7.40}, {panel::Analyte::pco2, 40.0}})});
    // Computed apart from this program: 0.0307 * 40 * 10^1.3 = 24.501821.
    CHECK(std::abs(evaluated.quantity(hco3).value() - 24501.821) < 0.0005);
}

TEST_CASE("models: minus zero is 0 at the end of a domain") {
    const auto model = index_of("baseExcess.clsi");
    CHECK(evaluate(model, {7.4, 24.0, -0.0}) == evaluate(model, {7.4, 24.0, 0.0}));
    CHECK(evaluate(model, {7.4, 24.0, -0.0}).has_value());
}
