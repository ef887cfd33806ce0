// Answers questions about units, one a line, for comparison with an outside reference. Columns are separated by tabs:
//   convert VALUE FROM TO SUBSTANCE   the value in the other unit; SUBSTANCE `-` where no molar mass is needed
//   base CODE                         the factor to base units, and a code of these
//   spelling WRITTEN                  the UCUM code
// The answer is one line; `refused` if the library refuses.
#include "isohydric/units/molar_mass.hpp"
#include "isohydric/units/quantity_text.hpp"
#include "isohydric/units/spelling.hpp"
#include "isohydric/units/unit.hpp"

#include <iostream>
#include <sstream>
#include <string>
#include <vector>

#include <fmt/format.h>

namespace {

namespace units = isohydric::units;

constexpr const char* k_refused = "refused";

std::string convert(const std::vector<std::string>& columns) {
    const auto number = units::parse_number(columns.at(1));
    const auto from = units::parse_unit(columns.at(2));
    const auto to = units::parse_unit(columns.at(3));
    if (!number || !from || !to) {
        return k_refused;
    }
    if (units::commensurable(*from, *to)) {
        return fmt::format("{:.17g}", units::convert(number->value, *from, *to));
    }
    const auto molar_mass_g_mol = units::molar_mass_g_mol(columns.at(4));
    if (!molar_mass_g_mol) {
        return k_refused;
    }
    const auto factor = units::factor_by_molar_mass(*from, *to, *molar_mass_g_mol);
    return factor ? fmt::format("{:.17g}", number->value * *factor) : k_refused;
}

std::string base(const std::vector<std::string>& columns) {
    const auto unit = units::parse_unit(columns.at(1));
    if (!unit) {
        return k_refused;
    }
    const units::Dimension& dimension = unit->dimension();
    std::string code;
    const auto append = [&](const char* atom, int exponent) {
        if (exponent != 0) {
            code += fmt::format("{}{}{}", code.empty() ? "" : ".", atom, exponent);
        }
    };
    append("m", dimension.length);
    append("g", dimension.mass);
    append("s", dimension.time);
    append("K", dimension.temperature);
    append("mol", dimension.amount);
    return fmt::format("{:.17g}\t{}", unit->factor(), code.empty() ? "1" : code);
}

std::string answer(const std::string& line) {
    std::vector<std::string> columns;
    std::istringstream stream(line);
    for (std::string column; std::getline(stream, column, '\t');) {
        columns.push_back(column);
    }
    const std::string& question = columns.at(0);
    if (question == "convert") {
        return convert(columns);
    }
    if (question == "base") {
        return base(columns);
    }
    return units::ucum_of(columns.at(1)).value_or(k_refused);
}

}  // namespace

int main() {
    for (std::string line; std::getline(std::cin, line);) {
        std::cout << answer(line) << '\n';
    }
    return 0;
}
