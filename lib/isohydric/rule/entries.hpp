// The kinds of entries that a rule file may hold, after reading and checking. Plain data: the engine compiles it, reports
// print it. Names are resolved to indices by `RuleSet`.
#pragma once

#include "isohydric/panel/context.hpp"
#include "isohydric/rule/expression.hpp"

#include <cstdint>
#include <optional>
#include <string>
#include <vector>

namespace isohydric::rule {

/// Where a number or a rule comes from: a key of the bibliography and a place in that work.
struct Citation {
    std::string ref;      ///< key in sources.json, or `common-practice`
    std::string at;       ///< page, table, abstract ...
    bool checked = true;  ///< false: recalled, not compared with its source
    std::string note;
};

/// What every entry has.
struct EntryHead {
    std::string id;
    diag::Place place;
    std::vector<Citation> sources;
    std::string reviewed;  ///< ISO date
    bool policy = false;   ///< a choice among published practices, not a fact

    [[nodiscard]] bool unchecked() const {
        for (const Citation& source : sources) {
            if (!source.checked) {
                return true;
            }
        }
        return false;
    }
};

/// One of several ways to get a quantity, the first that is present counts.
struct Alternative {
    std::string from;  ///< plain words: "calculated from pH and pCO2"
    ExpressionPtr formula;
};

/// A chemistry model with the expressions that feed its inputs, in the order of its signature.
struct ModelCall {
    std::uint32_t model{};  ///< index into the signatures given to the reader
    std::vector<ExpressionPtr> inputs;
};

/// A named number: by formula, by the first of several formulas, or by a chemistry model.
struct Quantity {
    EntryHead head;
    std::string label;
    units::Unit unit = units::one();
    int decimals{};
    std::vector<Alternative> alternatives;  ///< one for a plain formula
    std::optional<ModelCall> model;
    std::string interval;    ///< name of the interval it is shown against, empty for none
    std::string convention;  ///< id of the convention it belongs to, empty for none
    bool internal = false;   ///< an aid to other entries, not listed in results
};

/// A named truth, an aid to other entries.
struct Condition {
    EntryHead head;
    ExpressionPtr when;
    std::string convention;
};

/// Numeric part of an interval's context: from (inclusive) to below (exclusive), in canonical units; absent ends are open.
struct Range {
    std::optional<double> from;
    std::optional<double> below;
};

/// Limits and mid-value of a quantity in one context. At most one interval of a name may hold for any context.
struct Interval {
    EntryHead head;
    std::uint32_t name{};                        ///< index into RuleSet::interval_names
    std::optional<double> low, mid, high;        ///< in RuleSet::interval_units[name]
    std::vector<panel::Specimen> specimens;      ///< empty: any
    std::vector<panel::Population> populations;  ///< empty: any
    Range age_a, altitude_m;
    bool needs_age = false;  ///< has an age criterion: holds only where an age is given
    bool shipped_default =
        false;             ///< belongs to an analyser method: until replaced, sentences say so
    std::string shown_as;  ///< said beside the value, e.g. "arterial interval used"
};

/// A statement about the panel and the disorders that it asserts.
struct Finding {
    EntryHead head;
    std::string approach;
    std::string label;
    ExpressionPtr when;
    std::vector<std::uint32_t> unless;   ///< indices of findings that take precedence
    std::string states;                  ///< template with {name} places
    std::vector<std::uint32_t> asserts;  ///< indices of disorders
    std::vector<std::string> consider;
    std::string table;  ///< id of the table it was compiled from, empty for none
};

/// A decision table, as far as it is more than the findings and checks that its rows became.
struct Table {
    EntryHead head;
    std::string approach;
    std::vector<std::string> rows;  ///< ids `<table>.<row>` of findings and checks, in order
};

/// A plausibility or consistency check: `when` holds if something is wrong.
struct Check {
    EntryHead head;
    ExpressionPtr when;
    bool stops = false;
    std::string states;
    std::vector<std::uint32_t> contradicts;  ///< indices of panel::Analyte
    std::string table;
};

/// A value that somebody must be told of at once, whatever the rest says.
struct Critical {
    EntryHead head;
    ExpressionPtr when;
    std::string states;
    Symbol value;  ///< analyte or quantity
};

enum class Onset : std::uint8_t { none, acute, chronic, acute_on_chronic, baseline };

/// The band that an explanation expects of a quantity.
struct Compensation {
    std::uint32_t quantity{};
    ExpressionPtr low, high;
    std::string from;  ///< the formula in plain words
};

/// A combination of disorders that would account for the panel.
struct Explanation {
    EntryHead head;
    std::string approach;
    std::vector<std::uint32_t> disorders;  ///< sorted indices of main disorders; empty: none
    Onset onset{};
    ExpressionPtr when;
    std::optional<Compensation> compensation;
    std::vector<std::uint32_t>
        early_beside;  ///< listed as early beside a fit of exactly these disorders; empty: never
    std::string early_states;
    ExpressionPtr early_when;  ///< where an incomplete response can be thought of; null: anywhere
    std::string states;
};

/// Findings or explanations declared exclusive and/or exhaustive over a domain.
struct Group {
    EntryHead head;
    std::vector<std::string> members;  ///< ids of findings, checks or explanations; tables unfolded
    bool exclusive = false;
    bool exhaustive = false;
    ExpressionPtr domain;
};

/// One word of the shared vocabulary.
struct Disorder {
    EntryHead head;
    std::string label;
    bool main = false;                     ///< one of the four that explanations count
    std::optional<std::uint32_t> kind_of;  ///< the main disorder that it is a kind of
    std::vector<std::string> approaches;   ///< that can speak of it
    ExpressionPtr judged_when;  ///< where explanations can tell of it; null: wherever they fit
};

/// A choice among published alternatives; its quantities and conditions are in force while it is chosen.
struct Convention {
    EntryHead head;
    std::string choice;
    std::string title;
    std::string why;
    bool chosen = false;
    std::vector<std::string> defines;  ///< ids of its quantities and conditions
};

/// A worked case beside a rule file.
struct Case {
    std::string id;
    diag::Place place;
    std::vector<std::pair<std::string, std::string>>
        panel;  ///< analyte as written, value with unit
    std::vector<std::pair<std::string, std::string>> context;  ///< item, value as text

    struct Expectation {
        std::string entry;
        std::string value;  ///< `yes`, `no`, `unknown` or a number
        diag::Place place;
    };

    std::vector<Expectation> expect;
    std::vector<Citation> sources;
};

}  // namespace isohydric::rule
