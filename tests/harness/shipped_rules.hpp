// The shipped rules, and panels as texts, for tests of what stands above them.
#pragma once

#include "isohydric/engine/program.hpp"
#include "isohydric/interpret/interpretation.hpp"
#include "isohydric/panel/panel.hpp"

#include <initializer_list>
#include <memory>
#include <optional>
#include <string>
#include <utility>

namespace isohydric::harness {

using Texts = std::initializer_list<std::pair<const char*, const char*>>;

/// The shipped rule set, read once for the whole test program. Fails the test if it has errors.
[[nodiscard]] std::shared_ptr<const rule::RuleSet> shipped_rules();

/// The same, compiled with everything in it.
[[nodiscard]] std::shared_ptr<const engine::Program> shipped_program();

/// A panel from texts; fails the test if one cannot be read.
[[nodiscard]] panel::Panel make_panel(Texts values, Texts context = {});

/// Interprets with the shipped rules.
[[nodiscard]] interpret::Interpretation interpreted(const panel::Panel& panel);
[[nodiscard]] interpret::Interpretation interpreted(Texts values,
                                                    Texts context = {{"specimen", "arterial"}});

/// Members of a result by id; fails the test if there is none.
[[nodiscard]] const interpret::CheckResult& check_of(const interpret::Interpretation& result,
                                                     const std::string& id);
[[nodiscard]] const interpret::FindingResult& finding_of(const interpret::Interpretation& result,
                                                         const std::string& id);
[[nodiscard]] const interpret::QuantityResult& quantity_of(const interpret::Interpretation& result,
                                                           const std::string& name);
[[nodiscard]] const interpret::DisorderResult& disorder_of(const interpret::Interpretation& result,
                                                           const std::string& id);

/// Main disorders of each listed explanation, joined by `+`; "none" for the empty set.
[[nodiscard]] std::vector<std::string> explanation_sets(const interpret::Interpretation& result);

}  // namespace isohydric::harness
