#include "reference/limit_panels.hpp"

#include "isohydric/rule/walk.hpp"

#include <cmath>

namespace isohydric::test {

namespace {

constexpr std::uint32_t k_seed = 20261201;

using Limits = std::map<std::string, std::vector<double>>;

void add_intervals(Limits& limits, const rule::RuleSet& rules) {
    for (const rule::Interval& interval : rules.intervals) {
        std::vector<double>& numbers = limits[rules.interval_units[interval.name].code()];
        for (const auto& limit : {interval.low, interval.mid, interval.high}) {
            if (limit) {
                numbers.push_back(*limit);
            }
        }
    }
}

void add_literals(Limits& limits, const rule::ExpressionPtr& expression) {
    if (expression) {
        rule::for_each_node(*expression, [&limits](const rule::Expression& node) {
            if (node.kind == rule::NodeKind::number_literal) {
                limits[node.unit.code()].push_back(node.number);
            }
        });
    }
}

}  // namespace

LimitPanels::LimitPanels(const rule::RuleSet& rules)
    : rules_(rules), random_(k_seed) {  // NOLINT(cert-msc51-cpp): the same panels every time
    add_intervals(limits_, rules);
    for (const rule::Quantity& quantity : rules.quantities) {
        for (const rule::Alternative& alternative : quantity.alternatives) {
            add_literals(limits_, alternative.formula);
        }
    }
    for (const rule::Condition& condition : rules.conditions) {
        add_literals(limits_, condition.when);
    }
    for (const rule::Finding& finding : rules.findings) {
        add_literals(limits_, finding.when);
    }
    for (const rule::Check& check : rules.checks) {
        add_literals(limits_, check.when);
    }
    for (const rule::Critical& critical : rules.criticals) {
        add_literals(limits_, critical.when);
    }
}

double LimitPanels::uniform(double low, double high) {
    // Not std::uniform_real_distribution: its numbers differ between libraries.
    constexpr double k_two_to_32 = 4294967296.0;
    return low + (high - low) * (static_cast<double>(random_()) / k_two_to_32);
}

bool LimitPanels::one_in(unsigned chances) {
    return random_() % chances == 0;
}

/// Half of the values on a limit, where one of the unit is plausible; the others printed as an analyser prints them.
double LimitPanels::value(const panel::AnalyteInfo& info) {
    const std::vector<double>& numbers = limits_[info.unit.code()];
    if (!numbers.empty() && one_in(2)) {
        const double limit = numbers[random_() % numbers.size()];
        if (info.plausible.contain(limit)) {
            return limit;
        }
    }
    const double scale = std::pow(10.0, info.decimals);
    return std::round(uniform(info.plausible.low, info.plausible.high) * scale) / scale;
}

panel::Panel LimitPanels::next() {
    panel::Panel panel;
    const unsigned chances_of_missing =
        2 + random_() % 8;  // some panels are full, some are half empty
    for (const panel::AnalyteInfo& info : rules_.catalogue->analytes) {
        if (!one_in(chances_of_missing)) {
            panel::Entered entered;
            entered.value = value(info);
            entered.half_digit = 0.5 * std::pow(10.0, -info.decimals);
            panel[info.analyte] = entered;
        }
    }
    set_context(panel.context);
    return panel;
}

void LimitPanels::set_context(panel::Context& context) {
    constexpr double k_oldest_a = 100.0;
    constexpr double k_highest_m = 5500.0;
    if (!one_in(2)) {
        context.specimen = static_cast<panel::Specimen>(random_() % panel::k_specimen_names.size());
        context.population =
            static_cast<panel::Population>(random_() % panel::k_population_names.size());
    } else {
        context.specimen = panel::Specimen::arterial;
    }
    context.onset = static_cast<panel::StatedOnset>(random_() % panel::k_onset_names.size());
    if (one_in(3)) {
        context.age_a = std::round(uniform(0.0, k_oldest_a));
    }
    if (one_in(4)) {
        context.altitude_m = std::round(uniform(0.0, k_highest_m));
    }
    if (one_in(4)) {
        context.baseline_pco2_mmHg = std::round(uniform(30.0, 80.0));
        if (one_in(2)) {
            context.baseline_hco3_mmol_L = std::round(uniform(20.0, 40.0));
        }
    }
}

}  // namespace isohydric::test
