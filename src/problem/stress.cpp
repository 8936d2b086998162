#include "dropfront/problem/stress.hpp"

#include <algorithm>
#include <cmath>

namespace dropfront::problem {
namespace {

constexpr double kTwoPi = 6.28318530717958648;

}  // namespace

Stress::Stress(const scoring::Requirement& requirement) {
  for (const scoring::Supply& supply : requirement.supplies) {
    line_Vrms_ = std::max(line_Vrms_, supply.voltage_Vrms.high);
    volts_times_hertz_ = std::max(volts_times_hertz_, supply.voltage_Vrms.high * supply.frequency_Hz.high);
  }
}

double Stress::line_peak_V() const { return std::sqrt(2.0) * line_Vrms_; }

double Stress::current_Arms(double capacitance_F) const {
  return kTwoPi * volts_times_hertz_ * capacitance_F;
}

double Stress::resistor_W(double capacitance_F, double resistance_ohm) const {
  const double current_A = current_Arms(capacitance_F);
  return current_A * current_A * resistance_ohm;
}

double Stress::clamp_W(double capacitance_F, double clamp_V, bool full_wave) const {
  const double charge_A = std::sqrt(2.0) * volts_times_hertz_ * capacitance_F;  // f·C·Vpk
  if (!full_wave) return 2 * charge_A * clamp_V;
  return 4 * charge_A * clamp_V * std::max(0.0, 1 - clamp_V / line_peak_V());
}

}  // namespace dropfront::problem
