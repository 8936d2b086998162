#include <cmath>

#include "dropfront/scoring/checks/checks.hpp"
#include "dropfront/scoring/checks/make_check.hpp"
#include "dropfront/scoring/checks/stress.hpp"

namespace dropfront::scoring {

std::optional<Check> thyristor_turn_off(Evidence& evidence) {
  const Design& design = evidence.design();
  if (design.thyristor == nullptr) return std::nullopt;
  return worst_over(hot_points(evidence), [&](const OperatingPoint& point) {
    double rest_s = INFINITY;
    if (!point.state.thyristor_turn_off_s.empty()) rest_s = point.state.thyristor_turn_off_s.front();
    // It does not fire at all at this load: a whole period is as long as it could be asked for.
    if (!std::isfinite(rest_s)) rest_s = point.values.mains.period_s();
    return with(
        at_least("thyristor.turn_off", rest_s, design.thyristor->turn_off_time_s, "s", at_point(point),
                 "least time at or below its on-voltage before the anode is positive again"),
        {{"line_frequency_Hz", point.values.mains.frequency_Hz()}});
  });
}

}  // namespace dropfront::scoring
