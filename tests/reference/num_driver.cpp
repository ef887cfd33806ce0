// Answers questions about isohydric::num for the outside oracles beside it: one question a line,
// numbers as the 16 hexadecimal digits of their bits, one answer a line.
#include "isohydric/num/number.hpp"
#include "isohydric/num/rounding.hpp"

#include <bit>
#include <charconv>
#include <cstdint>
#include <functional>
#include <iostream>
#include <map>
#include <sstream>
#include <stdexcept>
#include <string>
#include <string_view>
#include <vector>

namespace {

namespace num = isohydric::num;
using num::Interval;
using Numbers = std::vector<double>;

double number_of(std::string_view word) {
    std::uint64_t bits = 0;
    std::from_chars(word.data(), word.data() + word.size(), bits, 16);
    return std::bit_cast<double>(bits);
}

std::string text_of(double value) {
    constexpr std::string_view k_digits = "0123456789abcdef";
    std::string text(16, '0');
    auto bits = std::bit_cast<std::uint64_t>(value);
    for (auto digit = text.rbegin(); digit != text.rend(); ++digit, bits >>= 4) {
        *digit = k_digits[bits & 15];
    }
    return text;
}

std::string text_of(const Interval& value) {
    return text_of(value.lower()) + ' ' + text_of(value.upper());
}

template <class Function>
std::function<std::string(const Numbers&)> one(Function function) {
    return [function](const Numbers& x) {
        return text_of(function(x.at(0)));
    };
}

template <class Function>
std::function<std::string(const Numbers&)> on_interval(Function function) {
    return [function](const Numbers& x) {
        return text_of(function(Interval(x.at(0), x.at(1))));
    };
}

template <class Function>
std::function<std::string(const Numbers&)> on_intervals(Function function) {
    return [function](const Numbers& x) {
        return text_of(function(Interval(x.at(0), x.at(1)), Interval(x.at(2), x.at(3))));
    };
}

const std::map<std::string, std::function<std::string(const Numbers&)>, std::less<>>& answers() {
    static const std::map<std::string, std::function<std::string(const Numbers&)>, std::less<>>
        k_answers = {
            {"exp", one([](double x) { return num::exp(x); })},
            {"log", one([](double x) { return num::log(x); })},
            {"log10", one([](double x) { return num::log10(x); })},
            {"pow10", one([](double x) { return num::pow10(x); })},
            {"sqrt", one([](double x) { return num::sqrt(x); })},
            {"pow",
             [](const Numbers& x) {
                 return text_of(num::pow(x.at(0), x.at(1)));
             }},
            {"round8", one([](double x) { return num::round_to_8_decimals(x); })},
            {"compare8",
             [](const Numbers& x) {
                 return std::to_string(num::compare_at_8_decimals(x.at(0), x.at(1)));
             }},
            {"shortest",
             [](const Numbers& x) {
                 return num::shortest(x.at(0));
             }},
            {"decimals",
             [](const Numbers& x) {
                 return num::format_decimals(x.at(0), static_cast<int>(x.at(1)));
             }},
            {"iexp", on_interval([](const Interval& x) { return exp(x); })},
            {"ilog", on_interval([](const Interval& x) { return log(x); })},
            {"ilog10", on_interval([](const Interval& x) { return log10(x); })},
            {"ipow10", on_interval([](const Interval& x) { return pow10(x); })},
            {"isqrt", on_interval([](const Interval& x) { return sqrt(x); })},
            {"iabs", on_interval([](const Interval& x) { return abs(x); })},
            {"ineg", on_interval([](const Interval& x) { return -x; })},
            {"iadd", on_intervals([](const Interval& x, const Interval& y) { return x + y; })},
            {"isub", on_intervals([](const Interval& x, const Interval& y) { return x - y; })},
            {"imul", on_intervals([](const Interval& x, const Interval& y) { return x * y; })},
            {"idiv", on_intervals([](const Interval& x, const Interval& y) { return x / y; })},
            {"ipow", on_intervals([](const Interval& x, const Interval& y) { return pow(x, y); })},
        };
    return k_answers;
}

}  // namespace

int main() {
    std::ios::sync_with_stdio(false);
    std::string line;
    while (std::getline(std::cin, line)) {
        std::istringstream words(line);
        std::string name;
        words >> name;
        Numbers numbers;
        for (std::string word; words >> word;) {
            numbers.push_back(number_of(word));
        }
        const auto answer = answers().find(name);
        if (answer == answers().end()) {
            std::cerr << "unknown question: " << line << '\n';
            return 2;
        }
        std::cout << answer->second(numbers) << '\n';
    }
    return 0;
}
