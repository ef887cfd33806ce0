#include "isohydric/units/detail/code.hpp"

#include "isohydric/units/detail/atom.hpp"

#include <algorithm>
#include <charconv>
#include <cstdlib>
#include <optional>

#include <fmt/format.h>

namespace isohydric::units::detail {

namespace {

constexpr std::string_view k_power_of_ten = "10*";
/// Longer than any unit of the trade; a bound on what hostile text can ask for.
constexpr std::size_t k_longest_code = 100;

/// Where the part at the front of `text` ends: at the next operator outside braces.
std::size_t part_length(std::string_view text) {
    bool in_braces = false;
    for (std::size_t i = 0; i < text.size(); ++i) {
        if (text[i] == '{' || text[i] == '}') {
            in_braces = text[i] == '{';
        } else if (!in_braces && (text[i] == '.' || text[i] == '/')) {
            return i;
        }
    }
    return text.size();
}

/// `kg{H2O}` -> `kg`; none if braces do not close at the end or hold braces.
std::optional<std::string_view> without_annotation(std::string_view part) {
    const std::size_t open = part.find('{');
    if (open == std::string_view::npos) {
        return part.find('}') == std::string_view::npos ? std::optional(part) : std::nullopt;
    }
    const bool closes_at_end = part.find_first_of("{}", open + 1) == part.size() - 1;
    return closes_at_end && part.back() == '}' ? std::optional(part.substr(0, open)) : std::nullopt;
}

/// Where the exponent begins: behind `10*`, or at the last sign and digits.
std::size_t exponent_start(std::string_view part) {
    if (part.starts_with(k_power_of_ten)) {
        return k_power_of_ten.size();
    }
    std::size_t start = part.find_last_not_of("0123456789") + 1;
    if (start < part.size() && start > 0 && (part[start - 1] == '+' || part[start - 1] == '-')) {
        --start;
    }
    return start;
}

/// A whole number with an optional sign, not zero and not beyond `largest`.
std::optional<int> parse_exponent(std::string_view text, int largest) {
    const std::string_view unsigned_text = text.starts_with('+') ? text.substr(1) : text;
    int exponent = 0;
    const char* const end = unsigned_text.data() + unsigned_text.size();
    const auto [stop, fault] = std::from_chars(unsigned_text.data(), end, exponent);
    const bool is_number = fault == std::errc{} && stop == end;
    if (!is_number || exponent == 0 || std::abs(exponent) > largest) {
        return std::nullopt;
    }
    return exponent;
}

/// The term of one part between operators; an exponent of 0 if the part counts as nothing (`1`, `{ratio}`).
diag::Result<Term> parse_part(std::string_view annotated) {
    if (annotated.empty()) {
        return diag::unexpected("an operator has nothing beside it");
    }
    const auto part = without_annotation(annotated);
    if (!part) {
        return diag::unexpected("its braces do not match");
    }
    if (part->empty() || *part == "1") {
        return Term{};
    }
    const std::size_t split = exponent_start(*part);
    const std::string_view atom = part->substr(0, split);
    if (!find_atom(atom)) {
        return diag::unexpected(fmt::format("\"{}\" is not known", atom.empty() ? *part : atom));
    }
    if (split == part->size()) {
        return Term{std::string(atom), 1};
    }
    const int largest = atom == k_power_of_ten ? k_largest_decimal_exponent : k_largest_exponent;
    const auto exponent = parse_exponent(part->substr(split), largest);
    if (!exponent) {
        return diag::unexpected(fmt::format(
            "the exponent of \"{}\" is not a whole number between -{} and {} other than 0",
            *part,
            largest,
            largest));
    }
    return Term{std::string(atom), *exponent};
}

bool stands_alone(const Term& term) {
    const auto atom = find_atom(term.atom);
    return atom && atom->kind == AtomKind::alone;
}

/// `Cel` in a product or power would have to lose its zero point.
std::optional<std::string> misplaced(const std::vector<Term>& terms, bool any_division) {
    const auto found = std::ranges::find_if(terms, stands_alone);
    if (found == terms.end() || (terms.size() == 1 && found->exponent == 1 && !any_division)) {
        return std::nullopt;
    }
    return fmt::format("\"{}\" cannot be part of a product{}",
                       found->atom,
                       found->atom == "Cel" ? ", write \"K\"" : "");
}

std::string written(const Term& term) {
    const int exponent = std::abs(term.exponent);
    return exponent == 1 ? term.atom : fmt::format("{}{}", term.atom, exponent);
}

}  // namespace

diag::Result<std::vector<Term>> parse_terms(std::string_view code) {
    if (code.empty()) {
        return diag::unexpected("it is empty");
    }
    if (code.size() > k_longest_code) {
        return diag::unexpected(fmt::format("it is longer than {} characters", k_longest_code));
    }
    std::vector<Term> terms;
    std::string_view rest = code;
    bool divides = rest.starts_with('/');
    bool any_division = divides;
    rest.remove_prefix(divides ? 1 : 0);
    for (bool more = true; more;) {
        const std::size_t length = part_length(rest);
        auto term = parse_part(rest.substr(0, length));
        if (!term) {
            return diag::unexpected(std::move(term).error());
        }
        if (term->exponent != 0) {
            terms.push_back({std::move(term->atom), divides ? -term->exponent : term->exponent});
        }
        more = length < rest.size();
        divides = more && rest[length] == '/';
        any_division = any_division || divides;
        rest.remove_prefix(more ? length + 1 : length);
    }
    if (auto fault = misplaced(terms, any_division)) {
        return diag::unexpected(*std::move(fault));
    }
    return terms;
}

std::vector<Term> merge(std::vector<Term> terms) {
    std::vector<Term> merged;
    for (Term& term : terms) {
        const auto same = std::ranges::find(merged, term.atom, &Term::atom);
        if (same == merged.end()) {
            merged.push_back(std::move(term));
        } else {
            same->exponent += term.exponent;
        }
    }
    std::erase_if(merged,
                  [](const Term& term) { return term.exponent == 0 || term.atom == "[pH]"; });
    return merged;
}

std::string write_terms(const std::vector<Term>& terms) {
    std::string above;
    std::string below;
    for (const Term& term : terms) {
        if (term.exponent > 0) {
            above += (above.empty() ? "" : ".") + written(term);
        } else {
            below += "/" + written(term);
        }
    }
    return above.empty() && below.empty() ? "1" : above + below;
}

}  // namespace isohydric::units::detail
