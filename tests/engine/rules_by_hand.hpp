// Small rule sets for the tests of the engine, written as expressions instead of files.
#pragma once

#include "isohydric/panel/block.hpp"
#include "isohydric/panel/panel.hpp"
#include "isohydric/rule/rule_set.hpp"

#include <initializer_list>
#include <memory>
#include <optional>
#include <string>
#include <utility>
#include <vector>

namespace isohydric::test {

/// Builds a rule set entry by entry; each expression may use the names defined before it. A faulty expression throws.
class RulesByHand {
  public:
    RulesByHand();

    std::uint32_t
    quantity(const std::string& id, const std::string& formula, const std::string& unit);
    std::uint32_t first_of(const std::string& id,
                           const std::vector<std::pair<std::string, std::string>>& from_and_formula,
                           const std::string& unit);
    std::uint32_t model(const std::string& id,
                        const std::string& model_id,
                        const std::vector<std::string>& inputs,
                        const std::string& unit);
    std::uint32_t condition(const std::string& id, const std::string& when);
    std::uint32_t finding(const std::string& id,
                          const std::string& when,
                          const std::vector<std::uint32_t>& unless = {});
    /// An interval of `name`, whose unit is that of the first interval of that name.
    rule::Interval& interval(const std::string& name,
                             const std::string& unit,
                             std::optional<double> low,
                             std::optional<double> high);

    /// An expression over the names defined so far, of any type.
    [[nodiscard]] rule::ExpressionPtr expression(const std::string& text,
                                                 rule::Type type,
                                                 const std::optional<std::string>& unit = {});

    [[nodiscard]] rule::RuleSet& set() { return *set_; }

    [[nodiscard]] std::shared_ptr<const rule::RuleSet> rules() const { return set_; }

  private:
    std::uint32_t add(rule::Quantity quantity, const std::string& id, const std::string& unit);

    std::shared_ptr<rule::RuleSet> set_;
};

/// A panel with these values, each as if entered with `half_digit` 0.05.
[[nodiscard]] panel::Panel
panel_of(std::initializer_list<std::pair<panel::Analyte, double>> values);

/// A block of these panels.
[[nodiscard]] panel::PanelBlock block_of(const std::vector<panel::Panel>& panels);

}  // namespace isohydric::test
