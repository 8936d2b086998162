#include "dropfront/circuit/steady_state.hpp"

#include <algorithm>
#include <cmath>

#include "dropfront/circuit/period_totals.hpp"
#include "dropfront/circuit/settle.hpp"
#include "dropfront/circuit/thyristor_figures.hpp"

namespace dropfront::circuit {

namespace {

/// Energy in must equal energy out to this share of the input, or the answer is not believed.
constexpr double kEnergyLaw = 1e-6;

bool fail(SteadyState& answer, std::string reason) {
  answer.status = SteadyStatus::failed;
  answer.reason = std::move(reason);
  return false;
}

/// Greatest current of each branch, and its mean, with the mirrored half period folded in.
void collect_branches(const PeriodMap& map, const Settled& settled, const WalkTotals& totals, bool peaks,
                      SteadyState& answer) {
  const auto& network = map.walker().network();
  const auto& mains = network.source.waveform;
  const std::size_t resistors = network.resistors.size();
  std::vector<double> peak(network.branches.size(), 0);
  std::vector<double> mean(network.branches.size(), 0);
  TonePhase phase(mains);
  for (std::size_t b = 0; b < network.branches.size(); ++b) {
    mean[b] = totals.element_As[resistors + b] / totals.duration_s;
    if (!peaks) continue;
    for (const auto& segment : settled.segments) {
      if (!((segment.mode->mask >> b) & 1u)) continue;
      Extremes over;
      include_extremes(segment, segment.mode->guard[b], segment.mode->guard_forced[b], phase, over);
      peak[b] = std::max(peak[b], over.high / network.branches[b].slope_ohm);
    }
  }
  answer.branch_peak_A = peak;
  answer.branch_mean_A = mean;
  if (!map.halved() || settled.alternating) return;
  for (std::size_t b = 0; b < peak.size(); ++b) {
    const auto partner = static_cast<std::size_t>(network.half_period_partner[b]);
    answer.branch_peak_A[b] = std::max(peak[b], peak[partner]);
    answer.branch_mean_A[b] = 0.5 * (mean[b] + mean[partner]);
  }
}

bool collect_powers(const PeriodMap& map, const Settled& settled, bool peaks, SteadyState& answer) {
  const auto& network = map.walker().network();
  const WalkTotals totals = integrate(map.walker(), settled.segments);
  const double duration_s = totals.duration_s;
  answer.rail_mean_V = totals.rail_Vs / duration_s;
  answer.input_power_W = totals.input_J / duration_s;
  answer.input_current_Arms = std::sqrt(std::max(0.0, totals.input_A2s / duration_s));
  std::size_t e = 0;
  const auto add = [&](Owner owner) {
    answer.loss_W[static_cast<std::size_t>(owner)] += totals.element_J[e++] / duration_s;
  };
  for (const auto& r : network.resistors) add(r.owner);
  for (const auto& d : network.branches) add(d.owner);
  for (std::size_t k = 0; k < network.loads.size(); ++k) add(Owner::load);
  for (std::size_t k = 0; k < network.thyristors.size(); ++k) add(Owner::thyristor);
  for (const double a2s : totals.capacitor_A2s) {
    answer.capacitor_current_Arms.push_back(std::sqrt(std::max(0.0, a2s / duration_s)));
  }
  const double stored = stored_J(network, settled.end) - stored_J(network, settled.start);
  answer.energy_residual =
      std::abs(totals.input_J - totals.dissipated_J() - stored) / std::max(std::abs(totals.input_J), 1e-12);
  if (!(answer.energy_residual <= kEnergyLaw)) return fail(answer, "the energy law does not close");
  collect_branches(map, settled, totals, peaks, answer);
  const ThyristorFigures figures = thyristor_figures(map.walker(), settled.segments, totals);
  answer.thyristor_peak_A = figures.peak_A;
  answer.thyristor_mean_A = figures.mean_A;
  answer.thyristor_turn_off_s = figures.turn_off_s;
  return true;
}

}  // namespace

SteadyState solve_steady_state(const Network& network, const SteadyOptions& options,
                               const StateVector* guess) {
  SteadyState answer;
  PeriodMap map(network);
  if (!map.fault().empty()) {
    answer.reason = map.fault();
    return answer;
  }
  for (std::size_t k = 0; k < network.capacitors.size(); ++k) {
    answer.start[k] = guess ? (*guess)[k] : network.capacitors[k].start_V;
  }
  const Settled settled = settle(map, answer.start, options);
  answer.passes = settled.passes;
  answer.greatest_multiplier = settled.greatest_multiplier;
  if (!settled.found) {
    fail(answer, settled.reason);
    return answer;
  }
  answer.start = settled.start;
  const Extremes rail = rail_extremes(map.walker(), settled.segments);
  answer.rail_min_V = rail.low;
  answer.rail_max_V = rail.high;
  if (options.powers && !collect_powers(map, settled, options.peaks, answer)) return answer;
  answer.reason = settled.reason;
  answer.status = settled.alternating ? SteadyStatus::alternating : SteadyStatus::converged;
  return answer;
}

}  // namespace dropfront::circuit
