#include "dropfront/scoring/bounds/clamp_heat.hpp"

#include <algorithm>

#include "dropfront/scoring/corners/zener_curve.hpp"

namespace dropfront::scoring {

namespace {
constexpr double kReference_degC = 25;
constexpr double kLeastThreshold_V = 1e-3;  // both as in zener_curve
constexpr double kLeastSlope_ohm = 1e-3;
}  // namespace

ClampSpan clamp_span(const parts::Clamp& part, double voltage_V, double back_ohm, double slope_ohm,
                     const ClampHeat& heat) {
  const double tempco = part.temperature_coefficient_per_K;
  const auto threshold_V = [&](double junction_degC) {
    const double warm = 1 + tempco * (junction_degC - kReference_degC);
    return std::max(kLeastThreshold_V, voltage_V * warm - back_ohm * part.test_current_A);
  };
  const double cool_V = threshold_V(heat.coolest_degC);
  const double hottest_V = threshold_V(kHottest_degC);
  const double air_degC = std::min(kHottest_degC, heat.air_degC);
  if (tempco > 0) {
    const double k = voltage_V * tempco * part.thermal_resistance_K_per_W * heat.mean_A;
    if (!(k < 0.9)) return {cool_V, hottest_V};
    const double ripple_V = slope_ohm * heat.peak_A;
    const double warm_V = (threshold_V(air_degC) + ripple_V + k * heat.forward_V) / (1 - k) - ripple_V;
    return {cool_V, std::min(hottest_V, warm_V)};
  }
  const double power_W = (cool_V + slope_ohm * heat.peak_A + heat.forward_V) * heat.mean_A;
  const double junction_degC = air_degC + part.thermal_resistance_K_per_W * power_W;
  return {threshold_V(std::min(kHottest_degC, junction_degC)), cool_V};
}

ClampSpan high_clamp_span(const parts::Clamp& part, const ClampHeat& heat) {
  const double least_ohm = std::max(kLeastSlope_ohm, part.slope_min_ohm);
  const double most_ohm = std::max(least_ohm, part.slope_resistance_ohm);
  return clamp_span(part, part.voltage_max_V, least_ohm, most_ohm, heat);
}

double self_heated_V(const parts::Clamp& part, double air_degC, double mean_A, double other_W) {
  const double tempco = part.temperature_coefficient_per_K;
  if (!(tempco > 0)) return 0;
  const auto at_V = [&](double degC) { return zener_curve(part, ZenerCurve::high, degC).main.threshold_V; };
  const double per_W = part.voltage_max_V * tempco * part.thermal_resistance_K_per_W;
  const double k = std::clamp(per_W * mean_A, 0.0, 0.9);
  const double warm_V = (at_V(air_degC) + per_W * std::max(0.0, other_W)) / (1 - k);
  return std::min(warm_V, at_V(kHottest_degC));
}

}  // namespace dropfront::scoring
