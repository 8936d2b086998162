#include "dropfront/scoring/point_solver.hpp"

#include <algorithm>
#include <cmath>

#include "dropfront/scoring/clamp_power.hpp"

namespace dropfront::scoring {

namespace {

constexpr double kTemperatureTolerance_K = 0.05;
constexpr double kCurrentTolerance = 1e-6;
constexpr int kMostPasses = 12;
constexpr double kCeiling_degC = 1000;  // only keeps a hopeless design's figures finite

/// Rail maximum with no drop between a clamp ahead and the rail. Back to back, the zener in its forward
/// direction carries the full current: its drop does not shrink by the 0.3 V of an idle diode.
double greatest_rail_V(const circuit::Arrangement& wiring, const circuit::ElementValues& values,
                       const circuit::SteadyState& state, bool least_drops) {
  if (!wiring.clamp_ahead) return state.rail_max_V;
  if (!wiring.full_wave) return state.rail_max_V + values.rectifier.threshold_V;
  return state.rail_max_V + 2 * values.rectifier.threshold_V + (least_drops ? 0.3 : 0.0);
}

}  // namespace

Temperatures Rises::over(double ambient_degC) const {
  const double local_degC = std::min(kCeiling_degC, ambient_degC + local_K);
  return {local_degC, std::min(kCeiling_degC, local_degC + junction_K)};
}

PointSolver::PointSolver(const Design& design, const Requirement& requirement, double required_V)
    : design_(&design), requirement_(&requirement), required_V_(required_V) {}

circuit::ElementValues PointSolver::values(const Recipe& recipe, const Rises& rises,
                                           double ambient_degC) const {
  return corner_values(*design_, recipe, rises.over(ambient_degC), 0.5 * required_V_);
}

circuit::SteadyState PointSolver::steady(const circuit::ElementValues& values,
                                         const circuit::SteadyOptions& options,
                                         const circuit::StateVector* guess) {
  ++steady_states_;
  return circuit::solve_steady_state(design_->arrangement->build(values), options, guess);
}

Rises PointSolver::rises_of(const circuit::ElementValues& values, const circuit::SteadyState& state,
                            double junction_K) const {
  const auto& clamp = *design_->clamp;
  const double power_W = clamp_power_W(*design_->arrangement, values, state);
  const double rise_K = clamp.thermal_resistance_K_per_W * power_W;
  // The power goes with the voltage, the voltage with the junction: one Newton step of that.
  const double gain = rise_K * clamp.temperature_coefficient_per_K;
  const double next_K = gain < 0.5 ? (rise_K - gain * junction_K) / (1 - gain) : rise_K;
  return {requirement_->surroundings.enclosure_K_per_W * std::max(0.0, state.input_power_W), next_K};
}

Rises PointSolver::estimated_rises(const circuit::ElementValues& values, double load_A) const {
  const auto& wiring = *design_->arrangement;
  const double clamp_V = values.clamp.main.threshold_V;
  const double delivered_A = charge_balance_A(wiring, values, clamp_V);
  const double line_A = wiring.dropper
                            ? values.mains.omega() * values.dropper_F * values.mains.voltage_Vrms()
                            : values.mains.voltage_Vrms() / (std::sqrt(2) * values.series_resistor_ohm);
  double clamp_W = clamp_V * std::max(0.0, delivered_A - load_A);
  if (wiring.clamp_ahead && !wiring.full_wave) clamp_W += values.rectifier.threshold_V * delivered_A;
  const double input_W = clamp_V * delivered_A + line_A * line_A * values.series_resistor_ohm +
                         values.mains.voltage_Vrms() * values.mains.voltage_Vrms() / values.discharge_ohm;
  return {requirement_->surroundings.enclosure_K_per_W * input_W,
          design_->clamp->thermal_resistance_K_per_W * clamp_W / std::max(1, wiring.clamp_count)};
}

OperatingPoint PointSolver::solve(const char* corner, const Recipe& recipe, const LoadCase& load,
                                  double ambient_degC, const OperatingPoint* warm) {
  OperatingPoint point;
  point.corner = corner;
  point.ambient_degC = ambient_degC;
  point.load = load.name;
  point.load_current_A = load.output_A;
  const bool stepping = design_->output_stage->kind == parts::StageKind::step_down;
  double rail_V = warm != nullptr ? warm->state.rail_mean_V : design_->clamp->voltage_V;
  auto quiescent = load.quiescent;
  circuit::StateVector start{};
  const circuit::StateVector* guess = nullptr;
  Rises rises;
  if (warm != nullptr) {
    rises = {warm->local_degC - warm->ambient_degC, warm->clamp_junction_degC - warm->local_degC};
    start = warm->state.start;
    guess = &start;
  } else {
    rises = estimated_rises(values(recipe, {}, ambient_degC), load.output_A + load.beside_A);
  }
  for (int pass = 0; pass < kMostPasses; ++pass) {
    point.values = values(recipe, rises, ambient_degC);
    const double reached_V = std::max(rail_V, required_V_);  // below it the stage has cut out
    point.rail_current_A =
        stage_current_A(*design_->output_stage, load.output_A, reached_V, quiescent, load.output) +
        load.beside_A;
    point.values.rail_current_A = point.rail_current_A;
    point.state = steady(point.values, {}, guess);
    if (!point.state.usable()) break;
    start = point.state.start;
    guess = &start;
    const auto now = rises_of(point.values, point.state, rises.junction_K);
    const auto used = rises.over(ambient_degC);
    const auto implied = now.over(ambient_degC);
    const bool cool =
        std::abs(implied.local_degC - used.local_degC) <= kTemperatureTolerance_K &&
        std::abs(implied.clamp_junction_degC - used.clamp_junction_degC) <= kTemperatureTolerance_K;
    rises = now;
    bool steady_current = true;
    if (stepping) {
      const double now_V = load.at_trough ? point.state.rail_min_V : point.state.rail_mean_V;
      const double before_V = std::max(rail_V, required_V_);
      rail_V = now_V;
      steady_current = std::abs(std::max(now_V, required_V_) - before_V) <= kCurrentTolerance * before_V;
    } else if (quiescent == Quiescent::data && point.state.rail_min_V < required_V_ &&
               quiescent_A(*design_->output_stage, Quiescent::dropout) >
                   quiescent_A(*design_->output_stage, quiescent)) {
      quiescent = Quiescent::dropout;
      steady_current = false;
    }
    if (cool && steady_current) break;
    if (pass + 1 == kMostPasses) {
      point.state.status = circuit::SteadyStatus::failed;
      point.state.reason = "temperatures and load did not settle";
    }
  }
  const auto at = rises.over(ambient_degC);
  point.local_degC = at.local_degC;
  point.clamp_junction_degC = at.clamp_junction_degC;
  if (point.state.usable()) {
    point.rail_greatest_V =
        greatest_rail_V(*design_->arrangement, point.values, point.state, recipe.drops == Drops::least);
  }
  return point;
}

}  // namespace dropfront::scoring
