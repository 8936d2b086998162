#include "dropfront/circuit/disturbance.hpp"

#include <algorithm>
#include <cmath>
#include <utility>

namespace dropfront::circuit {

namespace {

constexpr double kGrid_deg = 10;
constexpr double kNear_deg = 30 + 1e-6;
constexpr double kTurned_V = 1e-6;  // a minimum no further below the one before has turned
constexpr int kMostRecovery = 64;   // periods
constexpr int kFallingEnough = 4;   // periods below the floor, each lower than the one before
constexpr double kLong = 2;         // periods; beyond, phases are ranked by a shorter disturbance
constexpr int kFinalists = 3;
constexpr int kSections = 6;  // leave 20 degrees / 18
constexpr double kRecovered_V = 1e-3;
constexpr double kPeriodic_V = 1e-7;  // a disturbed period that moves the capacitors by less repeats itself
constexpr int kMostRepeated = 400;    // periods

}  // namespace

Disturbance::Disturbance(Network normal, Network disturbed, double duration_s, const SteadyState& start,
                         double floor_V)
    : normal_(std::move(normal)),
      disturbed_(std::move(disturbed)),
      duration_s_(duration_s),
      floor_V_(floor_V),
      steady_min_V_(start.rail_min_V) {
  const bool mirrored =
      !normal_.network().half_period_signs.empty() && !disturbed_.network().half_period_signs.empty();
  if (mirrored) turns_of_two_ = 1;
  if (start.status == SteadyStatus::alternating) turns_of_two_ = 4;
  start_.time_s = normal_.network().period_start_s;
  start_.x = start.start;
}

double Disturbance::span_s() const { return 0.5 * turns_of_two_ * normal_.period_s(); }

/// Mains time within the span from the start of the period.
double Disturbance::time_of(double phase_deg) const {
  const double ahead_s = phase_deg / 360 * normal_.period_s() - start_.time_s;
  return start_.time_s + ahead_s - span_s() * std::floor(ahead_s / span_s());
}

/// Whether nothing drives the disturbed network: its length then costs nothing.
bool Disturbance::still() const { return disturbed_.network().source.waveform.crest_V() == 0; }

Disturbance::Least Disturbance::failed(double phase_deg) const {
  Least least;
  least.phase_deg = phase_deg;
  least.reason = normal_.fault().empty() ? disturbed_.fault() : normal_.fault();
  return least;
}

bool Disturbance::sample_grid() {
  if (!grid_.empty()) return true;
  const int count = static_cast<int>(std::lround(span_deg() / kGrid_deg));
  const double step_s = span_s() / count;
  RunPoint at = start_;
  const double first_s = step_s * std::ceil(start_.time_s / step_s - 1e-9);
  for (int k = 0; k < count; ++k) {
    if (!normal_.advance(first_s + k * step_s - at.time_s, at)) return false;
    at.time_s = first_s + k * step_s;
    grid_.push_back(at);
  }
  return true;
}

bool Disturbance::on_orbit(double phase_deg, RunPoint& at) {
  const double time_s = time_of(phase_deg);
  at = start_;
  for (const RunPoint& sample : grid_) {
    if (sample.time_s <= time_s + 1e-12) at = sample;
  }
  return normal_.advance(time_s - at.time_s, at);
}

/// Least rail of the recovery from `at` on. Short: a period. To the end: until the minimum a period has
/// turned twice or is back at the steady one, towards which it then goes on.
bool Disturbance::recover(RunPoint& at, bool to_the_end, Extremes& rail, Least& least) {
  double before_V = INFINITY;
  int turned = 0, falling = 0;
  for (int k = 0; k < kMostRecovery; ++k) {
    Extremes period;
    if (!normal_.advance(normal_.period_s(), at, &period)) return false;
    rail.include(period.low, period.low_at_s);
    if (!to_the_end || period.low >= steady_min_V_ - kTurned_V) return true;
    const bool lower = period.low < before_V - kTurned_V;
    turned = lower ? 0 : turned + 1;
    falling = lower && period.low < floor_V_ ? falling + 1 : 0;
    if (turned == 2) return true;
    if (falling > kFallingEnough) break;
    before_V = period.low;
  }
  least.recovers = false;
  return true;
}

/// The disturbance itself. A long one is run period by period until these repeat themselves.
bool Disturbance::disturb(double duration_s, RunPoint& at, Extremes& rail) {
  const double period_s = normal_.period_s();
  double left_s = duration_s;
  if (!still()) {
    for (; left_s > kLong * period_s; left_s -= period_s) {
      const StateVector before = at.x;
      if (!disturbed_.advance(period_s, at, &rail)) return false;
      double moved_V = 0;
      for (std::size_t i = 0; i < before.size(); ++i) {
        moved_V = std::max(moved_V, std::abs(at.x[i] - before[i]));
      }
      if (!(moved_V < kPeriodic_V)) continue;
      const double alike_s = period_s * std::floor(left_s / period_s - 1);
      at.time_s += alike_s;
      left_s -= alike_s + period_s;
      break;
    }
  }
  return disturbed_.advance(left_s, at, &rail);
}

Disturbance::Least Disturbance::begun(double phase_deg, double duration_s, bool to_the_end) {
  ++runs_;
  Least least;
  least.phase_deg = phase_deg;
  RunPoint at;
  Extremes rail;
  if (!on_orbit(phase_deg, at) || !disturb(duration_s, at, rail) || !recover(at, to_the_end, rail, least)) {
    return failed(phase_deg);
  }
  least.rail_V = std::min(rail.low, steady_min_V_);
  least.usable = true;
  return least;
}

Disturbance::Least Disturbance::at(double phase_deg) { return begun(phase_deg, duration_s_, true); }

Disturbance::Least Disturbance::worst(std::optional<double> near_deg) {
  if (!sample_grid()) return failed(0);
  const double period_s = normal_.period_s();
  double ranked_s = duration_s_;
  if (!still() && duration_s_ > kLong * period_s) {
    ranked_s = period_s + std::fmod(duration_s_, period_s);
  }
  const auto quick = [&](double phase_deg) { return begun(phase_deg, ranked_s, false); };
  std::vector<Least> tried;
  for (const RunPoint& sample : grid_) {
    const double phase_deg = sample.time_s / period_s * 360;
    if (near_deg && std::abs(std::remainder(phase_deg - *near_deg, span_deg())) > kNear_deg) continue;
    tried.push_back(quick(phase_deg));
    if (!tried.back().usable) return tried.back();
  }
  const auto finalists = std::min<std::ptrdiff_t>(kFinalists, static_cast<std::ptrdiff_t>(tried.size()));
  std::stable_sort(tried.begin(), tried.end(),
                   [](const Least& a, const Least& b) { return a.rail_V < b.rail_V; });
  Least worst;
  for (auto candidate = tried.begin(); candidate != tried.begin() + finalists; ++candidate) {
    const Least full = at(candidate->phase_deg);
    if (!full.usable) return full;
    if (!worst.usable || full.rail_V < worst.rail_V) worst = full;
  }
  constexpr double kGolden = 0.6180339887498949;
  double low_deg = worst.phase_deg - kGrid_deg, high_deg = worst.phase_deg + kGrid_deg;
  Least left = quick(high_deg - kGolden * (high_deg - low_deg));
  Least right = quick(low_deg + kGolden * (high_deg - low_deg));
  for (int k = 0; k < kSections && left.usable && right.usable; ++k) {
    if (left.rail_V < right.rail_V) {
      high_deg = right.phase_deg;
      right = left;
      left = quick(high_deg - kGolden * (high_deg - low_deg));
    } else {
      low_deg = left.phase_deg;
      left = right;
      right = quick(low_deg + kGolden * (high_deg - low_deg));
    }
  }
  const Least refined = at(left.rail_V < right.rail_V ? left.phase_deg : right.phase_deg);
  if (!refined.usable) return refined;
  if (refined.rail_V < worst.rail_V) worst = refined;
  worst.phase_deg -= span_deg() * std::floor(worst.phase_deg / span_deg());
  return worst;
}

/// Whether the reservoir is charged as it was, to a millivolt: the map never expands what is left.
bool Disturbance::back(const RunPoint& at, const RunPoint& before) const {
  const auto& capacitors = normal_.network().capacitors;
  for (std::size_t i = 0; i < capacitors.size(); ++i) {
    if (capacitors[i].owner == Owner::reservoir && !(std::abs(at.x[i] - before.x[i]) <= kRecovered_V)) {
      return false;
    }
  }
  return true;
}

Disturbance::Least Disturbance::repeated(double phase_deg, double every_s) {
  const double period_s = normal_.period_s();
  const bool whole = every_s >= 2 * period_s;
  const double spacing_s = whole ? period_s * std::floor(every_s / period_s + 1e-9) : every_s;
  RunPoint at;
  Least least;
  least.phase_deg = phase_deg;
  least.rail_V = steady_min_V_;
  least.usable = true;
  if (!on_orbit(phase_deg, at)) return failed(phase_deg);
  const RunPoint orbit = at;
  double before_V = INFINITY;
  for (double run_s = 0; run_s < kMostRepeated * period_s; run_s += spacing_s) {
    ++runs_;
    Extremes round;
    if (!disturb(duration_s_, at, round)) return failed(phase_deg);
    const double left_s = std::max(0.0, spacing_s - duration_s_);
    const double rest_s = std::fmod(left_s, period_s);
    if (!normal_.advance(rest_s, at, &round)) return failed(phase_deg);
    bool recovered = whole && back(at, orbit);
    for (double more_s = left_s - rest_s; more_s > 0.5 * period_s && !recovered; more_s -= period_s) {
      if (!normal_.advance(period_s, at, &round)) return failed(phase_deg);
      recovered = whole && back(at, orbit);
    }
    least.rail_V = std::min(least.rail_V, round.low);
    if (recovered || round.low >= before_V - kRecovered_V / 10) return least;
    if (round.low < floor_V_ && before_V < floor_V_) break;
    before_V = round.low;
  }
  least.recovers = false;
  return least;
}

}  // namespace dropfront::circuit
