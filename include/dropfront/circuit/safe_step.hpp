#pragma once
#include <cmath>
#include <limits>

namespace dropfront::circuit {

/// Longest time for which a function with value >= 0, the given slope and |second derivative| <= bound must
/// stay >= 0: the positive root of value + slope·s - bound·s^2/2. Infinite where it can never fall.
inline double safe_step(double value, double slope, double bound) {
  if (bound <= 0) return slope < 0 ? value / -slope : std::numeric_limits<double>::infinity();
  const double root = std::sqrt(slope * slope + 2 * bound * value);
  // Each form adds like signs only.
  return slope < 0 ? 2 * value / (root - slope) : (root + slope) / bound;
}

}  // namespace dropfront::circuit
