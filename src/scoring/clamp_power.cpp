#include "dropfront/scoring/clamp_power.hpp"

#include <algorithm>

namespace dropfront::scoring {

namespace {
double loss_W(const circuit::SteadyState& state, circuit::Owner owner) {
  return state.loss_W[static_cast<int>(owner)];
}

/// Mean of what the resistor passes while the line stands above rail and diode. The sum over a period's
/// points misses the integral of this bent but continuous function by some 1e-5 of it.
double resistive_A(const circuit::ElementValues& values, double rail_V) {
  constexpr int kPoints = 720;
  double sum_V = 0;
  for (int k = 0; k < kPoints; ++k) {
    const double line_V = values.mains.value_V(values.mains.period_s() * k / kPoints);
    sum_V += std::max(0.0, line_V - rail_V - values.rectifier.threshold_V);
  }
  return sum_V / (kPoints * values.series_resistor_ohm);
}

}  // namespace

double charge_balance_A(const circuit::Arrangement& arrangement, const circuit::ElementValues& values,
                        double rail_V) {
  if (!arrangement.dropper) return resistive_A(values, rail_V);
  const double fC = values.mains.frequency_Hz() * values.dropper_F;
  const double drops_V = 2 * values.rectifier.threshold_V;
  const double swing_V = values.mains.sum_of_rises_V();
  if (arrangement.full_wave) return std::max(0.0, 2 * fC * (swing_V - 2 * rail_V - 2 * drops_V));
  return std::max(0.0, fC * (swing_V - rail_V - drops_V));
}

double clamp_power_W(const circuit::Arrangement& arrangement, const circuit::ElementValues& values,
                     const circuit::SteadyState& state) {
  double total_W = loss_W(state, circuit::Owner::clamp);
  if (arrangement.clamp_ahead && !arrangement.full_wave) {
    // The zener's forward direction is one of the two rectifier branches; it is told from the series diode,
    // which carries the rail current, by its share of the mean current.
    const auto network = arrangement.build(values);
    double forward_A = 0;
    double all_A = 0;
    for (std::size_t i = 0; i < network.branches.size() && i < state.branch_mean_A.size(); ++i) {
      const auto& branch = network.branches[i];
      if (branch.owner != circuit::Owner::rectifier) continue;
      all_A += state.branch_mean_A[i];
      if (branch.a == 0) forward_A += state.branch_mean_A[i];
    }
    if (all_A > 0) total_W += loss_W(state, circuit::Owner::rectifier) * forward_A / all_A;
  }
  return total_W / std::max(1, arrangement.clamp_count);
}

}  // namespace dropfront::scoring
