#include "dropfront/circuit/walker.hpp"

#include <algorithm>
#include <cmath>

namespace dropfront::circuit {

namespace {
constexpr double kResolution = 1e-13;   // of the period: where a crossing counts as found
constexpr double kConsistent_V = 1e-7;  // a guard on the wrong side by less is rounding
constexpr int kMostSegments = 20000;
}  // namespace

Walker::Walker(const Network& network)
    : network_(network), topology_(analyse(network)), phase_(network.source.waveform) {
  fault_ = topology_.fault;
  modes_.reserve(16);
  // Loads usually stand above their cut-off.
  for (std::size_t k = 0; k < network.loads.size(); ++k) last_start_ |= 1u << (network.branches.size() + k);
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
  for (std::size_t b = 0; b < candidate.guard.size(); ++b) {
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
  for (ConductionMask trial = 0; trial < (1u << bits); ++trial) {
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
  ConductionMask mask = last_start_;
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
    if (crossing->bit >= 0) mask ^= 1u << crossing->bit;
  }
  return std::all_of(x.begin(), x.end(), [](double v) { return std::isfinite(v); });
}

SmallMatrix Walker::sensitivity(const std::vector<Segment>& segments) const {
  const int n = topology_.states;
  SmallMatrix total{};
  for (int i = 0; i < n; ++i) total[i][i] = 1;
  for (const auto& segment : segments) {
    const auto& m = *segment.mode;
    StateVector decay{};
    for (int k = 0; k < n; ++k) decay[k] = std::exp(m.lambda[k] * segment.length_s);
    SmallMatrix next{};
    for (int c = 0; c < n; ++c) {
      for (int k = 0; k < n; ++k) {
        double z = 0;
        for (int i = 0; i < n; ++i) z += m.to_modal[k][i] * total[i][c];
        z *= decay[k];
        for (int i = 0; i < n; ++i) next[i][c] += m.to_state[i][k] * z;
      }
    }
    total = next;
  }
  return total;
}

}  // namespace dropfront::circuit
