// Which table of tests/published speaks of each registered model, under which name and in which columns.
#pragma once

#include <string>
#include <string_view>
#include <vector>

namespace isohydric::test {

/// A registered model as a published table has it; no table where none was found outside this program.
struct PublishedModel {
    std::string_view id;
    std::string_view table;
    std::string_view model;
    std::vector<std::string_view> columns;  ///< in the order of the model's inputs
};

/// One for every registered model.
[[nodiscard]] const std::vector<PublishedModel>& published_models();

}  // namespace isohydric::test
