#include "dropfront/scoring/bounds/charge.hpp"
#include "dropfront/scoring/bounds/rules.hpp"
#include "dropfront/scoring/checks/stress.hpp"

namespace dropfront::scoring::bounds {

/// High ambient + Rth·loss with the least rail under the heaviest load, over the stage's own maximum less the
/// derating. Theorem.
double output_stage_junction(const BoxQuestion& question) {
  if (!question.ends.known_circuit()) return 0;
  const auto charge = question.charge(BoxCorner::rich);
  const double rail_V =
      rail_floor_V(question, BoxCorner::rich, charge, load_most_A(question, BoxCorner::rich, 1));
  const double heaviest_A = question.context.loads.heaviest_output_A();
  return question.least_share(question.box.output_stages, [&](const parts::OutputStage* stage) {
    if (stage->kind == parts::StageKind::direct || !stage->thermal_resistance_K_per_W ||
        !stage->max_junction_degC) {
      return 0.0;
    }
    const double limit_degC = *stage->max_junction_degC - question.context.requirement->derating.junction_K;
    if (!(limit_degC > 0)) return 0.0;
    const double loss_W = stage_loss_W(*stage, rail_V, heaviest_A);
    return (question.context.ambient_high_degC() + *stage->thermal_resistance_K_per_W * loss_W) / limit_degC;
  });
}

}  // namespace dropfront::scoring::bounds
