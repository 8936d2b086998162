#include "dropfront/circuit/orbit.hpp"

#include <algorithm>
#include <cmath>

namespace dropfront::circuit {

namespace {

constexpr double kRounding_V = 1e-12;  // a residual this small is rounding of volts
// A rail without any load has no isolated orbit: it creeps up to its peak for ever. Where Newton no longer
// helps, this residual ends the climb.
constexpr double kSettled_V = 1e-9;

double greatest(const StateVector& v, int n) {
  double worst = 0;
  for (int i = 0; i < n; ++i) worst = std::max(worst, std::abs(v[i]));
  return worst;
}

struct Point {
  StateVector x{};
  StateVector mapped{};
  SmallMatrix jacobian{};
  double residual = 0;
};

bool evaluate(PeriodMap& map, Point& point, Orbit& orbit) {
  ++orbit.passes;
  if (!map.apply(point.x, point.mapped, &point.jacobian)) {
    orbit.reason = map.fault();
    return false;
  }
  point.residual = map.distance(point.x, point.mapped);
  return true;
}

}  // namespace

Orbit find_orbit(PeriodMap& map, const StateVector& start, const SteadyOptions& options) {
  Orbit orbit;
  Point here;
  here.x = start;
  if (!evaluate(map, here, orbit)) return orbit;
  for (int pass = 0;; ++pass) {
    StateVector step{};
    const bool solved = map.newton_step(here.x, here.mapped, here.jacobian, step);
    // The step, not the residual, is the distance to the orbit: a lightly loaded rail contracts by a few
    // thousandths a period, and its residual is that much smaller than its error.
    if (solved && here.residual <= options.state_tolerance_V &&
        greatest(step, map.states()) <= options.state_tolerance_V) {
      break;
    }
    if (pass >= options.max_rounds) {
      orbit.reason = "no periodic steady state found";
      return orbit;
    }
    // Newton's direction lowers the residual at its foot; where the map bends ahead, a shorter step does.
    bool improved = false;
    for (double share = 1; solved && share > 1e-3 && !improved; share /= 2) {
      Point trial;
      for (int i = 0; i < map.states(); ++i) trial.x[i] = here.x[i] + share * step[i];
      if (!evaluate(map, trial, orbit)) return orbit;
      if (trial.residual < here.residual || trial.residual <= kRounding_V) {
        here = trial;
        improved = true;
      }
    }
    if (improved && here.residual <= kRounding_V) break;
    if (improved) continue;
    if (here.residual <= kSettled_V) break;
    // A drifting rail moves alike period after period: take many at once, at least one (which never expands).
    for (double periods = 256; !improved; periods /= 4) {
      Point trial;
      for (int i = 0; i < map.states(); ++i) trial.x[i] = here.x[i] + periods * (here.mapped[i] - here.x[i]);
      if (!evaluate(map, trial, orbit)) return orbit;
      improved = periods <= 1 || trial.residual <= here.residual;
      if (improved) here = trial;
    }
  }
  orbit.start = here.x;
  orbit.jacobian = here.jacobian;
  orbit.found = true;
  return orbit;
}

}  // namespace dropfront::circuit
