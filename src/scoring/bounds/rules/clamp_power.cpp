#include "dropfront/scoring/bounds/clamp_load.hpp"
#include "dropfront/scoring/bounds/rules.hpp"

namespace dropfront::scoring::bounds {

/// Least mean power in one clamp over its own derated rating, rich and empty. Theorem.
double clamp_power(const BoxQuestion& question) {
  if (!question.ends.known_circuit()) return 0;
  const ClampLoad load(question);
  const double derating = question.context.requirement->derating.clamp_power;
  return question.least_share(question.box.clamps, [&](const parts::Clamp* part) {
    return part->rated_power_W ? load.least_W(*part) / (*part->rated_power_W * derating) : 0;
  });
}

}  // namespace dropfront::scoring::bounds
