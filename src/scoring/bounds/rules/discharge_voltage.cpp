#include "dropfront/circuit/discharge.hpp"
#include "dropfront/scoring/bounds/rules.hpp"
#include "dropfront/scoring/corners.hpp"
#include "dropfront/scoring/discharge_rules.hpp"

namespace dropfront::scoring::bounds {

/// Vcrest·exp(-t/(Rb·C)) grows with Rb and C, what the rule allows falls with C: least at the least of both.
/// A dropper at or below the rule's capacitance shows nothing. Theorem.
double discharge_voltage(const BoxQuestion& question) {
  const auto& rule = question.context.requirement->limits.discharge;
  if (!rule || (!question.ends.known_circuit() && !question.ends.known_shunt())) return 0;
  const double cold_degC = question.context.ambient_low_degC();
  const double least_F = question.least_over(question.box.droppers, [&](const parts::Dropper* part) {
    if (part->capacitance_F * (1 + part->tolerance) <= rule->not_below_F) return 0.0;
    return dropper_F(*part, End::high, false, cold_degC);
  });
  if (!(least_F > 0)) return 0;
  const double left_V = circuit::discharged_voltage_V(
      question.supply.rich.crest_V, question.ends.least(Figure::chain_high_ohm), least_F, rule->after_s);
  return left_V / allowed_voltage_V(*rule, least_F, question.supply.rich.crest_V);
}

}  // namespace dropfront::scoring::bounds
