#pragma once
#include <array>
#include <vector>

#include "dropfront/circuit/walker.hpp"

namespace dropfront::circuit {

/// Integrals over a walk, in closed form: every current and voltage is a sum of exponentials, sinusoids, a
/// constant and (slow modes) a parabola, so every product integral is elementary.
struct WalkTotals {
  double duration_s = 0;
  double rail_Vs = 0;                 ///< integral of the rail voltage
  double input_J = 0;                 ///< integral of v·i drawn from the line
  double input_A2s = 0;               ///< integral of i^2
  std::vector<double> element_J;      ///< dissipated (loads: consumed), topology order
  std::vector<double> element_As;     ///< integral of the current through each element
  std::vector<double> capacitor_A2s;  ///< integral of i^2 in each capacitor
  double dissipated_J() const;
};

/// Sums over `segments`. Slow modes are taken to second order in lambda·s < 1e-4.
WalkTotals integrate(const Walker& walker, const std::vector<Segment>& segments);

/// Energy stored in the capacitors.
double stored_J(const Network& network, const StateVector& x);

}  // namespace dropfront::circuit
