#include "isohydric/rule/detail/set_file.hpp"

#include "isohydric/rule/detail/fields.hpp"

#include <algorithm>
#include <utility>

#include <fmt/format.h>

namespace isohydric::rule::detail {
namespace {

std::vector<ChosenAlternative> read_conventions(diag::ObjectReader& reader, diag::Report& report) {
    std::vector<ChosenAlternative> chosen;
    const diag::Json* conventions = reader.optional("conventions", diag::Kind::object);
    if (conventions == nullptr) {
        return chosen;
    }
    for (const diag::Member& member : conventions->members()) {
        if (diag::expect_kind(member.value, diag::Kind::string, "the convention chosen", report)) {
            chosen.push_back(
                {.choice = {member.name, member.name_place}, .convention = written(member.value)});
        }
    }
    return chosen;
}

// An approval counts only if somebody put a role and a date to it; until then the set is a draft.
void read_approval(diag::ObjectReader& reader, SetFile& set, diag::Report& report) {
    const diag::Json* approval = reader.optional("approved", diag::Kind::object);
    if (approval == nullptr) {
        return;
    }
    diag::ObjectReader fields(*approval, report, "approval");
    const auto role = fields.required_text("role");
    const diag::Json* date = fields.required("date", diag::Kind::string);
    fields.finish();
    if (!role || role->empty() || date == nullptr || date->text().empty()) {
        return;
    }
    set.approved_role = *role;
    set.approved_date = checked_date(*date, report);
}

SetFile read_set_file(const Document& document, diag::Report& report) {
    diag::ObjectReader reader(document.json, report, "rule set");
    SetFile set;
    set.path = document.path;
    set.place = document.json.place();
    reader.any("$schema");
    set.id = reader.required_text("id").value_or("");
    set.version = reader.required_text("version").value_or("");
    set.title = reader.required_text("title").value_or("");
    set.extends = read_written(reader, "extends");
    set.analytes = read_written(reader, "analytes");
    set.sources = read_written(reader, "sources");
    set.files = read_list(reader, "files", report);
    set.replace = read_list(reader, "replace", report);
    set.remove = read_list(reader, "remove", report);
    set.conventions = read_conventions(reader, report);
    read_approval(reader, set, report);
    reader.finish();
    return set;
}

void report_cycle(const std::vector<SetFile>& chain, diag::Report& report) {
    std::string path;
    for (const SetFile& set : chain) {
        path += set.path + " extends ";
    }
    const Written& last = *chain.back().extends;
    report.error("rule-set-cycle",
                 last.place,
                 fmt::format("rule sets extend each other in a circle: {}{}; "
                             "let one of them extend nothing",
                             path,
                             last.text));
}

// What only a set that extends another can have, and what one that extends nothing must have.
void check_ends(const SetFile& set, diag::Report& report) {
    if (set.extends) {
        return;
    }
    for (const auto* list : {&set.replace, &set.remove}) {
        if (!list->empty()) {
            report.error("rule-set-parent",
                         list->front().place,
                         "there is nothing to replace or remove: this set extends no other; "
                         "name one in \"extends\"");
        }
    }
    if (!set.analytes || !set.sources) {
        report.error("rule-set-parent",
                     set.place,
                     "a set that extends no other must name its \"analytes\" and its \"sources\"");
    }
}

}  // namespace

std::vector<SetFile>
read_set_chain(const std::string& path, Documents& documents, diag::Report& report) {
    std::vector<SetFile> chain;
    const std::size_t errors_before = report.error_count();
    const Document* document = documents.read_if_present(path);
    if (document == nullptr && report.error_count() == errors_before) {
        report.error("rule-file-missing", {}, fmt::format("there is no rule set \"{}\"", path));
    }
    while (document != nullptr) {
        chain.push_back(read_set_file(*document, report));
        const SetFile& set = chain.back();
        check_ends(set, report);
        document = set.extends ? documents.read(*set.extends, set.path) : nullptr;
        const auto same = [&](const SetFile& other) {
            return document != nullptr && other.path == document->path;
        };
        if (std::ranges::any_of(chain, same)) {
            report_cycle(chain, report);
            break;
        }
    }
    std::ranges::reverse(chain);
    return chain;
}

}  // namespace isohydric::rule::detail
