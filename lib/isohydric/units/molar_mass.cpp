#include "isohydric/units/molar_mass.hpp"

#include <algorithm>

namespace isohydric::units {

std::optional<double> molar_mass_g_mol(std::string_view substance) {
    const auto* found = std::ranges::find(k_substances, substance, &Substance::name);
    return found == k_substances.end() ? std::nullopt : std::optional(found->molar_mass_g_mol);
}

std::optional<double>
factor_by_molar_mass(const Unit& from, const Unit& to, double molar_mass_g_mol) {
    static const Unit gram_per_mole = parse_unit("g/mol").value();
    if (const Unit amount = from / gram_per_mole; commensurable(amount, to)) {
        return factor_between(amount, to) / molar_mass_g_mol;
    }
    if (const Unit mass = from * gram_per_mole; commensurable(mass, to)) {
        return factor_between(mass, to) * molar_mass_g_mol;
    }
    return std::nullopt;
}

}  // namespace isohydric::units
