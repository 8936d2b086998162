#include "dropfront/circuit/varistor.hpp"

#include <cmath>
#include <iterator>

namespace dropfront::circuit {

double VaristorLaw::exponent() const { return std::log(clamp_V / one_mA_V) / std::log(clamp_A / 1e-3); }

double VaristorLaw::voltage_V(double current_A) const {
  return clamp_V * std::pow(current_A / clamp_A, exponent());
}

std::vector<Curve> varistor_branches(const VaristorLaw& law) {
  constexpr double kPoints_A[] = {1e-3, 0.1, 1, 10, 30, 100, 300, 1000, 3000};
  std::vector<Curve> branches;
  double conductance_S = 0;  // of all branches so far
  for (std::size_t k = 0; k + 1 < std::size(kPoints_A); ++k) {
    const double from_V = law.voltage_V(kPoints_A[k]);
    const double to_V = law.voltage_V(kPoints_A[k + 1]);
    const double wanted_S = (kPoints_A[k + 1] - (k == 0 ? 0 : kPoints_A[k])) / (to_V - from_V);
    branches.push_back({from_V, 1 / (wanted_S - conductance_S)});
    conductance_S = wanted_S;
  }
  return branches;
}

double varistor_one_mA_V(double continuous_Vrms) { return continuous_Vrms * 430 / 275; }

}  // namespace dropfront::circuit
