#include "dropfront/circuit/load_newton.hpp"

#include <algorithm>
#include <cmath>

#include "dropfront/circuit/orbit.hpp"
#include "dropfront/circuit/period_totals.hpp"
#include "dropfront/circuit/small_solve.hpp"

namespace dropfront::circuit {

namespace {

constexpr int kUnknowns = kMaxStates + 1;

/// A modal row's derivative by the capacitor voltages, and the row's own growth with the load, at one place
/// of a walk where the voltages themselves have moved by `by_start`, `by_load`.
void row_gradient(const Segment& segment, const ModalRow& row, const SmallMatrix& by_start,
                  const StateVector& by_load, int n, StateVector& gradient, double& by_current) {
  StateVector by_state{};
  for (int i = 0; i < n; ++i) {
    for (int k = 0; k < n; ++k) by_state[i] += row.z[k] * segment.mode->to_modal[k][i];
  }
  gradient = {};
  by_current = row.per_A;
  for (int i = 0; i < n; ++i) {
    for (int c = 0; c < n; ++c) gradient[c] += by_state[i] * by_start[i][c];
    by_current += by_state[i] * by_load[i];
  }
}

/// Everything the Newton step needs from one walk.
struct Walked {
  SmallMatrix by_start{};  ///< of the end
  StateVector by_load{};
  double rail_min_V = 0;
  StateVector min_by_start{};
  double min_by_load = 0;
};

/// Adds what moves the minimum when it sits where a branch changes side: rail' times the crossing's shift.
void add_crossing_shift(const Segment& segment, const Walker::GuardRows& guard, TonePhase& phase,
                        const SmallMatrix& by_start, const StateVector& by_load, int n, Walked& walked) {
  const auto& mode = *segment.mode;
  phase.set(segment.start_s + segment.length_s);
  const ModalMoment moment = modal_moment(segment, segment.length_s);
  const double guard_slope = slope_at(*guard.row, *guard.forced, moment, phase);
  const double rail_slope = slope_at(mode.rail, mode.rail_forced, moment, phase);
  if (!(std::abs(guard_slope) > 1e-6)) return;
  StateVector gradient{};
  double by_current = 0;
  row_gradient(segment, *guard.row, by_start, by_load, n, gradient, by_current);
  for (int c = 0; c < n; ++c) walked.min_by_start[c] -= rail_slope * gradient[c] / guard_slope;
  walked.min_by_load -= rail_slope * by_current / guard_slope;
}

Walked differentiate(const PeriodMap& map) {
  const int n = map.states();
  const auto& segments = map.segments();
  TonePhase phase(map.walker().network().source.waveform);
  Walked walked;
  walked.rail_min_V = INFINITY;
  for (int i = 0; i < n; ++i) walked.by_start[i][i] = 1;
  for (std::size_t k = 0; k < segments.size(); ++k) {
    const auto& segment = segments[k];
    Extremes here;
    include_extremes(segment, segment.mode->rail, segment.mode->rail_forced, phase, here);
    if (here.low < walked.rail_min_V) {
      walked.rail_min_V = here.low;
      const double s = here.low_at_s - segment.start_s;
      SmallMatrix by_start = walked.by_start;
      StateVector by_load = walked.by_load;
      map.walker().carry(segment, s, by_start, by_load);
      row_gradient(segment, segment.mode->rail, by_start, by_load, n, walked.min_by_start,
                   walked.min_by_load);
      const bool at_crossing = s > segment.length_s * (1 - 1e-9) && k + 1 < segments.size();
      if (at_crossing) {
        Walker::GuardRows guard;
        if (map.walker().crossed_guard(segment, segments[k + 1], guard)) {
          add_crossing_shift(segment, guard, phase, by_start, by_load, n, walked);
        }
      }
    }
    map.walker().carry(segment, segment.length_s, walked.by_start, walked.by_load);
    if (k + 1 < segments.size()) {
      map.walker().cross(segment, segments[k + 1], walked.by_start, walked.by_load);
    }
  }
  return walked;
}

}  // namespace

double surplus_A(const PeriodMap& map) {
  const WalkTotals totals = integrate(map.walker(), map.segments());
  const auto& network = map.walker().network();
  double sum_As = 0;
  for (std::size_t b = 0; b < network.branches.size(); ++b) {
    if (network.branches[b].owner == Owner::clamp) sum_As += totals.element_As[network.resistors.size() + b];
  }
  const std::size_t shunts = network.resistors.size() + network.branches.size() + network.loads.size();
  for (std::size_t t = 0; t < network.thyristors.size(); ++t) sum_As += totals.element_As[shunts + t];
  return totals.duration_s > 0 ? sum_As / totals.duration_s : 0;
}

LoadRoot newton_load(PeriodMap& map, const StateVector& start, double start_A, double required_V) {
  const int n = map.states();
  LoadRoot root;
  root.state = start;
  root.current_A = std::max(start_A, 1e-6);
  const double most_A = 4 * root.current_A + 1e-3;
  for (; root.passes < 14; ++root.passes) {
    map.set_load(root.current_A);
    StateVector mapped{};
    if (!map.apply(root.state, mapped, nullptr)) return root;
    Walked walked = differentiate(map);
    if (map.halved()) {
      const auto& signs = map.walker().network().half_period_signs;
      for (int i = 0; i < n; ++i) {
        for (int c = 0; c < n; ++c) walked.by_start[i][c] *= signs[i];
        walked.by_load[i] *= signs[i];
      }
    }
    const double short_V = required_V - walked.rail_min_V;
    std::array<std::array<double, kUnknowns>, kUnknowns> m{};
    std::array<double, kUnknowns> step{};
    for (int i = 0; i < n; ++i) {
      for (int c = 0; c < n; ++c) m[i][c] = (i == c ? 1.0 : 0.0) - walked.by_start[i][c];
      m[i][n] = -walked.by_load[i];
      m[n][i] = walked.min_by_start[i];
      step[i] = mapped[i] - root.state[i];
    }
    m[n][n] = walked.min_by_load;
    step[n] = short_V;
    if (map.distance(root.state, mapped) < 1e-8 && std::abs(short_V) < 1e-8) {
      std::array<double, kUnknowns> per_V{};
      per_V[n] = 1;
      root.found = solve_small<kUnknowns>(n + 1, m, per_V);
      root.current_per_V = per_V[n];
      return root;
    }
    if (!solve_small<kUnknowns>(n + 1, m, step)) return root;
    for (int i = 0; i < n; ++i) root.state[i] += std::clamp(step[i], -1e4, 1e4);
    // The load stays positive and never more than halves or doubles at once.
    root.current_A = std::clamp(root.current_A + step[n], 0.5 * root.current_A, 2 * root.current_A);
    if (root.current_A > most_A) return root;
  }
  return root;
}

}  // namespace dropfront::circuit
