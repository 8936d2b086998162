#include "dropfront/parts/output_stage.hpp"

#include "dropfront/parts/read_part.hpp"

namespace dropfront::parts {
namespace {

using values::Unit;

std::string kind_word(const OutputStage& part) {
  switch (part.kind) {
    case StageKind::linear:
      return "linear";
    case StageKind::step_down:
      return "step-down";
    case StageKind::direct:
      break;
  }
  return "direct";
}

void set_kind(OutputStage& part, const std::string& text) {
  part.kind = text == "linear"      ? StageKind::linear
              : text == "step-down" ? StageKind::step_down
                                    : StageKind::direct;
}

Rating default_dropout(const OutputStage& part) { return part.kind == StageKind::linear ? 2.0 : 0.0; }

Rating default_quiescent(const OutputStage& part) {
  if (part.kind == StageKind::linear) return 6e-3;
  return part.kind == StageKind::step_down ? 1e-3 : 0.0;
}

Rating same_in_dropout(const OutputStage& part) { return part.quiescent_current_A; }
Rating default_junction(const OutputStage&) { return 150.0; }

Field<OutputStage> step_down_needs(Field<OutputStage> field) {
  field.column.required_for = "step-down";
  return field;
}

}  // namespace

template <>
const std::vector<Field<OutputStage>>& fields_of<OutputStage>() {
  static const std::vector<Field<OutputStage>> fields = {
      word<OutputStage>("kind", ColumnClass::required, {kind_word, set_kind},
                        {"direct", "linear", "step-down"}),
      required("output_voltage", Unit::volt, &OutputStage::output_voltage_V, above_0(1e4)),
      required("tolerance", Unit::share, &OutputStage::tolerance, below_1),
      property("dropout", Unit::volt, &OutputStage::dropout_V, from_0(1e4), "linear 2 V, else 0 V",
               "older three-terminal regulators, from memory", default_dropout),
      property("quiescent_current", Unit::ampere, &OutputStage::quiescent_current_A, from_0(1e3),
               "linear 6 mA, step-down 1 mA, direct 0 mA", "older three-terminal regulators, from memory",
               default_quiescent),
      property("quiescent_current_dropout", Unit::ampere, &OutputStage::quiescent_current_dropout_A,
               from_0(1e3), "quiescent_current", "no rise in dropout unless stated", same_in_dropout),
      rating("input_max", Unit::volt, &OutputStage::input_max_V, above_0(1e4)),
      step_down_needs(rating("input_min", Unit::volt, &OutputStage::input_min_V, above_0(1e4))),
      rating("input_on", Unit::volt, &OutputStage::input_on_V, above_0(1e4)),
      rating("input_off", Unit::volt, &OutputStage::input_off_V, above_0(1e4)),
      step_down_needs(rating("efficiency", Unit::share, &OutputStage::efficiency, above_0(1))),
      rating("thermal_resistance", Unit::K_per_W, &OutputStage::thermal_resistance_K_per_W, above_0(1e6)),
      property("max_junction", Unit::degC, &OutputStage::max_junction_degC, temperatures_degC, "150 °C",
               "the least usual rating of silicon", default_junction),
  };
  return fields;
}

template <>
std::optional<Contradiction> contradiction_in(const OutputStage& part) {
  if (part.kind == StageKind::step_down) {
    if (!part.efficiency)
      return Contradiction{"efficiency", "efficiency is missing: a step-down stage needs it"};
    if (!part.input_min_V)
      return Contradiction{"input_min", "input_min is missing: a step-down stage needs it"};
    if (!(*part.input_min_V >= part.output_voltage_V)) {
      return Contradiction{"input_min", "input_min of a step-down stage is less than output_voltage"};
    }
  }
  if (part.input_min_V && part.input_max_V && !(*part.input_min_V < *part.input_max_V)) {
    return Contradiction{"input_max", "input_max is not above input_min"};
  }
  if (part.input_on_V && part.input_off_V && !(*part.input_off_V <= *part.input_on_V)) {
    return Contradiction{"input_off", "input_off is greater than input_on"};
  }
  if (part.input_max_V && !(part.output_voltage_V <= *part.input_max_V)) {
    return Contradiction{"input_max", "input_max is less than output_voltage"};
  }
  return std::nullopt;
}

OutputStage read_output_stage(const FieldSource& source, bool inline_part) {
  return read_part<OutputStage>(source, inline_part);
}

std::optional<ColumnValue> column_value(const OutputStage& part, std::string_view name) {
  return field_value(part, name);
}

}  // namespace dropfront::parts
