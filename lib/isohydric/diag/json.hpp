// JSON with places: a value tree in which every value and every name knows where in the text it
// stands, so that whoever reads a rule or a panel can point at the very characters that are wrong;
// and a reader of objects that reports what is missing, of the wrong kind, or unknown.
#pragma once

#include "isohydric/diag/report.hpp"
#include "isohydric/diag/source.hpp"

#include <cstddef>
#include <memory>
#include <optional>
#include <string>
#include <string_view>
#include <variant>
#include <vector>

namespace isohydric::diag {

/// Kinds of JSON values [@rfc8259, section 3].
enum class Kind { null, boolean, number, string, array, object };

/// A kind with its article, for messages: `a number`, `an array`, `null`.
[[nodiscard]] std::string_view describe(Kind kind);

struct Member;

/// A JSON value. Asking a value for what its kind does not have is our own mistake (InternalError);
/// ask `kind()` first, or read through ObjectReader.
class Json {
  public:
    /// A null without a place.
    Json() = default;

    [[nodiscard]] Kind kind() const { return static_cast<Kind>(content_.index()); }

    /// The characters of the value; of a string with its quotes, of an array or object with its
    /// brackets.
    [[nodiscard]] const Place& place() const { return place_; }

    [[nodiscard]] bool as_bool() const;

    /// The decoded content of a string, or the characters of a number exactly as they stand in the
    /// text.
    [[nodiscard]] std::string_view text() const;

    /// The nearest double; finite.
    [[nodiscard]] double number() const;

    /// Digits behind the point of a number as they stand in the text: 2 for `7.40`, 0 for `740e-2`.
    [[nodiscard]] int decimals() const;

    [[nodiscard]] const std::vector<Json>& items() const;

    /// Members of an object in the order of the text.
    [[nodiscard]] const std::vector<Member>& members() const;

    /// The first member of that name of an object, or null.
    [[nodiscard]] const Json* find(std::string_view name) const;

  private:
    friend class JsonBuilder;

    using Content = std::
        variant<std::monostate, bool, double, std::string, std::vector<Json>, std::vector<Member>>;

    Place place_;
    Content content_;
};

/// A member of an object. `name` is decoded; `name_place` includes the quotes.
struct Member {
    std::string name;
    Place name_place;
    Json value;
};

/// Reads one JSON text [@rfc8259, section 2]. Beyond the standard, these are errors: a repeated
/// name in an object, nesting deeper than 100, a number beyond the range of double, a byte order
/// mark, an escaped surrogate without its partner. Gives nothing if the text has no readable
/// structure; a tree that has repeated names only is given, so that its reader can report further
/// faults, but the report then has errors.
[[nodiscard]] std::optional<Json> read_json(std::shared_ptr<const Source> source, Report& report);

/// The place of the decoded bytes `[begin, end)` of a string, inside its quotes. Offsets behind the
/// string mean its end.
[[nodiscard]] Place string_place(const Json& string_value, std::size_t begin, std::size_t end);

/// Reads one object. Every name asked for is thereby known; `finish()` reports the members that
/// nobody asked for. The object and the report must outlive the reader.
class ObjectReader {
  public:
    /// `what` names the object in messages: `interval`. Another kind of value than an object is
    /// reported at once; all questions then find nothing and report nothing more.
    ObjectReader(const Json& object, Report& report, std::string what);

    /// The member; reports one that is missing or of another kind, and gives null then.
    const Json* required(std::string_view name, Kind kind);

    /// The member, or null where it is missing or null; reports one of another kind, and gives null
    /// then.
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
    const Json* of_kind(const Json* value, std::string_view name, Kind kind);
    std::optional<std::vector<std::string>> texts(const Json* array, std::string_view name);

    const Json* object_;  // null if the value is no object
    Place place_;
    Report& report_;
    std::string what_;
    std::vector<std::string> asked_;
};

/// Reports `json-wrong-kind` and gives false unless the value has the kind; `what` names it in the
/// message.
bool expect_kind(const Json& value, Kind kind, std::string_view what, Report& report);

}  // namespace isohydric::diag
