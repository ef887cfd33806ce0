#include "isohydric/report/rule_report.hpp"

#include "isohydric/diag/render.hpp"
#include "isohydric/report/caution.hpp"
#include "isohydric/report/detail/text_layout.hpp"
#include "isohydric/rule/plain_text.hpp"

#include <algorithm>
#include <vector>

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

std::string limits_text(const rule::Interval& interval, const RuleSet& rules) {
    const auto number = [](const std::optional<double>& value) {
        return value ? fmt::format("{:g}", *value) : std::string("-");
    };
    return fmt::format("{} {} to {}, mid {} {}",
                       rules.interval_names[interval.name],
                       number(interval.low),
                       number(interval.high),
                       number(interval.mid),
                       rules.interval_units[interval.name].code());
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

    std::string write(const rule::EntryRef& entry) {
        const Line line = line_of(rules_, entry);
        out_.item("", caution());
        out_.blank();
        out_.item("", fmt::format("{} {}", rule::describe(entry.kind), line.head->id));
        out_.item("  says      ", line.says);
        details(entry);
        head(*line.head);
        out_.blank();
        out_.item("", caution());
        return out_.take();
    }

  private:
    void details(const rule::EntryRef& entry);
    void quantity(const rule::Quantity& quantity);
    void convention(const rule::Convention& convention);
    void alternatives(const std::string& choice);
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
        return when(rules_.findings[i].when);
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
              fmt::format("{}, {} decimals", quantity.unit.code(), quantity.decimals));
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
        alternatives(rules_.conventions[*owner].choice);
    }
}

void Page::convention(const rule::Convention& convention) {
    out_.item("  why       ", convention.why);
    for (const std::string& id : convention.defines) {
        out_.item("  defines   ", id);
    }
    alternatives(convention.choice);
}

void Page::alternatives(const std::string& choice) {
    for (const rule::Convention& other : rules_.conventions) {
        if (other.choice == choice) {
            out_.item(other.chosen ? "  in force  " : "  or        ",
                      fmt::format("{}: {}. {}", other.head.id, other.title, other.why));
        }
    }
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
    out.item("", caution());
    out.blank();
    std::vector<std::vector<std::string>> rows;
    for (const auto& [id, entry] : rules.by_id) {
        if (kind.empty() || rule::describe(entry.kind) == kind) {
            const Line line = line_of(rules, entry);
            rows.push_back({std::string(rule::describe(entry.kind)),
                            id,
                            line.head->reviewed,
                            line.head->unchecked() ? "unchecked" : "",
                            line.says});
        }
    }
    std::stable_sort(rows.begin(), rows.end(), [](const auto& a, const auto& b) {
        return a.front() < b.front();
    });
    out.table(rows, "");
    out.blank();
    out.item("", caution());
    return out.take();
}

std::optional<std::string> show_rule(const RuleSet& rules, std::string_view id) {
    const std::optional<rule::EntryRef> entry = rules.find(id);
    return entry ? std::optional<std::string>(Page(rules).write(*entry)) : std::nullopt;
}

}  // namespace isohydric::report
