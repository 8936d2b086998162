#include <algorithm>
#include <cmath>

#include "dropfront/circuit/steady_state.hpp"
#include "dropfront/scoring/bounds/charge.hpp"
#include "dropfront/scoring/bounds/rules.hpp"
#include "dropfront/scoring/corners.hpp"
#include "dropfront/scoring/stage_law.hpp"

namespace dropfront::scoring::bounds {

namespace {

/// Where the input power of a shunt was found to grow with C, Rs, trigger zener, drops, gate resistor, load
/// and reservoir and to fall with the chain and the ESR [3,000 designs, every one of these moved: no
/// exception]. With less current the thyristor does not hold, the zener clamps instead and takes more
/// [C down by a tenth: input power up by 140 %].
bool in_range(const BoxQuestion& question, double load_A) {
  const auto& ends = question.ends;
  const auto& line = question.supply.standby;
  const double phase = line.omega * ends.greatest(Figure::series_high_ohm) * ends.greatest(Figure::new_F);
  const double chain = 1 / (line.omega * ends.least(Figure::new_F) * ends.least(Figure::chain_low_ohm));
  const double peak_A = line.omega * ends.least(Figure::new_F) * line.crest_V;
  const double holding_A = question.box.thyristors.front()->holding_current_A.value_or(INFINITY);
  const double charge_A =
      2 * line.frequency_Hz * ends.least(Figure::new_F) * line.crest_V * (question.full_wave() ? 2 : 1);
  return phase <= 0.4 && chain <= 0.15 && peak_A >= 3 * holding_A && load_A <= 0.25 * charge_A &&
         ends.greatest(Figure::new_clamp_V) <= 0.24 * line.crest_V;
}

/// Least rail current of a member asleep: least stage, least leakage; a step-down stage at the highest rail,
/// or at V_required where that is higher: below it the stage draws what it draws there.
double load_least_A(const BoxQuestion& question, double highest_V) {
  const auto& loads = question.context.loads;
  const double stage_A = question.least_over(question.box.output_stages, [&](const auto* stage) {
    const double required_V =
        required_rail_V(*stage, question.context.requirement->output, loads).value_or(0);
    const double rail_V = std::max(highest_V, required_V);
    return stage_current_A(*stage, loads.standby_A, rail_V, Quiescent::data, End::low);
  });
  return stage_A + question.ends.least(Figure::leakage_A) + loads.rail_A;
}

}  // namespace

/// Input power of a steady state with the least of all it grows with and the greatest of all it falls with.
/// Monotone by test, in the range of `in_range`; a state that does not converge shows nothing.
std::optional<double> shunt_standby(const BoxQuestion& question) {
  const auto& ends = question.ends;
  if (!ends.known_shunt() || !in_range(question, load_most_A(question, BoxCorner::standby, 1))) {
    return std::nullopt;
  }
  const auto& thyristor = *question.box.thyristors.front();
  const auto& gate = *question.box.gate_resistors.front();
  circuit::ElementValues values;
  values.mains = question.supply.shapes.nominal;
  values.series_resistor_ohm = ends.least(Figure::series_high_ohm);
  values.dropper_F = ends.least(Figure::new_F);
  values.dropper_esr_ohm = ends.least(Figure::loss_tangent) / (values.mains.omega() * values.dropper_F);
  values.discharge_ohm = ends.greatest(Figure::chain_low_ohm);
  values.rectifier = {ends.least(Figure::drop_V), ends.least(Figure::drop_ohm)};
  values.clamp.main = {ends.least(Figure::new_clamp_V), ends.least(Figure::clamp_ohm)};
  values.thyristor = {thyristor.on_voltage_V, thyristor.slope_resistance_ohm};
  values.thyristor_holding_A = *thyristor.holding_current_A;
  values.thyristor_trigger_A = *thyristor.trigger_current_A;
  values.gate_resistor_ohm = resistor_ohm(gate, End::high);
  values.reservoir_F = ends.least(Figure::new_can_F);
  values.reservoir_esr_ohm = ends.greatest(Figure::new_can_ohm);
  const double highest_V =
      ends.greatest(Figure::new_clamp_V) + 1 + ends.greatest(Figure::clamp_ohm) * ends.peak_A();
  values.rail_current_A = load_least_A(question, highest_V);
  values.load_cutoff_V = 0.5 * ends.greatest(Figure::required_V);  // a starved rail draws less
  const auto state = circuit::solve_steady_state(question.box.arrangement->build(values), {.peaks = false});
  if (state.status != circuit::SteadyStatus::converged) return std::nullopt;
  return state.input_power_W * (1 - 5e-6);
}

}  // namespace dropfront::scoring::bounds
