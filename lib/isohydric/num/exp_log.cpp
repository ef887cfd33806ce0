#include "isohydric/num/exp_log.hpp"

#include <algorithm>

namespace isohydric::num {

namespace {

template <class Function>
void each(std::span<const double> x, std::span<double> out, Function function) {
    const std::size_t size = std::min(x.size(), out.size());
    for (std::size_t i = 0; i < size; ++i) {
        out[i] = function(x[i]);
    }
}

// This file is compiled without errno for mathematics: the square root is one instruction.
double root(double x) {
    return __builtin_sqrt(x);
}

}  // namespace

double sqrt(double x) {
    return root(x);
}

void exp(std::span<const double> x, std::span<double> out) {
    each(x, out, [](double value) { return exp(value); });
}

void pow10(std::span<const double> x, std::span<double> out) {
    each(x, out, [](double value) { return pow10(value); });
}

void log(std::span<const double> x, std::span<double> out) {
    each(x, out, [](double value) { return log(value); });
}

void log10(std::span<const double> x, std::span<double> out) {
    each(x, out, [](double value) { return log10(value); });
}

void pow(std::span<const double> x, std::span<const double> y, std::span<double> out) {
    const std::size_t size = std::min({x.size(), y.size(), out.size()});
    for (std::size_t i = 0; i < size; ++i) {
        out[i] = pow(x[i], y[i]);
    }
}

void sqrt(std::span<const double> x, std::span<double> out) {
    each(x, out, root);
}

}  // namespace isohydric::num
