#include "dropfront/scoring/lean_search.hpp"

#include <algorithm>
#include <cmath>

#include "dropfront/circuit/available_current.hpp"
#include "dropfront/scoring/clamp_power.hpp"
#include "dropfront/scoring/power_peak.hpp"

namespace dropfront::scoring {

namespace {

constexpr double kRailTolerance_V = 1e-6;         // twice that of the searches
constexpr double kTemperatureTolerance_K = 0.25;  // the rise over the ambient is a few kelvin here
constexpr int kMostTemperaturePasses = 4;
constexpr circuit::SteadyOptions kRailOnly{.powers = false, .multipliers = false};

const char* end_name(End end) { return end == End::low ? "low" : "high"; }

}  // namespace

std::string ends_text(const LeanEnds& ends) {
  return std::string("series_resistor ") + end_name(ends.series_resistor) + ", esr " + end_name(ends.esr) +
         ", discharge " + end_name(ends.discharge);
}

LeanSearch::LeanSearch(PointSolver& points, const circuit::Waveform& lean_mains, double overhead_A, bool aged)
    : points_(&points), mains_(&lean_mains), overhead_A_(overhead_A), aged_(aged) {}

Recipe LeanSearch::recipe(const LeanEnds& ends) const {
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
  recipe.temperature = true;
  return recipe;
}

double LeanSearch::capability_A(const LeanSolution& solution) const {
  const auto& stage = *points_->design().output_stage;
  const double spare_A = solution.best_A - overhead_A_;
  if (stage.kind != parts::StageKind::step_down) return spare_A;
  return stage.efficiency.value_or(0) * spare_A * solution.best_rail_V / stage.output_voltage_V;
}

/// Whether the clamp stands so little above the required rail that the cold end of its curve decides: its
/// room is then of the order of the ripple.
bool LeanSearch::knee_presumed() const {
  const auto& wiring = *points_->design().arrangement;
  const auto values = points_->values(recipe({}), {}, points_->requirement().surroundings.ambient_degC.low);
  const double drop_V = wiring.clamp_ahead ? values.rectifier.threshold_V : 0;
  const double room_V = values.clamp.main.threshold_V - drop_V - points_->required_V();
  const double ripples_a_period = wiring.full_wave ? 2 : 1;
  const double ripple_V = charge_balance_A(wiring, values, points_->required_V()) /
                          (ripples_a_period * values.mains.frequency_Hz() * values.reservoir_F);
  return room_V < 1.2 * ripple_V;
}

std::vector<LeanSearch::Case> LeanSearch::cases(bool cold, bool hot) const {
  const auto& ambient = points_->requirement().surroundings.ambient_degC;
  std::vector<double> ambients;
  if (cold) ambients.push_back(ambient.low);
  if (hot && !(cold && ambient.low == ambient.high)) ambients.push_back(ambient.high);
  if (ambients.size() == 2 && !knee_presumed()) std::swap(ambients[0], ambients[1]);
  const bool bled = points_->design().discharge != nullptr && points_->design().discharge_count > 0;
  std::vector<Case> all;
  for (const double t : ambients) {
    for (const End discharge : {End::high, End::low}) {
      if (discharge == End::low && !bled) continue;
      for (const End esr : {End::high, End::low}) {
        for (const End series : {End::high, End::low}) all.push_back({t, {series, esr, discharge}});
      }
    }
  }
  return all;
}

LeanSolution LeanSearch::search(const Case& where, const Rises* known) {
  LeanSolution found;
  found.ambient_degC = where.ambient_degC;
  found.ends = where.ends;
  const auto& wiring = *points_->design().arrangement;
  const bool stepping = points_->design().output_stage->kind == parts::StageKind::step_down;
  const auto what = recipe(where.ends);
  if (known != nullptr) {
    found.rises = *known;
  } else {
    const auto values = points_->values(what, {}, where.ambient_degC);
    found.rises = points_->estimated_rises(values, charge_balance_A(wiring, values, points_->required_V()));
  }
  for (int pass = 0; pass < kMostTemperaturePasses; ++pass) {
    auto values = points_->values(what, found.rises, where.ambient_degC);
    const auto answer = circuit::find_available_current(wiring.build, values, points_->required_V());
    points_->count(answer.steady_states);
    if (!answer.usable) {
      found.reason = answer.reason;
      return found;
    }
    found.available_A = found.best_A = answer.current_A;
    found.best_rail_V = points_->required_V();
    found.state = answer.state;
    if (stepping && found.available_A > overhead_A_) {
      const auto power = [&](double load_A) {
        values.rail_current_A = load_A;
        const auto state = points_->steady(values, kRailOnly, &found.state);
        if (!state.usable() || !(state.rail_min_V >= points_->required_V() - kRailTolerance_V)) return 0.0;
        return (load_A - overhead_A_) * state.rail_min_V;
      };
      const double low_A = std::max(overhead_A_, 0.3 * found.available_A);
      const auto peak = find_peak(power, low_A, found.available_A, 2e-3, 14);
      if (peak.value > 0) {
        found.best_A = peak.x;
        found.best_rail_V = peak.value / (peak.x - overhead_A_);
      }
    }
    values.rail_current_A = found.best_A;
    const auto state = points_->steady(values, {}, &found.state);
    if (!state.usable()) {
      found.reason = state.reason;
      return found;
    }
    found.state = state.start;
    const auto used = found.rises.over(where.ambient_degC);
    found.rises = points_->rises_of(values, state, found.rises.junction_K);
    const auto now = found.rises.over(where.ambient_degC);
    if (std::abs(now.local_degC - used.local_degC) <= kTemperatureTolerance_K &&
        std::abs(now.clamp_junction_degC - used.clamp_junction_degC) <= kTemperatureTolerance_K) {
      break;
    }
  }
  found.usable = true;
  return found;
}

/// Rail minimum at `where` with the load of a solution found elsewhere; far below zero when it has no answer.
double LeanSearch::rail_at(const Case& where, const LeanSolution& known) {
  auto values = points_->values(recipe(where.ends), known.rises, where.ambient_degC);
  values.rail_current_A = known.best_A;
  const auto state = points_->steady(values, kRailOnly, &known.state);
  return state.usable() ? state.rail_min_V : -1e9;
}

LeanSolution LeanSearch::least_of(std::vector<Case> open) {
  LeanSolution least = search(open.front(), nullptr);
  open.erase(open.begin());
  // Each round keeps the cases that fall short of the least so far and searches at the lowest of them.
  while (least.usable && least.best_A > 0 && !open.empty()) {
    std::vector<Case> short_of_it;
    double lowest_V = least.best_rail_V - kRailTolerance_V;
    std::size_t worst = 0;
    for (const auto& where : open) {
      const double rail_V = rail_at(where, least);
      if (rail_V >= least.best_rail_V - kRailTolerance_V) continue;
      if (rail_V < lowest_V) {
        lowest_V = rail_V;
        worst = short_of_it.size();
      }
      short_of_it.push_back(where);
    }
    if (short_of_it.empty()) break;
    auto next = search(short_of_it[worst], &least.rises);
    short_of_it.erase(short_of_it.begin() + static_cast<std::ptrdiff_t>(worst));
    open = std::move(short_of_it);
    if (!next.usable || capability_A(next) < capability_A(least)) least = std::move(next);
  }
  return least;
}

const LeanSolution& LeanSearch::least() {
  if (!least_) least_ = least_of(cases(true, true));
  return *least_;
}

const LeanSolution& LeanSearch::at(bool hot) {
  auto& answer = at_[hot ? 1 : 0];
  if (!answer) {
    const auto& ambient = points_->requirement().surroundings.ambient_degC;
    const double here_degC = hot ? ambient.high : ambient.low;
    const auto& overall = least();
    answer = overall.ambient_degC == here_degC ? overall : least_of(cases(!hot, hot));
  }
  return *answer;
}

std::optional<double> LeanSearch::current_at_A(double rail_V) {
  const auto& known = least();
  if (!known.usable) return std::nullopt;
  if (rail_V == points_->required_V()) return known.available_A;
  const auto& ambient = points_->requirement().surroundings.ambient_degC;
  std::optional<double> lesser;
  for (const double t : {ambient.low, ambient.high}) {
    const auto values = points_->values(recipe(known.ends), known.rises, t);
    const auto answer = circuit::find_available_current(points_->design().arrangement->build, values, rail_V);
    points_->count(answer.steady_states);
    if (!answer.usable) return std::nullopt;
    if (!lesser || answer.current_A < *lesser) lesser = answer.current_A;
    if (ambient.low == ambient.high) break;
  }
  return lesser;
}

}  // namespace dropfront::scoring
