#include "dropfront/scoring/lean_search.hpp"

#include <algorithm>

#include "dropfront/circuit/available_current.hpp"
#include "dropfront/scoring/clamp_power.hpp"

namespace dropfront::scoring {

namespace {

constexpr double kRailTolerance_V = 1e-6;  // ten times that of the searches
constexpr int kMostRounds = 6;

End flipped(End end) { return end == End::low ? End::high : End::low; }

}  // namespace

LeanSearch::LeanSearch(PointSolver& points, const circuit::Waveform& lean_mains, double overhead_A,
                       double aged)
    : solver_(points, lean_mains, overhead_A, aged) {}

LeanSearch::Cases LeanSearch::settled_cases() {
  return {[this](const LeanCase& where, const LeanSolution* near) { return solver_.solve(where, near); },
          [this](const LeanCase& where, const LeanSolution& known) { return solver_.rail_V(where, known); },
          [this](const LeanSolution& solution) { return solver_.capability_A(solution); }};
}

/// A step-down stage always works where the clamp lets go.
bool LeanSearch::knee_presumed() const {
  return solver_.stepping() || little_room(solver_.points().required_V());
}

/// Whether the clamp stands so little above a rail that the cold end of its curve decides: its room is then
/// of the order of the ripple.
bool LeanSearch::little_room(double rail_V) const {
  const auto& points = solver_.points();
  const auto& wiring = *points.design().arrangement;
  const auto values =
      points.values(solver_.recipe({}), {}, points.requirement().surroundings.ambient_degC.low);
  const double drop_V = wiring.clamp_ahead ? values.rectifier.threshold_V : 0;
  const double room_V = values.clamp.main.threshold_V - drop_V - rail_V;
  const double ripples_a_period = wiring.full_wave ? 2 : 1;
  const double ripple_V = charge_balance_A(wiring, values, rail_V) /
                          (ripples_a_period * values.mains.frequency_Hz() * values.reservoir_F);
  return room_V < 1.2 * ripple_V;
}

/// What decided most often among random designs: Rb low; saturated Rs high and ESR low, in the knee Rs low
/// and ESR high. Only the cost of the search hangs on it.
LeanEnds LeanSearch::presumed_ends(bool knee) const {
  return knee ? LeanEnds{End::low, End::high, End::low} : LeanEnds{End::high, End::low, End::low};
}

/// Cases next to a solution whose rail falls short of it at its load: at each ambient the same ends and each
/// of them turned. Turns that lower the rail further at one ambient are joined into one case.
std::vector<LeanSearch::Short> LeanSearch::short_cases(const Cases& cases,
                                                       const std::vector<double>& ambients,
                                                       const LeanSolution& least) {
  const auto& design = solver_.points().design();
  const bool bled = design.discharge != nullptr && design.discharge_count > 0;
  const double enough_V = least.best_rail_V - kRailTolerance_V;
  std::vector<Short> found;
  for (const double t : ambients) {
    const LeanCase same{t, least.where.ends};
    const double same_V = t == least.where.ambient_degC ? least.best_rail_V : cases.rail_V(same, least);
    Short joined{same, same_V};
    for (const auto member : {&LeanEnds::series_resistor, &LeanEnds::esr, &LeanEnds::discharge}) {
      if (member == &LeanEnds::discharge && !bled) continue;
      LeanCase turned = same;
      turned.ends.*member = flipped(turned.ends.*member);
      const double rail_V = cases.rail_V(turned, least);
      if (!(rail_V < same_V - kRailTolerance_V)) continue;
      joined.where.ends.*member = turned.ends.*member;
      joined.rail_V = std::min(joined.rail_V, rail_V);
    }
    if (joined.rail_V < enough_V) found.push_back(joined);
  }
  std::stable_sort(found.begin(), found.end(),
                   [](const Short& a, const Short& b) { return a.rail_V < b.rail_V; });
  return found;
}

LeanSolution LeanSearch::least_of(const Cases& cases, const std::vector<double>& ambients,
                                  const LeanEnds& first) {
  LeanSolution least = cases.solve({ambients.front(), first}, nullptr);
  std::vector<LeanCase> tried{least.where};
  for (int round = 0; round < kMostRounds && least.usable && least.best_A > 0; ++round) {
    bool lowered = false;
    for (const auto& next : short_cases(cases, ambients, least)) {
      if (std::find(tried.begin(), tried.end(), next.where) != tried.end()) continue;
      tried.push_back(next.where);
      auto solved = cases.solve(next.where, &least);
      // A rail that falls short with a borrowed junction may hold with its own.
      lowered = !solved.usable || cases.capability_A(solved) < cases.capability_A(least);
      if (!lowered) continue;
      least = std::move(solved);
      break;
    }
    if (!lowered) break;
  }
  return least;
}

const LeanSolution& LeanSearch::least() {
  if (least_) return *least_;
  const auto& ambient = solver_.points().requirement().surroundings.ambient_degC;
  const bool knee = knee_presumed();
  std::vector<double> ambients{ambient.low};
  if (ambient.high != ambient.low) ambients.insert(knee ? ambients.end() : ambients.begin(), ambient.high);
  least_ = least_of(settled_cases(), ambients, presumed_ends(knee));
  return *least_;
}

const LeanSolution& LeanSearch::at(bool hot) {
  auto& answer = at_[hot ? 1 : 0];
  if (!answer) {
    const auto& ambient = solver_.points().requirement().surroundings.ambient_degC;
    const double here_degC = hot ? ambient.high : ambient.low;
    const auto& overall = least();
    answer = overall.where.ambient_degC == here_degC
                 ? overall
                 : least_of(settled_cases(), {here_degC}, presumed_ends(knee_presumed()));
  }
  return *answer;
}

std::optional<double> LeanSearch::current_at_A(double rail_V) {
  const auto& known = least();
  if (!known.usable) return std::nullopt;
  auto& points = solver_.points();
  if (rail_V == points.required_V()) return known.available_A;
  const auto& ambient = points.requirement().surroundings.ambient_degC;
  const bool one_ambient = ambient.low == ambient.high;
  std::optional<double> least_A;
  for (const bool warm : {false, true}) {
    const auto rises_at = [&](double degC) {
      return (one_ambient ? warm : degC == ambient.high) ? known.rises : Rises{};
    };
    const Cases cases{[&](const LeanCase& where, const LeanSolution* near) {
                        return solver_.solve_at(rail_V, where, rises_at(where.ambient_degC), near);
                      },
                      [&](const LeanCase& where, LeanSolution solution) {
                        solution.rises = rises_at(where.ambient_degC);
                        return solver_.rail_V(where, solution);
                      },
                      [](const LeanSolution& solution) { return solution.available_A; }};
    std::vector<double> ambients{ambient.high};
    if (!one_ambient) ambients.push_back(ambient.low);
    const auto found = least_of(cases, ambients, presumed_ends(little_room(rail_V)));
    if (!found.usable) return std::nullopt;
    least_A = std::min(least_A.value_or(found.available_A), found.available_A);
    if (!one_ambient) break;  // one descent has seen both
  }
  return least_A;
}

}  // namespace dropfront::scoring
