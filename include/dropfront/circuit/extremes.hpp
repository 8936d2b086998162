#pragma once
#include <vector>

#include "dropfront/circuit/segment.hpp"

namespace dropfront::circuit {

struct Extremes {
  double low = 0, high = 0;
  double low_at_s = 0, high_at_s = 0;
  void include(double value, double time_s);
  bool empty = true;
};

/// Least and greatest value of a row along one segment, its ends included. Stationary points are found like
/// crossings, by stepping to the root of a lower bound of |slope|, so a hump between the ends is never
/// missed.
void include_extremes(const Segment& segment, const ModalRow& row, const ForcedRow& forced, TonePhase& phase,
                      Extremes& extremes);

}  // namespace dropfront::circuit
