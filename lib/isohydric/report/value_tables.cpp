#include "isohydric/report/detail/value_tables.hpp"

#include "isohydric/engine/explain.hpp"
#include "isohydric/interpret/words.hpp"

#include <algorithm>
#include <charconv>

#include <fmt/format.h>

namespace isohydric::report {

namespace {

using Bound = std::optional<double>;

std::string range_text(const Bound& low, const Bound& high, int decimals) {
    if (low && high) {
        return engine::printed(*low, decimals) + " to " + engine::printed(*high, decimals);
    }
    if (low) {
        return "from " + engine::printed(*low, decimals);
    }
    return high ? "up to " + engine::printed(*high, decimals) : std::string();
}

/// A value with as many digits as make "low" or "high" look true beside its limit.
std::string value_text(double value, int decimals, const Bound& low, const Bound& high) {
    if (low && value < *low) {
        return engine::printed(value, decimals, low);
    }
    return high && value > *high ? engine::printed(value, decimals, high)
                                 : engine::printed(value, decimals);
}

std::string side(double value, const Bound& low, const Bound& high) {
    if (low && value < *low) {
        return "low";
    }
    return high && value > *high ? "high" : "";
}

std::string with_unit(std::string number, std::string_view unit) {
    return unit.empty() ? std::move(number) : fmt::format("{} {}", number, unit);
}

/// Remarks, each said once for all the values to which it belongs.
class Remarks {
  public:
    void add(const std::string& name, const std::string& remark) {
        if (remark.empty()) {
            return;
        }
        const auto known = std::find_if(remarks_.begin(), remarks_.end(), [&](const auto& entry) {
            return entry.first == remark;
        });
        if (known == remarks_.end()) {
            remarks_.push_back({remark, {name}});
        } else {
            known->second.push_back(name);
        }
    }

    void write(TextLayout& out) const {
        std::vector<std::string> texts;
        for (const auto& [remark, names] : remarks_) {
            texts.push_back(fmt::format("{}: {}", listed(names), remark));
        }
        if (!texts.empty()) {
            out.item("    ", listed(texts, "; "));
        }
    }

  private:
    std::vector<std::pair<std::string, std::vector<std::string>>> remarks_;
};

/// Whether the digits that were written are those of the value shown: then there is nothing to add to it.
bool shows_as_entered(const panel::Entered& entered) {
    double written = 0;
    const char* const end = entered.as_entered.data() + entered.as_entered.size();
    const auto [rest, problem] = std::from_chars(entered.as_entered.data(), end, written);
    return problem == std::errc() && written == entered.value && (rest == end || *rest != ',');
}

std::string censored_text(const panel::Entered& entered, const panel::AnalyteInfo& info) {
    const std::string_view sign = entered.censoring == panel::Censoring::below ? "<" : ">";
    return with_unit(fmt::format("{}{}", sign, engine::printed(entered.value, info.decimals)),
                     info.unit_text);
}

bool is_model(const interpret::Interpretation& of, const std::string& quantity) {
    const rule::RuleSet& rules = of.program->rules();
    const std::optional<std::uint32_t> index = rules.find_quantity(quantity);
    return index && rules.quantities[*index].model.has_value();
}

/// Where a calculated value is from, as people say it: a model is known by its source, not by its id.
std::string origin(const interpret::Interpretation& of, const interpret::QuantityResult& quantity) {
    const bool plain = quantity.from == "calculated" || is_model(of, quantity.name);
    return plain ? std::string() : quantity.from;
}

bool is_calculated(const interpret::QuantityResult& quantity) {
    return quantity.value && quantity.from != "measured" && quantity.from != "as reported";
}

std::string joined(const std::string& first, const std::string& second) {
    return first.empty() || second.empty() ? first + second : first + ", " + second;
}

}  // namespace

void write_panel(const interpret::Interpretation& of, bool full, TextLayout& out) {
    TextLayout::Rows rows;
    Remarks remarks;
    std::vector<std::string> otherwise;
    for (const interpret::AnalyteResult& result : of.entered) {
        const panel::AnalyteInfo& info = (*of.program->rules().catalogue)[result.analyte];
        const panel::Entered& entered = *of.panel[result.analyte];
        const std::string name(panel::id_of(result.analyte));
        const bool censored = entered.censoring != panel::Censoring::none;
        rows.push_back(
            {name,
             censored ? censored_text(entered, info)
                      : with_unit(value_text(entered.value, info.decimals, result.low, result.high),
                                  info.unit_text),
             censored ? "bound" : side(entered.value, result.low, result.high),
             range_text(result.low, result.high, info.decimals)});
        if (full) {
            rows.back().push_back(joined(entered.as_entered, entered.note));
            continue;
        }
        if (!shows_as_entered(entered) && !censored) {
            otherwise.push_back(name + " " + entered.as_entered);
        }
        remarks.add(name, entered.note);
    }
    out.heading(full ? "Panel: value, interval, as entered" : "Panel");
    if (full) {
        out.table(rows, "  ");
        return;
    }
    out.table_side_by_side(rows, "  ");
    if (!otherwise.empty()) {
        out.item("    ", "entered as " + listed(otherwise));
    }
    remarks.write(out);
}

/// In short, values that have no interval stand in one line below those that have.
void write_calculated(const interpret::Interpretation& of, bool full, TextLayout& out) {
    TextLayout::Rows rows;
    Remarks remarks;
    std::vector<std::string> others;
    for (const interpret::QuantityResult& quantity : of.quantities) {
        if (!is_calculated(quantity)) {
            continue;
        }
        const Bound& low = quantity.low;
        const Bound& high = quantity.high;
        const std::string value =
            with_unit(value_text(*quantity.value, quantity.decimals, low, high),
                      interpret::unit_words(quantity.unit));
        const std::string remark = joined(origin(of, quantity), quantity.interval_note);
        if (!full) {
            remarks.add(quantity.label, remark);
        }
        if (!full && !low && !high) {
            others.push_back(quantity.label + " " + value);
            continue;
        }
        rows.push_back({quantity.label,
                        value,
                        side(*quantity.value, low, high),
                        range_text(low, high, quantity.decimals)});
        if (full) {
            rows.back().push_back(remark);
        }
    }
    if (rows.empty() && others.empty()) {
        return;
    }
    out.heading("Calculated");
    out.table(rows, "  ");
    if (!others.empty()) {
        out.item("  ", listed(others, "; "));
    }
    remarks.write(out);
}

}  // namespace isohydric::report
