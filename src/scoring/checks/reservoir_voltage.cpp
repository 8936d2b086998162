#include "dropfront/scoring/checks/checks.hpp"
#include "dropfront/scoring/checks/make_check.hpp"
#include "dropfront/scoring/checks/stress.hpp"

namespace dropfront::scoring {

std::optional<Check> reservoir_voltage(Evidence& evidence) {
  const double limit =
      evidence.design().reservoir->rated_voltage_V * evidence.requirement().derating.reservoir_voltage;
  const auto judge = [&](const OperatingPoint& point) {
    return with(at_most("reservoir.voltage", point.rail_greatest_V, limit, "V", at_point(point),
                        "greatest rail against the rating x derating"),
                {{"rated_voltage_V", evidence.design().reservoir->rated_voltage_V},
                 {"derating", evidence.requirement().derating.reservoir_voltage}});
  };
  std::vector<const OperatingPoint*> points = loaded_points(evidence);
  points.push_back(&evidence.rich_empty());
  return worst_over(points, judge);
}

}  // namespace dropfront::scoring
