#pragma once
#include "dropfront/circuit/element_values.hpp"
#include "dropfront/circuit/network.hpp"

namespace dropfront::circuit {

/// Resistance of the documented leak that fixes the potential of a bridge's output while all diodes are off.
inline constexpr double kBridgeLeak_ohm = 1e9;

/// Line, varistor and series resistor. Returns the node behind the resistor.
Node add_line(Network& network, const ElementValues& values);

/// The same, then the dropper with its loss and discharge chain. Returns the node behind the dropper.
Node add_mains_side(Network& network, const ElementValues& values);

/// Zener breakdown from cathode to anode, knee branch included.
void add_clamp(Network& network, Node cathode, Node anode, const ClampCurve& clamp);

/// One rectifier diode.
void add_rectifier(Network& network, Node anode, Node cathode, const Curve& curve);

/// Four diodes between the a.c. nodes `line_side` and the neutral, the leak, and the half-period symmetry.
/// Returns the positive and negative rail nodes.
struct BridgeNodes {
  Node positive, negative;
};
BridgeNodes add_bridge(Network& network, Node line_side, const ElementValues& values);

/// Reservoir with its ESR and the load, and names them the rail.
void add_rail(Network& network, Node positive, Node negative, const ElementValues& values);

/// Off-state leakage of a shunt behind a bridge, a few microamperes (from memory). It also fixes the
/// potential of the bridge's output while nothing conducts: much less would let diodes conduct picoamperes,
/// where a change of state drowns in rounding.
inline constexpr double kShuntLeak_ohm = 2e6;

/// Shunt thyristor from `anode` to `cathode`, fired from the rail (positive to negative) through gate
/// resistor and trigger zener. `feed_branch` is the blocking diode, already in the network.
inline constexpr double kGateVoltage_V = 0.7;  ///< gate to cathode as it fires (from memory)
void add_shunt(Network& network, Node anode, Node cathode, Node positive, Node negative, int feed_branch,
               const ElementValues& values);

/// Rail voltage at which the shunt fires.
double firing_rail_V(const ElementValues& values);

/// Analytic cold start at mains phase zero (v = 0, rising, dropper current at its crest): the rail at its
/// clamp, the dropper carrying what is left. `drop_V` is what stands between dropper node and rail.
void set_start(Network& network, const ElementValues& values, double rail_V, double drop_V);

/// Zener in breakdown in series with a forward diode, as one equivalent curve (exact for these curves).
ClampCurve in_series(const ClampCurve& clamp, const Curve& forward);

}  // namespace dropfront::circuit
