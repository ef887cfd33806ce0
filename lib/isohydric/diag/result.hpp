// Result: a value or the reason why there is none. Its members are a subset of std::expected's, so
// that it can become an alias of that once every compiler in use has it.
#pragma once

#include "isohydric/diag/assert.hpp"

#include <concepts>
#include <cstddef>
#include <string>
#include <type_traits>
#include <utility>
#include <variant>

namespace isohydric::diag {

/// The reason why there is no value, on its way into a Result.
template <class E>
struct Unexpected {
    E error;
};

/// Makes the failure side of a Result: `return unexpected("no unit given");`.
template <class E>
[[nodiscard]] Unexpected<std::decay_t<E>> unexpected(E&& error) {
    return {std::forward<E>(error)};
}

/// A T, or an E that says why not. Asking for the side that is not there is our own mistake
/// (InternalError).
template <class T, class E = std::string>
class [[nodiscard]] Result {
  public:
    // A Result is not convertible to its T, so copies and moves never come here.
    template <std::convertible_to<T> U = T>
    // NOLINTNEXTLINE(google-explicit-constructor, bugprone-forwarding-reference-overload)
    Result(U&& value) : content_(std::in_place_index<0>, std::forward<U>(value)) {}

    template <std::convertible_to<E> G>
    // NOLINTNEXTLINE(google-explicit-constructor): as std::expected
    Result(Unexpected<G> failure) : content_(std::in_place_index<1>, std::move(failure.error)) {}

    [[nodiscard]] bool has_value() const noexcept { return content_.index() == 0; }

    explicit operator bool() const noexcept { return has_value(); }

    [[nodiscard]] T& value() & { return side<0>(content_); }

    [[nodiscard]] const T& value() const& { return side<0>(content_); }

    [[nodiscard]] T&& value() && { return std::move(side<0>(content_)); }

    [[nodiscard]] T& operator*() & { return value(); }

    [[nodiscard]] const T& operator*() const& { return value(); }

    [[nodiscard]] T&& operator*() && { return std::move(*this).value(); }

    [[nodiscard]] T* operator->() { return &value(); }

    [[nodiscard]] const T* operator->() const { return &value(); }

    [[nodiscard]] E& error() & { return side<1>(content_); }

    [[nodiscard]] const E& error() const& { return side<1>(content_); }

    [[nodiscard]] E&& error() && { return std::move(side<1>(content_)); }

    template <std::convertible_to<T> U>
    [[nodiscard]] T value_or(U&& other) const {
        return has_value() ? value() : static_cast<T>(std::forward<U>(other));
    }

  private:
    template <std::size_t Index, class Content>
    static auto& side(Content& content) {
        auto* found = std::get_if<Index>(&content);
        ISOHYDRIC_ASSERT(found != nullptr);
        return *found;
    }

    std::variant<T, E> content_;
};

}  // namespace isohydric::diag
