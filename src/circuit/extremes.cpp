#include "dropfront/circuit/extremes.hpp"

#include <algorithm>
#include <cmath>
#include <numbers>

#include "dropfront/circuit/safe_step.hpp"

namespace dropfront::circuit {

void Extremes::include(double value, double time_s) {
  if (empty || value < low) {
    low = value;
    low_at_s = time_s;
  }
  if (empty || value > high) {
    high = value;
    high_at_s = time_s;
  }
  empty = false;
}

void include_extremes(const Segment& segment, const ModalRow& row, const ForcedRow& forced, TonePhase& phase,
                      Extremes& extremes) {
  const auto& mode = *segment.mode;
  // An error of this much in the place of a flat point moves the value by its square: nothing.
  const double resolution_s = 1e-7 * 2 * std::numbers::pi / phase.omega[0];
  double granted_s = INFINITY;  // in which a growing mode gains a factor e
  for (int i = 0; mode.grows && i < mode.states; ++i) {
    if (mode.lambda[i] > 0) granted_s = std::min(granted_s, 1 / mode.lambda[i]);
  }
  double s = 0;
  double side = 0;  // sign of the slope being followed
  for (int evaluation = 0; evaluation < 5000; ++evaluation) {
    phase.set(segment.start_s + s);
    const ModalMoment moment = modal_moment(segment, s);
    const double slope = slope_at(row, forced, moment, phase);
    const double turn = curvature_at(segment, row, forced, moment, phase);
    if (s == 0) extremes.include(value_at(row, forced, moment, phase), segment.start_s);
    if (side == 0 || side * slope < 0) {
      if (s > 0) extremes.include(value_at(row, forced, moment, phase), segment.start_s + s);
      side = slope < 0 ? -1 : 1;
    }
    double bound = forced.jerk;
    for (int i = 0; i < mode.modes; ++i) {
      const double ahead = mode.lambda[i] > 0 ? std::numbers::e : 1;
      bound += std::abs(row.z[i] * mode.lambda[i] * mode.lambda[i] * moment.slope[i]) * ahead;
    }
    double step = std::min(granted_s, safe_step(std::abs(slope), side * turn, bound));
    if (step < resolution_s) {
      extremes.include(value_at(row, forced, moment, phase), segment.start_s + s);
      step = resolution_s;
    }
    s += step;
    if (!(s < segment.length_s)) break;
  }
  phase.set(segment.start_s + segment.length_s);
  const ModalMoment last = modal_moment(segment, segment.length_s);
  extremes.include(value_at(row, forced, last, phase), segment.start_s + segment.length_s);
}

}  // namespace dropfront::circuit
