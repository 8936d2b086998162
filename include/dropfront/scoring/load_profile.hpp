#pragma once
#include <string>

#include "dropfront/scoring/requirement.hpp"

namespace dropfront::scoring {

/// What the loads of a problem ask, seen from the output and from the rail.
struct LoadProfile {
  double heaviest_state_A = 0;  ///< greatest of the alternative states, at the output
  std::string heaviest_name = "none";
  double burst_mean_output_A = 0;  ///< sum over repeated bursts of current x duration/period
  double burst_mean_rail_A = 0;
  double standby_A = 0;  ///< at the output
  std::string standby_name = "none";
  double rail_A = 0;          ///< always-on rail loads
  double rail_minimum_V = 0;  ///< greatest stated minimum of the always-on rail loads; 0: none stated

  /// Heaviest sustained output load with the mean of the output bursts.
  double heaviest_output_A() const { return heaviest_state_A + burst_mean_output_A; }
  /// Rail loads that go with it.
  double heaviest_rail_A() const { return rail_A + burst_mean_rail_A; }
};

/// Sorts the loads of `need`. A burst without period happens once: mean 0. A burst longer than its period
/// counts as always on.
LoadProfile load_profile(const OutputNeed& need);

}  // namespace dropfront::scoring
