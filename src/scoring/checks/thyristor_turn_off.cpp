#include <cmath>

#include "dropfront/scoring/checks/checks.hpp"
#include "dropfront/scoring/checks/make_check.hpp"
#include "dropfront/scoring/checks/stress.hpp"

namespace dropfront::scoring {

std::optional<Check> thyristor_turn_off(Evidence& evidence) {
  const Design& design = evidence.design();
  if (design.thyristor == nullptr) return std::nullopt;
  // Points at which it does not fire ask nothing of it; unloaded it must.
  std::vector<const OperatingPoint*> firing;
  for (const OperatingPoint* point : rich_points(evidence)) {
    const bool fires = !point->state.thyristor_turn_off_s.empty() &&
                       std::isfinite(point->state.thyristor_turn_off_s.front());
    if (fires || !point->state.usable()) firing.push_back(point);
  }
  if (firing.empty()) {
    return unsolved(at_least("thyristor.turn_off", std::nullopt, design.thyristor->turn_off_time_s, "s",
                             at_point(evidence.rich_empty_hot()), "it does not fire without load"),
                    "it does not fire without load");
  }
  return worst_over(firing, [&](const OperatingPoint& point) {
    const double rest_s =
        point.state.thyristor_turn_off_s.empty() ? 0 : point.state.thyristor_turn_off_s.front();
    return with(
        at_least("thyristor.turn_off", rest_s, design.thyristor->turn_off_time_s, "s", at_point(point),
                 "least time at or below its on-voltage before the anode is positive again"),
        {{"line_frequency_Hz", point.values.mains.frequency_Hz()}});
  });
}

}  // namespace dropfront::scoring
