// Files as texts: what can be read is read byte by byte, what cannot says why.
#include "isohydric/io/files.hpp"

#include <doctest/doctest.h>

#include <filesystem>
#include <fstream>
#include <string>

#include <unistd.h>

namespace isohydric::io {

namespace {

/// A folder for one test, gone afterwards.
class Folder {
  public:
    Folder()
        : path_(std::filesystem::temp_directory_path() /
                ("isohydric-io-" + std::to_string(getpid()))) {
        std::filesystem::create_directories(path_ / "sets");
    }

    ~Folder() {
        std::error_code ignored;
        std::filesystem::remove_all(path_, ignored);
    }

    Folder(const Folder&) = delete;
    Folder& operator=(const Folder&) = delete;
    Folder(Folder&&) = delete;
    Folder& operator=(Folder&&) = delete;

    [[nodiscard]] std::string write(const std::string& name, const std::string& text) const {
        std::ofstream(path_ / name, std::ios::binary) << text;
        return (path_ / name).string();
    }

    [[nodiscard]] std::string path() const { return path_.string(); }

  private:
    std::filesystem::path path_;
};

}  // namespace

TEST_CASE("files: every byte is read, line ends and zero bytes too") {
    const Folder folder;
    const std::string bytes("a\r\n\0\xFF\n", 6);
    const diag::Result<std::string> text = read_file(folder.write("bytes", bytes));
    REQUIRE(text);
    CHECK(*text == bytes);
}

TEST_CASE("files: an empty file is an empty text") {
    const Folder folder;
    const diag::Result<std::string> text = read_file(folder.write("empty", ""));
    REQUIRE(text);
    CHECK(text->empty());
}

TEST_CASE("files: a folder, and a file that is not there, say what they are") {
    const Folder folder;
    const diag::Result<std::string> of_folder = read_file(folder.path());
    REQUIRE_FALSE(of_folder);
    CHECK(of_folder.error().find("is a folder") != std::string::npos);
    const diag::Result<std::string> missing = read_file(folder.path() + "/none");
    REQUIRE_FALSE(missing);
    CHECK(missing.error().find("No such file") != std::string::npos);
    CHECK_FALSE(read_source(folder.path() + "/none"));
}

TEST_CASE("files: more than 64 MiB is refused before it is read") {
    const Folder folder;
    const std::string path = folder.write("large", "");
    std::filesystem::resize_file(path, (std::uintmax_t{64} << 20U) + 1);
    const diag::Result<std::string> text = read_file(path);
    REQUIRE_FALSE(text);
    CHECK(text.error().find("at most") != std::string::npos);
}

TEST_CASE("files: a rule tree reads below its root, and other paths as they are") {
    const Folder folder;
    const std::string outside = folder.write("outside.json", "outside");
    CHECK_FALSE(folder.write("sets/one.json", "inside").empty());
    const rule::FileReader tree = rule_tree(folder.path());
    CHECK(tree("sets/one.json") == "inside");
    CHECK(tree(outside) == "outside");
    CHECK_FALSE(tree("sets/none.json").has_value());
    CHECK_FALSE(tree("./sets/one.json").has_value());
}

}  // namespace isohydric::io
