// Every row of the tables of tests/published that speak of chemistry, to half a unit of its last
// digit.
#include <doctest/doctest.h>

#include <algorithm>
#include <array>
#include <cmath>
#include <fstream>
#include <set>
#include <string>
#include <tuple>

#include "chem/all_models.hpp"
#include "chem/published_table.hpp"

namespace isohydric::chem::testing {
namespace {

constexpr std::array k_tables = {"austin1963",
                                 "bradley1956",
                                 "christiansen1981",
                                 "clsi2009",
                                 "crc-handbook",
                                 "dorwart1975",
                                 "fazekas2013",
                                 "iapws-r11-07",
                                 "iapws-r11-24",
                                 "jorgensen1957",
                                 "kassirer1965",
                                 "kell1975",
                                 "kellum2005",
                                 "kelman1967",
                                 "khajuria2005",
                                 "lang2002",
                                 "lynd2008",
                                 "marshall1981",
                                 "mohan-sharma",
                                 "nunn1965",
                                 "pmc6090410",
                                 "putnam1991",
                                 "rasouli2005",
                                 "rosenthal1948",
                                 "severinghaus1976",
                                 "siggaard-andersen1960s",
                                 "siggaard-andersen1977",
                                 "siggaard-andersen1988",
                                 "siggaard-andersen2006",
                                 "small-animal-practice",
                                 "smithline1976",
                                 "stumm1981",
                                 "unattributed-standard-bicarbonate",
                                 "university-laboratory-handbook"};

/// Models of which no value outside this program was found; identities and the reference check hold
/// them.
const std::set<std::string_view> k_without_table = {"kellum_2005::plasma",
                                                    "neutral_ph::at_temperature",
                                                    "severinghaus_1979::ln_po2_per_degC",
                                                    "siggaard_andersen_1977::extracellular_fluid",
                                                    "siggaard_andersen_1988::co2_solubility",
                                                    "siggaard_andersen_1988::pk_at_temperature",
                                                    "wooten_2003::plasma"};

PublishedTable table_named(const std::string& name) {
    return read_published_table(ISOHYDRIC_SOURCE_DIR "/tests/published/" + name + ".csv");
}

const Model<double>& model_named(const Models<double>& models, const std::string& name) {
    const auto found = std::find_if(models.begin(), models.end(), [&](const Model<double>& model) {
        return model.name == name;
    });
    REQUIRE_MESSAGE(found != models.end(), "no model is named " << name);
    return *found;
}

void check_row(const Models<double>& models, const std::string& table, const PublishedRow& row) {
    INFO("tests/published/" << table << ".csv:" << row.line);
    const Model<double>& model = model_named(models, row.text("model"));
    std::vector<double> x;
    for (const Input& input : model.inputs) {
        x.push_back(row.number(input.name));
    }
    const std::string& origin = row.text("origin");
    CHECK((origin == "printed" || origin == "computed"));
    const double actual = model.evaluate(x);
    const double expected = row.number("expected");
    const double tolerance = half_unit_of_last_digit(row.text("expected"));
    CHECK_MESSAGE(std::abs(actual - expected) <= tolerance,
                  model.name << " gives " << actual << ", expected " << row.text("expected"));
}

}  // namespace

TEST_CASE(
    "published tables: every row to half a unit of its last digit [the citation heads each]") {
    const Models<double> models = all_models<double>();
    for (const std::string name : k_tables) {
        INFO(name);
        for (const PublishedRow& row : table_named(name).rows) {
            check_row(models, name, row);
        }
    }
}

TEST_CASE("published tables: every model has one or is named as having none") {
    std::set<std::string, std::less<>> with_table;
    for (const std::string name : k_tables) {
        for (const PublishedRow& row : table_named(name).rows) {
            with_table.insert(row.text("model"));
        }
    }
    for (const Model<double>& model : all_models<double>()) {
        INFO(model.name);
        CHECK(with_table.contains(model.name) != k_without_table.contains(model.name));
    }
}

TEST_CASE("published tables: a file without rows, without citation or not there is refused") {
    const auto path = std::filesystem::temp_directory_path() / "isohydric_chem_table.csv";
    const auto written = [&](std::string_view text) -> const std::filesystem::path& {
        std::ofstream(path) << text;
        return path;
    };
    CHECK_THROWS(std::ignore = read_published_table(
                     written("# By hand [@kell1975, equation 16]\nmodel,expected\n")));
    CHECK_THROWS(std::ignore = read_published_table(written("model,expected\nx,1\n")));
    CHECK_THROWS(std::ignore = read_published_table(
                     written("# By hand [@kell1975, equation 16]\nmodel,expected\nx\n")));
    CHECK_NOTHROW(std::ignore = read_published_table(
                      written("# By hand [@kell1975, equation 16]\nmodel,expected\nx,1\n")));
    std::filesystem::remove(path);
    CHECK_THROWS(std::ignore = read_published_table(path));
}

TEST_CASE("published tables: half a unit of the last printed digit") {
    CHECK(half_unit_of_last_digit("158") == 0.5);
    CHECK(half_unit_of_last_digit("40.0") == doctest::Approx(0.05).epsilon(1e-12));
    CHECK(half_unit_of_last_digit("13.906565") == doctest::Approx(5e-7).epsilon(1e-12));
}

}  // namespace isohydric::chem::testing
