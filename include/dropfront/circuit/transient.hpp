#pragma once
#include <cstdint>
#include <functional>
#include <string>
#include <vector>

#include "dropfront/circuit/steady_state.hpp"

namespace dropfront::circuit {

/// One moment of a run, as handed to an observer.
struct Moment {
  double time_s;
  double step_s;  ///< the sample stands for (time - step, time]
  double rail_V;
  double source_current_A;
  const std::vector<double>& branch_A;  ///< one a branch
  const std::vector<double>& branch_V;
  const std::vector<double>& resistor_A;  ///< one a resistor
};

struct TransientOptions {
  double start_time_s = 0;  ///< mains phase at which the run begins
  double duration_s = 0.02;
  bool energies = true;       ///< false: the rail's extremes and the end state only (no energy law then)
  std::uint32_t latched = 0;  ///< thyristors latched as it begins, as an earlier run's `latched` says
  /// Called at every sample if set: segment ends and points graded to the fastest time constant inside.
  std::function<void(const Moment&)> observer;
};

/// A run of the same exact engine from a stated state. All figures are over the whole run.
struct Transient {
  bool usable = false;
  std::string reason;
  StateVector end{};                      ///< capacitor voltages at the end
  std::uint32_t latched = 0;              ///< thyristors latched at the end
  double rail_min_V = 0, rail_max_V = 0;  ///< ESR included
  double rail_max_at_s = 0, rail_min_at_s = 0;
  double input_energy_J = 0;  ///< integral of v·i drawn from the line
  std::array<double, static_cast<int>(Owner::count)> loss_J{};
  std::vector<double> resistor_energy_J;  ///< one a resistor of the network
  std::vector<double> branch_energy_J;
  std::vector<double> branch_peak_A;
  std::vector<double> thyristor_peak_A;
  std::vector<double> resistor_peak_A;   ///< greatest magnitude
  std::vector<double> capacitor_peak_V;  ///< likewise
  double stored_change_J = 0;
  double energy_residual = 0;  ///< |in - dissipated - stored change| / (|in| + stored at start)
};

/// Runs of changed networks (dips, bursts, contacts) follow one another by `end`, `latched` and the time: all
/// must have the same capacitors.
/// Runs `network` from `start` (capacitor voltages in network order). Never throws.
Transient run_transient(const Network& network, const StateVector& start, const TransientOptions& options);

}  // namespace dropfront::circuit
