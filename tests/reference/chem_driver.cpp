// Answers questions about isohydric::chem for the oracle chem_mpmath.py. `chem_driver models` lists each
// model with its inputs' domains; otherwise each input line is a model's name and its arguments, each
// answer the value in doubles and the bounds of the same template over Interval. Numbers are decimals
// that read back to the same double.
#include <charconv>
#include <iostream>
#include <map>
#include <sstream>
#include <string>
#include <string_view>

#include "chem/all_models.hpp"

namespace {

namespace testing = isohydric::chem::testing;
namespace num = isohydric::num;

std::string text_of(double value) {
    constexpr std::size_t k_longest = 32;
    std::string text(k_longest, '\0');
    const auto written = std::to_chars(text.data(), text.data() + text.size(), value);
    text.resize(static_cast<std::size_t>(written.ptr - text.data()));
    return text;
}

double number_of(std::string_view word) {
    double value = 0.0;
    std::from_chars(word.data(), word.data() + word.size(), value);
    return value;
}

void list_models() {
    for (const testing::Model<double>& model : testing::all_models<double>()) {
        std::cout << model.name;
        for (const testing::Input& input : model.inputs) {
            std::cout << ' ' << text_of(input.domain.low) << ' ' << text_of(input.domain.high);
        }
        std::cout << '\n';
    }
}

std::map<std::string_view, std::size_t> places_of(const testing::Models<double>& models) {
    std::map<std::string_view, std::size_t> places;
    for (std::size_t place = 0; place < models.size(); ++place) {
        places.emplace(models[place].name, place);
    }
    return places;
}

void answer_questions() {
    const auto plain = testing::all_models<double>();
    const auto wide = testing::all_models<num::Interval>();
    const auto places = places_of(plain);
    for (std::string line; std::getline(std::cin, line);) {
        std::istringstream words(line);
        std::string word;
        words >> word;
        const std::size_t place = places.at(word);
        std::vector<double> x;
        while (words >> word) {
            x.push_back(number_of(word));
        }
        const std::vector<num::Interval> points(x.begin(), x.end());
        const num::Interval bounds = wide[place].evaluate(points);
        std::cout << text_of(plain[place].evaluate(x)) << ' ' << text_of(bounds.lower()) << ' '
                  << text_of(bounds.upper()) << '\n';
    }
}

}  // namespace

int main(int argc, char** argv) {
    if (argc > 1 && std::string_view(argv[1]) == "models") {
        list_models();
    } else {
        answer_questions();
    }
}
