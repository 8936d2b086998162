#pragma once
#include <string>
#include <vector>

#include "dropfront/parts/part_info.hpp"

namespace dropfront::parts {

enum class Construction { film, wirewound };

/// Feeds the slots series_resistor, discharge and gate_resistor.
struct Resistor {
  PartInfo info;
  double resistance_ohm = 0;
  double tolerance = 0;
  Rating rated_power_W;       ///< at 70 degC
  Rating rated_voltage_Vrms;  ///< limiting element voltage (r.m.s. or d.c.)
  Rating overload_voltage_V;
  Construction construction = Construction::film;
  Rating pulse_energy_J;  ///< wirewound: joules, however short; film: energy of a 1 ms pulse
  bool fusible = false;
  Rating opens_at;                    ///< multiple of rated power at which it opens safely
  Rating thermal_resistance_K_per_W;  ///< default (155 - 70)/rated_power
  std::vector<std::string> slots;     ///< empty: all
};

}  // namespace dropfront::parts
