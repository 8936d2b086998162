#pragma once
#include "dropfront/parts/part_info.hpp"

namespace dropfront::parts {

/// Aluminium electrolytic reservoir.
struct Reservoir {
  PartInfo info;
  double capacitance_F = 0;
  double tolerance = 0;
  double rated_voltage_V = 0;
  Rating surge_voltage_V;
  double esr_ohm = 0;          ///< at 20 degC; default tan(delta) by voltage / (2 pi 120 Hz C)
  double esr_cold_ohm = 0;     ///< at -25 degC; default 3x (<= 16 V) or 2x
  Rating ripple_current_Arms;  ///< at ripple_frequency_Hz and life_temperature
  double ripple_frequency_Hz = 120;
  double leakage_A = 0;  ///< default max(0.01 C V, 3 uA)
  Rating life_h;
  Rating life_temperature_degC;
  double end_of_life_loss = 0.20;
  double end_of_life_esr = 2;  ///< multiple of the data ESR
};

}  // namespace dropfront::parts
