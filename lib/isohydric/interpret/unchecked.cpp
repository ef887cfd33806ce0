// Which entries that had a part in the results hold a value not compared with its source.
#include "isohydric/interpret/detail/assemble.hpp"

#include <algorithm>

namespace isohydric::interpret {

namespace {

class UncheckedIds {
  public:
    void add(const std::string& id, const std::vector<rule::Citation>& sources) {
        const bool unchecked =
            std::any_of(sources.begin(), sources.end(), [](const rule::Citation& source) {
                return !source.checked;
            });
        if (unchecked && std::find(ids_.begin(), ids_.end(), id) == ids_.end()) {
            ids_.push_back(id);
        }
    }

    void add(const rule::Interval* interval) {
        if (interval != nullptr) {
            add(interval->head.id, interval->head.sources);
        }
    }

    [[nodiscard]] std::vector<std::string> take() { return std::move(ids_); }

  private:
    std::vector<std::string> ids_;
};

const rule::Interval* interval_of(const QuantityResult& quantity, const Evaluation& evaluation) {
    const std::optional<std::uint32_t> index = evaluation.rules().find_quantity(quantity.name);
    return index ? evaluation.interval(evaluation.rules().quantities[*index].interval) : nullptr;
}

}  // namespace

std::vector<std::string> unchecked_ids(const Interpretation& so_far, const Evaluation& evaluation) {
    UncheckedIds ids;
    for (const CriticalValue& value : so_far.critical) {
        ids.add(value.id, value.sources);
    }
    for (const QuantityResult& quantity : so_far.quantities) {
        if (quantity.value) {
            ids.add(quantity.name, quantity.sources);
            ids.add(interval_of(quantity, evaluation));
        }
    }
    for (const FindingResult& finding : so_far.findings) {
        if (finding.state == Truth::yes) {
            ids.add(finding.id, finding.sources);
        }
    }
    for (const ExplanationResult& explanation : so_far.explanations) {
        ids.add(explanation.id, explanation.sources);
    }
    return ids.take();
}

}  // namespace isohydric::interpret
