#include "isohydric/rule/detail/declarations.hpp"

#include "isohydric/diag/text.hpp"
#include "isohydric/rule/detail/fields.hpp"
#include "isohydric/rule/detail/units_of.hpp"

#include <algorithm>
#include <array>
#include <set>
#include <utility>

#include <fmt/format.h>

namespace isohydric::rule::detail {
namespace {

// Words that expressions read as something other than the name of an entry.
constexpr std::array<std::string_view, 15> k_reserved{"limits",
                                                      "context",
                                                      "rounding",
                                                      "and",
                                                      "or",
                                                      "xor",
                                                      "implies",
                                                      "div",
                                                      "mod",
                                                      "in",
                                                      "contains",
                                                      "as",
                                                      "is",
                                                      "true",
                                                      "false"};

std::string choice_of(const diag::Json& convention) {
    const diag::Json* choice = peek(convention, "choice", diag::Kind::string);
    return choice == nullptr ? std::string() : std::string(choice->text());
}

/// Who has an id. Alternatives of one choice share theirs.
struct Owner {
    diag::Place place;  ///< where it was first used
    std::string choice;
    std::set<std::string, std::less<>> conventions;  ///< alternatives that have it
};

/// The convention whose members are being declared; none for entries that stand by themselves.
struct Membership {
    std::string choice;
    std::string convention;
    bool chosen = true;
};

class Declarer {
  public:
    Declarer(const Chosen& chosen, RuleSet& rules, diag::Report& report)
        : chosen_(chosen), rules_(rules), report_(report) {}

    void declare(const Draft& draft, const Membership& membership = {}) {
        if (!claim(draft.id, draft.kind, draft.id_place(), membership)) {
            return;
        }
        Declared declared{.kind = draft.kind,
                          .json = draft.json,
                          .convention = membership.convention,
                          .in_force = membership.chosen};
        if (membership.chosen) {
            declared.index = place(draft);
            rules_.by_id.emplace(draft.id, EntryRef{draft.kind, declared.index});
        }
        declared_.push_back(declared);
        if (draft.kind == EntryKind::convention) {
            declare_members(draft, declared.index);
        }
    }

    [[nodiscard]] std::vector<Declared> take() { return std::move(declared_); }

  private:
    bool claim(const std::string& id,
               EntryKind kind,
               const diag::Place& place,
               const Membership& membership) {
        if (kind == EntryKind::quantity || kind == EntryKind::condition) {
            if (!free_as_name(id, place)) {
                return false;
            }
        }
        const auto [found, fresh] = owners_.try_emplace(id, Owner{place, membership.choice, {}});
        Owner& owner = found->second;
        const bool new_to_alternative = owner.conventions.insert(membership.convention).second;
        const bool sibling = !membership.choice.empty() && owner.choice == membership.choice;
        if (fresh || (sibling && new_to_alternative)) {
            return true;
        }
        report_
            .error("rule-id-twice",
                   place,
                   fmt::format("the id \"{}\" is used twice; ids are unique over all kinds of "
                               "entries, so rename one of them",
                               id))
            .notes.push_back({"the first is here", owner.place});
        return false;
    }

    bool free_as_name(const std::string& id, const diag::Place& place) {
        if (std::ranges::find(k_reserved, id) != k_reserved.end()) {
            report_.error("rule-id-form",
                          place,
                          fmt::format("\"{}\" is a word of the expression language; choose another "
                                      "name",
                                      id));
            return false;
        }
        const auto& analytes = rules_.catalogue->analytes;
        if (std::ranges::find(analytes, id, &panel::AnalyteInfo::expression_name) !=
            analytes.end()) {
            report_.error(
                "rule-id-twice",
                place,
                fmt::format("\"{}\" already names the entered value of an analyte; choose "
                            "another name",
                            id));
            return false;
        }
        return true;
    }

