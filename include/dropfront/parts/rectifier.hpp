#pragma once
#include "dropfront/parts/part_info.hpp"

namespace dropfront::parts {

/// One rectifier diode as threshold and slope, at 25 degC.
struct Rectifier {
  PartInfo info;
  double threshold_voltage_V = 0.67;
  double slope_resistance_ohm = 0.67;
  Rating reverse_voltage_V;
  Rating surge_current_A;  ///< 8.3 ms half sine
};

}  // namespace dropfront::parts
