// Reads quantities: by formula, by the first of several formulas, or by a chemistry model.
#include "isohydric/diag/text.hpp"
#include "isohydric/rule/detail/entry_reader.hpp"
#include "isohydric/rule/detail/units_of.hpp"

#include <algorithm>

#include <fmt/format.h>

namespace isohydric::rule::detail {
namespace {

constexpr int k_most_decimals = 9;

/// Reads one quantity; its members depend on the unit read before them.
class QuantityReader {
  public:
    QuantityReader(const diag::Json& json, const EntryContext& context)
        : context_(context), reader_(json, context.report, "quantity") {}

    Quantity read() {
        quantity_.head = read_head(reader_, context_);
        quantity_.internal = reader_.optional_bool("internal").value_or(false);
        if (const diag::Json* unit = reader_.required("unit", diag::Kind::string)) {
            quantity_.unit = read_unit(*unit, context_.report).value_or(units::one());
        }
        read_display();
        read_interval_name();
        read_value();
        reader_.finish();
        return std::move(quantity_);
    }

  private:
    // What is not listed in results needs no words and no digits.
    void read_display() {
        quantity_.label =
            (quantity_.internal ? reader_.optional_text("label") : reader_.required_text("label"))
                .value_or("");
        const diag::Json* decimals = quantity_.internal
                                         ? reader_.optional("decimals", diag::Kind::number)
                                         : reader_.required("decimals", diag::Kind::number);
        if (decimals == nullptr) {
            return;
        }
        const double value = decimals->number();
        quantity_.decimals = static_cast<int>(std::clamp<double>(value, 0, k_most_decimals));
        if (quantity_.decimals != value) {
            context_.report.error("rule-decimals",
                                  decimals->place(),
                                  fmt::format("{} is no number of decimals; write a whole number "
                                              "from 0 to {}",
                                              decimals->text(),
                                              k_most_decimals));
        }
    }

    void read_interval_name() {
        const auto name = read_written(reader_, "interval");
        if (!name) {
            return;
        }
        quantity_.interval = name->text;
        const auto index = context_.rules.find_interval_name(name->text);
        if (!index) {
            context_.report.error(
                "rule-interval-name",
                name->place,
                fmt::format("no interval is \"of\" \"{}\"{}",
                            name->text,
                            diag::did_you_mean(name->text, context_.rules.interval_names)));
        } else if (context_.rules.interval_units[*index] != quantity_.unit) {
            context_.report.error("rule-unit-differs",
                                  name->place,
                                  fmt::format("the interval is in {}, the quantity in {}; use one "
                                              "unit for both",
                                              context_.rules.interval_units[*index].code(),
                                              quantity_.unit.code()));
        }
    }

    void read_value() {
        const diag::Json* formula = reader_.optional("formula", diag::Kind::string);
        const diag::Json* first_of = reader_.optional("firstOf", diag::Kind::array);
        const diag::Json* model = reader_.optional("model", diag::Kind::string);
        const diag::Json* inputs = reader_.optional("inputs", diag::Kind::object);
        const int ways = (formula != nullptr) + (first_of != nullptr) + (model != nullptr);
        if (ways != 1 || (model == nullptr) != (inputs == nullptr)) {
            context_.report.error(
                "rule-quantity-value",
                quantity_.head.place,
                fmt::format("\"{}\" needs exactly one of \"formula\", \"firstOf\", "
                            "or \"model\" with \"inputs\"",
                            quantity_.head.id));
            return;
        }
        const Wanted wanted{.type = Type::number, .unit = quantity_.unit};
        if (formula != nullptr) {
            quantity_.alternatives.push_back(
                {"", read_expression(*formula, context_.names, wanted, context_.report)});
        } else if (first_of != nullptr) {
            read_alternatives(*first_of, wanted);
        } else {
            read_model(*model, *inputs);
        }
    }

    void read_alternatives(const diag::Json& first_of, const Wanted& wanted) {
        if (first_of.items().empty()) {
            context_.report.error("rule-quantity-value",
                                  first_of.place(),
                                  "\"firstOf\" is empty; give it one alternative at least");
        }
        for (const diag::Json& item : first_of.items()) {
            diag::ObjectReader reader(item, context_.report, "alternative");
            std::string from = reader.required_text("from").value_or("");
            quantity_.alternatives.push_back(
                {std::move(from), read_formula(reader, "formula", wanted, context_)});
            reader.finish();
        }
    }

    void read_model(const diag::Json& model, const diag::Json& inputs) {
        const auto& models = context_.rules.models;
        const auto found = std::ranges::find(models, model.text(), &ModelSignature::id);
        if (found == models.end()) {
            std::vector<std::string> known;
            std::ranges::transform(models, std::back_inserter(known), &ModelSignature::id);
            context_.report.error("rule-model-unknown",
                                  model.place(),
                                  fmt::format("there is no chemistry model \"{}\"{}",
                                              model.text(),
                                              diag::did_you_mean(model.text(), known)));
            return;
        }
        const auto result = port_unit(found->result);
        if (result != quantity_.unit) {
            context_.report.error("rule-unit-differs",
                                  model.place(),
                                  fmt::format("the model \"{}\" gives {}, the quantity is in {}; "
                                              "give the quantity the unit of the model",
                                              found->id,
                                              result.code(),
                                              quantity_.unit.code()));
        }
        read_inputs(*found, inputs);
        quantity_.model->model = static_cast<std::uint32_t>(found - models.begin());
    }

    void read_inputs(const ModelSignature& signature, const diag::Json& inputs) {
        quantity_.model.emplace();
        diag::ObjectReader reader(inputs, context_.report, "list of inputs of this model");
        for (const ModelPort& port : signature.inputs) {
            const Wanted wanted{.type = Type::number, .unit = port_unit(port)};
            quantity_.model->inputs.push_back(read_formula(reader, port.name, wanted, context_));
        }
        reader.finish();
    }

    // Signatures come from the program, not from a file: a unit in them that cannot be read is our own mistake.
    static units::Unit port_unit(const ModelPort& port) {
        const auto unit = units::parse_unit(port.unit);
        ISOHYDRIC_ASSERT(unit.has_value());
        return *unit;
    }

    const EntryContext& context_;
    diag::ObjectReader reader_;
    Quantity quantity_;
};

}  // namespace

Quantity read_quantity(const diag::Json& json, const EntryContext& context) {
    return QuantityReader(json, context).read();
}

}  // namespace isohydric::rule::detail
