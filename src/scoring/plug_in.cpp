#include "dropfront/scoring/plug_in.hpp"

#include <algorithm>
#include <limits>

#include "dropfront/scoring/clamp_trace.hpp"
#include "dropfront/scoring/run_figures.hpp"

namespace dropfront::scoring {

namespace {

using circuit::Owner;

/// Dropper at the opposite crest (its plates run from line to clamp), reservoir at `full_V`.
circuit::StateVector left_charged(const circuit::Network& network, double crest_V, double full_V) {
  circuit::StateVector state{};
  for (std::size_t i = 0; i < network.capacitors.size() && i < state.size(); ++i) {
    if (network.capacitors[i].owner == Owner::dropper) state[i] = -crest_V;
  }
  return with_rail_at(network, state, full_V);
}

/// The pulse is over after ten time constants; beyond half a period it would be the mains again. Without a
/// dropper there is no pulse but the half period itself.
double pulse_duration_s(const circuit::ElementValues& values) {
  if (!(values.dropper_F > 0)) return 0.5 * values.mains.period_s();
  const double resistance = values.series_resistor_ohm + values.dropper_esr_ohm + values.reservoir_esr_ohm +
                            values.clamp.main.slope_ohm + 2 * values.rectifier.slope_ohm;
  return std::min(0.5 * values.mains.period_s(), 10 * resistance * values.dropper_F);
}

/// One run and what is read from it.
struct Tried {
  PlugIn plug;
  SeriesResistorFigures resistor;
  double rectifier_peak_A = 0;
  std::vector<circuit::PowerStep> trace;  ///< low-slope curve only
};

Tried try_plug_in(const PointSolver& points, const Recipe& recipe, const OperatingPoint& rest) {
  const auto& wiring = *points.design().arrangement;
  const bool for_clamp = recipe.clamp == ZenerCurve::low_slope;
  const Rises rises{rest.local_degC - rest.ambient_degC, rest.clamp_junction_degC - rest.local_degC};
  auto values = points.values(recipe, rises, rest.ambient_degC);
  // The film's series resistance follows tan(delta)/(omega·C): at the microseconds of a plug-in it is a
  // thousandth of the series resistor, and none is the worse case.
  values.dropper_esr_ohm = 0;
  const auto network = wiring.build(values);
  const double full_V = for_clamp ? values.clamp.main.threshold_V : rest.rail_greatest_V;
  const bool back_to_back = wiring.clamp_ahead && wiring.full_wave;
  ClampTrace trace(network, back_to_back ? &values.rectifier : nullptr);
  circuit::TransientOptions options;
  options.start_time_s = values.mains.crest_time_s();
  options.duration_s = pulse_duration_s(values);
  if (for_clamp) options.observer = [&trace](const circuit::Moment& m) { trace.add(m); };
  Tried tried;
  tried.plug.run =
      circuit::run_transient(network, left_charged(network, values.mains.crest_V(), full_V), options);
  bool shunted = false;
  if (!network.thyristors.empty()) {
    // The engine's thyristor takes over in no time, a real one in a microsecond or two (from memory): until
    // then the pulse goes into the reservoir.
    constexpr double kTurnOn_s = 2e-6;
    auto waiting = network;
    waiting.thyristors.clear();
    options.duration_s = std::min(options.duration_s, kTurnOn_s);
    options.observer = nullptr;
    const auto first =
        circuit::run_transient(waiting, left_charged(network, values.mains.crest_V(), full_V), options);
    auto& run = tried.plug.run;
    run.usable = run.usable && first.usable;
    run.rail_max_V = std::max(run.rail_max_V, first.rail_max_V);
    shunted = true;
  }
  tried.plug.ambient_degC = rest.ambient_degC;
  tried.plug.values = values;
  tried.plug.local_degC = rest.local_degC;
  tried.plug.clamp_junction_degC = rest.clamp_junction_degC;
  tried.plug.ends = recipe.series_resistor == End::low ? "series_resistor low" : "series_resistor high";
  tried.resistor = series_resistor_figures(network, tried.plug.run);
  tried.rectifier_peak_A = greatest_branch_A(network, tried.plug.run, Owner::rectifier);
  // Until it fires the series diode takes the whole pulse, on the other crest the reset diode does.
  if (shunted) tried.rectifier_peak_A = std::max(tried.rectifier_peak_A, tried.resistor.peak_A);
  tried.trace = trace.take();
  return tried;
}

}  // namespace

PlugInAnswer run_plug_ins(const PointSolver& points, const Recipe& rich,
                          const std::vector<const OperatingPoint*>& rest, int& transients) {
  PlugInAnswer answer;
  answer.crest_V = rich.mains->crest_V();
  double worst_use = -1;
  for (const auto* from : rest) {
    if (!from->state.usable()) {
      answer.reason = from->state.reason;
      return answer;
    }
    const double room_K =
        points.design().clamp->max_junction_degC - std::max(25.0, from->clamp_junction_degC);
    for (const End end : {End::low, End::high}) {
      for (const auto curve : {ZenerCurve::high, ZenerCurve::low_slope}) {
        Recipe recipe = rich;
        recipe.series_resistor = end;
        recipe.clamp = curve;
        auto tried = try_plug_in(points, recipe, *from);
        ++transients;
        if (!tried.plug.run.usable) {
          answer.reason = tried.plug.run.reason;
          return answer;
        }
        answer.input_peak_A = std::max(answer.input_peak_A, tried.resistor.peak_A);
        answer.rectifier_peak_A = std::max(answer.rectifier_peak_A, tried.rectifier_peak_A);
        for (const double peak_A : tried.plug.run.thyristor_peak_A) {
          answer.thyristor_peak_A = std::max(answer.thyristor_peak_A, peak_A);
        }
        auto& energy_J = end == End::low ? answer.resistor_energy_low_J : answer.resistor_energy_high_J;
        if (tried.resistor.energy_J > energy_J) {
          energy_J = tried.resistor.energy_J;
          (end == End::low ? answer.resistor_low : answer.resistor_high) = tried.plug;
        }
        if (curve == ZenerCurve::high && tried.plug.run.rail_max_V > answer.rail_max_V) {
          answer.rail_max_V = tried.plug.run.rail_max_V;
          answer.rail = tried.plug;
        }
        if (curve != ZenerCurve::low_slope) continue;
        const double pulse = circuit::greatest_diffusion_W_sqrt_s(tried.trace);
        const double use = room_K > 0 ? pulse / room_K : std::numeric_limits<double>::max();
        if (use > worst_use) {
          worst_use = use;
          answer.clamp_pulse = pulse;
          answer.clamp_junction_degC = from->clamp_junction_degC;
          answer.clamp_trace = std::move(tried.trace);
          answer.clamp = std::move(tried.plug);
        }
      }
    }
  }
  answer.usable = !rest.empty();
  return answer;
}

}  // namespace dropfront::scoring
