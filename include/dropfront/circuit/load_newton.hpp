#pragma once
#include "dropfront/circuit/period_map.hpp"

namespace dropfront::circuit {

struct LoadRoot {
  bool found = false;
  double current_A = 0;
  double current_per_V = 0;  ///< how the root moves with required_V
  StateVector state{};
  int passes = 0;
};

/// Mean current in the clamp's branches along map.segments(): what a load could take instead. A start value.
double surplus_A(const PeriodMap& map);

/// Newton in the capacitor voltages and the load current together, for the load at which the periodic rail
/// minimum equals `required_V`: map(x, I) = x and min rail(x, I) = V. The rail minimum's derivative is taken
/// at its place (where it sits on a crossing, the crossing's own movement is added). It may end on a false
/// root where the minimum jumps between two valleys, so its answer counts only after an independent steady
/// state at that load. Not found: after 14 passes, or a load that leaves 0 .. what the start suggests.
LoadRoot newton_load(PeriodMap& map, const StateVector& start, double start_A, double required_V);

}  // namespace dropfront::circuit
