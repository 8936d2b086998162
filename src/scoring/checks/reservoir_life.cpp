#include "dropfront/circuit/life.hpp"
#include "dropfront/circuit/thermal.hpp"
#include "dropfront/scoring/checks/checks.hpp"
#include "dropfront/scoring/checks/make_check.hpp"
#include "dropfront/scoring/checks/stress.hpp"
#include "dropfront/scoring/ripple_life.hpp"
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
    const double current_Arms = reservoir_current_Arms(evidence, point);
    const double rating_Arms = *carried_ripple_rating_Arms(evidence, point);
    const double still_h = circuit::electrolytic_life_h(*part.life_h, *part.life_temperature_degC, can_degC,
                                                        0, circuit::RippleTerm::none);
    const double ripple =
        ripple_life_factor(around.ripple_life, current_Arms, rating_Arms, *part.life_temperature_degC);
    At at = at_point(point);
    at.ambient_degC = around.mean_over_life_degC;
    const auto& law = ripple_life_laws()[static_cast<std::size_t>(around.ripple_life)];
    return with(
        at_least("reservoir.life", still_h * ripple, around.life_years * values::kHoursPerYear, "h", at,
                 "10 K rule at the mean ambient + local rise; ripple term " + std::string(law.name) + ": " +
                     std::string(law.basis)),
        {{"rated_life_h", *part.life_h},
         {"rated_life_degC", *part.life_temperature_degC},
         {"can_degC", can_degC},
         {"ripple_Arms", current_Arms},
         {"rated_ripple_Arms", rating_Arms},
         {"ripple_factor", ripple}});
  };
  return worst_over(loaded_points(evidence), judge);
}

}  // namespace dropfront::scoring
