#include "dropfront/scoring/lean_case.hpp"

#include <algorithm>
#include <cmath>

#include "dropfront/circuit/available_current.hpp"
#include "dropfront/circuit/greatest_power.hpp"
#include "dropfront/scoring/clamp_power.hpp"
#include "dropfront/scoring/power_peak.hpp"
#include "dropfront/scoring/settled_rise.hpp"

namespace dropfront::scoring {

namespace {

constexpr double kRailTolerance_V = 1e-6;  // ten times that of the searches
constexpr double kRiseTolerance_K = 0.1;
constexpr int kMostRisePasses = 8;
constexpr double kPeakTolerance = 1.5e-3;  // of the available current; the rail falls steeply past the peak
constexpr double kFirstReach = 0.12;       // of the closed form's current
constexpr double kNeighbourReach = 0.025;
constexpr int kPeakCalls = 18;
constexpr circuit::SteadyOptions kRailOnly{.powers = false, .multipliers = false};

const char* end_name(End end) { return end == End::low ? "low" : "high"; }

}  // namespace

std::string ends_text(const LeanEnds& ends, bool bled) {
  std::string text =
      std::string("series_resistor ") + end_name(ends.series_resistor) + ", esr " + end_name(ends.esr);
  if (bled) text += std::string(", discharge ") + end_name(ends.discharge);
  return text;
}

LeanCaseSolver::LeanCaseSolver(PointSolver& points, const circuit::Waveform& lean_mains, double overhead_A,
                               double aged)
    : points_(&points), mains_(&lean_mains), overhead_A_(overhead_A), aged_(aged) {}

Recipe LeanCaseSolver::recipe(const LeanEnds& ends) const {
  Recipe recipe;
  recipe.mains = mains_;
  recipe.dropper = End::low;
  recipe.series_resistor = ends.series_resistor;
  recipe.discharge = ends.discharge;
  recipe.clamp = ZenerCurve::low;
  recipe.reservoir = End::low;
  recipe.esr = ends.esr;
  recipe.drops = Drops::greatest;
  recipe.aged = aged_;
  return recipe;
}

bool LeanCaseSolver::stepping() const {
  return points_->design().output_stage->kind == parts::StageKind::step_down;
}

double LeanCaseSolver::capability_A(const LeanSolution& solution) const {
  const auto& stage = *points_->design().output_stage;
  const double spare_A = solution.best_A - overhead_A_;
  if (!stepping()) return spare_A;
  return stage.efficiency.value_or(0) * spare_A * solution.best_rail_V / stage_output_V(stage, End::high);
}

/// Greatest (I - overhead)·rail_min(I) up to the available current: by its derivative along the rail voltage,
/// else by its values alone. Those are looked for within `reach` of `near_A`
/// first; where the peak lies at the edge of that neighbourhood, over the whole range. Cold starts: a start
/// from a rail volts away takes longer.
void LeanCaseSolver::find_power_peak(circuit::ElementValues values, double near_A, double reach,
                                     LeanSolution& found) {
  if (!(found.available_A > overhead_A_)) return;
  values.rail_current_A = found.available_A;
  const auto greatest = circuit::find_greatest_power(points_->design().arrangement->build(values),
                                                     points_->required_V(), found.available_A, overhead_A_);
  points_->count(greatest.steady_states);
  if (greatest.usable) {
    found.best_A = greatest.current_A;
    found.best_rail_V = greatest.rail_V;
    return;
  }
  const auto power = [&](double load_A) {
    values.rail_current_A = load_A;
    const auto state = points_->steady(values, kRailOnly);
    if (!state.usable() || !(state.rail_min_V >= points_->required_V() - kRailTolerance_V)) return 0.0;
    return (load_A - overhead_A_) * state.rail_min_V;
  };
  const double floor_A = std::max(overhead_A_, 0.3 * found.available_A);
  const double low_A = std::max(floor_A, (1 - reach) * near_A);
  const double high_A = std::min(found.available_A, (1 + reach) * near_A);
  const double tolerance_A = kPeakTolerance * found.available_A;
  Peak peak;
  if (low_A < high_A) peak = find_peak(power, low_A, high_A, tolerance_A, kPeakCalls);
  const bool at_low = peak.x - low_A <= tolerance_A && low_A > floor_A;
  const bool at_high = high_A - peak.x <= tolerance_A && high_A < found.available_A;
  if (!(peak.value > 0) || at_low || at_high) {
    peak = find_peak(power, floor_A, found.available_A, tolerance_A, kPeakCalls);
  }
  if (!(peak.value > 0)) return;
  found.best_A = peak.x;
  found.best_rail_V = peak.value / (peak.x - overhead_A_);
}

LeanSolution LeanCaseSolver::solve(const LeanCase& where, const LeanSolution* neighbour) {
  LeanSolution found;
  found.where = where;
  const auto& wiring = *points_->design().arrangement;
  const auto what = recipe(where.ends);
  auto values = points_->values(what, {}, where.ambient_degC);
  double near_A = charge_balance_A(wiring, values, values.clamp.main.threshold_V);
  double reach = kFirstReach;
  if (neighbour != nullptr) {
    found.rises = neighbour->rises;
    near_A = neighbour->best_A;
    reach = kNeighbourReach;
  } else {
    found.rises = points_->estimated_rises(values, charge_balance_A(wiring, values, points_->required_V()));
  }
  SettledRise settled(kRiseTolerance_K);
  for (int pass = 0; pass < kMostRisePasses; ++pass) {
    values = points_->values(what, found.rises, where.ambient_degC);
    const auto* near = found.available.usable ? &found.available
                       : neighbour            ? &neighbour->available
                                              : nullptr;
    const auto answer = circuit::find_available_current(wiring.build, values, points_->required_V(), near);
    points_->count(answer.steady_states);
    if (!answer.usable) {
      found.reason = answer.reason;
      return found;
    }
    found.available = answer;
    found.available_A = found.best_A = answer.current_A;
    found.best_rail_V = points_->required_V();
    if (stepping()) find_power_peak(values, near_A, reach, found);
    near_A = found.best_A;
    reach = kNeighbourReach;
    values.rail_current_A = found.best_A;
    const auto state = points_->steady(values, {.multipliers = false}, &answer.state);
    if (!state.usable()) {
      found.reason = state.reason;
      return found;
    }
    found.best_state = state.start;
    const auto implied = points_->rises_of(values, state, found.rises.junction_K);
    const bool calm = std::abs(implied.local_K - found.rises.local_K) <= kRiseTolerance_K;
    const double next_K = settled.next(found.rises.junction_K, implied.junction_K);
    if (calm && settled.done()) break;
    if (pass + 1 < kMostRisePasses) found.rises = {implied.local_K, next_K};
  }
  found.usable = true;
  return found;
}

LeanSolution LeanCaseSolver::solve_at(double rail_V, const LeanCase& where, const Rises& rises,
                                      const LeanSolution* neighbour) {
  LeanSolution found;
  found.where = where;
  found.rises = rises;
  found.available = circuit::find_available_current(
      points_->design().arrangement->build, points_->values(recipe(where.ends), rises, where.ambient_degC),
      rail_V, neighbour != nullptr ? &neighbour->available : nullptr);
  points_->count(found.available.steady_states);
  found.usable = found.available.usable;
  found.reason = found.available.reason;
  found.available_A = found.best_A = found.available.current_A;
  found.best_rail_V = rail_V;
  found.best_state = found.available.state;
  return found;
}

double LeanCaseSolver::rail_V(const LeanCase& where, const LeanSolution& known) {
  auto values = points_->values(recipe(where.ends), known.rises, where.ambient_degC);
  values.rail_current_A = known.best_A;
  const auto state = points_->steady(values, kRailOnly, &known.best_state);
  return state.usable() ? state.rail_min_V : -1e9;
}

}  // namespace dropfront::scoring
