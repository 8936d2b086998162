#include "dropfront/scoring/rail_load.hpp"

#include <algorithm>
#include <cmath>

namespace dropfront::scoring {

RailLoad rail_load(const parts::OutputStage& stage, double output_A, double beside_A, Quiescent quiescent) {
  const double own_A = beside_A + quiescent_A(stage, quiescent);
  const double efficiency = stage.efficiency.value_or(0);
  if (stage.kind != parts::StageKind::step_down || !(efficiency > 0)) return {own_A + output_A, 0};
  return {own_A, stage_output_V(stage, End::high) * output_A / efficiency};
}

void hang(const RailLoad& load, const parts::OutputStage& stage, double required_V,
          circuit::ElementValues& values) {
  constexpr double kAboveClamp = 1.1;  // no rail stands much higher under load
  constexpr double kChord = 1.15;      // voltages of a chord's ends: it lies 0.5 % above the law at most
  values.rail_current_A = load.current_A;
  values.rail_power_W = load.power_W;
  const double off_V = stage.input_off_V.value_or(0);
  values.power_from_V = off_V > 0 && off_V < required_V ? off_V : 0.5 * required_V;
  values.power_to_V = std::max(kAboveClamp * values.clamp.main.threshold_V, 1.2 * required_V);
  const double span = std::log(values.power_to_V / values.power_from_V) / std::log(kChord);
  values.power_chords = std::clamp(static_cast<int>(std::ceil(span)), 1, 12);
}

}  // namespace dropfront::scoring
