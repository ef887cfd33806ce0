// Panels that lie on the limits of a rule set: seeded, with missing values, in every context.
#pragma once

#include "isohydric/panel/panel.hpp"
#include "isohydric/rule/rule_set.hpp"

#include <map>
#include <random>
#include <string>
#include <vector>

namespace isohydric::test {

/// A source of panels. An analyte's value is missing, or any plausible one, or one of the numbers of its unit that the
/// intervals and expressions of the rule set name.
class LimitPanels {
  public:
    explicit LimitPanels(const rule::RuleSet& rules);

    [[nodiscard]] panel::Panel next();

  private:
    [[nodiscard]] double uniform(double low, double high);
    [[nodiscard]] bool one_in(unsigned chances);
    [[nodiscard]] double value(const panel::AnalyteInfo& info);
    void set_context(panel::Context& context);

    const rule::RuleSet& rules_;
    std::map<std::string, std::vector<double>> limits_;  ///< by UCUM code of the unit
    std::mt19937 random_;
};

}  // namespace isohydric::test
