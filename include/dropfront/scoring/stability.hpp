#pragma once
#include <string>

#include "dropfront/scoring/lean_runs.hpp"
#include "dropfront/scoring/requirement.hpp"

namespace dropfront::scoring {

enum class StabilityShown {
  passive,      ///< constant current, no thyristor: no run needed
  alternating,  ///< the shunt's own steady state is marched already
  marched
};

/// Where the rail stays after a kick of the lean state at the heaviest sustained load.
struct StabilityAnswer {
  bool usable = false;
  std::string reason;
  StabilityShown shown = StabilityShown::passive;
  double rail_min_V = 0;  ///< least rail of the last 32 of 64 periods
  OperatingPoint at;      ///< the steady state it began from
};

/// The worst of both ambients. 64 periods from 1 % below every capacitor voltage of the steady state, the
/// load by the stage's own law; a run that repeats itself to 1e-7 V is not followed further. Where a constant
/// current loads a network of resistors, capacitors and branches whose current never falls with their
/// voltage, no run is needed: two solutions of such a network never move apart in the energy norm (the
/// difference of two states only dissipates), so a kick dies out and the rail ends at its steady minimum.
StabilityAnswer try_stability(const LeanRuns& runs, const LoadProfile& loads);

}  // namespace dropfront::scoring
