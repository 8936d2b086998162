#include "dropfront/circuit/segment.hpp"

#include <cmath>
#include <limits>

#include "dropfront/circuit/safe_step.hpp"

namespace dropfront::circuit {

namespace {
/// Guards closer to their threshold than this are on it: far below any voltage that matters, far above
/// rounding of the node solution in a floating bridge.
constexpr double kOnThreshold_V = 1e-9;
}  // namespace

void TonePhase::set(const Waveform& mains, double time_s) {
  const auto& tones = mains.tones();
  cosine.resize(tones.size());
  sine.resize(tones.size());
  const double angle = mains.omega() * time_s;
  for (std::size_t h = 0; h < tones.size(); ++h) {
    cosine[h] = std::cos(tones[h].order * angle);
    sine[h] = std::sin(tones[h].order * angle);
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

Segment begin_segment(const ConductionMode& mode, const Waveform& mains, double start_s, const StateVector& x,
                      TonePhase& phase) {
  Segment segment;
  segment.mode = &mode;
  segment.start_s = start_s;
  phase.set(mains, start_s);
  const auto count = mains.tones().size();
  for (int i = 0; i < mode.states; ++i) {
    double z = 0;
    for (int k = 0; k < mode.states; ++k) z += mode.to_modal[i][k] * x[k];
    for (std::size_t h = 0; h < count; ++h) {
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

StateVector state_at(const Segment& segment, const Waveform& mains, double s, TonePhase& phase) {
  const auto& mode = *segment.mode;
  phase.set(mains, segment.start_s + s);
  const ModalMoment moment = modal_moment(segment, s);
  const auto count = mains.tones().size();
  StateVector x{};
  for (int i = 0; i < mode.states; ++i) {
    double z = moment.value[i];
    for (std::size_t h = 0; h < count; ++h) {
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
  for (std::size_t h = 0; h < phase.cosine.size(); ++h) {
    v += forced.cosine[h] * phase.cosine[h] + forced.sine[h] * phase.sine[h];
  }
  return v;
}

double slope_at(const ModalRow& row, const ForcedRow& forced, const ModalMoment& moment,
                const TonePhase& phase, const Waveform& mains) {
  double v = 0;
  for (int i = 0; i < kMaxStates; ++i) v += row.z[i] * moment.slope[i];
  for (std::size_t h = 0; h < phase.cosine.size(); ++h) {
    const double w = mains.tones()[h].order * mains.omega();
    v += w * (forced.sine[h] * phase.cosine[h] - forced.cosine[h] * phase.sine[h]);
  }
  return v;
}

double curvature_at(const Segment& segment, const ModalRow& row, const ForcedRow& forced,
                    const ModalMoment& moment, const TonePhase& phase, const Waveform& mains) {
  double v = 0;
  for (int i = 0; i < segment.mode->states; ++i) v += row.z[i] * segment.mode->lambda[i] * moment.slope[i];
  for (std::size_t h = 0; h < phase.cosine.size(); ++h) {
    const double w = mains.tones()[h].order * mains.omega();
    v -= w * w * (forced.cosine[h] * phase.cosine[h] + forced.sine[h] * phase.sine[h]);
  }
  return v;
}

std::optional<Crossing> first_crossing(const Segment& segment, const Waveform& mains, double limit_s,
                                       double resolution_s, TonePhase& phase) {
  const auto& mode = *segment.mode;
  const int bits = static_cast<int>(mode.guard.size());
  double s = 0;
  for (int evaluation = 0; evaluation < 20000; ++evaluation) {
    phase.set(mains, segment.start_s + s);
    const ModalMoment moment = modal_moment(segment, s);
    double step = std::numeric_limits<double>::infinity();
    int nearest = -1;
    bool falling = false;
    for (int bit = 0; bit < bits; ++bit) {
      const double side = ((mode.mask >> bit) & 1u) ? 1 : -1;
      double h = side * value_at(mode.guard[bit], mode.guard_forced[bit], moment, phase);
      const double slope = side * slope_at(mode.guard[bit], mode.guard_forced[bit], moment, phase, mains);
      if (h < -kOnThreshold_V || (h <= kOnThreshold_V && s == 0 && slope < 0) || (h <= 0 && s > 0)) {
        return Crossing{s, bit};
      }
      if (h < 0) h = 0;
      double bound = mode.guard_forced[bit].curvature;
      for (int i = 0; i < mode.states; ++i) {
        bound += std::abs(mode.guard[bit].z[i] * mode.lambda[i] * moment.slope[i]);
      }
      const double safe = safe_step(h, slope, bound);
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
    if (s >= limit_s) return std::nullopt;
  }
  return Crossing{s, -1};  // never reached in practice: the walker reports it
}

}  // namespace dropfront::circuit
