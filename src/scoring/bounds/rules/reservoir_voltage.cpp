#include "dropfront/scoring/bounds/empty_rail.hpp"
#include "dropfront/scoring/bounds/rules.hpp"

namespace dropfront::scoring::bounds {

/// The empty rich rail over the best derated rating. Theorem.
double reservoir_voltage(const BoxQuestion& question) {
  if (!question.ends.known_circuit()) return 0;
  const auto charge = question.charge(BoxCorner::rich);
  const double rail_V = empty_rail_V(question, charge, charge.clamp_V);
  const double derating = question.context.requirement->derating.reservoir_voltage;
  return question.least_share(question.box.reservoirs, [&](const parts::Reservoir* part) {
    return rail_V / (part->rated_voltage_V * derating);
  });
}

}  // namespace dropfront::scoring::bounds
