#include "dropfront/scoring/stage_law.hpp"

#include <algorithm>

namespace dropfront::scoring {

double quiescent_A(const parts::OutputStage& stage, Quiescent quiescent) {
  switch (quiescent) {
    case Quiescent::least:
      return 0;
    case Quiescent::data:
      return stage.quiescent_current_A;
    case Quiescent::dropout:
      return std::max(stage.quiescent_current_A, stage.quiescent_current_dropout_A);
  }
  return stage.quiescent_current_A;
}

double stage_output_V(const parts::OutputStage& stage, End output) {
  const double part = output == End::low ? -stage.tolerance : output == End::high ? stage.tolerance : 0;
  return stage.output_voltage_V * (1 + part);
}

double stage_current_A(const parts::OutputStage& stage, double output_A, double rail_V, Quiescent quiescent,
                       End output) {
  const double own_A = quiescent_A(stage, quiescent);
  if (stage.kind != parts::StageKind::step_down) return output_A + own_A;
  const double efficiency = stage.efficiency.value_or(1);
  if (!(efficiency > 0) || !(rail_V > 0)) return output_A + own_A;
  return stage_output_V(stage, output) * output_A / (efficiency * rail_V) + own_A;
}

std::optional<double> stage_required_V(const parts::OutputStage& stage, const OutputNeed& need,
                                       bool with_tolerance) {
  switch (stage.kind) {
    case parts::StageKind::direct:
      return need.voltage_V * (1 - need.tolerance);
    case parts::StageKind::linear:
      return stage.output_voltage_V * (1 + (with_tolerance ? stage.tolerance : 0)) + stage.dropout_V;
    case parts::StageKind::step_down:
      return stage.input_min_V;
  }
  return std::nullopt;
}

std::optional<double> required_rail_V(const parts::OutputStage& stage, const OutputNeed& need,
                                      const LoadProfile& profile, bool with_tolerance) {
  const auto own_V = stage_required_V(stage, need, with_tolerance);
  if (!own_V) return std::nullopt;
  const double required_V = std::max(*own_V, profile.rail_minimum_V);
  if (!(required_V > 0)) return std::nullopt;
  return required_V;
}

}  // namespace dropfront::scoring
