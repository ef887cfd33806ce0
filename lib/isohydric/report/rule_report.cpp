#include "isohydric/report/rule_report.hpp"

#include "isohydric/diag/render.hpp"
#include "isohydric/interpret/words.hpp"
#include "isohydric/report/caution.hpp"
#include "isohydric/report/detail/text_layout.hpp"
#include "isohydric/rule/plain_text.hpp"

#include <algorithm>
#include <set>

#include <fmt/format.h>

namespace isohydric::report {

namespace {

using rule::EntryKind;
using rule::RuleSet;

constexpr std::size_t k_width = 100;

/// Head and one-line description of an entry, whatever its kind.
struct Line {
    const rule::EntryHead* head;
    std::string says;
};

std::string hyphened(std::string_view kind) {
    std::string name(kind);
    std::replace(name.begin(), name.end(), ' ', '-');
    return name;
}

/// Name, limits and mid-value; for whom they hold is told by the id.
std::string limits_text(const rule::Interval& interval, const RuleSet& rules) {
    const std::string unit = interpret::unit_words(rules.interval_units[interval.name].code());
    std::string text = rules.interval_names[interval.name];
    if (interval.low && interval.high) {
        text += fmt::format(" {:g} to {:g}", *interval.low, *interval.high);
    } else if (interval.low || interval.high) {
        text += interval.low ? fmt::format(" from {:g}", *interval.low)
                             : fmt::format(" up to {:g}", *interval.high);
    }
    text += unit.empty() ? "" : " " + unit;
    return text + (interval.mid ? fmt::format(", mid-value {:g}", *interval.mid) : std::string());
}

Line line_of(const RuleSet& rules, const rule::EntryRef& entry) {
    const std::uint32_t i = entry.index;
    switch (entry.kind) {
    case EntryKind::quantity:
        return {&rules.quantities[i].head, rules.quantities[i].label};
    case EntryKind::condition:
        return {&rules.conditions[i].head, rule::plain_text(*rules.conditions[i].when)};
    case EntryKind::interval:
        return {&rules.intervals[i].head, limits_text(rules.intervals[i], rules)};
    case EntryKind::finding:
        return {&rules.findings[i].head, rules.findings[i].states};
    case EntryKind::table:
        return {&rules.tables[i].head,
                fmt::format("decision table of {} rows", rules.tables[i].rows.size())};
    case EntryKind::explanation:
        return {&rules.explanations[i].head, rules.explanations[i].states};
    case EntryKind::group:
        return {&rules.groups[i].head, fmt::format("{} members", rules.groups[i].members.size())};
    case EntryKind::check:
        return {&rules.checks[i].head,
                (rules.checks[i].stops ? "stops: " : "warns: ") + rules.checks[i].states};
    case EntryKind::critical:
        return {&rules.criticals[i].head, rules.criticals[i].states};
    case EntryKind::disorder:
        return {&rules.disorders[i].head, rules.disorders[i].label};
    case EntryKind::convention:
        return {&rules.conventions[i].head,
                fmt::format("{}: {}{}",
                            rules.conventions[i].choice,
                            rules.conventions[i].title,
                            rules.conventions[i].chosen ? " (in force)" : "")};
    }
    return {nullptr, {}};
}

/// The pages of `rules show`: what each kind has beyond its head.
class Page {
  public:
    explicit Page(const RuleSet& rules) : rules_(rules), out_(k_width) {}

    void write(const rule::EntryRef& entry) {
        const Line line = line_of(rules_, entry);
        out_.item("", fmt::format("{} {}", rule::describe(entry.kind), line.head->id));
        out_.item("  says      ", line.says);
        details(entry);
        head(*line.head);
    }

    /// All alternatives of a choice; nothing if there is no such choice.
    void write_choice(const std::string& choice) {
        const bool known =
            std::any_of(rules_.conventions.begin(),
                        rules_.conventions.end(),
                        [&](const auto& convention) { return convention.choice == choice; });
        if (!known) {
            return;
        }
        out_.item("", "choice " + choice);
        alternatives(choice, true);
        how_to_choose(choice);
    }

