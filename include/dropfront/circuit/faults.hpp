#pragma once
#include <vector>

#include "dropfront/circuit/network.hpp"

namespace dropfront::circuit {

/// A shorted part is this in parallel with it; an opened capacitor is left with this capacitance.
inline constexpr double kShort_ohm = 10e-3;
inline constexpr double kOpened_F = 1e-12;

enum class FaultKind { open, shorted };

/// One part of a network that may fail, by the nodes it lies between (anode or positive side first).
struct FaultPlace {
  Owner owner;
  Node a, b;
};

/// Every part a fault can befall, in network order: capacitors, resistors, diodes, zeners, thyristors,
/// varistors. A zener, its knee and its own forward direction are one part; two zeners back to back are two
/// places, one a direction. The discharge chain is one resistor here. Each diode of a bridge is a place.
std::vector<FaultPlace> fault_places(const Network& network);

/// The network with that part open or shorted. The half-period symmetry is lost. An open diode of a bridge
/// takes its partner out of use (they share their current); with a shorted one the other three stand singly.
/// Of two zeners back to back an open one opens both directions; a shorted one leaves the other's breakdown
/// in its direction and the other's forward voltage in the opposite one (its knee, if any, is left out).
Network with_fault(Network network, const FaultPlace& place, FaultKind kind);

}  // namespace dropfront::circuit
