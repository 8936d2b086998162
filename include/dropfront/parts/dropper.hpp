#pragma once
#include <string>

#include "dropfront/parts/part_info.hpp"

namespace dropfront::parts {

/// Series film capacitor. SI units; tolerances and losses are fractions.
struct Dropper {
  PartInfo info;
  double capacitance_F = 0;
  double tolerance = 0;
  double rated_voltage_Vrms = 0;
  std::string class_name;     ///< "X1", "X2", "X3" or empty: not given
  bool series_rated = false;  ///< maker states use in series with the mains
  Rating slew_V_per_s;
  Rating impulse_V;
  double loss_tangent = 0.001;
  double end_of_life_loss = 0.30;  ///< default 0.10 if series_rated, else 0.30
  double temperature_coefficient_per_K = -200e-6;
};

}  // namespace dropfront::parts
