#include <algorithm>

#include "dropfront/scoring/bounds/empty_rail.hpp"
#include "dropfront/scoring/bounds/rules.hpp"

namespace dropfront::scoring::bounds {

/// Regulating stages: each one's own band against the asked one. Direct: the empty rich rail's distance above
/// the asked voltage. Theorem.
double output_band(const BoxQuestion& question) {
  const auto& need = question.context.requirement->output;
  const double allowed_V = need.voltage_V * need.tolerance;
  double rail_V = 0;
  if (question.ends.known_circuit()) {
    const auto charge = question.charge(BoxCorner::rich);
    rail_V = empty_rail_V(question, charge, charge.clamp_V);
  }
  return question.least_share(question.box.output_stages, [&](const parts::OutputStage* stage) {
    if (stage == nullptr) return 0.0;
    const bool direct = stage->kind == parts::StageKind::direct;
    const double low_V = direct ? need.voltage_V : stage->output_voltage_V * (1 - stage->tolerance);
    const double high_V = direct ? rail_V : stage->output_voltage_V * (1 + stage->tolerance);
    // On the band's edge rounding decides nothing.
    const bool inside = low_V >= need.voltage_V * (1 - need.tolerance) * (1 - 1e-12) &&
                        high_V <= need.voltage_V * (1 + need.tolerance) * (1 + 1e-12);
    if (inside) return 0.0;
    return std::max(need.voltage_V - low_V, high_V - need.voltage_V) / allowed_V;
  });
}

}  // namespace dropfront::scoring::bounds
