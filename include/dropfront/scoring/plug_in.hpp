#pragma once
#include <string>

#include "dropfront/circuit/transient.hpp"

namespace dropfront::scoring {

/// One plug-in: closing on the crest of the high mains with the dropper left at the opposite crest.
struct PlugIn {
  circuit::Transient run;
  double ambient_degC = 25;
  std::string ends;  ///< of the series resistor
  double crest_V = 0;
};

/// Plug-in figures, each the worst of both ambients and both ends of the series resistor. C max, Rb min.
struct PlugInAnswer {
  bool usable = false;
  std::string reason;
  PlugIn rail;  ///< greatest rail: high clamp curve, full reservoir, C min, ESR max aged (cold at cold)
  double rail_max_V = 0;   ///< ESR included, no drop in the diodes behind a clamp ahead
  PlugIn clamp;            ///< greatest clamp pulse: low-slope curve
  double clamp_pulse = 0;  ///< max over t of 1/2·integral of P(tau)·(t - tau)^-1/2, one clamp part, W·s^1/2
  double clamp_junction_degC = 25;   ///< of the clamp before that pulse
  double clamp_pulse_shortest = 0;   ///< seconds below which the data do not reach: used as floor (0: none)
  PlugIn resistor_low;               ///< series resistor at its low end
  PlugIn resistor_high;              ///< and at its high end
  double resistor_energy_low_J = 0;  ///< in the series resistor
  double resistor_energy_high_J = 0;
  double rectifier_peak_A = 0;  ///< greatest in any one rectifier
  double input_peak_A = 0;      ///< greatest series-resistor current
};

}  // namespace dropfront::scoring
