#include "dropfront/scoring/corners/zener_curve.hpp"

#include <algorithm>
#include <cmath>

namespace dropfront::scoring {

namespace {

constexpr double kReference_degC = 25;
constexpr double kLeastThreshold_V = 1e-3;  // breakdown stays a passive element
constexpr double kLeastSlope_ohm = 1e-3;

std::optional<circuit::Curve> knee_branch(const parts::Clamp& part, double voltage_V, double main_V0) {
  if (!part.knee_current_A || !part.knee_resistance_ohm) return std::nullopt;
  const double knee_A = *part.knee_current_A;
  const double knee_ohm = *part.knee_resistance_ohm;
  if (!(knee_A > 0) || !(knee_ohm > 0) || !(part.test_current_A > knee_A)) return std::nullopt;
  const double product_V = 0.5 * (part.slope_resistance_ohm * part.test_current_A + knee_ohm * knee_A);
  const double at_knee_V = voltage_V - product_V * std::log(part.test_current_A / knee_A);
  const double threshold_V = std::max(kLeastThreshold_V, at_knee_V - knee_ohm * knee_A);
  if (!(threshold_V < main_V0)) return std::nullopt;  // the data show no soft knee
  return circuit::Curve{threshold_V, knee_ohm};
}

}  // namespace

circuit::ClampCurve zener_curve(const parts::Clamp& part, ZenerCurve curve, double junction_degC) {
  const double warm = 1 + part.temperature_coefficient_per_K * (junction_degC - kReference_degC);
  const double least_ohm = std::max(kLeastSlope_ohm, part.slope_min_ohm);
  const double most_ohm = std::max(least_ohm, part.slope_resistance_ohm);
  double voltage_V = part.voltage_V * warm;
  double back_ohm = most_ohm;  // slope that carries the voltage back from the test current to no current
  double slope_ohm = most_ohm;
  switch (curve) {
    case ZenerCurve::low:
      voltage_V = part.voltage_min_V * warm;
      slope_ohm = least_ohm;
      break;
    case ZenerCurve::nominal:
      break;
    case ZenerCurve::high:
      voltage_V = part.voltage_max_V * warm;
      back_ohm = least_ohm;
      break;
    case ZenerCurve::low_slope:
      voltage_V = part.voltage_max_V * warm;
      back_ohm = least_ohm;
      slope_ohm = least_ohm;
      break;
  }
  circuit::ClampCurve result;
  result.main = {std::max(kLeastThreshold_V, voltage_V - back_ohm * part.test_current_A), slope_ohm};
  if (curve == ZenerCurve::low) result.knee = knee_branch(part, voltage_V, result.main.threshold_V);
  return result;
}

}  // namespace dropfront::scoring
