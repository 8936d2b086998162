#include "dropfront/scoring/bounds/empty_rail.hpp"
#include "dropfront/scoring/bounds/rules.hpp"
#include "dropfront/scoring/checks/stress.hpp"

namespace dropfront::scoring::bounds {

/// The empty rich rail over the best derated reservoir, and over the best input_max: a member breaks the
/// check at the lesser of its own two. An input_max that is not given counts as unlimited. Theorem.
double rail_max(const BoxQuestion& question) {
  if (!question.ends.known_circuit()) return 0;
  const auto charge = question.charge(BoxCorner::rich);
  const double rail_V = empty_rail_V(question, charge, charge.clamp_V);
  const double derating = question.context.requirement->derating.reservoir_voltage;
  const double can_use = question.least_share(question.box.reservoirs, [&](const parts::Reservoir* part) {
    return rail_V / (part->rated_voltage_V * derating);
  });
  const double stage_use =
      question.least_share(question.box.output_stages, [&](const parts::OutputStage* stage) {
        return has_input_rating(*stage) && stage->input_max_V ? rail_V / *stage->input_max_V : 0;
      });
  return std::max(can_use, stage_use);
}

}  // namespace dropfront::scoring::bounds
