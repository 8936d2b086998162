#include "dropfront/circuit/start_up.hpp"

#include <algorithm>
#include <cmath>
#include <utility>
#include <vector>

namespace dropfront::circuit {

namespace {

constexpr double kStep_deg = 20;
constexpr double kPeriodic_V = 1e-7;  // a period that moves no capacitor by more repeats itself
constexpr double kNoLower_V = 1e-4;
constexpr int kCalm = 3;
constexpr double kLongEnough = 16;  // periods above the level, whatever the minima do
constexpr int kFinalists = 2;

double moved_V(const StateVector& a, const StateVector& b) {
  double most = 0;
  for (std::size_t i = 0; i < a.size(); ++i) most = std::max(most, std::abs(a[i] - b[i]));
  return most;
}

}  // namespace

StartUp::StartUp(Network rising, std::optional<Network> running, double turn_on_V, double cut_out_V,
                 double required_V)
    : rising_(std::move(rising)), turn_on_V_(turn_on_V), cut_out_V_(cut_out_V), required_V_(required_V) {
  if (running) running_.emplace(std::move(*running));
}

double StartUp::reservoir_V(const RunPoint& at) const {
  const auto& capacitors = rising_.network().capacitors;
  for (std::size_t i = 0; i < capacitors.size(); ++i) {
    if (capacitors[i].owner == Owner::reservoir) return at.x[i];
  }
  return 0;
}

StartUp::Start StartUp::at(double phase_deg, double give_up_s) {
  ++runs_;
  Start start;
  start.phase_deg = phase_deg;
  const double period_s = rising_.period_s();
  const double began_s = phase_deg / 360 * period_s;
  RunPoint at;
  at.time_s = began_s;
  RailRun* now = &rising_;
  bool on = !running_;
  double last_below_s = began_s, before_V = -INFINITY;
  int calm = 0;
  while (at.time_s - began_s < give_up_s) {
    const RunPoint before = at;
    Extremes rail;
    if (!now->advance(period_s, at, &rail)) {
      start.reason = now->fault();
      return start;
    }
    const bool turns_on = !on && rail.high >= turn_on_V_;
    if (turns_on) {
      const double until_s = now->first_at_s(turn_on_V_).value_or(at.time_s);
      at = before;
      if (!now->advance(until_s - before.time_s, at)) {
        start.reason = now->fault();
        return start;
      }
    }
    if (rail.low < required_V_) last_below_s = now->last_below_s(required_V_).value_or(last_below_s);
    if (turns_on) {
      on = true;
      now = &*running_;
      continue;
    }
    start.usable = true;
    start.time_s = at.time_s - began_s;
    if (running_ && on && rail.low < cut_out_V_) {
      start.outcome = Outcome::cuts_out;
      return start;
    }
    const bool high = on && rail.low >= required_V_;
    calm = high && rail.low >= before_V - kNoLower_V ? calm + 1 : 0;
    before_V = rail.low;
    const bool periodic = moved_V(at.x, before.x) < kPeriodic_V;
    const bool stays = at.time_s - last_below_s > kLongEnough * period_s;
    if (high && (calm >= kCalm || periodic || stays)) {
      start.outcome = Outcome::reached;
      start.time_s = last_below_s - began_s;
      return start;
    }
    if (periodic) {
      start.outcome = Outcome::stays_low;
      return start;
    }
  }
  start.usable = true;
  return start;
}

/// Reservoir voltage two periods after mains time zero.
double StartUp::charged_V(double phase_deg) {
  ++runs_;
  RunPoint at;
  at.time_s = phase_deg / 360 * rising_.period_s();
  return rising_.advance(2 * rising_.period_s() - at.time_s, at) ? reservoir_V(at) : 0;
}

/// What a period adds after that; 0 where the start is over by then.
double StartUp::gain_V() {
  RunPoint at;
  Extremes rail;
  if (!rising_.advance(2 * rising_.period_s(), at, &rail)) return 0;
  if (rail.high >= std::max(required_V_, turn_on_V_)) return 0;
  const double before_V = reservoir_V(at);
  return rising_.advance(rising_.period_s(), at) ? reservoir_V(at) - before_V : 0;
}

/// Phases worth a full run.
std::vector<double> StartUp::candidates_deg() {
  const double span_deg = rising_.network().half_period_signs.empty() ? 360 : 180;
  const double gain = gain_V();
  std::vector<double> phases_deg;
  for (double deg = 0; deg < span_deg - 1e-9; deg += kStep_deg) phases_deg.push_back(deg);
  if (!(gain > 0)) return phases_deg;
  std::vector<std::pair<double, double>> ranked;  // what is behind (in turns, negated), phase
  const auto rank = [&](double deg) { ranked.push_back({deg / 360 + charged_V(deg) / gain, deg}); };
  for (const double deg : phases_deg) rank(deg);
  std::sort(ranked.begin(), ranked.end());
  const double last_deg = ranked.front().second;
  for (const double beside_deg : {last_deg + 0.5 * kStep_deg, last_deg - 0.5 * kStep_deg}) {
    rank(beside_deg < 0 ? beside_deg + 360 : beside_deg);
  }
  std::sort(ranked.begin(), ranked.end());
  phases_deg.clear();
  for (int k = 0; k < kFinalists; ++k) phases_deg.push_back(ranked[static_cast<std::size_t>(k)].second);
  return phases_deg;
}

StartUp::Start StartUp::worst(double give_up_s) {
  Start worst;
  bool first = true;
  for (const double deg : candidates_deg()) {
    const Start tried = at(deg, give_up_s);
    if (first || tried.longer_than(worst)) worst = tried;
    if (!worst.usable || worst.outcome != Outcome::reached) return worst;
    first = false;
  }
  return worst;
}

bool StartUp::Start::longer_than(const Start& other) const {
  if (!usable || !other.usable) return !usable;
  const bool never = outcome != Outcome::reached, other_never = other.outcome != Outcome::reached;
  return never != other_never ? never : time_s > other.time_s;
}

}  // namespace dropfront::circuit
