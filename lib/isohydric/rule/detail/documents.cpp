#include "isohydric/rule/detail/documents.hpp"

#include <filesystem>
#include <utility>
#include <vector>

#include <fmt/format.h>

namespace isohydric::rule::detail {
namespace {

namespace fs = std::filesystem;

bool outside_of_tree(std::string_view path) {
    return path.starts_with("/") || path.starts_with("./") || path.starts_with("../");
}

std::string normal(const fs::path& path) {
    return path.lexically_normal().generic_string();
}

// Normalisation takes the mark `./` away from a path outside of the tree; it must stay recognisable as one.
std::string beside(std::string_view set_path, const std::string& wanted) {
    std::string path = normal(fs::path(set_path).parent_path() / wanted);
    return outside_of_tree(path) ? path : "./" + path;
}

std::vector<std::string> possible_paths(const std::string& wanted, std::string_view set_path) {
    std::vector<std::string> paths;
    if (outside_of_tree(set_path)) {
        paths.push_back(beside(set_path, wanted));
    }
    if (std::string path = normal(wanted); !outside_of_tree(path)) {
        paths.push_back(std::move(path));
    }
    return paths;
}

}  // namespace

const Document* Documents::kept(std::string_view path) const {
    for (const Document& document : documents_) {
        if (document.path == path) {
            return &document;
        }
    }
    return nullptr;
}

const Document* Documents::keep(const std::string& path, std::string text) {
    auto source = diag::make_source(path, std::move(text));
    auto json = diag::read_json(source, report_);
    if (!json) {
        return nullptr;
    }
    return &documents_.emplace_back(Document{path, std::move(source), std::move(*json)});
}

const Document* Documents::read(const Written& wanted, std::string_view set_path) {
    for (const std::string& path : possible_paths(wanted.text, set_path)) {
        if (const Document* document = kept(path)) {
            return document;
        }
        if (auto text = files_(path)) {
            return keep(path, std::move(*text));
        }
    }
    report_.error("rule-file-missing",
                  wanted.place,
                  fmt::format("there is no file \"{}\"; paths are relative to the rule tree, and "
                              "for a set outside it relative to that set first",
                              wanted.text));
    return nullptr;
}

const Document* Documents::read_if_present(const std::string& path) {
    if (const Document* document = kept(path)) {
        return document;
    }
    auto text = files_(path);
    return text ? keep(path, std::move(*text)) : nullptr;
}

}  // namespace isohydric::rule::detail
