#include "dropfront/circuit/derating.hpp"

#include <algorithm>
#include <cmath>

namespace dropfront::circuit {
namespace {

constexpr double kFullPower_degC = 70;
constexpr double kNoPower_degC = 155;

double ripple_multiplier(double frequency_Hz) {
  constexpr double kMains_Hz = 60, kReference_Hz = 120, kSwitching_Hz = 100e3;
  constexpr double kAtMains = 0.8, kAtSwitching = 1.6;
  if (frequency_Hz <= kMains_Hz) return kAtMains;
  if (frequency_Hz >= kSwitching_Hz) return kAtSwitching;
  if (frequency_Hz <= kReference_Hz)
    return kAtMains +
           (1 - kAtMains) * std::log(frequency_Hz / kMains_Hz) / std::log(kReference_Hz / kMains_Hz);
  return 1 + (kAtSwitching - 1) * std::log(frequency_Hz / kReference_Hz) /
                 std::log(kSwitching_Hz / kReference_Hz);
}

}  // namespace

double resistor_power_share(double ambient_degC) {
  return std::clamp((kNoPower_degC - ambient_degC) / (kNoPower_degC - kFullPower_degC), 0.0, 1.0);
}

double ripple_rating_factor(double rated_Hz, double running_Hz) {
  return ripple_multiplier(running_Hz) / ripple_multiplier(rated_Hz);
}

}  // namespace dropfront::circuit
