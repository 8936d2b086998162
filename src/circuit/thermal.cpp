#include "dropfront/circuit/thermal.hpp"

#include <algorithm>

namespace dropfront::circuit {

double allowed_power_W(double ambient_degC, double thermal_resistance_K_per_W, double maximum_degC) {
  return std::max(0.0, (maximum_degC - ambient_degC) / thermal_resistance_K_per_W);
}

}  // namespace dropfront::circuit
