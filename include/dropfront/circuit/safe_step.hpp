#pragma once
#include <algorithm>
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

/// The same from the third order, for a function that is >= 0, rising and bending upwards: it stays above
/// value + slope·s + turn·s^2/2 - jerk·s^3/6, which has one positive root; every single term's balance
/// against the last lies below it. 0 where a sign does not fit. A guard that has just changed side at a flat
/// point (current reversal) leaves it in one step instead of doubling away from nothing.
inline double safe_step_rising(double value, double slope, double turn, double jerk) {
  if (!(slope >= 0) || !(turn >= 0) || !(jerk > 0)) return 0;
  return std::max(
      {3 * turn / jerk, std::sqrt(6 * slope / jerk), value > 0 ? std::cbrt(6 * value / jerk) : 0.0});
}

}  // namespace dropfront::circuit
