// Result and the assertions behind it.
#include "isohydric/diag/result.hpp"

#include <doctest/doctest.h>

#include <memory>
#include <string>

namespace isohydric::diag {
namespace {

Result<int> half(int number) {
    if (number % 2 != 0) {
        return unexpected("odd");
    }
    return number / 2;
}

}  // namespace

TEST_CASE("result: holds the value or the reason") {
    const Result<int> good = half(8);
    CHECK(good.has_value());
    CHECK(good);
    CHECK(*good == 4);
    CHECK(good.value() == 4);
    CHECK(good.value_or(7) == 4);

    const Result<int> bad = half(7);
    CHECK_FALSE(bad.has_value());
    CHECK_FALSE(bad);
    CHECK(bad.error() == "odd");
    CHECK(bad.value_or(7) == 7);
}

TEST_CASE("result: asking for the side that is not there is an internal error") {
    CHECK_THROWS_AS((void)half(7).value(), InternalError);
    CHECK_THROWS_AS((void)*half(7), InternalError);
    CHECK_THROWS_AS((void)half(8).error(), InternalError);
}

TEST_CASE("result: value and reason may be of one type") {
    const Result<std::string> value = "a";
    const Result<std::string> reason = unexpected("a");
    CHECK(value.has_value());
    CHECK(*value == "a");
    CHECK_FALSE(reason.has_value());
    CHECK(reason.error() == "a");
}

TEST_CASE("result: carries values that can only be moved") {
    Result<std::unique_ptr<int>> owner = std::make_unique<int>(5);
    CHECK(**owner == 5);
    const std::unique_ptr<int> taken = std::move(owner).value();
    CHECK(*taken == 5);
}

TEST_CASE("result: members of the value are reached by arrow, and can be changed") {
    Result<std::string> word = "ab";
    word->push_back('c');
    CHECK(word->size() == 3);
}

TEST_CASE("result: other types of reasons") {
    enum class Fault { none, far };
    const Result<double, Fault> result = unexpected(Fault::far);
    CHECK(result.error() == Fault::far);
}

TEST_CASE("assert: says file, line and condition; passes silently if it holds") {
    ISOHYDRIC_ASSERT(1 + 1 == 2);
    CHECK_THROWS_AS(ISOHYDRIC_NEVER(), InternalError);
    try {
        ISOHYDRIC_ASSERT(1 + 1 == 3);
        FAIL("not thrown");
    } catch (const InternalError& error) {
        const std::string what = error.what();
        CHECK(what.find("result_test.cpp:") != std::string::npos);
        CHECK(what.find("1 + 1 == 3") != std::string::npos);
    }
}

}  // namespace isohydric::diag
