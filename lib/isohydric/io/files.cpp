#include "isohydric/io/files.hpp"

#include <cerrno>
#include <filesystem>
#include <fstream>
#include <iterator>
#include <system_error>

#include <fmt/format.h>

namespace isohydric::io {

namespace {

constexpr std::uintmax_t k_largest_file = std::uintmax_t{64} << 20U;

bool outside_tree(const std::string& path) {
    return path.starts_with('/') || path.starts_with("./") || path.starts_with("../");
}

}  // namespace

diag::Result<std::string> read_file(const std::string& path) {
    std::error_code problem;
    if (std::filesystem::is_directory(path, problem)) {
        return diag::unexpected(fmt::format("{} is a folder; give a file", path));
    }
    errno = 0;
    std::ifstream stream(path, std::ios::binary);
    if (!stream) {
        return diag::unexpected(
            fmt::format("cannot open {}: {}", path, std::generic_category().message(errno)));
    }
    const std::uintmax_t size = std::filesystem::file_size(path, problem);
    if (!problem && size > k_largest_file) {
        return diag::unexpected(
            fmt::format("{} has {} bytes; at most {} are read", path, size, k_largest_file));
    }
    std::string text{std::istreambuf_iterator<char>(stream), {}};
    if (stream.bad()) {
        return diag::unexpected(
            fmt::format("cannot read {}: {}", path, std::generic_category().message(errno)));
    }
    return text;
}

diag::Result<std::shared_ptr<const diag::Source>> read_source(const std::string& path) {
    diag::Result<std::string> text = read_file(path);
    if (!text) {
        return diag::unexpected(text.error());
    }
    return diag::make_source(path, std::move(*text));
}

rule::FileReader rule_tree(std::string root) {
    return [root = std::move(root)](const std::string& path) -> std::optional<std::string> {
        diag::Result<std::string> text = read_file(outside_tree(path) ? path : root + "/" + path);
        return text ? std::optional<std::string>(std::move(*text)) : std::nullopt;
    };
}

}  // namespace isohydric::io
