// ObjectReader: takes the members of one JSON object by name and kind, and reports what is missing, of the wrong kind,
// or unknown.
#pragma once

#include "isohydric/diag/json.hpp"
#include "isohydric/diag/report.hpp"

#include <optional>
#include <string>
#include <string_view>
#include <vector>

namespace isohydric::diag {

/// Reads one object. Every name asked for is thereby known; `finish()` reports the members that nobody asked for. The
/// object and the report must outlive the reader.
class ObjectReader {
  public:
    /// `what` names the object in messages: `interval`. Another kind of value than an object is reported at once; all
    /// questions then find nothing and report nothing more.
    ObjectReader(const Json& object, Report& report, std::string what);

    /// The member; reports one that is missing or of another kind, and gives null then.
    const Json* required(std::string_view name, Kind kind);

    /// The member, or null where it is missing or null; reports one of another kind, and gives null then.
    const Json* optional(std::string_view name, Kind kind);

    /// The member of whatever kind, or null where it is missing.
    const Json* any(std::string_view name);

    std::optional<std::string> required_text(std::string_view name);
    std::optional<std::string> optional_text(std::string_view name);
    std::optional<double> required_number(std::string_view name);
    std::optional<double> optional_number(std::string_view name);
    std::optional<bool> required_bool(std::string_view name);
    std::optional<bool> optional_bool(std::string_view name);

    /// An array of strings; items of another kind are reported and left out.
    std::optional<std::vector<std::string>> required_texts(std::string_view name);
    std::optional<std::vector<std::string>> optional_texts(std::string_view name);

    /// Whether the value is an object at all.
    [[nodiscard]] bool is_object() const { return object_ != nullptr; }

    /// The place of the object.
    [[nodiscard]] const Place& place() const { return place_; }

    /// Reports every member that was not asked for, with the nearest known name.
    void finish();

  private:
    const Json* ask(std::string_view name);
    const Json* of_kind(const Json* value, std::string_view name, Kind kind);
    std::optional<std::vector<std::string>> texts(const Json* array, std::string_view name);

    const Json* object_;  // null if the value is no object
    Place place_;
    Report& report_;
    std::string what_;
    std::vector<std::string> asked_;
};

/// Reports `json-wrong-kind` and gives false unless the value has the kind; `what` names it in the message.
bool expect_kind(const Json& value, Kind kind, std::string_view what, Report& report);

}  // namespace isohydric::diag
