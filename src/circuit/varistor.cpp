#include "dropfront/circuit/varistor.hpp"

#include <cmath>
#include <iterator>

namespace dropfront::circuit {

double VaristorLaw::exponent() const { return std::log(clamp_V / one_mA_V) / std::log(clamp_A / 1e-3); }

double VaristorLaw::voltage_V(double current_A) const {
  return clamp_V * std::pow(current_A / clamp_A, exponent());
}

namespace {

constexpr double kFirst_A = 1e-3;

std::vector<Curve> through_points(const VaristorLaw& law, const std::vector<double>& points_A) {
  std::vector<Curve> branches;
  double conductance_S = 0;  // of all branches so far
  for (std::size_t k = 0; k + 1 < points_A.size(); ++k) {
    const double from_V = law.voltage_V(points_A[k]);
    const double to_V = law.voltage_V(points_A[k + 1]);
    const double wanted_S = (points_A[k + 1] - (k == 0 ? 0 : points_A[k])) / (to_V - from_V);
    branches.push_back({from_V, 1 / (wanted_S - conductance_S)});
    conductance_S = wanted_S;
  }
  return branches;
}

}  // namespace

std::vector<Curve> varistor_branches(const VaristorLaw& law) {
  return through_points(law, {kFirst_A, 0.1, 1, 10, 30, 100, 300, 1000, 3000});
}

std::vector<Curve> varistor_branches(const VaristorLaw& law, double greatest_A) {
  std::vector<double> points_A;
  if (!(greatest_A > kFirst_A)) return {};
  points_A.push_back(kFirst_A);
  for (const double share : {1.0 / 300, 1.0 / 30, 0.2, 1.0}) {
    if (share * greatest_A > 2 * kFirst_A || share == 1.0) points_A.push_back(share * greatest_A);
  }
  return through_points(law, points_A);
}

double current_behind_A(const VaristorLaw& law, double open_V, double source_ohm) {
  if (!(open_V > law.one_mA_V)) return 0;
  double low = 0, high = (open_V - law.one_mA_V) / source_ohm;
  for (int k = 0; k < 60; ++k) {
    const double middle = 0.5 * (low + high);
    (law.voltage_V(middle) + source_ohm * middle < open_V ? low : high) = middle;
  }
  return 0.5 * (low + high);
}

double varistor_one_mA_V(double continuous_Vrms) { return continuous_Vrms * 430 / 275; }

}  // namespace dropfront::circuit
