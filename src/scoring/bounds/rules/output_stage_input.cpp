#include "dropfront/scoring/bounds/empty_rail.hpp"
#include "dropfront/scoring/bounds/rules.hpp"
#include "dropfront/scoring/checks/stress.hpp"

namespace dropfront::scoring::bounds {

/// The empty rich rail, the first of the loads compared, over the best input_max. Theorem.
double output_stage_input(const BoxQuestion& question) {
  if (!question.ends.known_circuit()) return 0;
  const auto charge = question.charge(BoxCorner::rich);
  const double rail_V = empty_rail_V(question, charge, charge.clamp_V);
  return question.least_share(question.box.output_stages, [&](const parts::OutputStage* stage) {
    return has_input_rating(*stage) && stage->input_max_V ? rail_V / *stage->input_max_V : 0;
  });
}

}  // namespace dropfront::scoring::bounds
