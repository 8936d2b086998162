#pragma once
#include <optional>
#include <vector>

#include "dropfront/circuit/conduction_mode.hpp"

namespace dropfront::circuit {

/// A stretch of time in one conduction mode, in closed form. With s the time since its start:
/// z_i(s) = alpha_i·e^(lambda_i·s) + drift_i·psi_i(s) + forced_i(t), psi(s) = (e^(lambda·s) - 1)/lambda.
/// `drift` is the mode's constant where the mode is slow, else 0 (then it is inside alpha and the forced
/// part).
struct Segment {
  const ConductionMode* mode = nullptr;
  double start_s = 0;
  double length_s = 0;
  StateVector alpha{};
  StateVector drift{};
};

/// cos and sin of every tone's angle at one time. One sine-cosine a moment; the harmonics follow by turning.
class TonePhase {
 public:
  explicit TonePhase(const Waveform& mains);
  void set(double time_s);
  int count = 0;
  std::array<double, kMostTones> omega, cosine, sine;  ///< only the first `count` are set

 private:
  double fundamental_ = 0;
  std::array<int, kMostTones> order_;
};

/// The transient part of every mode at s: value, and what its derivatives are made of.
struct ModalMoment {
  StateVector value{};  ///< alpha·e^(lambda s) + drift·psi
  StateVector slope{};  ///< first derivative
};
ModalMoment modal_moment(const Segment& segment, double s);

/// Begins a segment at time `start_s` from capacitor voltages `x`.
Segment begin_segment(const ConductionMode& mode, double start_s, const StateVector& x, TonePhase& phase);

/// Capacitor voltages at s.
StateVector state_at(const Segment& segment, double s, TonePhase& phase);

double value_at(const ModalRow& row, const ForcedRow& forced, const ModalMoment& moment,
                const TonePhase& phase);
double slope_at(const ModalRow& row, const ForcedRow& forced, const ModalMoment& moment,
                const TonePhase& phase);
double curvature_at(const Segment& segment, const ModalRow& row, const ForcedRow& forced,
                    const ModalMoment& moment, const TonePhase& phase);

/// The first moment at which a branch or load changes side.
struct Crossing {
  double s = 0;  ///< since the segment's start
  int bit = 0;   ///< of the mask
};

/// First crossing in (0, limit], found by stepping to the root of a lower bound: from a value h, slope h' and
/// a bound M on |h''| ahead, h stays positive at least until h + h'·s - M·s^2/2 = 0. No crossing can be
/// jumped over; near a simple root the steps converge quadratically. `resolution_s` ends the search.
std::optional<Crossing> first_crossing(const Segment& segment, double limit_s, double resolution_s,
                                       TonePhase& phase);

}  // namespace dropfront::circuit
