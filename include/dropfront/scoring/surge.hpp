#pragma once
#include <string>
#include <vector>

#include "dropfront/scoring/requirement.hpp"
#include "dropfront/scoring/surge_case.hpp"

namespace dropfront::scoring {

/// What the combination wave of IEC 61000-4-5, line to line, does to a running supply: the unloaded high
/// line, surge at 0, 90, 180 and 270 degrees, both polarities; a bridge on odd harmonics does half a period
/// later what it does now, mirrored, and runs half of them. Each figure is the worst of its runs, with that
/// run.
///
/// Rb at its low end (its current is a thousandth of the surge's), C at its greatest (least for the dropper's
/// own voltage and for the varistor), reservoir full, C min, ESR max, least drops. The clamp, the rail and
/// the dropper are worst at the low end of the series resistor; its own energy is sought at both ends and
/// where it peaks between. Places are found at one ambient, the worst repeated at the other.
struct SurgeAnswer {
  bool usable = false;
  std::string reason;
  SurgeRun rail;                    ///< greatest rail: high clamp curve
  SurgeRun clamp;                   ///< greatest use of the clamp's pulse rating: low-slope curve
  std::vector<SurgeRun> resistors;  ///< series resistor at its low end, between if it peaks there, high end
  SurgeRun dropper;                 ///< greatest voltage on the dropper and its chain
  SurgeRun varistor;                ///< greatest varistor energy; nothing in it without a varistor
  SurgeRun varistor_peak;           ///< greatest varistor current
  SurgeRun line;                    ///< greatest integral of the squared line current
  SurgeRun rectifier;               ///< greatest rectifier current
  SurgeRun thyristor;               ///< greatest thyristor current
};

/// Series resistance at which its own share of a surge's energy is greatest. A tail of time constant T into a
/// capacitor C through r and R leaves R/(R + r) of ½·C·V²·T/(T + (R + r)·C) in R, greatest at
///   R = √(r² + r·T/C)
/// (the front, two hundred times shorter than the tail, is taken as a step). r > 0, C > 0.
double greatest_energy_ohm(double other_ohm, double capacitance_F);

/// Runs the surges. `rich`: rich values; `rest`: the unloaded steady states, hot first. Adds to `transients`
/// what it ran.
SurgeAnswer run_surges(const PointSolver& points, const Recipe& rich,
                       const std::vector<const OperatingPoint*>& rest, const Surge& surge, int& transients);

}  // namespace dropfront::scoring
