#pragma once
#include <string>

#include "dropfront/circuit/element_values.hpp"
#include "dropfront/circuit/network.hpp"

namespace dropfront::circuit {

/// Rail load of greatest output for a constant-power stage.
struct GreatestPower {
  bool usable = false;
  double current_A = 0;  ///< rail load, overhead included
  double rail_V = 0;     ///< rail minimum there, of an independent steady state
  int steady_states = 0;
  std::string reason;
};

/// Greatest (I - overhead_A)·v over rail minima v >= floor_V, I(v) being the load that holds the rail minimum
/// at v. The derivative (I - overhead) + v·dI/dv comes with each root; its zero is bracketed from
/// `floor_load_A`, the available current at the floor (known, > overhead_A), to the rail at the overhead
/// alone. Tolerance: 2e-4 of the rail voltage, where the power is flat to its square (or at a kink to 2e-4 of
/// itself). Not usable: a root was not found or the independent steady state disagrees.
GreatestPower find_greatest_power(const Network& network, double floor_V, double floor_load_A,
                                  double overhead_A);

}  // namespace dropfront::circuit
