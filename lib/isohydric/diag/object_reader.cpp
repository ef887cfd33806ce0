#include "isohydric/diag/json.hpp"
#include "isohydric/diag/text.hpp"

#include <algorithm>
#include <utility>

#include <fmt/format.h>

namespace isohydric::diag {
namespace {

template <class Read>
auto read_with(const Json* value, Read read) -> std::optional<decltype(read(*value))> {
    if (value == nullptr) {
        return std::nullopt;
    }
    return read(*value);
}

std::optional<std::string> as_text(const Json* value) {
    return read_with(value, [](const Json& json) { return std::string(json.text()); });
}

std::optional<double> as_number(const Json* value) {
    return read_with(value, [](const Json& json) { return json.number(); });
}

std::optional<bool> as_bool(const Json* value) {
    return read_with(value, [](const Json& json) { return json.as_bool(); });
}

}  // namespace

bool expect_kind(const Json& value, Kind kind, std::string_view what, Report& report) {
    if (value.kind() == kind) {
        return true;
    }
    report.error(
        "json-wrong-kind",
        value.place(),
        fmt::format("{}: expected {}, found {}", what, describe(kind), describe(value.kind())));
    return false;
}

ObjectReader::ObjectReader(const Json& object, Report& report, std::string what)
    : object_(expect_kind(object, Kind::object, what, report) ? &object : nullptr),
      place_(object.place()),
      report_(report),
      what_(std::move(what)) {}

const Json* ObjectReader::any(std::string_view name) {
    if (object_ == nullptr) {
        return nullptr;
    }
    if (std::find(asked_.begin(), asked_.end(), name) == asked_.end()) {
        asked_.emplace_back(name);
    }
    return object_->find(name);
}

const Json* ObjectReader::of_kind(const Json* value, std::string_view name, Kind kind) {
    if (value == nullptr) {
        return nullptr;
    }
    return expect_kind(*value, kind, fmt::format("\"{}\" of {}", name, what_), report_) ? value
                                                                                        : nullptr;
}

const Json* ObjectReader::required(std::string_view name, Kind kind) {
    const Json* value = any(name);
    if (value == nullptr && object_ != nullptr) {
        report_.error("json-missing-key",
                      place_,
                      fmt::format("{} needs \"{}\", {}", what_, name, describe(kind)));
    }
    return of_kind(value, name, kind);
}

const Json* ObjectReader::optional(std::string_view name, Kind kind) {
    const Json* value = any(name);
    const bool is_absent = value == nullptr || value->kind() == Kind::null;
    return is_absent ? nullptr : of_kind(value, name, kind);
}

std::optional<std::string> ObjectReader::required_text(std::string_view name) {
    return as_text(required(name, Kind::string));
}

std::optional<std::string> ObjectReader::optional_text(std::string_view name) {
    return as_text(optional(name, Kind::string));
}

std::optional<double> ObjectReader::required_number(std::string_view name) {
    return as_number(required(name, Kind::number));
}

std::optional<double> ObjectReader::optional_number(std::string_view name) {
    return as_number(optional(name, Kind::number));
}

std::optional<bool> ObjectReader::required_bool(std::string_view name) {
    return as_bool(required(name, Kind::boolean));
}

std::optional<bool> ObjectReader::optional_bool(std::string_view name) {
    return as_bool(optional(name, Kind::boolean));
}

std::optional<std::vector<std::string>> ObjectReader::texts(const Json* array,
                                                            std::string_view name) {
    if (array == nullptr) {
        return std::nullopt;
    }
    const std::string what = fmt::format("an item of \"{}\" of {}", name, what_);
    std::vector<std::string> result;
    for (const Json& item : array->items()) {
        if (expect_kind(item, Kind::string, what, report_)) {
            result.emplace_back(item.text());
        }
    }
    return result;
}

std::optional<std::vector<std::string>> ObjectReader::required_texts(std::string_view name) {
    return texts(required(name, Kind::array), name);
}

std::optional<std::vector<std::string>> ObjectReader::optional_texts(std::string_view name) {
    return texts(optional(name, Kind::array), name);
}

void ObjectReader::finish() {
    if (object_ == nullptr) {
        return;
    }
    for (const Member& member : object_->members()) {
        if (std::find(asked_.begin(), asked_.end(), member.name) != asked_.end()) {
            continue;
        }
        std::string hint = did_you_mean(member.name, asked_);
        if (hint.empty()) {
            hint = fmt::format("; known are {}", join(asked_, ", "));
        }
        report_.error("json-unknown-key",
                      member.name_place,
                      fmt::format("unknown name \"{}\" in {}{}", member.name, what_, hint));
    }
}

}  // namespace isohydric::diag
