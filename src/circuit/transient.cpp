#include "dropfront/circuit/transient.hpp"

#include <algorithm>
#include <cmath>

#include "dropfront/circuit/extremes.hpp"
#include "dropfront/circuit/period_totals.hpp"
#include "dropfront/circuit/thyristor_figures.hpp"

namespace dropfront::circuit {

namespace {

/// A quantity of a mode; `forced` null where its forced part is still to be worked out.
struct Quantity {
  const ModalRow* row = nullptr;
  const ForcedRow* forced = nullptr;
};

/// Greatest magnitude over all segments of the quantity that `row_of` gives for each mode (no row: none
/// there).
template <typename RowOf>
double greatest(const Walker& walker, const std::vector<Segment>& segments, RowOf row_of) {
  const auto& mains = walker.network().source.waveform;
  TonePhase phase(mains);
  double most = 0;
  for (const auto& segment : segments) {
    const Quantity quantity = row_of(*segment.mode);
    if (!quantity.row) continue;
    Extremes extremes;
    if (quantity.forced) {
      include_extremes(segment, *quantity.row, *quantity.forced, phase, extremes);
    } else {
      include_extremes(segment, *quantity.row, forced_part(*segment.mode, mains, *quantity.row), phase,
                       extremes);
    }
    most = std::max({most, std::abs(extremes.low), std::abs(extremes.high)});
  }
  return most;
}

/// Places inside a segment at which an observer is called: dense where the fastest live mode decays, then
/// wider, never wider than a 256th of the period.
double next_sample(const Segment& segment, double s, double period_s) {
  double step = period_s / 256;
  for (int i = 0; i < segment.mode->states; ++i) {
    const double lambda = -segment.mode->lambda[i];
    if (lambda <= 0) continue;
    const double tau = 1 / lambda;
    if (s < 12 * tau) step = std::min(step, std::max(tau / 24, s / 12));
  }
  return std::min(s + step, segment.length_s);
}

Owner owner_of(const Network& network, std::size_t element) {
  if (element < network.resistors.size()) return network.resistors[element].owner;
  element -= network.resistors.size();
  if (element < network.branches.size()) return network.branches[element].owner;
  return element - network.branches.size() < network.loads.size() ? Owner::load : Owner::thyristor;
}

void observe(const Walker& walker, const std::vector<Segment>& segments, const TransientOptions& options) {
  const auto& network = walker.network();
  const auto& mains = network.source.waveform;
  const std::size_t resistors = network.resistors.size();
  std::vector<double> branch_A(network.branches.size());
  std::vector<double> branch_V(network.branches.size());
  std::vector<double> resistor_A(resistors);
  TonePhase phase(mains);
  for (const auto& segment : segments) {
    const auto& mode = *segment.mode;
    const ModalRow source = to_modal_row(mode, mode.source_A);
    const ForcedRow source_forced = forced_part(mode, mains, source);
    std::vector<ForcedRow> forced;
    for (const auto& row : mode.element_V) forced.push_back(forced_part(mode, mains, row));
    double s = 0;
    double previous = 0;
    bool first = true;
    while (first || s < segment.length_s) {
      if (!first) s = next_sample(segment, s, mains.period_s());
      phase.set(segment.start_s + s);
      const ModalMoment moment = modal_moment(segment, s);
      for (std::size_t r = 0; r < resistors; ++r) {
        resistor_A[r] =
            value_at(mode.element_V[r], forced[r], moment, phase) / network.resistors[r].resistance_ohm;
      }
      for (std::size_t b = 0; b < branch_A.size(); ++b) {
        const auto& branch = network.branches[b];
        branch_V[b] = value_at(mode.element_V[resistors + b], forced[resistors + b], moment, phase);
        const bool on = (mode.mask >> b) & 1u;
        branch_A[b] = on ? std::max(0.0, (branch_V[b] - branch.threshold_V) / branch.slope_ohm) : 0;
      }
      const Moment now{segment.start_s + s,
                       s - previous,
                       value_at(mode.rail, mode.rail_forced, moment, phase),
                       value_at(source, source_forced, moment, phase),
                       branch_A,
                       branch_V,
                       resistor_A};
      options.observer(now);
      previous = s;
      first = false;
    }
  }
}

}  // namespace

Transient run_transient(const Network& network, const StateVector& start, const TransientOptions& options) {
  Transient run;
  Walker walker(network);
  std::vector<Segment> segments;
  run.end = start;
  walker.set_latched(options.latched & walker.thyristor_bits());
  if (!walker.fault().empty() ||
      !walker.walk(options.start_time_s, options.start_time_s + options.duration_s, run.end, segments)) {
    run.reason = walker.fault().empty() ? "the run left the numbers" : walker.fault();
    return run;
  }
  const auto& mains = network.source.waveform;
  TonePhase phase(mains);
  Extremes rail;
  for (const auto& segment : segments) {
    include_extremes(segment, segment.mode->rail, segment.mode->rail_forced, phase, rail);
  }
  run.rail_min_V = rail.low;
  run.rail_max_V = rail.high;
  run.rail_min_at_s = rail.low_at_s - options.start_time_s;
  run.rail_max_at_s = rail.high_at_s - options.start_time_s;

  run.latched = walker.latched();
  if (!options.energies) {
    run.usable = true;
    return run;
  }

  const WalkTotals totals = integrate(walker, segments);
  const std::size_t resistors = network.resistors.size();
  for (std::size_t e = 0; e < totals.element_J.size(); ++e) {
    const Owner owner = owner_of(network, e);
    run.loss_J[static_cast<std::size_t>(owner)] += totals.element_J[e];
  }
  const auto branches_from = totals.element_J.begin() + static_cast<std::ptrdiff_t>(resistors);
  run.resistor_energy_J.assign(totals.element_J.begin(), branches_from);
  run.branch_energy_J.assign(branches_from,
                             branches_from + static_cast<std::ptrdiff_t>(network.branches.size()));
  for (std::size_t r = 0; r < resistors; ++r) {
    const double peak_V =
        greatest(walker, segments, [r](const ConductionMode& m) { return Quantity{&m.element_V[r]}; });
    run.resistor_peak_A.push_back(peak_V / network.resistors[r].resistance_ohm);
  }
  for (std::size_t c = 0; c < network.capacitors.size(); ++c) {
    Row state{};
    state[c] = 1;
    ModalRow row;
    run.capacitor_peak_V.push_back(greatest(walker, segments, [&](const ConductionMode& m) {
      row = to_modal_row(m, state);
      return Quantity{&row};
    }));
  }
  for (std::size_t b = 0; b < network.branches.size(); ++b) {
    const double over_V = greatest(walker, segments, [b](const ConductionMode& m) {
      return ((m.mask >> b) & 1u) ? Quantity{&m.guard[b], &m.guard_forced[b]} : Quantity{};
    });
    run.branch_peak_A.push_back(over_V / network.branches[b].slope_ohm);
  }
  run.thyristor_peak_A = thyristor_figures(walker, segments, totals).peak_A;
  run.input_energy_J = totals.input_J;
  const double stored_before = stored_J(network, start);
  run.stored_change_J = stored_J(network, run.end) - stored_before;
  run.energy_residual = std::abs(totals.input_J - totals.dissipated_J() - run.stored_change_J) /
                        std::max(std::abs(totals.input_J) + stored_before, 1e-12);
  if (!(run.energy_residual <= 1e-6)) {
    run.reason = "the energy law does not close";
    return run;
  }
  if (options.observer) observe(walker, segments, options);
  run.usable = true;
  return run;
}

}  // namespace dropfront::circuit
