#pragma once
#include "dropfront/circuit/network.hpp"

namespace dropfront::circuit {

/// A shorted part is this in parallel with it; an opened capacitor is left with this capacitance.
inline constexpr double kShort_ohm = 10e-3;
inline constexpr double kOpened_F = 1e-12;

enum class FaultKind { open, shorted };

/// How many separate elements of `owner` a fault can befall. Elements between the same nodes in the same
/// direction are one part (a zener and its knee); build the network with single diodes first.
int fault_places(const Network& network, Owner owner);

/// The network with one part of `owner` open or shorted (`place` counts as in fault_places). The half-period
/// symmetry is lost.
Network with_fault(Network network, Owner owner, FaultKind kind, int place);

}  // namespace dropfront::circuit
