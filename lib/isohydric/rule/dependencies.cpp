#include "isohydric/rule/dependencies.hpp"

#include "isohydric/rule/walk.hpp"

#include <algorithm>

namespace isohydric::rule {
namespace {

class Collector {
  public:
    void add(const Symbol& symbol) {
        if (std::ranges::find(symbols_, symbol) == symbols_.end()) {
            symbols_.push_back(symbol);
        }
    }

    void add(const ExpressionPtr& expression) {
        for (const Symbol& symbol : names_of(*expression)) {
            add(symbol);
        }
    }

    void add(const Quantity& quantity) {
        for (const Alternative& alternative : quantity.alternatives) {
            add(alternative.formula);
        }
        if (quantity.model) {
            for (const ExpressionPtr& input : quantity.model->inputs) {
                add(input);
            }
        }
    }

    void add(const Finding& finding) {
        add(finding.when);
        for (const std::uint32_t index : finding.unless) {
            add(Symbol{.kind = SymbolKind::finding, .index = index});
        }
    }

    [[nodiscard]] std::vector<Symbol> take() { return std::move(symbols_); }

  private:
    std::vector<Symbol> symbols_;
};

}  // namespace

std::vector<Symbol> dependencies_of(const RuleSet& rules, const Symbol& symbol) {
    Collector collector;
    if (symbol.kind == SymbolKind::quantity) {
        collector.add(rules.quantities[symbol.index]);
    } else if (symbol.kind == SymbolKind::condition) {
        collector.add(rules.conditions[symbol.index].when);
    } else if (symbol.kind == SymbolKind::finding) {
        collector.add(rules.findings[symbol.index]);
    }
    return collector.take();
}

}  // namespace isohydric::rule