    /// Appends the shell of an entry and gives its index.
    std::uint32_t place(const Draft& draft) {
        switch (draft.kind) {
        case EntryKind::quantity:
            return place_quantity(draft);
        case EntryKind::condition:
            return append(rules_.conditions, draft.id);
        case EntryKind::interval:
            return place_interval(draft);
        case EntryKind::finding:
            return append(rules_.findings, draft.id);
        case EntryKind::table:
            return place_table(draft);
        case EntryKind::explanation:
            return place_explanation(draft);
        case EntryKind::group:
            return append(rules_.groups, draft.id);
        case EntryKind::check:
            return append(rules_.checks, draft.id);
        case EntryKind::critical:
            return append(rules_.criticals, draft.id);
        case EntryKind::disorder:
            return place_disorder(draft);
        case EntryKind::convention:
            return append(rules_.conventions, draft.id);
        }
        ISOHYDRIC_NEVER();
    }

    template <class Entry>
    static std::uint32_t append(std::vector<Entry>& entries, const std::string& id) {
        entries.emplace_back().head.id = id;
        return static_cast<std::uint32_t>(entries.size() - 1);
    }

    std::optional<units::Unit> unit_of(const Draft& draft) {
        diag::ObjectReader reader(*draft.json, report_, std::string(rule::describe(draft.kind)));
        const diag::Json* unit = reader.required("unit", diag::Kind::string);
        return unit == nullptr ? std::nullopt : read_unit(*unit, report_);
    }

    std::uint32_t place_quantity(const Draft& draft) {
        const std::uint32_t index = append(rules_.quantities, draft.id);
        rules_.quantities[index].unit = unit_of(draft).value_or(units::one());
        return index;
    }

    // References to disorders ask whether they are main ones.
    std::uint32_t place_disorder(const Draft& draft) {
        const std::uint32_t index = append(rules_.disorders, draft.id);
        const diag::Json* main = peek(*draft.json, "main", diag::Kind::boolean);
        rules_.disorders[index].main = main != nullptr && main->as_bool();
        return index;
    }

    // Groups ask for all explanations of an approach.
    std::uint32_t place_explanation(const Draft& draft) {
        const std::uint32_t index = append(rules_.explanations, draft.id);
        if (const diag::Json* approach = peek(*draft.json, "approach", diag::Kind::string)) {
            rules_.explanations[index].approach = approach->text();
        }
        return index;
    }

    std::uint32_t place_interval(const Draft& draft) {
        const std::uint32_t index = append(rules_.intervals, draft.id);
        diag::ObjectReader reader(*draft.json, report_, "interval");
        const diag::Json* of = reader.required("of", diag::Kind::string);
        const auto unit = unit_of(draft);
        if (of == nullptr || !unit) {
            return index;
        }
        const auto name = rules_.find_interval_name(of->text());
        if (!name) {
            rules_.interval_names.emplace_back(of->text());
            rules_.interval_units.push_back(*unit);
        } else if (rules_.interval_units[*name] != *unit) {
            report_.error("rule-unit-differs",
                          draft.json->find("unit")->place(),
                          fmt::format("this interval of \"{}\" is in {}, an earlier one in {}; "
                                      "give all intervals of a name in one unit",
                                      of->text(),
                                      unit->code(),
                                      rules_.interval_units[*name].code()));
        }
        return index;
    }

    std::uint32_t place_table(const Draft& draft) {
        const std::uint32_t index = append(rules_.tables, draft.id);
        for (const diag::Json& row : peek_items(*draft.json, "rows")) {
            diag::ObjectReader reader(row, report_, "row");
            const diag::Json* id = reader.required("id", diag::Kind::string);
            if (id == nullptr || !check_id(*id, EntryKind::table, report_)) {
                continue;
            }
            const std::string full = fmt::format("{}.{}", draft.id, id->text());
            const EntryKind kind =
                row.find("stops") == nullptr ? EntryKind::finding : EntryKind::check;
            if (claim(full, kind, id->place(), {})) {
                const std::uint32_t at = kind == EntryKind::finding ? append(rules_.findings, full)
                                                                    : append(rules_.checks, full);
                rules_.by_id.emplace(full, EntryRef{kind, at});
                rules_.tables[index].rows.push_back(full);
            }
        }
        return index;
    }

