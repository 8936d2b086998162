#pragma once
#include "dropfront/parts/part_info.hpp"

namespace dropfront::parts {

struct Varistor {
  PartInfo info;
  double continuous_voltage_Vrms = 0;
  Rating clamp_voltage_V;  ///< at clamp_current_A
  Rating clamp_current_A;
  Rating energy_J;
  Rating surge_current_A;  ///< 8/20 us
};

struct Fuse {
  PartInfo info;
  double rated_current_A = 0;
  Rating melting_i2t_A2s;
  Rating rated_voltage_Vrms;
};

struct Thyristor {
  PartInfo info;
  double on_voltage_V = 1;
  double slope_resistance_ohm = 0.1;
  Rating trigger_current_A;
  Rating holding_current_A;
  Rating latching_current_A;
  Rating turn_off_time_s;
  Rating surge_current_A;
};

struct Ceramic {
  PartInfo info;
  double capacitance_F = 0;
  double tolerance = 0;
  Rating rated_voltage_V;
};

}  // namespace dropfront::parts
