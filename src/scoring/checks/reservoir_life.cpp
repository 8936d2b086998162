#include "dropfront/circuit/life.hpp"
#include "dropfront/circuit/thermal.hpp"
#include "dropfront/scoring/checks/checks.hpp"
#include "dropfront/scoring/checks/make_check.hpp"
#include "dropfront/scoring/checks/stress.hpp"
#include "dropfront/values/year.hpp"

namespace dropfront::scoring {

std::optional<Check> reservoir_life(Evidence& evidence) {
  const parts::Reservoir& part = *evidence.design().reservoir;
  const Surroundings& around = evidence.requirement().surroundings;
  if (!part.life_h || !part.life_temperature_degC || !part.ripple_current_Arms) {
    return at_least("reservoir.life", std::nullopt, std::nullopt, "h", at_corner("rich_loaded"),
                    "life_hours, life_temperature or ripple_current is not given");
  }
  const auto judge = [&](const OperatingPoint& point) {
    const double can_degC = circuit::temperature_degC(around.mean_over_life_degC, around.enclosure_K_per_W,
                                                      point.state.input_power_W);
    const double rise = circuit::ripple_rise_K(reservoir_current_Arms(evidence, point),
                                               *carried_ripple_rating_Arms(evidence, point));
    const double life =
        circuit::electrolytic_life_h(*part.life_h, *part.life_temperature_degC, can_degC, rise);
    At at = at_point(point);
    at.ambient_degC = around.mean_over_life_degC;
    return at_least(
        "reservoir.life", life, around.life_years * values::kHoursPerYear, "h", at,
        "10 K rule at the mean ambient + local rise, ripple term 2^(-dT/5) with 5 K at the rating");
  };
  return worst_over(loaded_points(evidence), judge);
}

}  // namespace dropfront::scoring
