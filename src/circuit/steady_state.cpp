#include "dropfront/circuit/steady_state.hpp"

#include <algorithm>
#include <cmath>

#include "dropfront/circuit/extremes.hpp"
#include "dropfront/circuit/period_map.hpp"
#include "dropfront/circuit/period_totals.hpp"

namespace dropfront::circuit {

namespace {

/// Energy in must equal energy out to this share of the input, or the answer is not believed.
constexpr double kEnergyLaw = 1e-6;

bool fail(SteadyState& answer, std::string reason) {
  answer.status = SteadyStatus::failed;
  answer.reason = std::move(reason);
  return false;
}

/// Newton on the period map: (J - 1)·dx = x - map(x). With the full step refused when it makes the residual
/// grow (the map bends where crossings appear or vanish), half of it is tried, then one plain period.
bool converge(PeriodMap& map, const SteadyOptions& options, SteadyState& answer) {
  StateVector x = answer.start;
  StateVector mapped{};
  SmallMatrix jacobian{};
  if (!map.apply(x, mapped, &jacobian)) return fail(answer, map.fault());
  ++answer.passes;
  double residual = map.distance(x, mapped);
  int marched = 0;
  for (int pass = 0; residual > options.state_tolerance_V; ++pass) {
    if (pass >= options.max_newton_passes || marched > options.max_march_periods) {
      return fail(answer, "no periodic steady state found");
    }
    StateVector step{};
    bool improved = false;
    if (map.newton_step(x, mapped, jacobian, step)) {
      for (double share = 1; share > 0.2 && !improved; share /= 2) {
        StateVector trial = x;
        for (int i = 0; i < map.states(); ++i) trial[i] += share * step[i];
        StateVector trial_mapped{};
        SmallMatrix trial_jacobian{};
        if (!map.apply(trial, trial_mapped, &trial_jacobian)) return fail(answer, map.fault());
        ++answer.passes;
        const double trial_residual = map.distance(trial, trial_mapped);
        if (trial_residual < residual) {
          x = trial;
          mapped = trial_mapped;
          jacobian = trial_jacobian;
          residual = trial_residual;
          improved = true;
        }
      }
    }
    if (improved) continue;
    // Passive networks contract: plain periods always lead home, however slowly.
    for (int k = 0; k < 16; ++k) {
      x = mapped;
      if (!map.apply(x, mapped, &jacobian)) return fail(answer, map.fault());
      ++answer.passes;
      ++marched;
    }
    residual = map.distance(x, mapped);
  }
  answer.start = x;
  if (options.multipliers) answer.greatest_multiplier = map.greatest_multiplier(jacobian);
  return true;
}

void collect_rail(PeriodMap& map, SteadyState& answer) {
  TonePhase phase(map.walker().network().source.waveform);
  Extremes rail;
  for (const auto& segment : map.segments()) {
    include_extremes(segment, segment.mode->rail, segment.mode->rail_forced, phase, rail);
  }
  answer.rail_min_V = rail.low;
  answer.rail_max_V = rail.high;
}

/// Greatest current of each branch, and its mean, with the mirrored half period folded in.
void collect_branches(PeriodMap& map, const WalkTotals& totals, SteadyState& answer) {
  const auto& network = map.walker().network();
  const auto& mains = network.source.waveform;
  const std::size_t resistors = network.resistors.size();
  std::vector<double> peak(network.branches.size(), 0);
  std::vector<double> mean(network.branches.size(), 0);
  TonePhase phase(mains);
  for (std::size_t b = 0; b < network.branches.size(); ++b) {
    mean[b] = totals.element_As[resistors + b] / totals.duration_s;
    for (const auto& segment : map.segments()) {
      if (!((segment.mode->mask >> b) & 1u)) continue;
      Extremes over;
      include_extremes(segment, segment.mode->guard[b], segment.mode->guard_forced[b], phase, over);
      peak[b] = std::max(peak[b], over.high / network.branches[b].slope_ohm);
    }
  }
  answer.branch_peak_A = peak;
  answer.branch_mean_A = mean;
  if (!map.halved()) return;
  for (std::size_t b = 0; b < peak.size(); ++b) {
    const auto partner = static_cast<std::size_t>(network.half_period_partner[b]);
    answer.branch_peak_A[b] = std::max(peak[b], peak[partner]);
    answer.branch_mean_A[b] = 0.5 * (mean[b] + mean[partner]);
  }
}

bool collect_powers(PeriodMap& map, const StateVector& end, SteadyState& answer) {
  const auto& network = map.walker().network();
  const WalkTotals totals = integrate(map.walker(), map.segments());
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
  for (const double a2s : totals.capacitor_A2s) {
    answer.capacitor_current_Arms.push_back(std::sqrt(std::max(0.0, a2s / duration_s)));
  }
  const double stored = stored_J(network, end) - stored_J(network, answer.start);
  answer.energy_residual =
      std::abs(totals.input_J - totals.dissipated_J() - stored) / std::max(std::abs(totals.input_J), 1e-12);
  if (!(answer.energy_residual <= kEnergyLaw)) return fail(answer, "the energy law does not close");
  collect_branches(map, totals, answer);
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
  if (!converge(map, options, answer)) return answer;
  // The last walk of converge() began at the answer: its segments are the solution.
  collect_rail(map, answer);
  if (options.powers && !collect_powers(map, map.raw_end(), answer)) return answer;
  if (options.multipliers && !(answer.greatest_multiplier < 1)) {
    fail(answer, "the periodic solution is not stable");
    return answer;
  }
  answer.status = SteadyStatus::converged;
  return answer;
}

}  // namespace dropfront::circuit
