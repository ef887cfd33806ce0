// Panel -> Interpretation: evaluates the compiled rules and assembles what they say.
#pragma once

#include "isohydric/interpret/interpretation.hpp"

#include <memory>

namespace isohydric::interpret {

/// Interprets panels one at a time with one rule set. Not thread-safe: one per thread; the program is shared.
class Interpreter {
  public:
    explicit Interpreter(std::shared_ptr<const engine::Program> program);

    /// Everything the rules say about `panel`. Never fails: what cannot be judged is unknown, with its needs.
    [[nodiscard]] Interpretation interpret(const panel::Panel& panel);

  private:
    std::shared_ptr<const engine::Program> program_;
    panel::PanelBlock block_;
    engine::Scratch scratch_;
};

}  // namespace isohydric::interpret
