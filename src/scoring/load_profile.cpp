#include "dropfront/scoring/load_profile.hpp"

#include <algorithm>

namespace dropfront::scoring {

LoadProfile load_profile(const OutputNeed& need) {
  LoadProfile profile;
  for (const auto& load : need.loads) {
    if (load.duration_s) {
      if (!load.period_s || !(*load.period_s > 0)) continue;
      const double share = std::clamp(*load.duration_s / *load.period_s, 0.0, 1.0);
      (load.at_rail ? profile.burst_mean_rail_A : profile.burst_mean_output_A) += share * load.current_A;
    } else if (load.at_rail) {
      profile.rail_A += load.current_A;
      profile.rail_minimum_V = std::max(profile.rail_minimum_V, load.min_voltage_V.value_or(0));
    } else if (load.current_A > profile.heaviest_state_A) {
      profile.heaviest_state_A = load.current_A;
      profile.heaviest_name = load.name;
    }
  }
  if (need.standby_load && *need.standby_load >= 0 &&
      *need.standby_load < static_cast<int>(need.loads.size())) {
    const auto& load = need.loads[*need.standby_load];
    profile.standby_A = load.current_A;
    profile.standby_name = load.name;
  }
  return profile;
}

}  // namespace dropfront::scoring