    void declare_members(const Draft& convention, std::uint32_t index) {
        const std::string choice = choice_of(*convention.json);
        const auto chosen = chosen_.find(choice);
        Membership membership{
            choice, convention.id, chosen != chosen_.end() && chosen->second == convention.id};
        rules_.conventions[index].choice = choice;
        rules_.conventions[index].chosen = membership.chosen;
        for (const auto& [name, kind] : {std::pair("quantities", EntryKind::quantity),
                                         std::pair("conditions", EntryKind::condition)}) {
            const auto items = peek_items(*convention.json, name);
            for (const Draft& draft : read_draft_list(items, kind, report_)) {
                rules_.conventions[index].defines.push_back(draft.id);
                declare(draft, membership);
            }
        }
    }

    const Chosen& chosen_;
    RuleSet& rules_;
    diag::Report& report_;
    std::map<std::string, Owner, std::less<>> owners_;
    std::vector<Declared> declared_;
};

/// The conventions of all drafts, by choice.
using Alternatives = std::map<std::string, std::vector<const Draft*>, std::less<>>;

Alternatives alternatives_by_choice(const std::vector<Draft>& drafts) {
    Alternatives alternatives;
    for (const Draft& draft : drafts) {
        if (draft.kind == EntryKind::convention) {
            alternatives[choice_of(*draft.json)].push_back(&draft);
        }
    }
    return alternatives;
}

std::vector<std::string> ids_of(const std::vector<const Draft*>& drafts) {
    std::vector<std::string> ids;
    ids.reserve(drafts.size());
    for (const Draft* draft : drafts) {
        ids.push_back(draft->id);
    }
    return ids;
}

/// Reports a choice that nobody offers, and an alternative that the choice does not have.
void check_choice(const Written& choice,
                  const Written& convention,
                  const Alternatives& alternatives,
                  diag::Report& report) {
    const auto found = alternatives.find(choice.text);
    const auto ids =
        found == alternatives.end() ? std::vector<std::string>() : ids_of(found->second);
    if (std::ranges::find(ids, convention.text) != ids.end()) {
        return;
    }
    report.error("rule-choice",
                 ids.empty() ? choice.place : convention.place,
                 ids.empty() ? fmt::format("no convention belongs to a choice \"{}\"", choice.text)
                             : fmt::format("\"{}\" is no alternative of \"{}\"; choose one of {}",
                                           convention.text,
                                           choice.text,
                                           diag::join(ids, ", ")));
}

}  // namespace

Chosen choose_conventions(const std::vector<SetFile>& chain,
                          const std::vector<Draft>& drafts,
                          diag::Report& report) {
    const auto alternatives = alternatives_by_choice(drafts);
    Chosen chosen;
    for (const SetFile& set : chain) {
        for (const auto& [choice, convention] : set.conventions) {
            check_choice(choice, convention, alternatives, report);
            chosen[choice.text] = convention.text;
        }
    }
    for (const auto& [choice, offered] : alternatives) {
        if (!choice.empty() && !chosen.contains(choice)) {
            report.error("rule-choice",
                         chain.back().place,
                         fmt::format("the set chooses nothing for \"{}\"; choose one of {} in "
                                     "\"conventions\"",
                                     choice,
                                     diag::join(ids_of(offered), ", ")));
        }
    }
    return chosen;
}

std::vector<Declared> declare(const std::vector<Draft>& drafts,
                              const Chosen& chosen,
                              RuleSet& rules,
                              diag::Report& report) {
    Declarer declarer(chosen, rules, report);
    for (const Draft& draft : drafts) {
        declarer.declare(draft);
    }
    return declarer.take();
}

}  // namespace isohydric::rule::detail
