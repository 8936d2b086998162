#include "dropfront/scoring/corners/electrolytic.hpp"

#include <algorithm>
#include <cmath>

#include "dropfront/parts/defaults.hpp"

namespace dropfront::scoring {

namespace {
constexpr double kReference_degC = 20;
constexpr double kCold_degC = -25;
constexpr double kColdCapacitance = 0.9;
constexpr double kLeastEsrShare = 0.1;  // data give a maximum; the same tenth as for a zener's slope
}  // namespace

double electrolytic_cold_capacitance(double local_degC) {
  if (!(local_degC < kReference_degC)) return 1;
  return std::pow(kColdCapacitance, (kReference_degC - local_degC) / (kReference_degC - kCold_degC));
}

double electrolytic_cold_esr(const parts::Reservoir& part, double local_degC) {
  if (!(local_degC < kReference_degC) || !(part.esr_ohm > 0)) return 1;
  const double default_ratio = parts::electrolytic_cold_factor(part.rated_voltage_V);
  const double ratio = part.esr_cold_ohm > 0 ? part.esr_cold_ohm / part.esr_ohm : default_ratio;
  const double reached = std::max(local_degC, kCold_degC);
  const double factor = std::pow(ratio, (kReference_degC - reached) / (kReference_degC - kCold_degC));
  return local_degC < kCold_degC ? factor * std::exp2((kCold_degC - local_degC) / 15) : factor;
}

double left_of(double end_of_life_loss, double aged) {
  constexpr double kLeastLeft = 0.05;
  return std::max(kLeastLeft, 1 - end_of_life_loss * aged);
}

double reservoir_least_F(const parts::Reservoir& part, double aged, double local_degC) {
  return part.capacitance_F * (1 - part.tolerance) * left_of(part.end_of_life_loss, aged) *
         electrolytic_cold_capacitance(local_degC);
}

double reservoir_greatest_F(const parts::Reservoir& part) {
  return part.capacitance_F * (1 + part.tolerance);
}

double reservoir_least_esr_ohm(const parts::Reservoir& part, double local_degC) {
  return part.esr_ohm * kLeastEsrShare * electrolytic_cold_esr(part, local_degC);
}

double reservoir_greatest_esr_ohm(const parts::Reservoir& part, double aged, double local_degC) {
  return part.esr_ohm * (1 + (part.end_of_life_esr - 1) * aged) * electrolytic_cold_esr(part, local_degC);
}

}  // namespace dropfront::scoring
