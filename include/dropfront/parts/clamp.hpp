#pragma once
#include "dropfront/parts/part_info.hpp"

namespace dropfront::parts {

/// Zener diode. Voltages at test_current_A and 25 degC.
struct Clamp {
  PartInfo info;
  double voltage_V = 0;
  double tolerance = 0;       ///< fraction; the greater side where voltage_min and voltage_max are given
  double voltage_min_V = 0;   ///< voltage_V·(1 - tolerance), or given
  double voltage_max_V = 0;   ///< voltage_V·(1 + tolerance), or given
  double test_current_A = 0;  ///< Izt
  double slope_min_ohm = 0;   ///< default slope_resistance_ohm / 10
  double slope_resistance_ohm = 0;  ///< data maximum at Izt (Zzt)
  Rating knee_current_A;            ///< Izk
  Rating knee_resistance_ohm;       ///< Zzk
  Rating rated_power_W;
  Rating pulse_power_W;  ///< non-repetitive, for pulse_time_s
  Rating pulse_time_s;
  double temperature_coefficient_per_K = 0;  ///< fraction of voltage per kelvin; default by voltage
  /// Junction to ambient; default (max_junction - 50 degC)/rated_power. 0: neither it nor rated_power is
  /// given, so that the junction's temperature is not known.
  double thermal_resistance_K_per_W = 0;
  double max_junction_degC = 150;
};

}  // namespace dropfront::parts
