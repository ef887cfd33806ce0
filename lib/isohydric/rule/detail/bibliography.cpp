#include "isohydric/rule/detail/bibliography.hpp"

#include "isohydric/diag/text.hpp"
#include "isohydric/rule/detail/fields.hpp"

#include <algorithm>

#include <fmt/format.h>

namespace isohydric::rule::detail {
namespace {

constexpr std::size_t k_most_authors = 3;

std::string text_of(const diag::Json& item, std::string_view name) {
    const diag::Json* member = item.find(name);
    const bool printable = member != nullptr && (member->kind() == diag::Kind::string ||
                                                 member->kind() == diag::Kind::number);
    return printable ? std::string(member->text()) : std::string();
}

constexpr bool is_capital(char c) {
    return c >= 'A' && c <= 'Z';
}

// "Robert W." becomes "RW", and so does "RW". Letters beyond ASCII are kept whole.
std::string initials(std::string_view given) {
    std::string letters;
    bool word_begins = true;
    bool kept = false;
    for (std::size_t i = 0; i < given.size();) {
        const std::size_t length =
            std::max<std::size_t>(1, diag::utf8_sequence_length(given.substr(i)));
        const bool gap = given[i] == ' ' || given[i] == '-' || given[i] == '.';
        kept = !gap && (word_begins || (kept && is_capital(given[i])));
        if (kept) {
            letters += given.substr(i, length);
        }
        word_begins = gap;
        i += length;
    }
    return letters;
}

std::string author_line(const diag::Json& item) {
    std::vector<std::string> names;
    for (const diag::Json& author : peek_items(item, "author")) {
        if (author.kind() != diag::Kind::object) {
            continue;
        }
        if (names.size() == k_most_authors) {
            names.emplace_back("et al");
            break;
        }
        const std::string family = text_of(author, "family");
        const std::string given = initials(text_of(author, "given"));
        names.push_back(family.empty()  ? text_of(author, "literal")
                        : given.empty() ? family
                                        : fmt::format("{} {}", family, given));
    }
    return diag::join(names, ", ");
}

std::string year_of(const diag::Json& item) {
    const diag::Json* issued = peek(item, "issued", diag::Kind::object);
    if (issued == nullptr) {
        return {};
    }
    for (const diag::Json& date : peek_items(*issued, "date-parts")) {
        if (date.kind() == diag::Kind::array && !date.items().empty()) {
            const diag::Json& year = date.items().front();
            return year.kind() == diag::Kind::number || year.kind() == diag::Kind::string
                       ? std::string(year.text())
                       : std::string();
        }
    }
    return {};
}

// "Ann Intern Med 1967;66:312-22", as far as the item knows.
std::string container_line(const diag::Json& item) {
    std::string line = text_of(item, "container-title-short");
    for (const char* name : {"container-title", "publisher"}) {
        if (line.empty()) {
            line = text_of(item, name);
        }
    }
    const auto append = [&](std::string_view separator, const std::string& part) {
        if (!part.empty()) {
            line += line.empty() ? part : std::string(separator) + part;
        }
    };
    append(" ", year_of(item));
    append(";", text_of(item, "volume"));
    append(":", text_of(item, "page"));
    return line;
}

// A work in a journal is found by authors and journal; any other needs its title.
std::string citation_line(const diag::Json& item) {
    std::vector<std::string> parts{author_line(item)};
    if (parts.front().empty() || item.find("container-title") == nullptr) {
        parts.push_back(text_of(item, "title"));
    }
    parts.push_back(container_line(item));
    std::erase(parts, "");
    return diag::join(parts, ". ");
}

/// Calls `visit(value of ref)` for every object below `json` that has a string `ref`.
template <class Visit>
void for_each_ref(const diag::Json& json, const Visit& visit) {
    if (json.kind() == diag::Kind::array) {
        for (const diag::Json& item : json.items()) {
            for_each_ref(item, visit);
        }
    } else if (json.kind() == diag::Kind::object) {
        if (const diag::Json* ref = peek(json, "ref", diag::Kind::string);
            ref != nullptr && ref->text() != "common-practice") {
            visit(*ref);
        }
        for (const diag::Member& member : json.members()) {
            for_each_ref(member.value, visit);
        }
    }
}

}  // namespace

void read_bibliography(const diag::Json& file, std::vector<CslItem>& items, diag::Report& report) {
    if (!diag::expect_kind(file, diag::Kind::array, "a bibliography", report)) {
        return;
    }
    for (const diag::Json& json : file.items()) {
        // CSL-JSON has some hundred members; those that are not printed are not looked at.
        diag::ObjectReader reader(json, report, "bibliography item");
        const diag::Json* id = reader.required("id", diag::Kind::string);
        reader.required_text("type");
        if (id == nullptr) {
            continue;
        }
        const std::string citation = citation_line(json);
        if (citation.empty()) {
            report.error("rule-source-empty",
                         id->place(),
                         fmt::format("nothing is told of \"{}\"; give its author, title, "
                                     "container-title or publisher",
                                     id->text()));
        }
        const auto same = [&](const CslItem& other) {
            return other.item.id == id->text();
        };
        if (const auto first = std::ranges::find_if(items, same); first != items.end()) {
            report
                .error("rule-source-twice",
                       id->place(),
                       fmt::format("the source \"{}\" is listed twice; take one out", id->text()))
                .notes.push_back({"the first is here", first->item.place});
            continue;
        }
        items.push_back(
            {.item = {.id = std::string(id->text()), .citation = citation, .place = id->place()},
             .json = &json});
    }
}

void collect_refs(const diag::Json& json, Refs& refs) {
    for_each_ref(json, [&](const diag::Json& ref) { refs.emplace(ref.text()); });
}

void check_refs(const diag::Json& json, const Refs& known, diag::Report& report) {
    for_each_ref(json, [&](const diag::Json& ref) {
        if (!known.contains(ref.text())) {
            report.error(
                "rule-source-unknown",
                ref.place(),
                fmt::format("the bibliography has no source \"{}\"{}",
                            ref.text(),
                            diag::did_you_mean(
                                ref.text(), std::vector<std::string>(known.begin(), known.end()))));
        }
    });
}

}  // namespace isohydric::rule::detail
