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

/// Newton on the period map from `start`: (1 - J)·dx = map(x) - x, shortened until the residual falls in the
/// energy norm. Where 1 - J is singular (a rail that only drifts) or no step helps, strides of whole periods
/// along the drift. Stop: residual and next step both <= options.state_tolerance_V. Afterwards
/// map.segments() is the orbit.
Orbit find_orbit(PeriodMap& map, const StateVector& start, const SteadyOptions& options);

}  // namespace dropfront::circuit
