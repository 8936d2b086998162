#include "dropfront/scoring/bounds/clamp_load.hpp"
#include "dropfront/scoring/bounds/rules.hpp"

namespace dropfront::scoring::bounds {

/// High ambient + Rth·(least mean power) over the clamp's own maximum less the derating. Theorem.
double clamp_junction(const BoxQuestion& question) {
  if (!question.ends.known_circuit()) return 0;
  const ClampLoad load(question);
  return question.least_share(question.box.clamps, [&](const parts::Clamp* part) {
    const double resistance_K_per_W = part->thermal_resistance_K_per_W;
    const double limit_degC = part->max_junction_degC - question.context.requirement->derating.junction_K;
    if (!(resistance_K_per_W > 0) || !(limit_degC > 0)) return 0.0;
    return (question.context.ambient_high_degC() + resistance_K_per_W * load.least_W(*part)) / limit_degC;
  });
}

}  // namespace dropfront::scoring::bounds
