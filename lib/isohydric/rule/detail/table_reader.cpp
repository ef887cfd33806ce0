// Reads decision tables: each row becomes a finding, or a check that stops, whose condition is the conjunction of the
// cases in its cells. A missing axis so makes a row that otherwise fits unknown, by three-valued logic alone.
#include "isohydric/diag/text.hpp"
#include "isohydric/rule/detail/entry_reader.hpp"

#include <fmt/format.h>

namespace isohydric::rule::detail {
namespace {

constexpr std::string_view k_any = "*";

struct AxisCase {
    std::string id;
    ExpressionPtr when;
};

struct Axis {
    std::string id;
    std::vector<AxisCase> cases;
};

/// Reports an id that is not well-formed or that one of `earlier` has.
template <class Named>
bool check_own_id(const diag::Json* id, const std::vector<Named>& earlier, diag::Report& report) {
    if (id == nullptr || !check_id(*id, EntryKind::table, report)) {
        return false;
    }
    for (const Named& other : earlier) {
        if (other.id == id->text()) {
            report.error("rule-repeated",
                         id->place(),
                         fmt::format("\"{}\" stands twice in this table; rename one", id->text()));
            return false;
        }
    }
    return true;
}

Axis read_axis(const diag::Json& json,
               const std::vector<Axis>& earlier,
               const EntryContext& context) {
    diag::ObjectReader reader(json, context.report, "axis");
    Axis axis;
    if (const diag::Json* id = reader.required("id", diag::Kind::string)) {
        axis.id = id->text();
        for (const Axis& other : earlier) {
            if (other.id == axis.id) {
                context.report.error(
                    "rule-repeated",
                    id->place(),
                    fmt::format("two axes are called \"{}\"; rename one", axis.id));
            }
        }
    }
    for (const diag::Json& item : read_items(reader, "cases")) {
        diag::ObjectReader fields(item, context.report, "case of an axis");
        const diag::Json* id = fields.required("id", diag::Kind::string);
        ExpressionPtr when = read_truth(fields, "when", context);
        fields.finish();
        if (check_own_id(id, axis.cases, context.report)) {
            axis.cases.push_back({std::string(id->text()), std::move(when)});
        }
    }
    reader.finish();
    return axis;
}

ExpressionPtr always(const diag::Place& place) {
    Expression expression;
    expression.kind = NodeKind::truth_literal;
    expression.type = Type::truth;
    expression.place = place;
    expression.truth = true;
    expression.text = "true";
    return std::make_shared<const Expression>(std::move(expression));
}

ExpressionPtr both(ExpressionPtr left, ExpressionPtr right, const diag::Place& place) {
    if (left == nullptr || right == nullptr) {
        return left == nullptr ? right : left;
    }
    Expression expression;
    expression.kind = NodeKind::logical_and;
    expression.type = Type::truth;
    expression.place = place;
    expression.text = "and";
    expression.children = {std::move(left), std::move(right)};
    return std::make_shared<const Expression>(std::move(expression));
}

/// Reads the rows of one table.
class RowReader {
  public:
    RowReader(TableRows& result, const std::vector<Axis>& axes, const EntryContext& context)
        : result_(result), axes_(axes), context_(context) {}

    void read(const diag::Json& json) {
        diag::ObjectReader reader(json, context_.report, "row");
        const diag::Json* id = reader.required("id", diag::Kind::string);
        ExpressionPtr when = read_cells(reader);
        Finding finding;
        finding.head = result_.table.head;
        if (id != nullptr) {
            finding.head.id = fmt::format("{}.{}", result_.table.head.id, id->text());
            finding.head.place = id->place();
        }
        if (reader.any("stops") != nullptr) {
            result_.checks.push_back({.head = std::move(finding.head),
                                      .when = std::move(when),
                                      .stops = true,
                                      .states = read_sentence(reader, "stops", context_),
                                      .contradicts = {},
                                      .table = result_.table.head.id});
        } else {
            finding.approach = result_.table.approach;
            finding.when = std::move(when);
            finding.states = read_sentence(reader, "states", context_);
            finding.table = result_.table.head.id;
            read_statement(reader, finding, context_);
            result_.findings.push_back(std::move(finding));
        }
        reader.finish();
    }

  private:
    ExpressionPtr read_cells(diag::ObjectReader& reader) {
        const diag::Json* cells = reader.required("cells", diag::Kind::array);
        if (cells == nullptr) {
            return nullptr;
        }
        if (cells->items().size() != axes_.size()) {
            context_.report.error("rule-table-cells",
                                  cells->place(),
                                  fmt::format("this row has {} cells, the table {} axes; give each "
                                              "axis a cell, \"*\" where any case will do",
                                              cells->items().size(),
                                              axes_.size()));
            return nullptr;
        }
        ExpressionPtr when;
        for (std::size_t i = 0; i < axes_.size(); ++i) {
            when = both(std::move(when), read_cell(cells->items()[i], axes_[i]), cells->place());
        }
        return when == nullptr ? always(cells->place()) : when;
    }

    ExpressionPtr read_cell(const diag::Json& cell, const Axis& axis) {
        if (!diag::expect_kind(cell, diag::Kind::string, "a cell", context_.report) ||
            cell.text() == k_any) {
            return nullptr;
        }
        std::vector<std::string> known;
        for (const AxisCase& possible : axis.cases) {
            if (possible.id == cell.text()) {
                return possible.when;
            }
            known.push_back(possible.id);
        }
        context_.report.error(
            "rule-table-cells",
            cell.place(),
            fmt::format("the axis \"{}\" has no case \"{}\"; it has {}, and \"*\" "
                        "for any",
                        axis.id,
                        cell.text(),
                        diag::join(known, ", ")));
        return nullptr;
    }

    TableRows& result_;
    const std::vector<Axis>& axes_;
    const EntryContext& context_;
};

}  // namespace

TableRows read_table(const diag::Json& json, const EntryContext& context) {
    diag::ObjectReader reader(json, context.report, "table");
    TableRows result;
    result.table.head = read_head(reader, context);
    result.table.approach = read_approach(reader, context);
    std::vector<Axis> axes;
    if (const diag::Json* list = reader.required("axes", diag::Kind::array)) {
        for (const diag::Json& item : list->items()) {
            axes.push_back(read_axis(item, axes, context));
        }
    }
    RowReader rows(result, axes, context);
    if (const diag::Json* list = reader.required("rows", diag::Kind::array)) {
        for (const diag::Json& item : list->items()) {
            rows.read(item);
        }
    }
    reader.finish();
    return result;
}

}  // namespace isohydric::rule::detail
