#include "dropfront/circuit/start_up.hpp"

#include <algorithm>
#include <cmath>
#include <utility>
#include <vector>

namespace dropfront::circuit {

namespace {

constexpr double kStep_deg = 10;
constexpr double kPeriodic_V = 1e-7;  // a period that moves no capacitor by more repeats itself
constexpr double kNoLower_V = 1e-4;
constexpr int kCalm = 3;
constexpr int kFinalists = 3;

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
      start.end = End::cuts_out;
      return start;
    }
    const bool high = on && rail.low >= required_V_;
    calm = high && rail.low >= before_V - kNoLower_V ? calm + 1 : 0;
    before_V = rail.low;
    const bool periodic = moved_V(at.x, before.x) < kPeriodic_V;
    if (calm == kCalm || (periodic && high)) {
      start.end = End::reached;
      start.time_s = last_below_s - began_s;
      return start;
    }
    if (periodic) {
      start.end = End::stays_low;
      return start;
    }
  }
  start.usable = true;
  return start;
}

StartUp::Start StartUp::worst(double give_up_s) {
  struct Phase {
    double deg, reservoir_V, behind_s;
  };
  const double period_s = rising_.period_s();
  const double span_deg = rising_.network().half_period_signs.empty() ? 360 : 180;
  std::vector<Phase> phases;
  double gain_V = 0;  // a period
  for (double deg = 0; deg < span_deg - 1e-9; deg += kStep_deg) {
    RunPoint at;
    at.time_s = deg / 360 * period_s;
    Extremes rail;
    if (!rising_.advance(2 * period_s - at.time_s, at, &rail)) {
      Start failed;
      failed.reason = rising_.fault();
      return failed;
    }
    phases.push_back({deg, reservoir_V(at), 0});
    if (deg > 0) continue;
    if (rail.high < std::max(required_V_, turn_on_V_) && rising_.advance(period_s, at)) {
      gain_V = reservoir_V(at) - phases.front().reservoir_V;
    }
  }
  runs_ += static_cast<int>(phases.size());
  if (gain_V > 0) {
    for (Phase& p : phases) p.behind_s = -(p.deg / 360 + p.reservoir_V / gain_V) * period_s;
    std::stable_sort(phases.begin(), phases.end(),
                     [](const Phase& a, const Phase& b) { return a.behind_s > b.behind_s; });
    phases.resize(std::min<std::size_t>(phases.size(), kFinalists));
  }
  Start worst;
  const auto longer = [&](const Start& other) {
    if (!other.usable) return true;
    if ((other.end == End::reached) != (worst.end == End::reached)) return other.end != End::reached;
    return other.time_s > worst.time_s;
  };
  for (const Phase& p : phases) {
    const Start tried = at(p.deg, give_up_s);
    if (&p == &phases.front() || longer(tried)) worst = tried;
    if (!worst.usable || worst.end != End::reached) return worst;
  }
  const double centre_deg = worst.phase_deg;
  for (const double deg : {centre_deg - 5, centre_deg + 5}) {
    const Start tried = at(deg < 0 ? deg + 360 : deg, give_up_s);
    if (longer(tried)) worst = tried;
  }
  return worst;
}

}  // namespace dropfront::circuit
