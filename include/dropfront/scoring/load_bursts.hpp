#pragma once
#include <string>
#include <vector>

#include "dropfront/scoring/lean_runs.hpp"
#include "dropfront/scoring/requirement.hpp"

namespace dropfront::scoring {

/// One burst of the load profile at its worst.
struct BurstAnswer {
  std::string name;
  double burst_A = 0;  ///< where the load hangs: at the output, or on the rail
  double duration_s = 0;
  double required_V = 0;  ///< V_required, or the burst's own min_voltage where that is higher
  EventAnswer worst;
};

/// Tries each load with a duration alone, from the lean steady state at the heaviest sustained load with the
/// others as their mean. At the output it goes through the stage's own law (step-down: its power), at the
/// rail it is a current.
std::vector<BurstAnswer> try_bursts(const LeanRuns& runs, const LoadProfile& loads);

}  // namespace dropfront::scoring
