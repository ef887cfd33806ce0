#include "isohydric/panel/catalogue.hpp"

#include "isohydric/diag/text.hpp"

#include <algorithm>
#include <utility>

#include <fmt/format.h>

namespace isohydric::panel {

std::string fold_name(std::string_view name) {
    std::string folded = diag::lower(name);
    std::erase_if(folded, [](char c) {
        return std::string_view{" \t-_.()/,"}.find(c) != std::string_view::npos;
    });
    return folded;
}

std::string unknown_name(const Catalogue& catalogue, std::string_view name) {
    const std::string near = catalogue.nearest(name);
    return fmt::format("\"{}\" is not the name of an analyte{}",
                       name,
                       near.empty() ? "" : fmt::format("; did you mean \"{}\"?", near));
}

std::optional<Analyte> analyte_of(std::string_view id) {
    const auto* const found = std::find(k_analyte_ids.begin(), k_analyte_ids.end(), id);
    if (found == k_analyte_ids.end()) {
        return std::nullopt;
    }
    return static_cast<Analyte>(found - k_analyte_ids.begin());
}

std::optional<Catalogue::Alias> Catalogue::find(std::string_view name) const {
    const std::string folded = fold_name(name);
    const auto found = std::ranges::lower_bound(names_, folded, {}, &Name::folded);
    if (found == names_.end() || found->folded != folded) {
        return std::nullopt;
    }
    return found->meaning;
}

std::string Catalogue::nearest(std::string_view name) const {
    std::vector<std::string> candidates;
    candidates.reserve(names_.size());
    for (const Name& known : names_) {
        candidates.push_back(known.written);
    }
    return diag::nearest(name, candidates);
}

const Catalogue::Name* Catalogue::add_name(Name name) {
    name.folded = fold_name(name.written);
    const auto at = std::ranges::lower_bound(names_, name.folded, {}, &Name::folded);
    if (at != names_.end() && at->folded == name.folded) {
        return &*at;
    }
    names_.insert(at, std::move(name));
    return nullptr;
}

}  // namespace isohydric::panel
