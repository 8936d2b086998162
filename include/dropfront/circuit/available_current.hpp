#pragma once
#include <functional>
#include <string>

#include "dropfront/circuit/element_values.hpp"
#include "dropfront/circuit/steady_state.hpp"

namespace dropfront::circuit {

/// Largest constant rail load with steady rail minimum >= the required voltage.
struct AvailableCurrent {
  bool usable = false;
  std::string reason;
  double current_A = 0;   ///< 0 when even the unloaded rail stays below required_V
  double rail_min_V = 0;  ///< of an independent steady state at current_A
  StateVector state{};    ///< start state there, to warm neighbouring corners of the same score
  int steady_states = 0;  ///< how many were solved
};

/// `values.rail_current_A` is ignored; load_cutoff_V should be half of required_V. Tolerance: current to
/// 1e-6 relative or 1 nA; the returned current is on the passing side (rail_min_V >= required_V - 1e-6 V).
/// `near`: the answer at slightly other values, or null. Newton then starts there and only its answer is
/// confirmed; without it a lighter load is tried too where the rail need not be monotone (bridges).
AvailableCurrent find_available_current(Network (*build)(const ElementValues&), ElementValues values,
                                        double required_V, const AvailableCurrent* near = nullptr);

}  // namespace dropfront::circuit
