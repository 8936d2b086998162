#pragma once
#include <string>

#include "dropfront/circuit/extremes.hpp"
#include "dropfront/circuit/period_map.hpp"

namespace dropfront::circuit {

/// What the search for a fixed point of the period map ended with.
struct Orbit {
  bool found = false;
  std::string reason;   ///< why not
  StateVector start{};  ///< capacitor voltages at mains phase zero
  SmallMatrix jacobian{};
  int passes = 0;  ///< walks made
};

/// Newton on the period map from `start`: (1 - J)·dx = map(x) - x. A full step that makes the residual grow
/// is halved twice, then sixteen plain periods are walked (passive networks contract, however slowly). Stop:
/// greatest |map(x) - x| <= options.state_tolerance_V. Afterwards map.segments() is the orbit.
Orbit find_orbit(PeriodMap& map, const StateVector& start, const SteadyOptions& options);

/// Extremes of the rail along map.segments().
Extremes rail_extremes(const PeriodMap& map);

}  // namespace dropfront::circuit
