// A syntax tree as nested lists, operator first: `(+ a (* b c))`.
#pragma once

#include "isohydric/rule/names.hpp"
#include "isohydric/rule/parser.hpp"

#include <string>

namespace isohydric::rule::testing {

inline std::string tree_of(const Syntax& node) {
    if (node.children.empty()) {
        return node.kind == NodeKind::name ? written_name(node.path) : node.text;
    }
    std::string inner;
    for (const Syntax& child : node.children) {
        inner += " " + tree_of(child);
    }
    return "(" + node.text + inner + ")";
}

}  // namespace isohydric::rule::testing
