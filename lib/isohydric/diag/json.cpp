#include "isohydric/diag/json.hpp"

#include "isohydric/diag/assert.hpp"
#include "isohydric/diag/detail/json_grammar.hpp"

#include <algorithm>

namespace isohydric::diag {
namespace {

template <class Wanted, class Content>
const Wanted& content_as(const Content& content) {
    const auto* found = std::get_if<Wanted>(&content);
    ISOHYDRIC_ASSERT(found != nullptr);
    return *found;
}

}  // namespace

std::string_view describe(Kind kind) {
    switch (kind) {
    case Kind::null:
        return "null";
    case Kind::boolean:
        return "true or false";
    case Kind::number:
        return "a number";
    case Kind::string:
        return "a string";
    case Kind::array:
        return "an array";
    case Kind::object:
        return "an object";
    }
    ISOHYDRIC_NEVER();
}

bool Json::as_bool() const {
    return content_as<bool>(content_);
}

std::string_view Json::text() const {
    if (kind() == Kind::number) {
        const Span span = place_.span;
        return std::string_view(place_.source->text()).substr(span.begin, span.end - span.begin);
    }
    return content_as<std::string>(content_);
}

double Json::number() const {
    return content_as<double>(content_);
}

int Json::decimals() const {
    ISOHYDRIC_ASSERT(kind() == Kind::number);
    const std::string_view digits = text();
    const std::size_t point = std::min(digits.find('.'), digits.size() - 1);
    const std::size_t end = std::min(digits.find_first_of("eE"), digits.size());
    return digits[point] == '.' ? static_cast<int>(end - point - 1) : 0;
}

const std::vector<Json>& Json::items() const {
    return content_as<std::vector<Json>>(content_);
}

const std::vector<Member>& Json::members() const {
    return content_as<std::vector<Member>>(content_);
}

const Json* Json::find(std::string_view name) const {
    const auto& all = members();
    const auto found =
        std::find_if(all.begin(), all.end(), [&](const Member& each) { return each.name == name; });
    return found == all.end() ? nullptr : &found->value;
}

Place string_place(const Json& string_value, std::size_t begin, std::size_t end) {
    ISOHYDRIC_ASSERT(string_value.kind() == Kind::string);
    const Place& whole = string_value.place();
    const std::size_t closing_quote = whole.span.end - 1;
    const std::string_view text = std::string_view(whole.source->text()).substr(0, closing_quote);
    std::size_t at = whole.span.begin + 1;
    std::size_t decoded = 0;
    const auto go_to = [&](std::size_t wanted, bool takes_whole_step) {
        while (at < text.size() && decoded < wanted) {
            const detail::StringStep step = detail::string_step(text.substr(at));
            if (!takes_whole_step && decoded + step.decoded > wanted) {
                break;  // a place inside an escape begins where the escape does
            }
            at += step.raw;
            decoded += step.decoded;
        }
        return at;
    };
    const std::size_t from = go_to(begin, false);
    return {whole.source, {from, go_to(std::max(begin, end), true)}};
}

}  // namespace isohydric::diag
