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
  double start_V = 0;  ///< analytic guess of its voltage at mains phase zero in the steady state
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
/// Constant current a to b for v >= cutoff_V; current_A·v/cutoff_V below (continuous and passive).
struct LoadElement {
  Node a, b;
  double current_A;
  double cutoff_V;
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
  Node rail = 0;  ///< rail voltage is v(rail) - v(rail_return), reservoir ESR included
  Node rail_return = 0;
  /// One sign a capacitor, set where shifting by half a period and applying the signs gives the same network
  /// (bridges, odd harmonics only): the solver then needs half a period. Empty: no such symmetry.
  std::vector<int> half_period_signs;
  /// With the symmetry: the branch that half a period later does what this one does now.
  std::vector<int> half_period_partner;

  Node add_node() { return node_count++; }
};

}  // namespace dropfront::circuit
