#include "dropfront/circuit/discharge.hpp"

#include <algorithm>
#include <cmath>
#include <limits>

namespace dropfront::circuit {

double discharged_voltage_V(double start_V, double resistance_ohm, double capacitance_F, double after_s) {
  return start_V * std::exp(-after_s / (resistance_ohm * capacitance_F));
}

double largest_bleeder_ohm(double start_V, double limit_V, double capacitance_F, double after_s) {
  if (!(start_V > limit_V)) return std::numeric_limits<double>::infinity();
  return after_s / (capacitance_F * std::log(start_V / limit_V));
}

double greatest_voltage_share(int count, double tolerance) {
  if (count <= 1) return 1;
  return (1 + tolerance) / ((1 + tolerance) + (count - 1) * (1 - tolerance));
}

double greatest_element_power_W(double chain_Vrms, int count, double element_ohm, double tolerance) {
  const double low = element_ohm * (1 - tolerance);
  const double high = element_ohm * (1 + tolerance);
  const double others = (std::max(count, 1) - 1) * low;
  const auto power = [&](double resistance) {
    const double current = chain_Vrms / (resistance + others);
    return current * current * resistance;
  };
  // In between, dP/dR = V²·(others - R)/(others + R)³: P rises up to R = others and falls beyond.
  return power(std::clamp(others, low, high));
}

}  // namespace dropfront::circuit
