#pragma once

namespace dropfront::scoring {

/// Which steady corner.
enum class BoxCorner { standby, rich };

/// What one corner of a box says about the currents behind the dropper.
struct CornerCharge {
  double each_way_A = 0;   ///< no member's mean current of one direction is less; 0: nothing shown
  double both_A = 0;       ///< what of it meets the rail: both directions of a bridge, else the forward one
  double node_most_V = 0;  ///< no voltage behind the dropper is greater, forward
  double reverse_most_V = 0;  ///< nor reverse
  double drop_most_V = 0;     ///< greatest threshold of a rectifier in this corner
  double drop_least_V = 0;    ///< and least
  double clamp_V = 0;         ///< least threshold of the clamp
};

}  // namespace dropfront::scoring
