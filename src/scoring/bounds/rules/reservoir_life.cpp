#include "dropfront/circuit/life.hpp"
#include "dropfront/scoring/bounds/rules.hpp"
#include "dropfront/scoring/checks/stress.hpp"
#include "dropfront/scoring/ripple_life.hpp"
#include "dropfront/values/year.hpp"

namespace dropfront::scoring::bounds {

/// Wanted life over the life at the mean ambient without ripple or local rise. Theorem.
double reservoir_life(const BoxQuestion& question) {
  const auto& around = question.context.requirement->surroundings;
  return question.least_share(question.box.reservoirs, [&](const parts::Reservoir* part) {
    if (part == nullptr || !part->life_h || !part->life_temperature_degC || !part->ripple_current_Arms)
      return 0.0;
    const double life_h = circuit::electrolytic_life_h(*part->life_h, *part->life_temperature_degC,
                                                       around.mean_over_life_degC, 0) *
                          ripple_life_factor(around.ripple_life, 0, 1, *part->life_temperature_degC);
    return around.life_years * values::kHoursPerYear / life_h;
  });
}

}  // namespace dropfront::scoring::bounds
