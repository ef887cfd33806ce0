#include "isohydric/rule/cases.hpp"

#include "isohydric/diag/text.hpp"
#include "isohydric/rule/detail/entry_fields.hpp"

#include <algorithm>
#include <array>
#include <utility>

#include <fmt/format.h>

namespace isohydric::rule {
namespace {

constexpr std::array<std::string_view, 7> k_context_items{
    "specimen", "population", "age", "altitude", "onset", "baseline-pCO2", "baseline-HCO3"};
constexpr std::array<std::string_view, 3> k_states{"yes", "no", "unknown"};
constexpr std::array<EntryKind, 6> k_expected_kinds{EntryKind::quantity,
                                                    EntryKind::condition,
                                                    EntryKind::finding,
                                                    EntryKind::check,
                                                    EntryKind::critical,
                                                    EntryKind::explanation};

using Pairs = std::vector<std::pair<std::string, std::string>>;

class CaseReader {
  public:
    CaseReader(const RuleSet& rules,
               const std::function<bool(std::string_view)>& superseded,
               diag::Report& report)
        : rules_(rules), superseded_(superseded), report_(report) {}

    Case read(const diag::Json& json) {
        diag::ObjectReader reader(json, report_, "case");
        Case result;
        if (const diag::Json* id = reader.required("id", diag::Kind::string)) {
            result.id = id->text();
            result.place = id->place();
        }
        result.panel = read_pairs(reader.required("panel", diag::Kind::object),
                                  [&](const diag::Member& member) { check_analyte(member); });
        result.context = read_pairs(reader.optional("context", diag::Kind::object),
                                    [&](const diag::Member& member) { check_item(member); });
        if (const diag::Json* expect = reader.required("expect", diag::Kind::object)) {
            for (const diag::Member& member : expect->members()) {
                read_expectation(member, result);
            }
        }
        if (const diag::Json* source = reader.any("source")) {
            result.sources = detail::read_citations(*source, report_);
        }
        reader.finish();
        return result;
    }

  private:
    template <class Check>
    Pairs read_pairs(const diag::Json* object, const Check& check) {
        Pairs pairs;
        if (object == nullptr) {
            return pairs;
        }
        for (const diag::Member& member : object->members()) {
            check(member);
            if (diag::expect_kind(
                    member.value, diag::Kind::string, "the value, as text", report_)) {
                pairs.emplace_back(member.name, member.value.text());
            }
        }
        return pairs;
    }

    void check_analyte(const diag::Member& member) {
        if (!rules_.catalogue->find(member.name)) {
            report_.error("rule-case-analyte",
                          member.name_place,
                          panel::unknown_name(*rules_.catalogue, member.name));
        }
    }

    void check_item(const diag::Member& member) {
        static_cast<void>(detail::read_word(
            {member.name, member.name_place}, k_context_items, "context item", report_));
    }

    void read_expectation(const diag::Member& member, Case& result) {
        if (superseded_(member.name)) {
            return;
        }
        const auto entry = rules_.find(member.name);
        if (!entry || std::ranges::find(k_expected_kinds, entry->kind) == k_expected_kinds.end()) {
            report_.error("rule-case-entry",
                          member.name_place,
                          fmt::format("\"{}\" has no value to expect; name a quantity, condition, "
                                      "finding, check, critical value or explanation{}",
                                      member.name,
                                      diag::did_you_mean(member.name, known_ids())));
            return;
        }
        if (fits(member.value, entry->kind)) {
            result.expect.push_back(
                {member.name, std::string(member.value.text()), member.value.place()});
            return;
        }
        report_.error("rule-case-value",
                      member.value.place(),
                      entry->kind == EntryKind::quantity
                          ? "a quantity is expected as a number, or as \"unknown\""
                          : "this is expected as \"yes\", \"no\" or \"unknown\"");
    }

    static bool fits(const diag::Json& value, EntryKind kind) {
        if (kind == EntryKind::quantity && value.kind() == diag::Kind::number) {
            return true;
        }
        if (value.kind() != diag::Kind::string) {
            return false;
        }
        return kind == EntryKind::quantity
                   ? value.text() == "unknown"
                   : std::ranges::find(k_states, value.text()) != k_states.end();
    }

    [[nodiscard]] std::vector<std::string> known_ids() const {
        std::vector<std::string> ids;
        for (const auto& [id, entry] : rules_.by_id) {
            ids.push_back(id);
        }
        return ids;
    }

    const RuleSet& rules_;
    const std::function<bool(std::string_view)>& superseded_;
    diag::Report& report_;
};

}  // namespace

std::string cases_path_of(std::string_view rule_file_path) {
    constexpr std::string_view k_ending = ".json";
    if (rule_file_path.ends_with(k_ending)) {
        rule_file_path.remove_suffix(k_ending.size());
    }
    return std::string(rule_file_path) + ".cases.json";
}

std::vector<Case> read_cases(const diag::Json& file,
                             const RuleSet& rules,
                             const std::function<bool(std::string_view id)>& superseded,
                             diag::Report& report) {
    std::vector<Case> cases;
    if (!diag::expect_kind(file, diag::Kind::array, "a file of cases", report)) {
        return cases;
    }
    CaseReader reader(rules, superseded, report);
    for (const diag::Json& item : file.items()) {
        Case read = reader.read(item);
        const auto first = std::ranges::find(cases, read.id, &Case::id);
        if (first != cases.end()) {
            report
                .error("rule-id-twice",
                       read.place,
                       fmt::format("two cases of this file are called \"{}\"; rename one", read.id))
                .notes.push_back({"the first is here", first->place});
        }
        cases.push_back(std::move(read));
    }
    return cases;
}

}  // namespace isohydric::rule
