#pragma once
#include <string>
#include <vector>

#include "dropfront/circuit/pulse.hpp"
#include "dropfront/circuit/transient.hpp"
#include "dropfront/scoring/point_solver.hpp"

namespace dropfront::scoring {

/// One plug-in: closing on the crest of the high mains with the dropper left at the opposite crest and the
/// reservoir full.
struct PlugIn {
  circuit::Transient run;
  double ambient_degC = 25;
  std::string ends;  ///< of the series resistor
  circuit::ElementValues values;
  double local_degC = 25;
  double clamp_junction_degC = 25;  ///< before the pulse
};

/// Plug-in figures, each the worst of both ambients and both ends of the series resistor. C max, Rb min,
/// reservoir C min, ESR max (aged, cold at the cold ambient), least drops.
struct PlugInAnswer {
  bool usable = false;
  std::string reason;
  double crest_V = 0;                           ///< of the mains it closes on
  PlugIn rail;                                  ///< greatest rail: high clamp curve
  double rail_max_V = 0;                        ///< ESR included
  PlugIn clamp;                                 ///< greatest clamp pulse: low-slope curve
  std::vector<circuit::PowerStep> clamp_trace;  ///< power in one clamp part, of that run
  double clamp_pulse = 0;                       ///< greatest diffusion value of that trace, in W·s^½
  double clamp_junction_degC = 25;              ///< of the clamp before that pulse: its unloaded steady state
  PlugIn resistor_low;                          ///< series resistor at its low end
  PlugIn resistor_high;                         ///< and at its high end
  double resistor_energy_low_J = 0;             ///< in the series resistor
  double resistor_energy_high_J = 0;
  double rectifier_peak_A = 0;  ///< greatest in any one rectifier
  double thyristor_peak_A = 0;  ///< 0 where there is none
  double input_peak_A = 0;      ///< greatest series-resistor current
};

/// Runs the plug-ins. `recipe`: rich values, ends of the series resistor left to this; `rest`: the unloaded
/// steady states it starts from, one an ambient. Adds to `transients` what it ran.
PlugInAnswer run_plug_ins(const PointSolver& points, const Recipe& recipe,
                          const std::vector<const OperatingPoint*>& rest, int& transients);

}  // namespace dropfront::scoring
