#include "dropfront/scoring/run_figures.hpp"

#include <algorithm>

namespace dropfront::scoring {

using circuit::Owner;

SeriesResistorFigures series_resistor_figures(const circuit::Network& network,
                                              const circuit::Transient& run) {
  SeriesResistorFigures sum;
  for (std::size_t i = 0; i < network.resistors.size(); ++i) {
    if (network.resistors[i].owner != Owner::series_resistor) continue;
    if (i < run.resistor_energy_J.size()) sum.energy_J += run.resistor_energy_J[i];
    if (i < run.resistor_peak_A.size()) sum.peak_A = std::max(sum.peak_A, run.resistor_peak_A[i]);
  }
  return sum;
}

double greatest_branch_A(const circuit::Network& network, const circuit::Transient& run, Owner owner) {
  double greatest = 0;
  for (std::size_t i = 0; i < network.branches.size() && i < run.branch_peak_A.size(); ++i) {
    if (network.branches[i].owner == owner) greatest = std::max(greatest, run.branch_peak_A[i]);
  }
  return greatest;
}

double greatest_dropper_V(const circuit::Network& network, const circuit::Transient& run) {
  double greatest = 0;
  for (std::size_t i = 0; i < network.capacitors.size() && i < run.capacitor_peak_V.size(); ++i) {
    if (network.capacitors[i].owner == Owner::dropper) {
      greatest = std::max(greatest, run.capacitor_peak_V[i]);
    }
  }
  return greatest;
}

double squared_current_A2s(const circuit::Network& network, const circuit::Transient& run, Owner owner) {
  double energy_J = 0, resistance_ohm = 0;
  for (std::size_t i = 0; i < network.resistors.size() && i < run.resistor_energy_J.size(); ++i) {
    if (network.resistors[i].owner != owner) continue;
    energy_J += run.resistor_energy_J[i];
    resistance_ohm += network.resistors[i].resistance_ohm;
  }
  return resistance_ohm > 0 ? energy_J / resistance_ohm : 0;
}

circuit::StateVector with_rail_at(const circuit::Network& network, circuit::StateVector state,
                                  double rail_V) {
  for (std::size_t i = 0; i < network.capacitors.size() && i < state.size(); ++i) {
    const auto owner = network.capacitors[i].owner;
    if (owner == Owner::reservoir || owner == Owner::ceramic) state[i] = rail_V;
  }
  return state;
}

}  // namespace dropfront::scoring
