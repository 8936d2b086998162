#include "dropfront/circuit/thermal.hpp"
#include "dropfront/scoring/checks/checks.hpp"
#include "dropfront/scoring/checks/make_check.hpp"
#include "dropfront/scoring/checks/stress.hpp"
#include "dropfront/scoring/clamp_power.hpp"

namespace dropfront::scoring {

std::optional<Check> clamp_junction(Evidence& evidence) {
  const Design& design = evidence.design();
  const parts::Clamp& clamp = *design.clamp;
  const double resistance = clamp.thermal_resistance_K_per_W;
  if (!(resistance > 0)) {
    return at_most("clamp.junction", std::nullopt, std::nullopt, "degC", at_corner("rich_empty"),
                   "thermal_resistance is not given");
  }
  const double limit = clamp.max_junction_degC - evidence.requirement().derating.junction_K;
  const auto judge = [&](const OperatingPoint& point) {
    const double power = clamp_power_W(*design.arrangement, point.values, point.state);
    return with(at_most("clamp.junction", circuit::temperature_degC(point.local_degC, resistance, power),
                        limit, "degC", at_point(point), "local ambient + Rth·P; maximum less the derating"),
                {{"power_W", power},
                 {"thermal_resistance_K_per_W", resistance},
                 {"max_junction_degC", clamp.max_junction_degC},
                 {"derating_K", evidence.requirement().derating.junction_K}});
  };
  return worst_over(rich_points(evidence), judge);
}

}  // namespace dropfront::scoring