    std::string take() { return out_.take(); }

  private:
    void details(const rule::EntryRef& entry);
    void quantity(const rule::Quantity& quantity);
    void finding(const rule::Finding& finding);
    void convention(const rule::Convention& convention);
    void alternatives(const std::string& choice, bool with_reasons);
    void how_to_choose(const std::string& choice);
    void head(const rule::EntryHead& head);

    void when(const rule::ExpressionPtr& expression) {
        out_.item("  when      ", rule::plain_text(*expression));
    }

    const RuleSet& rules_;
    TextLayout out_;
};

void Page::details(const rule::EntryRef& entry) {
    const std::uint32_t i = entry.index;
    switch (entry.kind) {
    case EntryKind::quantity:
        return quantity(rules_.quantities[i]);
    case EntryKind::convention:
        return convention(rules_.conventions[i]);
    case EntryKind::condition:
        return when(rules_.conditions[i].when);
    case EntryKind::finding:
        return finding(rules_.findings[i]);
    case EntryKind::check:
        return when(rules_.checks[i].when);
    case EntryKind::critical:
        return when(rules_.criticals[i].when);
    case EntryKind::explanation: {
        when(rules_.explanations[i].when);
        if (const auto& band = rules_.explanations[i].compensation) {
            out_.item("  expects   ",
                      fmt::format("{} between {} and {} ({})",
                                  rules_.quantities[band->quantity].label,
                                  rule::plain_text(*band->low),
                                  rule::plain_text(*band->high),
                                  band->from));
        }
        return;
    }
    case EntryKind::group:
        if (rules_.groups[i].domain) {
            out_.item("  domain    ", rule::plain_text(*rules_.groups[i].domain));
        }
        out_.item("  declared  ",
                  fmt::format("{}{}",
                              rules_.groups[i].exclusive ? "exclusive " : "",
                              rules_.groups[i].exhaustive ? "exhaustive" : ""));
        return;
    case EntryKind::table:
        for (const std::string& row : rules_.tables[i].rows) {
            out_.item("  row       ", row);
        }
        return;
    case EntryKind::interval:
    case EntryKind::disorder:
        return;
    }
}

void Page::quantity(const rule::Quantity& quantity) {
    out_.item("  unit      ",
              fmt::format("{}, {} decimal{}",
                          quantity.unit.code() == "1" ? "none" : quantity.unit.code(),
                          quantity.decimals,
                          quantity.decimals == 1 ? "" : "s"));
    if (quantity.model) {
        const rule::ModelSignature& model = rules_.models[quantity.model->model];
        out_.item("  model     ", model.id);
        for (std::size_t i = 0; i < model.inputs.size(); ++i) {
            out_.item("    input   ",
                      fmt::format("{} = {}",
                                  model.inputs[i].name,
                                  rule::plain_text(*quantity.model->inputs[i])));
        }
    }
    for (const rule::Alternative& alternative : quantity.alternatives) {
        out_.item("  formula   ",
                  (alternative.from.empty() ? "" : alternative.from + ": ") +
                      rule::plain_text(*alternative.formula));
    }
    const auto owner = rules_.find(quantity.convention, EntryKind::convention);
    if (owner) {
        out_.item("  belongs   ", "to convention " + quantity.convention);
        alternatives(rules_.conventions[*owner].choice, false);
        how_to_choose(rules_.conventions[*owner].choice);
    }
}

void Page::finding(const rule::Finding& finding) {
    when(finding.when);
    std::vector<std::string> asserted;
    for (const std::uint32_t disorder : finding.asserts) {
        asserted.push_back(rules_.disorders[disorder].label);
    }
    if (!asserted.empty()) {
        out_.item("  asserts   ", listed(asserted));
    }
    for (const std::uint32_t other : finding.unless) {
        out_.item("  unless    ", rules_.findings[other].head.id);
    }
    if (!finding.consider.empty()) {
        out_.item("  consider  ", listed(finding.consider, "; "));
    }
}

void Page::convention(const rule::Convention& convention) {
    out_.item("  defines   ", listed(convention.defines));
    alternatives(convention.choice, true);
    how_to_choose(convention.choice);
}

/// The alternative in force with its reason, then the others, with theirs if asked for.
void Page::alternatives(const std::string& choice, bool with_reasons) {
    for (const bool chosen : {true, false}) {
        for (const rule::Convention& other : rules_.conventions) {
            if (other.choice == choice && other.chosen == chosen) {
                const bool reason = (chosen || with_reasons) && !other.why.empty();
                out_.item(chosen ? "  in force  " : "  or        ",
                          fmt::format("{}: {}{}",
                                      other.head.id,
                                      other.title,
                                      reason ? " - " + other.why : std::string()));
            }
        }
    }
}

void Page::how_to_choose(const std::string& choice) {
    out_.item("  choose    ",
              fmt::format("in a set that extends this one: \"conventions\": {{\"{}\": \"<id>\"}}",
                          choice));
}

void Page::head(const rule::EntryHead& head) {
    for (const rule::Citation& source : head.sources) {
        const std::string work = source.ref == "common-practice"
                                     ? "common practice"
                                     : std::string(rules_.citation(source.ref));
        out_.item("  source    ",
                  fmt::format("{}{}{}{}",
                              work,
                              source.at.empty() ? "" : " [" + source.at + "]",
                              source.note.empty() ? "" : "; " + source.note,
                              source.checked ? "" : " (unchecked)"));
    }
    out_.item("  reviewed  ", head.reviewed + (head.policy ? "; a policy" : ""));
    out_.item("  file      ", diag::render(head.place));
}

}  // namespace

std::string list_rules(const RuleSet& rules, std::string_view kind) {
    TextLayout out(k_width);
    out.item("", fmt::format("{} {}: {}", rules.id, rules.version, rules.title));
    for (const std::string& name : kind_names()) {
        TextLayout::Rows rows;
        for (const auto& [id, entry] : rules.by_id) {
            if (hyphened(rule::describe(entry.kind)) == name) {
                const Line line = line_of(rules, entry);
                rows.push_back({id, line.says + (line.head->unchecked() ? " (unchecked)" : "")});
            }
        }
        if (!rows.empty() && (kind.empty() || kind == name)) {
            out.heading(fmt::format("{} ({})", name, rows.size()));
            out.table(rows, "  ");
        }
    }
    return with_caution(out.take(), k_width);
}

std::vector<std::string> kind_names() {
    std::vector<std::string> names;
    for (auto kind = EntryKind::quantity; kind <= EntryKind::convention;
         kind = static_cast<EntryKind>(static_cast<int>(kind) + 1)) {
        names.push_back(hyphened(rule::describe(kind)));
    }
    return names;
}

/// A choice may have the name of an entry; then both are shown.
std::optional<std::string> show_rule(const RuleSet& rules, std::string_view id) {
    Page page(rules);
    page.write_choice(std::string(id));
    std::string text = page.take();
    if (const std::optional<rule::EntryRef> entry = rules.find(id)) {
        text += text.empty() ? "" : "\n";
        page.write(*entry);
        text += page.take();
    }
    return text.empty() ? std::nullopt : std::optional<std::string>(with_caution(text, k_width));
}

std::vector<std::string> names_to_show(const RuleSet& rules) {
    std::set<std::string> names;
    for (const auto& entry : rules.by_id) {
        names.insert(entry.first);
    }
    for (const rule::Convention& convention : rules.conventions) {
        names.insert(convention.choice);
    }
    return {names.begin(), names.end()};
}

}  // namespace isohydric::report
