#include "dropfront/scoring/clamp_power.hpp"

#include "dropfront/scoring/checks/checks.hpp"
#include "dropfront/scoring/checks/make_check.hpp"
#include "dropfront/scoring/checks/stress.hpp"

namespace dropfront::scoring {

std::optional<Check> clamp_power(Evidence& evidence) {
  const Design& design = evidence.design();
  std::optional<double> limit;
  if (design.clamp->rated_power_W)
    limit = *design.clamp->rated_power_W * evidence.requirement().derating.clamp_power;
  const auto judge = [&](const OperatingPoint& point) {
    Check check =
        at_most("clamp.power", clamp_power_W(*design.arrangement, point.values, point.state), limit, "W",
                at_point(point), "mean power in one clamp, both directions; rating x derating");
    check.figures = {{"clamp_parts", static_cast<double>(design.arrangement->clamp_count)},
                     {"derating", evidence.requirement().derating.clamp_power}};
    add_figure(check, "rated_power_W", design.clamp->rated_power_W);
    return check;
  };
  return worst_over(rich_points(evidence), judge);
}

}  // namespace dropfront::scoring
