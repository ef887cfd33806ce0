// The JSON reader: a general-purpose parser checks the text and decodes it; the builder follows its
// steps on the text and gives every value its place.
#include "isohydric/diag/assert.hpp"
#include "isohydric/diag/detail/json_grammar.hpp"
#include "isohydric/diag/json.hpp"
#include "isohydric/diag/text.hpp"

#include <nlohmann/json.hpp>

#include <cstdint>
#include <map>
#include <utility>

#include <fmt/format.h>

namespace isohydric::diag {
namespace {

constexpr std::size_t k_deepest = 100;
constexpr std::string_view k_byte_order_mark = "\xEF\xBB\xBF";

}  // namespace

/// Receives the parser's events in the order of the text. Functions give false to stop the parser.
class JsonBuilder {
  public:
    JsonBuilder(std::shared_ptr<const Source> source, Report& report)
        : source_(std::move(source)), text_(source_->text()), report_(report) {
        if (text_.starts_with(k_byte_order_mark)) {
            last_end_ = k_byte_order_mark.size();
            report_.error("json-syntax",
                          place(0, last_end_),
                          "the text begins with a byte order mark: save it as UTF-8 without one");
        }
    }

    bool null() { return scalar(std::monostate(), 4); }

    bool boolean(bool value) { return scalar(value, value ? 4 : 5); }

    bool number_integer(std::int64_t value) { return number(static_cast<double>(value)); }

    bool number_unsigned(std::uint64_t value) { return number(static_cast<double>(value)); }

    bool number_float(double value, const std::string& /*digits*/) { return number(value); }

    bool string(std::string& value) {
        const std::size_t begin = detail::next_token(text_, last_end_);
        return scalar(std::move(value), detail::string_end(text_, begin) - begin);
    }

    bool binary(std::vector<std::uint8_t>& /*bytes*/) { ISOHYDRIC_NEVER(); }

    bool start_array(std::size_t /*size*/) { return open(std::vector<Json>()); }

    bool start_object(std::size_t /*size*/) { return open(std::vector<Member>()); }

    bool end_array() { return close(); }

    bool key(std::string& name);
    bool end_object();

    bool parse_error(std::size_t offset,
                     const std::string& token,
                     const nlohmann::json::exception& error);

    /// The whole value, once the parser has come to its end without stopping.
    std::optional<Json> finish();

  private:
    [[nodiscard]] Place place(std::size_t begin, std::size_t end) const {
        return {source_, {begin, end}};
    }

    [[nodiscard]] detail::After passed() const;
    static std::vector<Member>& members_of(Json& object);
    void report_syntax();
    void add(Json value);
    bool number(double value);
    bool scalar(Json::Content content, std::size_t length);
    bool open(Json::Content empty);
    bool close();

