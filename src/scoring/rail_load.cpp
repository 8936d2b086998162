#include "dropfront/scoring/rail_load.hpp"

#include <algorithm>

namespace dropfront::scoring {

RailLoad rail_load(const parts::OutputStage& stage, double output_A, double beside_A, Quiescent quiescent) {
  const double own_A = beside_A + quiescent_A(stage, quiescent);
  const double efficiency = stage.efficiency.value_or(0);
  if (stage.kind != parts::StageKind::step_down || !(efficiency > 0)) return {own_A + output_A, 0};
  return {own_A, stage.output_voltage_V * output_A / efficiency};
}

void hang(const RailLoad& load, const parts::OutputStage& stage, double required_V,
          circuit::ElementValues& values) {
  constexpr double kAboveClamp = 1.3;  // no rail stands higher under load, its ESR's spikes included
  values.rail_current_A = load.current_A;
  values.rail_power_W = load.power_W;
  const double off_V = stage.input_off_V.value_or(0);
  values.power_from_V = off_V > 0 && off_V < required_V ? off_V : 0.5 * required_V;
  values.power_to_V = std::max(kAboveClamp * values.clamp.main.threshold_V, 1.5 * required_V);
}

}  // namespace dropfront::scoring
