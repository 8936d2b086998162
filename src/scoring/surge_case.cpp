#include "dropfront/scoring/surge_case.hpp"

#include <algorithm>
#include <cmath>

#include "dropfront/circuit/surge_wave.hpp"
#include "dropfront/scoring/clamp_trace.hpp"

namespace dropfront::scoring {

namespace {

using circuit::Owner;
using circuit::SurgeWave;

/// Six time constants of the tail and of the dropper's charge: e^-12 of the energies is left.
double surge_duration_s(const circuit::ElementValues& values) {
  const double resistance = values.source_ohm + values.series_resistor_ohm + values.reservoir_esr_ohm +
                            values.clamp.main.slope_ohm + 2 * values.rectifier.slope_ohm;
  return std::min(0.5 * values.mains.period_s(), 6 * (SurgeWave::kTail_s + resistance * values.dropper_F));
}

/// The engine's thyristor takes over in no time, a real one in a microsecond or two (from memory): until that
/// long after the surge's front the pulse goes into the reservoir.
constexpr double kTurnOn_s = 2e-6 + 1.2e-6;

double unfired_rail_V(circuit::Network network, const circuit::StateVector& start, double start_s) {
  network.thyristors.clear();
  circuit::TransientOptions options;
  options.start_time_s = start_s;
  options.duration_s = kTurnOn_s;
  options.energies = false;
  const auto run = circuit::run_transient(network, start, options);
  return run.usable ? run.rail_max_V : std::nan("");
}

/// The pieces of one direction stand in parallel and carry their greatest currents together.
double varistor_peak_A(const circuit::Network& network, const circuit::Transient& run) {
  double into_neutral_A = 0, out_of_it_A = 0;
  for (std::size_t b = 0; b < network.branches.size() && b < run.branch_peak_A.size(); ++b) {
    if (network.branches[b].owner != Owner::varistor) continue;
    (network.branches[b].b == 0 ? into_neutral_A : out_of_it_A) += run.branch_peak_A[b];
  }
  return std::max(into_neutral_A, out_of_it_A);
}

void read_figures(const circuit::Network& network, const circuit::Transient& run, SurgeRun& out) {
  out.resistor = series_resistor_figures(network, run);
  out.dropper_peak_V = greatest_dropper_V(network, run);
  out.clamp_energy_J = run.loss_J[static_cast<std::size_t>(Owner::clamp)];
  out.clamp_peak_A = greatest_branch_A(network, run, Owner::clamp);
  out.rectifier_peak_A = greatest_branch_A(network, run, Owner::rectifier);
  for (const double peak_A : run.thyristor_peak_A) {
    out.thyristor_peak_A = std::max(out.thyristor_peak_A, peak_A);
  }
  out.line_A2s = squared_current_A2s(network, run, Owner::line);
  out.varistor_energy_J = run.loss_J[static_cast<std::size_t>(Owner::varistor)];
  out.varistor_peak_A = varistor_peak_A(network, run);
  out.energy_residual = run.energy_residual;
}

/// A varistor that the mains alone does not open conducts one way only, and no more than the line's greatest
/// voltage drives through what stands in front of it.
void set_varistor(const parts::Varistor& part, const SurgeCase& which, double start_s,
                  circuit::ElementValues& values) {
  const auto law = varistor_law(part, which.varistor);
  if (!law) return;
  if (!(law->one_mA_V > values.mains.crest_V())) {
    values.varistor = circuit::varistor_branches(*law);
    return;
  }
  const double sign = which.surge_V < 0 ? -1 : 1;
  const double line_V = std::abs(which.surge_V) + sign * values.mains.value_V(start_s);
  const double before_ohm = values.source_ohm + (values.varistor_before ? 0 : values.series_resistor_ohm);
  values.varistor = circuit::varistor_branches(*law, circuit::current_behind_A(*law, line_V, before_ohm));
  values.varistor_ways = sign > 0 ? 1 : -1;
}

}  // namespace

std::optional<circuit::VaristorLaw> varistor_law(const parts::Varistor& part, VaristorEnd end) {
  constexpr double kTolerance = 0.10;
  if (!part.clamp_voltage_V || !part.clamp_current_A || !(*part.clamp_current_A > 2e-3)) return std::nullopt;
  const double nominal_V = circuit::varistor_one_mA_V(part.continuous_voltage_Vrms);
  // Never so close to the clamping voltage that no slope is left between them.
  const double high_V = std::min((1 + kTolerance) * nominal_V, 0.95 * *part.clamp_voltage_V);
  circuit::VaristorLaw law{high_V, *part.clamp_voltage_V, *part.clamp_current_A};
  if (end == VaristorEnd::low) {
    constexpr double kSpread = (1 - kTolerance) / (1 + kTolerance);
    law.one_mA_V *= kSpread;
    law.clamp_V *= kSpread;
  }
  return law;
}

std::vector<SurgeMoment> surge_moments(const PointSolver& points, const OperatingPoint& rest,
                                       const std::vector<double>& phases_deg) {
  const auto network = points.design().arrangement->build(rest.values);
  const double period_s = rest.values.mains.period_s();
  std::vector<SurgeMoment> moments;
  for (const double phase_deg : phases_deg) {
    const double at_s = phase_deg / 360 * period_s;
    const double periods = std::ceil((network.period_start_s - at_s) / period_s);
    moments.push_back({phase_deg, at_s + std::max(0.0, periods) * period_s, {}, 0});
  }
  std::sort(moments.begin(), moments.end(),
            [](const SurgeMoment& a, const SurgeMoment& b) { return a.time_s < b.time_s; });
  double now_s = network.period_start_s;
  circuit::StateVector state = rest.state.start;
  std::uint32_t latched = 0;
  for (auto& moment : moments) {
    circuit::TransientOptions options;
    options.start_time_s = now_s;
    options.duration_s = moment.time_s - now_s;
    options.energies = false;
    options.latched = latched;
    if (options.duration_s > 0) {
      const auto run = circuit::run_transient(network, state, options);
      if (!run.usable) return {};
      state = run.end;
      latched = run.latched;
    }
    now_s = moment.time_s;
    moment.state = state;
    moment.latched = latched;
  }
  return moments;
}

SurgeRun run_surge(const PointSolver& points, const OperatingPoint& rest, const SurgeMoment& moment,
                   const SurgeCase& which) {
  const auto& design = points.design();
  const auto& wiring = *design.arrangement;
  const Rises rises{rest.local_degC - rest.ambient_degC, rest.clamp_junction_degC - rest.local_degC};
  SurgeRun out;
  out.phase_deg = moment.phase_deg;
  out.surge_V = which.surge_V;
  out.ambient_degC = rest.ambient_degC;
  out.local_degC = rest.local_degC;
  out.clamp_junction_degC = rest.clamp_junction_degC;
  out.values = points.values(which.recipe, rises, rest.ambient_degC);
  auto& values = out.values;
  // As at plug-in: at these microseconds the film's own resistance is nothing beside the series resistor.
  values.dropper_esr_ohm = 0;
  values.series_resistor_ohm = which.series_resistor_ohm;
  values.source_ohm = which.source_ohm;
  values.varistor_before = design.varistor_before;
  if (design.varistor != nullptr) set_varistor(*design.varistor, which, moment.time_s, values);
  const double full_V =
      which.recipe.clamp == ZenerCurve::low_slope ? values.clamp.main.threshold_V : rest.rail_greatest_V;
  const circuit::Waveform quiet = values.mains;
  values.mains = quiet.with_pulse(moment.time_s, SurgeWave::kScale * which.surge_V, SurgeWave::kFront_s,
                                  SurgeWave::kTail_s);
  const auto network = wiring.build(values);
  const auto start = with_rail_at(network, moment.state, full_V);
  const bool back_to_back = wiring.clamp_ahead && wiring.full_wave;
  const auto* forward = back_to_back ? &values.rectifier : nullptr;
  ClampTrace there(network, forward, ClampTrace::Way::there);
  ClampTrace back(network, forward, ClampTrace::Way::back);
  circuit::TransientOptions options;
  options.start_time_s = moment.time_s;
  options.duration_s = surge_duration_s(values);
  options.latched = moment.latched;
  options.energies = !which.rail_only;
  if (which.stress) {
    options.observer = [&](const circuit::Moment& m) {
      there.add(m);
      if (back_to_back) back.add(m);
    };
  }
  const auto run = circuit::run_transient(network, start, options);
  out.usable = run.usable;
  out.reason = run.reason;
  out.rail_max_V = run.rail_max_V;
  if (run.usable && !which.rail_only) read_figures(network, run, out);
  if (run.usable && !network.thyristors.empty()) {
    const double waiting_V = unfired_rail_V(network, start, moment.time_s);
    if (std::isnan(waiting_V)) out.usable = false;
    out.rail_max_V = std::max(out.rail_max_V, waiting_V);
    // Until it fires the series diode takes the whole pulse.
    out.rectifier_peak_A = std::max(out.rectifier_peak_A, out.resistor.peak_A);
  }
  if (which.stress) {
    out.clamp_stress_W_sqrt_s = std::max(circuit::pulse_stress_W_sqrt_s(there.take(), kShortestClampPulse_s),
                                         circuit::pulse_stress_W_sqrt_s(back.take(), kShortestClampPulse_s));
  }
  values.mains = quiet;  // the surge stands beside it, in surge_V
  return out;
}

}  // namespace dropfront::scoring
