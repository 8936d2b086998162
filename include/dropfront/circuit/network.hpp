#pragma once
#include <vector>

#include "dropfront/circuit/waveform.hpp"

namespace dropfront::circuit {

/// Node number; 0 is the neutral.
using Node = int;

/// The slot an element belongs to: losses, peaks and currents are reported by it.
enum class Owner {
  line,
  series_resistor,
  dropper,
  discharge,
  clamp,
  rectifier,
  reservoir,
  load,
  leak,
  thyristor,
  gate_resistor,
  ceramic,
  varistor,
  count
};

struct ResistorElement {
  Node a, b;
  double resistance_ohm;
  Owner owner;
};
/// A state: voltage v_a - v_b.
struct CapacitorElement {
  Node a, b;
  double capacitance_F;
  Owner owner;
  double start_V = 0;  ///< analytic guess of its steady voltage at period_start_s
};
/// Piecewise-linear one-way branch: no current below threshold_V, (v - threshold_V)/slope_ohm above, a to b.
/// A second leg (a2 to b2) is in series with the first although it lies elsewhere: the same current flows in
/// both, v is the sum of both voltages, threshold and slope are those of both legs together. The two diodes
/// of a bridge that conduct together are one such branch.
struct BranchElement {
  Node a, b;
  double threshold_V;
  double slope_ohm;
  Owner owner;
  Node a2 = 0, b2 = 0;  ///< both 0: no second leg
  bool paired() const { return a2 != b2; }
};
/// current_A + slope_S·(v - cutoff_V), a to b, for v >= cutoff_V; current_A·v/cutoff_V below (continuous, and
/// passive where slope_S >= 0). A slope below zero is the first chord of a constant-power load.
struct LoadElement {
  Node a, b;
  double current_A;
  double cutoff_V;
  double slope_S = 0;
};
/// Latching switch, a (anode) to b: open until it fires, then threshold on_voltage_V and slope_ohm until its
/// current falls below holding_A. It fires when `gate_resistor` (index into resistors) carries trigger_A
/// while `feed_branch` (index into branches: the diode whose current it takes over) carries holding_A.
struct ThyristorElement {
  Node a, b;
  double on_voltage_V;
  double slope_ohm;
  double holding_A;
  int gate_resistor;
  double trigger_A;
  int feed_branch;
};
/// The mains between `a` and node 0.
struct SourceElement {
  Node a;
  Waveform waveform;
};

/// One supply at one set of conditions. Built by an arrangement; used by the exact solver, the simulator deck
/// and the drawing. States are the capacitors in the order given (no loop of capacitors and source allowed).
struct Network {
  int node_count = 1;
  SourceElement source{};
  std::vector<ResistorElement> resistors;
  std::vector<CapacitorElement> capacitors;
  std::vector<BranchElement> branches;
  std::vector<LoadElement> loads;
  std::vector<ThyristorElement> thyristors;
  Node rail = 0;  ///< rail voltage is v(rail) - v(rail_return), reservoir ESR included
  Node rail_return = 0;
  /// Mains time at which a period is taken to begin: a moment when no thyristor is latched.
  double period_start_s = 0;
  /// One sign a capacitor, set where shifting by half a period and applying the signs gives the same network
  /// (bridges, odd harmonics only): the solver then needs half a period. Empty: no such symmetry.
  std::vector<int> half_period_signs;
  /// With the symmetry: the branch that half a period later does what this one does now.
  std::vector<int> half_period_partner;

  Node add_node() { return node_count++; }
};

}  // namespace dropfront::circuit
