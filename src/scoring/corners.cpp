#include "dropfront/scoring/corners.hpp"

#include <algorithm>
#include <limits>

#include "dropfront/circuit/discharge.hpp"

namespace dropfront::scoring {

namespace {

double ended(double value, double tolerance, End end) {
  if (end == End::low) return value * (1 - tolerance);
  if (end == End::high) return value * (1 + tolerance);
  return value;
}

}  // namespace

double resistor_ohm(const parts::Resistor& part, End end) {
  return ended(part.resistance_ohm, part.tolerance, end);
}

double series_resistor_ohm(const Design& design, End end) {
  return design.series_resistor_count * resistor_ohm(*design.series_resistor, end);
}

double series_resistor_share(const Design& design) {
  return circuit::greatest_voltage_share(design.series_resistor_count, design.series_resistor->tolerance);
}

double all_droppers_F(const Design& design, End end, double aged, double local_degC) {
  return design.dropper_count * dropper_F(*design.dropper, end, aged, local_degC);
}

double discharge_ohm(const Design& design, End end) {
  if (design.discharge == nullptr || design.discharge_count <= 0) {
    return std::numeric_limits<double>::infinity();
  }
  return design.discharge_count * resistor_ohm(*design.discharge, end);
}

double dropper_F(const parts::Dropper& part, End end, double aged, double local_degC) {
  constexpr double kReference_degC = 20;  // at which film capacitance is stated (IEC 60384-1, from memory)
  const double loss = end == End::low ? left_of(part.end_of_life_loss, aged) : 1;
  const double warm = 1 + part.temperature_coefficient_per_K * (local_degC - kReference_degC);
  return ended(part.capacitance_F, part.tolerance, end) * loss * warm;
}

double dropper_esr_ohm(const parts::Dropper& part, double capacitance_F, double frequency_Hz) {
  constexpr double kTwoPi = 6.283185307179586;
  return part.loss_tangent / (kTwoPi * frequency_Hz * capacitance_F);
}

circuit::Curve rectifier_curve(const parts::Rectifier& part, Drops drops, double local_degC) {
  constexpr double kLeast_V = 0.1;  // a lower threshold than any silicon diode's adds nothing
  double threshold_V = part.threshold_voltage_V;
  if (drops == Drops::least) threshold_V = std::max(kLeast_V, threshold_V - 0.3);
  if (drops == Drops::greatest) threshold_V += 2e-3 * std::max(0.0, 25 - local_degC);
  return {threshold_V, part.slope_resistance_ohm};
}

namespace {

/// Gate current that fires: the data give the greatest; sensitive types fire at a tenth of it (from memory).
constexpr double kLeastTrigger = 0.1;

/// The trigger follows the zener's end: the low curve fires early, the high curve late.
void set_shunt(const Design& design, const Recipe& recipe, circuit::ElementValues& values) {
  if (design.thyristor == nullptr || design.gate_resistor == nullptr) return;  // then no score gets here
  const auto& part = *design.thyristor;
  const bool early = recipe.clamp == ZenerCurve::low;
  const End end = early ? End::low : recipe.clamp == ZenerCurve::high ? End::high : End::nominal;
  values.thyristor = {part.on_voltage_V, part.slope_resistance_ohm};
  values.thyristor_holding_A = part.holding_current_A.value_or(0);
  values.thyristor_trigger_A = part.trigger_current_A.value_or(0) * (early ? kLeastTrigger : 1);
  values.gate_resistor_ohm = resistor_ohm(*design.gate_resistor, end);
}

}  // namespace

circuit::ElementValues corner_values(const Design& design, const Recipe& recipe, const Temperatures& at,
                                     double load_cutoff_V) {
  const double air_degC = at.local_degC;
  const auto& can = *design.reservoir;
  circuit::ElementValues values;
  values.mains = *recipe.mains;
  values.series_resistor_ohm = series_resistor_ohm(design, recipe.series_resistor);
  if (design.arrangement->dropper) {
    values.dropper_F = all_droppers_F(design, recipe.dropper, recipe.aged, air_degC);
    values.dropper_esr_ohm = dropper_esr_ohm(*design.dropper, values.dropper_F, values.mains.frequency_Hz());
    values.discharge_ohm = discharge_ohm(design, recipe.discharge);
  }
  values.rectifier = rectifier_curve(*design.rectifier, recipe.drops, air_degC);
  values.clamp = zener_curve(*design.clamp, recipe.clamp, at.clamp_junction_degC);
  values.reservoir_F = can.capacitance_F;
  if (recipe.reservoir == End::low) values.reservoir_F = reservoir_least_F(can, recipe.aged, air_degC);
  if (recipe.reservoir == End::high) values.reservoir_F = reservoir_greatest_F(can);
  values.reservoir_esr_ohm = can.esr_ohm;
  if (recipe.esr == End::low) values.reservoir_esr_ohm = reservoir_least_esr_ohm(can, air_degC);
  if (recipe.esr == End::high) {
    values.reservoir_esr_ohm = reservoir_greatest_esr_ohm(can, recipe.aged, air_degC);
  }
  set_shunt(design, recipe, values);
  values.ceramic_F = design.ceramic != nullptr
                         ? ended(design.ceramic->capacitance_F, design.ceramic->tolerance, recipe.reservoir)
                         : 0;
  values.load_cutoff_V = load_cutoff_V;
  return values;
}

}  // namespace dropfront::scoring
