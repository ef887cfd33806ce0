// What a formula may ask of a number, so that one template serves doubles, intervals and tests.
#pragma once

#include "isohydric/num/exp_log.hpp"
#include "isohydric/num/interval.hpp"

#include <concepts>

namespace isohydric::num {

/// Arithmetic with itself and with double, construction from double, and the functions
/// `exp log log10 pow10 sqrt abs pow`. A comparison is not asked for: a formula has no branch.
/// Call the functions as `num::exp(x)`: for a double, a bare `exp(x)` would find the C library's.
template <class T>
concept Number = std::copyable<T> && std::convertible_to<double, T> &&
    requires(T a, T b, double d) {
    { (a + b) } -> std::same_as<T>;
    { (a - b) } -> std::same_as<T>;
    { (a * b) } -> std::same_as<T>;
    { (a / b) } -> std::same_as<T>;
    { (d + a) } -> std::same_as<T>;
    { (d - a) } -> std::same_as<T>;
    { (d * a) } -> std::same_as<T>;
    { (d / a) } -> std::same_as<T>;
    { (a + d) } -> std::same_as<T>;
    { (a - d) } -> std::same_as<T>;
    { (a * d) } -> std::same_as<T>;
    { (a / d) } -> std::same_as<T>;
    { (-a) } -> std::same_as<T>;
    { exp(a) } -> std::same_as<T>;
    { log(a) } -> std::same_as<T>;
    { log10(a) } -> std::same_as<T>;
    { pow10(a) } -> std::same_as<T>;
    { sqrt(a) } -> std::same_as<T>;
    { abs(a) } -> std::same_as<T>;
    { pow(a, b) } -> std::same_as<T>;
};

}  // namespace isohydric::num
