#include "dropfront/circuit/segment.hpp"

#include <algorithm>
#include <cmath>
#include <limits>

#include "dropfront/circuit/safe_step.hpp"

namespace dropfront::circuit {

namespace {
/// Guards closer to their threshold than this are on it: far below any voltage that matters, far above
/// rounding of the node solution in a floating bridge.
constexpr double kOnThreshold_V = 1e-9;
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
  for (int i = 0; i < mode.states; ++i) {
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
  for (int i = 0; i < mode.states; ++i) {
    double z = 0;
    for (int k = 0; k < mode.states; ++k) z += mode.to_modal[i][k] * x[k];
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
  for (int i = 0; i < segment.mode->states; ++i) v += row.z[i] * segment.mode->lambda[i] * moment.slope[i];
  for (int h = 0; h < phase.count; ++h) {
    v -= phase.omega[h] * phase.omega[h] *
         (forced.cosine[h] * phase.cosine[h] + forced.sine[h] * phase.sine[h]);
  }
  return v;
}

std::optional<Crossing> first_crossing(const Segment& segment, double limit_s, double resolution_s,
                                       TonePhase& phase) {
  const auto& mode = *segment.mode;
  const int bits = static_cast<int>(mode.guard.size());
  double s = 0;
  for (int evaluation = 0; evaluation < 20000; ++evaluation) {
    phase.set(segment.start_s + s);
    const ModalMoment moment = modal_moment(segment, s);
    double step = std::numeric_limits<double>::infinity();
    int nearest = -1;
    bool falling = false;
    for (int bit = 0; bit < bits; ++bit) {
      const auto& row = mode.guard[bit];
      const auto& forced = mode.guard_forced[bit];
      double h = forced.constant;
      double slope = 0;
      double bound = forced.curvature;
      for (int i = 0; i < mode.states; ++i) {
        h += row.z[i] * moment.value[i];
        const double moving = row.z[i] * moment.slope[i];
        slope += moving;
        bound += std::abs(moving * mode.lambda[i]);
      }
      for (int k = 0; k < phase.count; ++k) {
        h += forced.cosine[k] * phase.cosine[k] + forced.sine[k] * phase.sine[k];
        slope += phase.omega[k] * (forced.sine[k] * phase.cosine[k] - forced.cosine[k] * phase.sine[k]);
      }
      if (((mode.mask >> bit) & 1u) == 0) {
        h = -h;
        slope = -slope;
      }
      if (h < -kOnThreshold_V || (h <= kOnThreshold_V && s == 0 && slope < 0) || (h <= 0 && s > 0)) {
        return Crossing{s, bit};
      }
      const double safe = safe_step(std::max(h, 0.0), slope, bound);
      if (safe < step) {
        step = safe;
        nearest = bit;
        falling = slope < 0;
      }
    }
    if (nearest < 0 || s + step >= limit_s) return std::nullopt;
    if (step < resolution_s) {
      if (falling) return Crossing{s + step, nearest};
      step = resolution_s;
    }
    s += step;
  }
  return Crossing{s, -1};  // never reached in practice: the walker reports it
}

}  // namespace dropfront::circuit
