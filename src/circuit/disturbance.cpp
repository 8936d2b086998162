#include "dropfront/circuit/disturbance.hpp"

#include <algorithm>
#include <cmath>
#include <utility>

namespace dropfront::circuit {

namespace {

constexpr double kGrid_deg = 10;
constexpr int kCoarse = 2;          // every second place of the grid first
constexpr double kTurned_V = 1e-6;  // a minimum no further below the one before has turned
constexpr int kMostRecovery = 64;   // periods
constexpr int kFallingEnough = 4;   // periods below the floor, each lower than the one before
constexpr double kLong = 2;         // periods; beyond, phases are ranked by a shorter disturbance
constexpr int kFinalists = 3;
constexpr int kSections = 6;  // leave 20 degrees / 18
constexpr double kRecovered_V = 1e-3;
constexpr double kPeriodic_V = 1e-7;  // a disturbed period that moves the capacitors by less repeats itself
constexpr int kSettled = 256;         // periods in which even a supply that alternates is where it stays
constexpr int kMostRepeated = 400;    // periods

/// Places of the lowest rails among those tried, lowest first.
std::vector<int> lowest(const std::vector<Disturbance::Least>& tried) {
  std::vector<int> places;
  for (std::size_t k = 0; k < tried.size(); ++k) {
    if (tried[k].usable) places.push_back(static_cast<int>(k));
  }
  const auto lower = [&tried](int a, int b) {
    return tried[static_cast<std::size_t>(a)].rail_V < tried[static_cast<std::size_t>(b)].rail_V;
  };
  std::stable_sort(places.begin(), places.end(), lower);
  if (places.size() > kFinalists) places.resize(kFinalists);
  return places;
}

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
  // With half-wave symmetry the rail does in half a period what else it does in a whole one.
  const double step_s = std::min(span_s(), normal_.period_s());
  for (int k = 0; k < kMostRecovery; ++k) {
    Extremes period;
    if (!normal_.advance(step_s, at, &period)) return false;
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
    for (int k = 0; left_s > kLong * period_s; left_s -= period_s, ++k) {
      const StateVector before = at.x;
      if (!disturbed_.advance(period_s, at, &rail)) return false;
      double moved_V = 0;
      for (std::size_t i = 0; i < before.size(); ++i) {
        moved_V = std::max(moved_V, std::abs(at.x[i] - before[i]));
      }
      if (!(moved_V < kPeriodic_V) && k < kSettled) continue;
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

/// What ranks the phases: the run until soon after the end, of a disturbance that may be shortened.
Disturbance::Least Disturbance::ranked(double phase_deg) {
  const double period_s = normal_.period_s();
  return begun(phase_deg, whole() ? duration_s_ : period_s + std::fmod(duration_s_, period_s), false);
}

bool Disturbance::whole() const { return still() || duration_s_ <= kLong * normal_.period_s(); }

Disturbance::Least Disturbance::worst_of_grid() {
  if (!sample_grid()) return failed(0);
  const int count = static_cast<int>(grid_.size());
  std::vector<Least> tried(grid_.size());
  const auto try_place = [&](int place) {
    Least& here = tried[static_cast<std::size_t>(place)];
    const RunPoint& sample = grid_[static_cast<std::size_t>(place)];
    if (!here.usable) here = ranked(sample.time_s / normal_.period_s() * 360);
    return here.usable;
  };
  for (int k = 0; k < count; k += kCoarse) {
    if (!try_place(k)) return failed(0);
  }
  for (const int k : lowest(tried)) {
    for (const int beside : {(k + 1) % count, (k + count - 1) % count}) {
      if (!try_place(beside)) return failed(0);
    }
  }
  Least worst;
  for (const int k : lowest(tried)) {
    const Least& candidate = tried[static_cast<std::size_t>(k)];
    const Least full = at(candidate.phase_deg);
    if (!full.usable) return full;
    if (!worst.usable || full.rail_V < worst.rail_V) worst = full;
    // Where the rest of the run took the rail no lower, the ranking is the answer.
    if (whole() && full.rail_V >= candidate.rail_V - kTurned_V) break;
  }
  return worst;
}

Disturbance::Least Disturbance::worst_around(double phase_deg) {
  constexpr double kGolden = 0.6180339887498949;
  double low_deg = phase_deg - kGrid_deg, high_deg = phase_deg + kGrid_deg;
  Least left = ranked(high_deg - kGolden * (high_deg - low_deg));
  Least right = ranked(low_deg + kGolden * (high_deg - low_deg));
  for (int k = 0; k < kSections && left.usable && right.usable; ++k) {
    if (left.rail_V < right.rail_V) {
      high_deg = right.phase_deg;
      right = left;
      left = ranked(high_deg - kGolden * (high_deg - low_deg));
    } else {
      low_deg = left.phase_deg;
      left = right;
      right = ranked(low_deg + kGolden * (high_deg - low_deg));
    }
  }
  Least lowest = at(left.rail_V < right.rail_V ? left.phase_deg : right.phase_deg);
  if (!lowest.usable) return lowest;
  const Least middle = at(phase_deg);
  if (!middle.usable || middle.rail_V < lowest.rail_V) lowest = middle;
  lowest.phase_deg -= span_deg() * std::floor(lowest.phase_deg / span_deg());
  return lowest;
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
    const double most_s = std::min(left_s - rest_s, kSettled * period_s);
    for (double run_on_s = 0; run_on_s < most_s - 0.5 * period_s && !recovered; run_on_s += period_s) {
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
