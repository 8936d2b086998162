#pragma once
#include <vector>

#include "dropfront/circuit/transient.hpp"

namespace dropfront::scoring {

/// What a run left in the series resistor, all its parts together.
struct SeriesResistorFigures {
  double energy_J = 0;
  double peak_A = 0;
};
SeriesResistorFigures series_resistor_figures(const circuit::Network& network, const circuit::Transient& run);

/// Greatest peak current in any branch of an owner.
double greatest_branch_A(const circuit::Network& network, const circuit::Transient& run,
                         circuit::Owner owner);

/// Greatest magnitude of the voltage across the dropper's film.
double greatest_dropper_V(const circuit::Network& network, const circuit::Transient& run);

/// Integral of the squared current through all resistors of an owner in series, in A²s: energy over ohms.
double squared_current_A2s(const circuit::Network& network, const circuit::Transient& run,
                           circuit::Owner owner);

/// A state with every capacitor of the rail (reservoir, ceramic) at `rail_V`, the rest as in `state`.
circuit::StateVector with_rail_at(const circuit::Network& network, circuit::StateVector state, double rail_V);

}  // namespace dropfront::scoring
