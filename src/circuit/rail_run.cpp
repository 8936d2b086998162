#include "dropfront/circuit/rail_run.hpp"

#include <utility>

namespace dropfront::circuit {

namespace {

double rail_at(const Segment& segment, double s, TonePhase& phase) {
  phase.set(segment.start_s + s);
  return value_at(segment.mode->rail, segment.mode->rail_forced, modal_moment(segment, s), phase);
}

Extremes rail_of(const Segment& segment, TonePhase& phase) {
  Extremes rail;
  include_extremes(segment, segment.mode->rail, segment.mode->rail_forced, phase, rail);
  return rail;
}

/// Between a moment below the level and one at or above it, in either order.
double level_crossing_s(const Segment& segment, double below_s, double above_s, double level_V,
                        TonePhase& phase) {
  for (int i = 0; i < 50; ++i) {
    const double middle_s = 0.5 * (below_s + above_s);
    (rail_at(segment, middle_s, phase) < level_V ? below_s : above_s) = middle_s;
  }
  return 0.5 * (below_s + above_s);
}

}  // namespace

RailRun::RailRun(Network network) : walker_(std::move(network)) {}

bool RailRun::advance(double duration_s, RunPoint& at, Extremes* rail) {
  segments_.clear();
  if (!(duration_s > 0)) return fault().empty();
  walker_.set_latched(at.latched & walker_.thyristor_bits());
  if (!walker_.walk(at.time_s, at.time_s + duration_s, at.x, segments_)) {
    if (fault().empty()) walker_.fail("the run left the numbers");
    return false;
  }
  at.time_s += duration_s;
  at.latched = walker_.latched();
  if (rail == nullptr) return true;
  TonePhase phase(network().source.waveform);
  for (const auto& segment : segments_) {
    include_extremes(segment, segment.mode->rail, segment.mode->rail_forced, phase, *rail);
  }
  return true;
}

std::optional<double> RailRun::last_below_s(double level_V) const {
  TonePhase phase(network().source.waveform);
  for (auto segment = segments_.rbegin(); segment != segments_.rend(); ++segment) {
    if (rail_at(*segment, segment->length_s, phase) < level_V) return segment->start_s + segment->length_s;
    // A segment may touch the level more than once: look on from each crossing until none is left.
    Segment rest = *segment;
    std::optional<double> last;
    for (int round = 0; round < 8; ++round) {
      const Extremes rail = rail_of(rest, phase);
      if (!(rail.low < level_V - 1e-9)) break;
      const double s = level_crossing_s(rest, rail.low_at_s - rest.start_s, rest.length_s, level_V, phase);
      last = rest.start_s + s;
      const double left_s = rest.length_s - s;
      rest = begin_segment(*rest.mode, *last, state_at(rest, s, phase), phase);
      rest.length_s = left_s;
    }
    if (last) return last;
  }
  return std::nullopt;
}

std::optional<double> RailRun::first_at_s(double level_V) const {
  TonePhase phase(network().source.waveform);
  for (const auto& segment : segments_) {
    if (rail_at(segment, 0, phase) >= level_V) return segment.start_s;
    Segment ahead = segment;
    std::optional<double> first;
    for (int round = 0; round < 8; ++round) {
      const Extremes rail = rail_of(ahead, phase);
      if (!(rail.high >= level_V)) break;
      ahead.length_s = level_crossing_s(ahead, 0, rail.high_at_s - ahead.start_s, level_V, phase);
      first = ahead.start_s + ahead.length_s;
      ahead.length_s *= 1 - 1e-9;
    }
    if (first) return first;
  }
  return std::nullopt;
}

}  // namespace dropfront::circuit
