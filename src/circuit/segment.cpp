#include "dropfront/circuit/segment.hpp"

#include <algorithm>
#include <cmath>
#include <limits>
#include <numbers>

#include "dropfront/circuit/safe_step.hpp"

namespace dropfront::circuit {

namespace {
/// A guard this far on the wrong side as a segment begins is rounding of the node solution, not a crossing,
/// as long as it is on its way back.
constexpr double kRounding_V = 1e-9;
}  // namespace

TonePhase::TonePhase(const Waveform& mains)
    : count(static_cast<int>(mains.tones().size())), fundamental_(mains.omega()) {
  for (int h = 0; h < count; ++h) {
    order_[h] = mains.tones()[h].order;
    omega[h] = order_[h] * fundamental_;
  }
}

void TonePhase::set(double time_s) {
  const double c1 = std::cos(fundamental_ * time_s);
  const double s1 = std::sin(fundamental_ * time_s);
  cosine[0] = c1;
  sine[0] = s1;
  double c = c1;
  double s = s1;
  int order = 1;
  for (int h = 1; h < count; ++h) {
    if (order_[h] < order) {
      c = c1;
      s = s1;
      order = 1;
    }
    for (; order < order_[h]; ++order) {
      const double turned = c * c1 - s * s1;
      s = c * s1 + s * c1;
      c = turned;
    }
    cosine[h] = c;
    sine[h] = s;
  }
}

ModalMoment modal_moment(const Segment& segment, double s) {
  const auto& mode = *segment.mode;
  ModalMoment moment;
  for (int i = 0; i < mode.modes; ++i) {
    const double exponent = mode.lambda[i] * s;
    if (mode.slow[i]) {
      const double grown = std::expm1(exponent);
      const double psi = mode.lambda[i] == 0 ? s : grown / mode.lambda[i];
      moment.value[i] = segment.alpha[i] * (1 + grown) + segment.drift[i] * psi;
      moment.slope[i] = (mode.lambda[i] * segment.alpha[i] + segment.drift[i]) * (1 + grown);
    } else if (exponent > -60) {
      moment.value[i] = segment.alpha[i] * std::exp(exponent);
      moment.slope[i] = mode.lambda[i] * moment.value[i];
    }
  }
  return moment;
}

Segment begin_segment(const ConductionMode& mode, double start_s, const StateVector& x, TonePhase& phase) {
  Segment segment;
  segment.mode = &mode;
  segment.start_s = start_s;
  phase.set(start_s);
  const int count = phase.count;
  for (int j = mode.states; j < mode.modes; ++j) {
    segment.alpha[j] = std::exp(mode.lambda[j] * (start_s - mode.pulse_start_s));
  }
  for (int i = 0; i < mode.states; ++i) {
    double z = 0;
    for (int k = 0; k < mode.states; ++k) z += mode.to_modal[i][k] * x[k];
    for (int j = mode.states; j < mode.modes; ++j)
      z -= mode.pulse_gain[i][j - mode.states] * segment.alpha[j];
    for (int h = 0; h < count; ++h) {
      z -= mode.forced_cosine[i * count + h] * phase.cosine[h] +
           mode.forced_sine[i * count + h] * phase.sine[h];
    }
    if (mode.slow[i]) {
      segment.drift[i] = mode.constant[i];
    } else {
      z += mode.constant[i] / mode.lambda[i];
    }
    segment.alpha[i] = z;
  }
  return segment;
}

StateVector state_at(const Segment& segment, double s, TonePhase& phase) {
  const auto& mode = *segment.mode;
  phase.set(segment.start_s + s);
  const ModalMoment moment = modal_moment(segment, s);
  const int count = phase.count;
  StateVector x{};
  for (int i = 0; i < mode.states; ++i) {
    double z = moment.value[i];
    for (int h = 0; h < count; ++h) {
      z += mode.forced_cosine[i * count + h] * phase.cosine[h] +
           mode.forced_sine[i * count + h] * phase.sine[h];
    }
    if (!mode.slow[i]) z -= mode.constant[i] / mode.lambda[i];
    for (int k = 0; k < mode.states; ++k) x[k] += mode.to_state[k][i] * z;
  }
  for (int j = mode.states; j < mode.modes; ++j) {
    for (int k = 0; k < mode.states; ++k) x[k] += mode.to_state[k][j] * moment.value[j];
  }
  return x;
}

double value_at(const ModalRow& row, const ForcedRow& forced, const ModalMoment& moment,
                const TonePhase& phase) {
  double v = forced.constant;
  for (int i = 0; i < kMaxStates; ++i) v += row.z[i] * moment.value[i];
  for (int h = 0; h < phase.count; ++h) {
    v += forced.cosine[h] * phase.cosine[h] + forced.sine[h] * phase.sine[h];
  }
  return v;
}

double slope_at(const ModalRow& row, const ForcedRow& forced, const ModalMoment& moment,
                const TonePhase& phase) {
  double v = 0;
  for (int i = 0; i < kMaxStates; ++i) v += row.z[i] * moment.slope[i];
  for (int h = 0; h < phase.count; ++h) {
    v += phase.omega[h] * (forced.sine[h] * phase.cosine[h] - forced.cosine[h] * phase.sine[h]);
  }
  return v;
}

double curvature_at(const Segment& segment, const ModalRow& row, const ForcedRow& forced,
                    const ModalMoment& moment, const TonePhase& phase) {
  double v = 0;
  for (int i = 0; i < segment.mode->modes; ++i) v += row.z[i] * segment.mode->lambda[i] * moment.slope[i];
  for (int h = 0; h < phase.count; ++h) {
    v -= phase.omega[h] * phase.omega[h] *
         (forced.cosine[h] * phase.cosine[h] + forced.sine[h] * phase.sine[h]);
  }
  return v;
}

namespace {

/// A guard's value, oriented so that it must stay positive, with its derivatives and bounds ahead.
struct GuardMoment {
  double value, slope, turn;  // and first and second derivative
  double curvature, jerk;     // bounds on the second and third derivative from here on
  void turn_round() {
    value = -value;
    slope = -slope;
    turn = -turn;
  }
};

GuardMoment guard_moment(const ConductionMode& mode, const ModalRow& row, const ForcedRow& forced,
                         const ModalMoment& moment, const TonePhase& phase) {
  GuardMoment g{forced.constant, 0, 0, forced.curvature, forced.jerk};
  for (int i = 0; i < mode.modes; ++i) {
    const double lambda = mode.lambda[i];
    const double moving = row.z[i] * moment.slope[i];
    // A mode that grows does so by no more than e over the step it is granted.
    const double ahead = lambda > 0 ? std::numbers::e : 1;
    g.value += row.z[i] * moment.value[i];
    g.slope += moving;
    g.turn += moving * lambda;
    g.curvature += std::abs(moving * lambda) * ahead;
    g.jerk += std::abs(moving) * lambda * lambda * ahead;
  }
  for (int k = 0; k < phase.count; ++k) {
    const double in_phase = forced.cosine[k] * phase.cosine[k] + forced.sine[k] * phase.sine[k];
    g.value += in_phase;
    g.slope += phase.omega[k] * (forced.sine[k] * phase.cosine[k] - forced.cosine[k] * phase.sine[k]);
    g.turn -= phase.omega[k] * phase.omega[k] * in_phase;
  }
  return g;
}

double safe_time(const GuardMoment& g) {
  const double value = std::max(g.value, 0.0);
  return std::max(safe_step(value, g.slope, g.curvature), safe_step_rising(value, g.slope, g.turn, g.jerk));
}

/// What one bit's guard says: when it may change side at the earliest.
struct Watch {
  GuardMoment guard{};
  double safe_s = 0;
  double alone_s = std::numeric_limits<double>::infinity();  ///< until then `guard` alone decides
  bool crossed = false;
};

bool has_crossed(const GuardMoment& g, double s) {
  return g.value < -kRounding_V || (g.value <= 0 && (s > 0 || g.slope < 0));
}

Watch watch_bit(const ConductionMode& mode, int bit, double s, const ModalMoment& moment,
                const TonePhase& phase) {
  Watch watch;
  watch.guard = guard_moment(mode, mode.guard[bit], mode.guard_forced[bit], moment, phase);
  const bool set = (mode.mask >> bit) & 1u;
  if (!set) watch.guard.turn_round();
  const int thyristor = bit - static_cast<int>(mode.guard.size() - mode.arming.size());
  if (set || thyristor < 0) {
    watch.crossed = has_crossed(watch.guard, s);
    watch.safe_s = safe_time(watch.guard);
    return watch;
  }
  // It fires when both conditions hold: it is safe as long as either does not.
  GuardMoment other =
      guard_moment(mode, mode.arming[thyristor], mode.arming_forced[thyristor], moment, phase);
  other.turn_round();
  watch.crossed = has_crossed(watch.guard, s) && has_crossed(other, s);
  if (other.value > watch.guard.value) std::swap(watch.guard, other);
  watch.safe_s = std::max(safe_time(watch.guard), other.value > 0 ? safe_time(other) : 0.0);
  other.turn_round();
  watch.alone_s = other.value > 0 ? safe_time(other) : 0;
  return watch;
}

}  // namespace

std::optional<Crossing> first_crossing(const Segment& segment, double limit_s, double resolution_s,
                                       TonePhase& phase) {
  const auto& mode = *segment.mode;
  const int bits = static_cast<int>(mode.guard.size());
  double granted_s = std::numeric_limits<double>::infinity();  // in which a growing mode gains a factor e
  for (int i = 0; mode.grows && i < mode.states; ++i) {
    if (mode.lambda[i] > 0) granted_s = std::min(granted_s, 1 / mode.lambda[i]);
  }
  double s = 0;
  for (int evaluation = 0; evaluation < 20000; ++evaluation) {
    phase.set(segment.start_s + s);
    const ModalMoment moment = modal_moment(segment, s);
    double step = granted_s;
    double others = step;  // safe time of all guards but the nearest
    int nearest = -1;
    Watch near{};
    for (int bit = 0; bit < bits; ++bit) {
      const Watch watch = watch_bit(mode, bit, s, moment, phase);
      if (watch.crossed) return Crossing{s, bit};
      if (watch.safe_s < step) {
        others = step;
        step = watch.safe_s;
        nearest = bit;
        near = watch;
      } else {
        others = std::min(others, watch.safe_s);
      }
    }
    if (s + step >= limit_s) return std::nullopt;
    const GuardMoment& g = near.guard;
    if (nearest >= 0 && g.slope < 0) {
      // The root of the second-order expansion is the crossing to within its third-order remainder.
      const double square = g.slope * g.slope - 2 * g.value * g.turn;
      if (square > 0.25 * g.slope * g.slope) {
        const double root = 2 * g.value / (std::sqrt(square) - g.slope);
        const double error = g.jerk * root * root * root / (6 * 0.5 * -g.slope);
        if (error < resolution_s && root < std::min(others, near.alone_s) && s + root < limit_s) {
          return Crossing{s + root, nearest};
        }
      }
      if (step < resolution_s && near.alone_s > 2 * resolution_s) return Crossing{s + step, nearest};
    }
    s += std::max(step, resolution_s);
  }
  return Crossing{s, -1};  // never reached in practice: the walker reports it
}

}  // namespace dropfront::circuit
