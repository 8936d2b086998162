#pragma once
#include <limits>
#include <optional>
#include <vector>

#include "dropfront/circuit/waveform.hpp"

namespace dropfront::circuit {

/// Piecewise-linear one-way curve: open below threshold_V, slope_ohm above.
struct Curve {
  double threshold_V = 0;
  double slope_ohm = 1;
};

/// Zener in breakdown: the main branch and, where the data give the knee, an inner parallel branch.
struct ClampCurve {
  Curve main;
  std::optional<Curve> knee;
};

/// One design's values at one set of conditions: everything an arrangement needs to build its network.
struct ElementValues {
  Waveform mains;
  double source_ohm = 0;        ///< behind the mains, 0: none (a surge generator's 2 ohm)
  std::vector<Curve> varistor;  ///< parallel branches, alike in both directions; empty: none
  int varistor_ways = 0;        ///< 0 both directions; 1, -1: only the way a voltage of that sign drives
  bool varistor_before = true;  ///< on the line side of the series resistor, else behind it
  double series_resistor_ohm = 0;
  double dropper_F = 0;
  double dropper_esr_ohm = 0;
  double discharge_ohm = std::numeric_limits<double>::infinity();  ///< whole chain; infinite: none
  Curve rectifier;                                                 ///< also the zener's forward direction
  ClampCurve clamp;
  Curve thyristor;  ///< while latched (shunt arrangements only)
  double thyristor_holding_A = 0;
  double thyristor_trigger_A = 0;  ///< gate current at which it fires
  double gate_resistor_ohm = 0;
  double reservoir_F = 0;
  double reservoir_esr_ohm = 0;
  double ceramic_F = 0;       ///< beside the reservoir; 0: none
  double rail_power_W = 0;    ///< constant-power load beside it, between the two voltages below; 0: none
  double power_from_V = 0;    ///< below, its current falls in proportion to the voltage
  double power_to_V = 0;      ///< above, its current stays
  int power_chords = 12;      ///< between them
  double rail_current_A = 0;  ///< constant-current load on the rail, leakage and Iq included
  double load_cutoff_V = 0;   ///< the load falls off linearly below this rail voltage
};

}  // namespace dropfront::circuit
