#pragma once
#include <string>
#include <vector>

#include "dropfront/circuit/orbit.hpp"

namespace dropfront::circuit {

/// Where a network ends up. Without thyristors this is its periodic orbit. With them the orbit may repel:
/// then the supply alternates from cycle to cycle, and what counts is where it goes.
struct Settled {
  bool found = false;
  bool alternating = false;
  std::string reason;
  StateVector start{};            ///< at period_start_s
  StateVector end{};              ///< after `segments`
  std::vector<Segment> segments;  ///< one period (half of one with the symmetry); alternating: 32 periods
  double greatest_multiplier = 0;
  int passes = 0;
};

/// find_orbit, then every multiplier must lie inside the unit circle. Where one does not, or a thyristor
/// network has no orbit to be found: 64 periods from 1 % beside it, the last 32 of them kept.
/// `map` must outlive the result (the segments point at its modes).
Settled settle(PeriodMap& map, const StateVector& start, const SteadyOptions& options);

/// Least and greatest rail along segments.
Extremes rail_extremes(const Walker& walker, const std::vector<Segment>& segments);

}  // namespace dropfront::circuit
