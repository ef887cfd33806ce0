#include "isohydric/rule/walk.hpp"

#include <algorithm>

namespace isohydric::rule {

std::vector<Symbol> names_of(const Expression& expression) {
    std::vector<Symbol> names;
    for_each_node(expression, [&names](const Expression& node) {
        const bool fresh = node.kind == NodeKind::name &&
                           std::find(names.begin(), names.end(), node.symbol) == names.end();
        if (fresh) {
            names.push_back(node.symbol);
        }
    });
    return names;
}

}  // namespace isohydric::rule
