#include "dropfront/circuit/orbit.hpp"

namespace dropfront::circuit {

namespace {

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
  int marched = 0;
  for (int pass = 0; !(here.residual <= options.state_tolerance_V); ++pass) {
    if (pass >= options.max_newton_passes || marched > options.max_march_periods) {
      orbit.reason = "no periodic steady state found";
      return orbit;
    }
    StateVector step{};
    bool improved = false;
    if (map.newton_step(here.x, here.mapped, here.jacobian, step)) {
      for (double share = 1; share > 0.2 && !improved; share /= 2) {
        Point trial;
        for (int i = 0; i < map.states(); ++i) trial.x[i] = here.x[i] + share * step[i];
        if (!evaluate(map, trial, orbit)) return orbit;
        if (trial.residual < here.residual) {
          here = trial;
          improved = true;
        }
      }
    }
    for (int k = 0; !improved && k < 16; ++k, ++marched) {
      here.x = here.mapped;
      if (!evaluate(map, here, orbit)) return orbit;
    }
  }
  orbit.start = here.x;
  orbit.jacobian = here.jacobian;
  orbit.found = true;
  return orbit;
}

Extremes rail_extremes(const PeriodMap& map) {
  TonePhase phase(map.walker().network().source.waveform);
  Extremes rail;
  for (const auto& segment : map.segments()) {
    include_extremes(segment, segment.mode->rail, segment.mode->rail_forced, phase, rail);
  }
  return rail;
}

}  // namespace dropfront::circuit