    std::shared_ptr<const Source> source_;
    std::string_view text_;
    Report& report_;
    std::size_t last_end_ = 0;  // offset behind the last token
    bool is_behind_name_ = false;
    std::vector<Json> open_;  // arrays and objects that are not closed yet, the outermost first
    std::optional<Json> root_;
};

std::vector<Member>& JsonBuilder::members_of(Json& object) {
    return std::get<std::vector<Member>>(object.content_);
}

detail::After JsonBuilder::passed() const {
    using detail::After;
    if (root_) {
        return After::document;
    }
    if (open_.empty()) {
        return After::nothing;
    }
    if (is_behind_name_) {
        return After::name;
    }
    const Json& inner = open_.back();
    if (inner.kind() == Kind::array) {
        return inner.items().empty() ? After::array_begin : After::array_item;
    }
    return inner.members().empty() ? After::object_begin : After::member_value;
}

void JsonBuilder::add(Json value) {
    is_behind_name_ = false;
    if (open_.empty()) {
        root_ = std::move(value);
    } else if (open_.back().kind() == Kind::array) {
        std::get<std::vector<Json>>(open_.back().content_).push_back(std::move(value));
    } else {
        members_of(open_.back()).back().value = std::move(value);
    }
}

bool JsonBuilder::number(double value) {
    const std::size_t begin = detail::next_token(text_, last_end_);
    return scalar(value, detail::number_end(text_, begin) - begin);
}

bool JsonBuilder::scalar(Json::Content content, std::size_t length) {
    const std::size_t begin = detail::next_token(text_, last_end_);
    last_end_ = begin + length;
    Json value;
    value.place_ = place(begin, last_end_);
    value.content_ = std::move(content);
    add(std::move(value));
    return true;
}

bool JsonBuilder::open(Json::Content empty) {
    const std::size_t begin = detail::next_token(text_, last_end_);
    last_end_ = begin + 1;
    if (open_.size() == k_deepest) {
        report_.error("json-too-deep",
                      place(begin, last_end_),
                      fmt::format("arrays and objects are nested deeper than {}", k_deepest));
        return false;
    }
    is_behind_name_ = false;
    Json value;
    value.place_ = place(begin, last_end_);
    value.content_ = std::move(empty);
    open_.push_back(std::move(value));
    return true;
}

bool JsonBuilder::close() {
    last_end_ = detail::skip_space(text_, last_end_) + 1;
    Json value = std::move(open_.back());
    open_.pop_back();
    value.place_.span.end = last_end_;
    add(std::move(value));
    return true;
}

bool JsonBuilder::key(std::string& name) {
    const std::size_t begin = detail::next_token(text_, last_end_);
    last_end_ = detail::string_end(text_, begin);
    is_behind_name_ = true;
    members_of(open_.back()).push_back({std::move(name), place(begin, last_end_), Json()});
    return true;
}

bool JsonBuilder::end_object() {
    std::map<std::string_view, const Member*> first;
    for (const Member& member : members_of(open_.back())) {
        const auto [found, is_new] = first.try_emplace(member.name, &member);
        if (!is_new) {
            report_
                .error("json-duplicate-key",
                       member.name_place,
                       fmt::format("the name \"{}\" stands twice in one object; keep one",
                                   member.name))
                .notes.push_back({"it stands here first", found->second->name_place});
        }
    }
    return close();
}

bool JsonBuilder::parse_error(std::size_t /*offset*/,
                              const std::string& token,
                              const nlohmann::json::exception& error) {
    constexpr int k_number_overflow = 406;
    if (error.id == k_number_overflow) {
        const std::size_t begin = detail::next_token(text_, last_end_);
        report_.error("json-number-range",
                      place(begin, begin + token.size()),
                      "the number is too large: the largest is about 1.8e308");
    } else {
        report_syntax();
    }
    return false;
}

void JsonBuilder::report_syntax() {
    const detail::SyntaxFault fault = detail::explain_syntax(text_, last_end_, passed());
    Diagnostic& added =
        report_.error("json-syntax", place(fault.span.begin, fault.span.end), fault.message);
    if (fault.span.begin == text_.size() && !open_.empty()) {
        const Json& inner = open_.back();
        added.notes.push_back(
            {fmt::format("{} that begins here is not closed", describe(inner.kind())),
             inner.place()});
    }
}

std::optional<Json> JsonBuilder::finish() {
    // The parser takes a NUL between tokens for the end of the text.
    if (detail::skip_space(text_, last_end_) < text_.size()) {
        report_syntax();
        return std::nullopt;
    }
    return std::move(root_);
}

std::optional<Json> read_json(std::shared_ptr<const Source> source, Report& report) {
    const std::string& text = source->text();
    if (const auto bad = first_invalid_utf8(text)) {
        report.error("json-not-utf8",
                     {source, {*bad, *bad + 1}},
                     fmt::format("byte \\x{:02X} is not UTF-8: save the text as UTF-8",
                                 static_cast<unsigned char>(text[*bad])));
        return std::nullopt;
    }
    JsonBuilder builder(std::move(source), report);
    const bool is_complete = nlohmann::json::sax_parse(text, &builder);
    return is_complete ? builder.finish() : std::nullopt;
}

}  // namespace isohydric::diag
