// A number type that can do what num::Number asks and nothing else. Include it before any header
// with a model: a template calls num::exp by its full name, which must be declared where the
// template stands.
#pragma once

#include "isohydric/num/exp_log.hpp"

namespace isohydric::num {

class Archetype {
  public:
    // NOLINTNEXTLINE(google-explicit-constructor): the concept asks for a conversion.
    Archetype(double value) : value_(value) {}

    [[nodiscard]] double reveal() const { return value_; }

    friend Archetype operator+(const Archetype& a, const Archetype& b) {
        return a.value_ + b.value_;
    }

    friend Archetype operator-(const Archetype& a, const Archetype& b) {
        return a.value_ - b.value_;
    }

    friend Archetype operator*(const Archetype& a, const Archetype& b) {
        return a.value_ * b.value_;
    }

    friend Archetype operator/(const Archetype& a, const Archetype& b) {
        return a.value_ / b.value_;
    }

    friend Archetype operator-(const Archetype& a) { return -a.value_; }

  private:
    double value_;
};

inline Archetype exp(const Archetype& x) {
    return exp(x.reveal());
}

inline Archetype log(const Archetype& x) {
    return log(x.reveal());
}

inline Archetype log10(const Archetype& x) {
    return log10(x.reveal());
}

inline Archetype pow10(const Archetype& x) {
    return pow10(x.reveal());
}

inline Archetype sqrt(const Archetype& x) {
    return sqrt(x.reveal());
}

inline Archetype abs(const Archetype& x) {
    return abs(x.reveal());
}

inline Archetype pow(const Archetype& x, const Archetype& y) {
    return pow(x.reveal(), y.reveal());
}

}  // namespace isohydric::num
