#include "isohydric/rule/detail/canonical_set.hpp"

#include "isohydric/rule/canonical.hpp"
#include "isohydric/rule/detail/fields.hpp"

#include <algorithm>
#include <map>

namespace isohydric::rule::detail {
namespace {

constexpr std::string_view k_left_out = "reviewed";

using ById = std::map<std::string, const diag::Json*, std::less<>>;

bool in_force(const Draft& draft, const Chosen& chosen) {
    return draft.kind != EntryKind::convention ||
           std::ranges::any_of(chosen, [&](const auto& pair) { return pair.second == draft.id; });
}

ById analytes_by_id(const diag::Json& file) {
    ById analytes;
    for (const diag::Json& analyte : peek_items(file, "analytes")) {
        if (const diag::Json* id = peek(analyte, "id", diag::Kind::string)) {
            analytes.emplace(id->text(), &analyte);
        }
    }
    return analytes;
}

void append_list(std::string& out, const ById& items) {
    out += '[';
    for (const auto& [id, json] : items) {
        if (out.back() != '[') {
            out += ',';
        }
        append_canonical(out, *json, k_left_out);
    }
    out += ']';
}

void append_conventions(std::string& out, const Chosen& chosen) {
    out += '{';
    for (const auto& [choice, convention] : chosen) {
        if (out.back() != '{') {
            out += ',';
        }
        append_canonical(out, std::string_view(choice));
        out += ':';
        append_canonical(out, std::string_view(convention));
    }
    out += '}';
}

void append_entries(std::string& out, const std::map<std::string, const Draft*>& entries) {
    out += '[';
    for (const auto& [id, draft] : entries) {
        if (out.back() != '[') {
            out += ',';
        }
        out += "{\"entry\":";
        append_canonical(out, *draft->json, k_left_out);
        out += ",\"kind\":";
        append_canonical(out, describe(draft->kind));
        out += '}';
    }
    out += ']';
}

}  // namespace

std::string canonical_set(const std::vector<Draft>& entries,
                          const Chosen& chosen,
                          const diag::Json& analytes,
                          const std::vector<CslItem>& bibliography) {
    std::map<std::string, const Draft*> entries_by_id;
    Refs refs;
    for (const Draft& draft : entries) {
        if (in_force(draft, chosen)) {
            entries_by_id.emplace(draft.id, &draft);
            collect_refs(*draft.json, refs);
        }
    }
    collect_refs(analytes, refs);
    ById sources;
    for (const CslItem& source : bibliography) {
        if (refs.contains(source.item.id)) {
            sources.emplace(source.item.id, source.json);
        }
    }
    std::string out = "{\"analytes\":";
    append_list(out, analytes_by_id(analytes));
    out += ",\"conventions\":";
    append_conventions(out, chosen);
    out += ",\"entries\":";
    append_entries(out, entries_by_id);
    out += ",\"sources\":";
    append_list(out, sources);
    out += '}';
    return out;
}

}  // namespace isohydric::rule::detail
