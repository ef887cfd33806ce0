// JSON with places: a value tree in which every value and every name knows where in the text it stands, so that whoever
// reads a rule or a panel can point at the very characters that are wrong.
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

/// A JSON value. Asking a value for what its kind does not have is our own mistake (InternalError); ask `kind()` first,
/// or read through ObjectReader.
class Json {
  public:
    /// A null without a place.
    Json() = default;

    [[nodiscard]] Kind kind() const { return static_cast<Kind>(content_.index()); }

    /// The characters of the value; of a string with its quotes, of an array or object with its brackets.
    [[nodiscard]] const Place& place() const { return place_; }

    [[nodiscard]] bool as_bool() const;

    /// The decoded content of a string, or the characters of a number exactly as they stand in the text.
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

/// Reads one JSON text [@rfc8259]. Beyond the standard, these are errors: a repeated name in an object, nesting deeper than
/// 100, a number beyond the range of double, a byte order mark, an escaped surrogate without its partner. Gives nothing
/// if the text has no readable structure; a tree that has repeated names only is given, so that its reader can report
/// further faults, but the report then has errors.
[[nodiscard]] std::optional<Json> read_json(std::shared_ptr<const Source> source, Report& report);

/// The place of the decoded bytes `[begin, end)` of a string, inside its quotes. Offsets behind the string mean its end.
[[nodiscard]] Place string_place(const Json& string_value, std::size_t begin, std::size_t end);

}  // namespace isohydric::diag
