#include "dropfront/circuit/walker.hpp"

#include <algorithm>
#include <cmath>
#include <utility>

namespace dropfront::circuit {

namespace {
constexpr double kResolution = 1e-13;   // of the period: where a crossing counts as found
constexpr double kConsistent_V = 1e-7;  // a guard on the wrong side by less is rounding
constexpr int kMostSegments = 20000;
}  // namespace

Walker::Walker(Network network)
    : network_(std::move(network)), topology_(analyse(network_)), phase_(network_.source.waveform) {
  fault_ = topology_.fault;
  modes_.reserve(16);
  // Loads usually stand above their cut-off.
  for (std::size_t k = 0; k < network_.loads.size(); ++k) last_start_ |= 1u << (network_.branches.size() + k);
}

const ConductionMode& Walker::mode(ConductionMask mask) {
  for (const auto& known : modes_) {
    if (known->mask == mask) return *known;
  }
  modes_.push_back(std::make_unique<ConductionMode>(derive_mode(network_, topology_, mask)));
  return *modes_.back();
}

double Walker::worst_violation_V(const ConductionMode& candidate, double time_s, const StateVector& x,
                                 int& bit) {
  const Segment segment = begin_segment(candidate, time_s, x, phase_);
  const ModalMoment moment = modal_moment(segment, 0);
  double worst = 0;
  bit = -1;
  // Thyristors remember: their bits are given, not found.
  const std::size_t free_bits = candidate.guard.size() - network_.thyristors.size();
  for (std::size_t b = 0; b < free_bits; ++b) {
    const double side = ((candidate.mask >> b) & 1u) ? 1 : -1;
    const double h = side * value_at(candidate.guard[b], candidate.guard_forced[b], moment, phase_);
    if (-h > worst) {
      worst = -h;
      bit = static_cast<int>(b);
    }
  }
  return worst;
}

bool Walker::find_mode(double time_s, const StateVector& x, ConductionMask& mask) {
  const int bits = static_cast<int>(network_.branches.size() + network_.loads.size());
  int bit = -1;
  for (int round = 0; round < 8 * bits + 8; ++round) {
    const auto& candidate = mode(mask);
    if (!candidate.solvable) break;
    if (worst_violation_V(candidate, time_s, x, bit) <= kConsistent_V) return true;
    mask ^= 1u << bit;
  }
  // Single flips went in a circle: look at every mode. Piecewise-linear monotone networks have exactly one.
  if (bits > 14) return false;
  double least = INFINITY;
  ConductionMask best = 0;
  const ConductionMask latched = mask & thyristor_bits();
  for (ConductionMask free = 0; free < (1u << bits); ++free) {
    const ConductionMask trial = free | latched;
    const ConductionMode candidate = derive_mode(network_, topology_, trial);
    if (!candidate.solvable) continue;
    const double violation = worst_violation_V(candidate, time_s, x, bit);
    if (violation < least) {
      least = violation;
      best = trial;
    }
  }
  mask = best;
  return least <= 1e-3;
}

bool Walker::walk(double from_s, double to_s, StateVector& x, std::vector<Segment>& segments) {
  segments.clear();
  if (!fault_.empty()) return false;
  const double resolution_s = kResolution * network_.source.waveform.period_s();
  const ConductionMask memory = thyristor_bits();
  ConductionMask mask = (last_start_ & ~memory) | latched_;
  if (!find_mode(from_s, x, mask)) {
    fault_ = "no conduction mode fits the start";
    return false;
  }
  last_start_ = mask;

  double time_s = from_s;
  int standing = 0;  // crossings in a row without time passing
  while (time_s < to_s) {
    const auto& here = mode(mask);
    if (!here.solvable || static_cast<int>(segments.size()) > kMostSegments) {
      fault_ = here.solvable ? "conduction changes without end" : "a node hangs on nothing";
      return false;
    }
    Segment segment = begin_segment(here, time_s, x, phase_);
    const double limit_s = to_s - time_s;
    auto crossing = first_crossing(segment, limit_s, resolution_s, phase_);
    if (crossing && crossing->bit < 0) {
      fault_ = "a crossing could not be placed";
      return false;
    }
    if (crossing && crossing->s <= resolution_s && ++standing > 4 * static_cast<int>(here.guard.size())) {
      // Branches tie to the last bit and hand over in a circle: settle by the fit at this very moment,
      // then let a thousand resolutions pass.
      if (!find_mode(time_s, x, mask)) {
        fault_ = "no conduction mode fits a tie";
        return false;
      }
      segment = begin_segment(mode(mask), time_s, x, phase_);
      crossing = Crossing{std::min(1e3 * resolution_s, limit_s), -1};
      standing = 0;
    } else if (!crossing || crossing->s > resolution_s) {
      standing = 0;
    }
    segment.length_s = crossing ? crossing->s : limit_s;
    if (segment.length_s > 0) {
      x = state_at(segment, segment.length_s, phase_);
      segments.push_back(segment);
    }
    if (!crossing) break;
    time_s += crossing->s;
    if (crossing->bit < 0) continue;
    mask ^= 1u << crossing->bit;
    // A thyristor moves node voltages at once: the branches follow.
    if (((1u << crossing->bit) & memory) && !find_mode(time_s, x, mask)) {
      fault_ = "no conduction mode fits a thyristor's change";
      return false;
    }
  }
  latched_ = mask & memory;
  return std::all_of(x.begin(), x.end(), [](double v) { return std::isfinite(v); });
}

SmallMatrix Walker::sensitivity(const std::vector<Segment>& segments) const {
  SmallMatrix total{};
  StateVector by_load{};
  for (int i = 0; i < topology_.states; ++i) total[i][i] = 1;
  for (std::size_t k = 0; k < segments.size(); ++k) {
    carry(segments[k], segments[k].length_s, total, by_load);
    if (k + 1 < segments.size()) cross(segments[k], segments[k + 1], total, by_load);
  }
  return total;
}

ConductionMask Walker::thyristor_bits() const {
  const auto first = network_.branches.size() + network_.loads.size();
  return ((1u << network_.thyristors.size()) - 1u) << first;
}

bool Walker::crossed_guard(const Segment& before, const Segment& after, GuardRows& rows) const {
  ConductionMask flipped = before.mode->mask ^ after.mode->mask;
  if (!flipped) return false;
  if (flipped & thyristor_bits()) flipped &= thyristor_bits();
  int bit = 0;
  while (!((flipped >> bit) & 1u)) ++bit;
  const auto& mode = *before.mode;
  rows = {&mode.guard[bit], &mode.guard_forced[bit]};
  const auto first = mode.guard.size() - mode.arming.size();
  if (static_cast<std::size_t>(bit) < first || ((mode.mask >> bit) & 1u)) return true;
  // Of the two conditions to fire, the one that was met last is the one near zero.
  const auto t = static_cast<std::size_t>(bit) - first;
  TonePhase phase = phase_;
  phase.set(before.start_s + before.length_s);
  const ModalMoment moment = modal_moment(before, before.length_s);
  const double gate = value_at(*rows.row, *rows.forced, moment, phase);
  const double arm = value_at(mode.arming[t], mode.arming_forced[t], moment, phase);
  if (arm < gate) rows = {&mode.arming[t], &mode.arming_forced[t]};
  return true;
}

void Walker::cross(const Segment& before, const Segment& after, SmallMatrix& by_start,
                   StateVector& by_load) const {
  if (((before.mode->mask ^ after.mode->mask) & thyristor_bits()) == 0) return;
  GuardRows guard;
  if (!crossed_guard(before, after, guard)) return;
  const int n = topology_.states;
  const double time_s = after.start_s;
  TonePhase phase = phase_;
  const StateVector x = state_at(before, before.length_s, phase);
  const double u = network_.source.waveform.value_V(time_s);
  StateVector jump{};
  for (int i = 0; i < n; ++i) {
    const Row& old = before.mode->capacitor_A[i];
    const Row& now = after.mode->capacitor_A[i];
    double more_A = (now[kSource] - old[kSource]) * u + now[kOne] - old[kOne];
    for (int k = 0; k < n; ++k) more_A += (now[k] - old[k]) * x[k];
    jump[i] = more_A / network_.capacitors[i].capacitance_F;
  }
  phase.set(time_s);
  const double rate = slope_at(*guard.row, *guard.forced, modal_moment(before, before.length_s), phase);
  if (!(std::abs(rate) > 1e-6)) return;
  StateVector by_state{};
  for (int i = 0; i < n; ++i) {
    for (int k = 0; k < n; ++k) by_state[i] += guard.row->z[k] * before.mode->to_modal[k][i];
  }
  double shift_by_load = guard.row->per_A;
  StateVector shift_by_start{};
  for (int i = 0; i < n; ++i) {
    shift_by_load += by_state[i] * by_load[i];
    for (int c = 0; c < n; ++c) shift_by_start[c] += by_state[i] * by_start[i][c];
  }
  for (int i = 0; i < n; ++i) {
    by_load[i] += jump[i] * shift_by_load / rate;
    for (int c = 0; c < n; ++c) by_start[i][c] += jump[i] * shift_by_start[c] / rate;
  }
}

void Walker::carry(const Segment& segment, double length_s, SmallMatrix& by_start,
                   StateVector& by_load) const {
  const int n = topology_.states;
  const auto& m = *segment.mode;
  SmallMatrix next{};
  StateVector next_by_load{};
  for (int k = 0; k < n; ++k) {
    const double grown = std::expm1(m.lambda[k] * length_s);
    const double decay = 1 + grown;
    const double reach_s = m.lambda[k] == 0 ? length_s : grown / m.lambda[k];
    double z = m.constant_per_A[k] * reach_s;
    for (int i = 0; i < n; ++i) z += decay * m.to_modal[k][i] * by_load[i];
    for (int i = 0; i < n; ++i) next_by_load[i] += m.to_state[i][k] * z;
    for (int c = 0; c < n; ++c) {
      z = 0;
      for (int i = 0; i < n; ++i) z += m.to_modal[k][i] * by_start[i][c];
      z *= decay;
      for (int i = 0; i < n; ++i) next[i][c] += m.to_state[i][k] * z;
    }
  }
  by_start = next;
  by_load = next_by_load;
}

void Walker::set_load(double current_A) {
  if (network_.loads.empty()) return;
  const double more_A = current_A - network_.loads.front().current_A;
  network_.loads.front().current_A = current_A;
  const auto load_bit = network_.branches.size();
  // Below the cut-off the load is a conductance: such modes are derived again when met.
  modes_.erase(std::remove_if(modes_.begin(), modes_.end(),
                              [load_bit](const auto& m) { return ((m->mask >> load_bit) & 1u) == 0; }),
               modes_.end());
  for (auto& kept : modes_) shift_load(*kept, more_A);
}

}  // namespace dropfront::circuit
