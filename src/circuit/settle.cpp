#include "dropfront/circuit/settle.hpp"

#include <algorithm>

namespace dropfront::circuit {

namespace {

constexpr int kMarched = 64;
constexpr int kCounted = 32;
constexpr int kRounds = 24;     // Newton steps granted to a network that may have no orbit
constexpr double kKick = 0.01;  // of every capacitor voltage: off an orbit that repels

bool march(PeriodMap& map, StateVector x, Settled& settled) {
  for (int k = 0; k < kMarched; ++k) {
    if (k == kMarched - kCounted) settled.start = x;
    if (!map.advance(x)) {
      settled.reason = map.fault();
      return false;
    }
    ++settled.passes;
    if (k < kMarched - kCounted) continue;
    settled.segments.insert(settled.segments.end(), map.segments().begin(), map.segments().end());
  }
  settled.end = x;
  settled.found = settled.alternating = true;
  settled.reason = "alternates from cycle to cycle";
  return true;
}

}  // namespace

Settled settle(PeriodMap& map, const StateVector& start, const SteadyOptions& options) {
  Settled settled;
  const bool remembers = !map.walker().network().thyristors.empty();
  SteadyOptions granted = options;
  if (remembers) granted.max_rounds = std::min(granted.max_rounds, kRounds);
  const Orbit orbit = find_orbit(map, start, granted);
  settled.passes = orbit.passes;
  settled.reason = orbit.reason;
  if (!orbit.found) {
    if (remembers) {
      map.forget_fault();
      march(map, start, settled);
    }
    return settled;
  }
  settled.start = orbit.start;
  settled.end = map.raw_end();
  settled.segments = map.segments();
  settled.found = true;
  if (!options.multipliers && !remembers) return settled;
  settled.greatest_multiplier = map.greatest_multiplier(orbit.jacobian);
  if (settled.greatest_multiplier < 1) return settled;
  settled.found = false;
  settled.reason = "the periodic solution is not stable";
  if (!remembers) return settled;
  settled.segments.clear();
  StateVector kicked = orbit.start;
  for (double& v : kicked) v *= 1 - kKick;
  march(map, kicked, settled);
  return settled;
}

Extremes rail_extremes(const Walker& walker, const std::vector<Segment>& segments) {
  TonePhase phase(walker.network().source.waveform);
  Extremes rail;
  for (const auto& segment : segments) {
    include_extremes(segment, segment.mode->rail, segment.mode->rail_forced, phase, rail);
  }
  return rail;
}

}  // namespace dropfront::circuit
