#pragma once
#include <array>
#include <string>
#include <vector>

#include "dropfront/circuit/network.hpp"

namespace dropfront::circuit {

inline constexpr int kMaxStates = 5;  ///< capacitors, and the two exponentials of a surge
using StateVector = std::array<double, kMaxStates>;

enum class SteadyStatus { converged, alternating, failed };

struct SteadyOptions {
  int max_rounds = 200;             ///< Newton steps (or strides along a drift) before giving up
  double state_tolerance_V = 1e-8;  ///< stop: greatest correction of the next Newton step
  bool powers = true;               ///< losses, currents, energy law; false: rail extremes only
  bool peaks = true;                ///< with powers: the peak current of every branch
  bool multipliers = true;          ///< check that every multiplier lies inside the unit circle
};

/// The periodic steady state of a network. Check `usable()` before any number.
struct SteadyState {
  SteadyStatus status = SteadyStatus::failed;
  std::string reason;   ///< why it failed or what was noticed; empty when all is well
  StateVector start{};  ///< capacitor voltages at the network's period_start_s
  double rail_min_V = 0;
  double rail_max_V = 0;
  double rail_mean_V = 0;
  double input_power_W = 0;  ///< mean of v·i drawn from the line
  double input_current_Arms = 0;
  std::array<double, static_cast<int>(Owner::count)> loss_W{};  ///< mean power dissipated, by owner
  std::vector<double> capacitor_current_Arms;                   ///< one a capacitor of the network
  std::vector<double> branch_peak_A;                            ///< one a branch of the network
  std::vector<double> branch_mean_A;
  std::vector<double> thyristor_peak_A;  ///< one a thyristor: the spike as it fires
  std::vector<double> thyristor_mean_A;
  std::vector<double> thyristor_turn_off_s;  ///< least time from dropping out to forward voltage again
  double energy_residual = 0;                ///< |in - dissipated - stored change| / in over the period
  double greatest_multiplier = 0;            ///< |eigenvalue| of the one-period Jacobian
  int passes = 0;

  bool usable() const { return status != SteadyStatus::failed; }
  double ripple_Vpp() const { return rail_max_V - rail_min_V; }
};

/// Solves for the periodic steady state. Never throws, never returns NaN in a usable result.
/// `guess` is a start state (capacitor voltages at period_start_s) or null for the analytic cold start.
/// Status alternating (thyristors only): the period's own orbit repels; 64 periods were marched and the
/// figures are those of the last 32, the rail's extremes the worst of them.
SteadyState solve_steady_state(const Network& network, const SteadyOptions& options = {},
                               const StateVector* guess = nullptr);

}  // namespace dropfront::circuit
