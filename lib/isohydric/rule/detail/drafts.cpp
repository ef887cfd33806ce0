#include "isohydric/rule/detail/drafts.hpp"

#include "isohydric/diag/text.hpp"
#include "isohydric/rule/detail/fields.hpp"

#include <algorithm>
#include <array>
#include <utility>

#include <fmt/format.h>

namespace isohydric::rule::detail {
namespace {

struct ArrayOfKind {
    std::string_view name;
    EntryKind kind;
};

constexpr std::array<ArrayOfKind, 11> k_arrays{{{"quantities", EntryKind::quantity},
                                                {"conditions", EntryKind::condition},
                                                {"intervals", EntryKind::interval},
                                                {"findings", EntryKind::finding},
                                                {"tables", EntryKind::table},
                                                {"explanations", EntryKind::explanation},
                                                {"groups", EntryKind::group},
                                                {"checks", EntryKind::check},
                                                {"criticals", EntryKind::critical},
                                                {"disorders", EntryKind::disorder},
                                                {"conventions", EntryKind::convention}}};

constexpr bool is_digit(char c) {
    return c >= '0' && c <= '9';
}

constexpr bool is_lower(char c) {
    return c >= 'a' && c <= 'z';
}

constexpr bool is_letter(char c) {
    return is_lower(c) || (c >= 'A' && c <= 'Z');
}

// Letters and digits, a letter first: what FHIRPath reads as one plain identifier.
bool is_identifier(std::string_view id) {
    return !id.empty() && is_letter(id.front()) &&
           std::ranges::all_of(id, [](char c) { return is_letter(c) || is_digit(c); });
}

// Words of lower-case letters and digits with single hyphens between them. A point may stand between two digits, so that
// the name of a convention can hold its constant.
bool is_kebab(std::string_view id) {
    bool inside_word = false;
    for (std::size_t i = 0; i < id.size(); ++i) {
        const bool word = is_lower(id[i]) || is_digit(id[i]);
        const bool joint = id[i] == '-' || (id[i] == '.' && i > 0 && is_digit(id[i - 1]) &&
                                            i + 1 < id.size() && is_digit(id[i + 1]));
        if (!word && (!joint || !inside_word)) {
            return false;
        }
        inside_word = word;
    }
    return inside_word;
}

std::vector<Draft> read_rule_file(const diag::Json& file, diag::Report& report) {
    diag::ObjectReader reader(file, report, "rule file");
    reader.any("$schema");
    reader.optional_text("topic");
    std::vector<Draft> drafts;
    for (const auto& [name, kind] : k_arrays) {
        std::ranges::move(read_draft_list(read_items(reader, name), kind, report),
                          std::back_inserter(drafts));
    }
    reader.finish();
    return drafts;
}

/// Carries out the chain, one set after the other.
class DraftReader {
  public:
    DraftReader(Documents& documents, diag::Report& report)
        : documents_(documents), report_(report) {}

    void apply(const SetFile& set) {
        for (const Written& id : set.remove) {
            remove(id);
        }
        for (const Written& path : set.replace) {
            for (Draft& draft : read_file(path, set)) {
                replace(std::move(draft));
            }
        }
        for (const Written& path : set.files) {
            std::ranges::move(read_file(path, set), std::back_inserter(drafts_.entries));
        }
        ++level_;
    }

    [[nodiscard]] Drafts take() { return std::move(drafts_); }

  private:
    std::vector<Draft> read_file(const Written& path, const SetFile& set) {
        const Document* document = documents_.read(path, set.path);
        if (document == nullptr) {
            return {};
        }
        if (std::ranges::find(drafts_.files, document, &RuleFile::document) !=
            drafts_.files.end()) {
            report_.error("rule-repeated",
                          path.place,
                          fmt::format("\"{}\" is read already; name each file once", path.text));
            return {};
        }
        drafts_.files.push_back({document, level_});
        return read_rule_file(document->json, report_);
    }

    void remove(const Written& id) {
        const auto found = std::ranges::find(drafts_.entries, id.text, &Draft::id);
        if (found == drafts_.entries.end()) {
            report_unknown(id, "removed");
            return;
        }
        drafts_.entries.erase(found);
        drafts_.superseded[id.text] = level_;
    }

    void replace(Draft draft) {
        const auto found = std::ranges::find(drafts_.entries, draft.id, &Draft::id);
        if (found == drafts_.entries.end()) {
            report_unknown({draft.id, draft.id_place()}, "replaced");
            return;
        }
        if (found->kind != draft.kind) {
            report_
                .error("rule-kind",
                       draft.id_place(),
                       fmt::format("\"{}\" is of kind {} in the parent set and cannot be replaced "
                                   "by kind {}; remove it and add a file that has the new one",
                                   draft.id,
                                   describe(found->kind),
                                   describe(draft.kind)))
                .notes.push_back({"the entry of the parent is here", found->id_place()});
            return;
        }
        if (const auto [at, fresh] = drafts_.superseded.try_emplace(draft.id, level_);
            !fresh && std::exchange(at->second, level_) == level_) {
            report_
                .error("rule-id-twice",
                       draft.id_place(),
                       fmt::format("\"{}\" is replaced twice by this set; take one out", draft.id))
                .notes.push_back({"the first is here", found->id_place()});
        }
        *found = std::move(draft);
    }

    void report_unknown(const Written& id, std::string_view done_to) {
        std::vector<std::string> known;
        for (const Draft& draft : drafts_.entries) {
            known.push_back(draft.id);
        }
        report_.error("rule-id-unknown",
                      id.place,
                      fmt::format("\"{}\" is not in the parent set and cannot be {}; rows belong "
                                  "to their table and convention members to their convention{}",
                                  id.text,
                                  done_to,
                                  diag::did_you_mean(id.text, known)));
    }

    Documents& documents_;
    diag::Report& report_;
    Drafts drafts_;
    std::size_t level_ = 0;
};

}  // namespace

diag::Place Draft::id_place() const {
    return json->find("id")->place();
}

bool check_id(const diag::Json& id, EntryKind kind, diag::Report& report) {
    const bool used_as_name = kind == EntryKind::quantity || kind == EntryKind::condition;
    if (used_as_name ? is_identifier(id.text()) : is_kebab(id.text())) {
        return true;
    }
    report.error("rule-id-form",
                 id.place(),
                 used_as_name
                     ? fmt::format("\"{}\" cannot be a name in expressions; use letters and "
                                   "digits, a letter first, as in \"anionGap\"",
                                   id.text())
                     : fmt::format("\"{}\" is not written as ids are; use words of lower-case "
                                   "letters and digits with hyphens between, as in \"raised-gap\"",
                                   id.text()));
    return false;
}

std::vector<Draft>
read_draft_list(std::span<const diag::Json> items, EntryKind kind, diag::Report& report) {
    std::vector<Draft> drafts;
    for (const diag::Json& item : items) {
        diag::ObjectReader reader(item, report, std::string(describe(kind)));
        const diag::Json* id = reader.required("id", diag::Kind::string);
        if (id != nullptr && check_id(*id, kind, report)) {
            drafts.push_back({kind, std::string(id->text()), &item});
        }
    }
    return drafts;
}

Drafts read_drafts(const std::vector<SetFile>& chain, Documents& documents, diag::Report& report) {
    DraftReader reader(documents, report);
    for (const SetFile& set : chain) {
        reader.apply(set);
    }
    return reader.take();
}

}  // namespace isohydric::rule::detail
