#include "dropfront/circuit/discharge.hpp"
#include "dropfront/scoring/checks/checks.hpp"
#include "dropfront/scoring/checks/make_check.hpp"
#include "dropfront/scoring/corners.hpp"
#include "dropfront/scoring/discharge_rules.hpp"

namespace dropfront::scoring {

/// The whole crest is taken to stand on the dropper at the moment of unplugging, and nothing but the chain to
/// discharge it.
std::optional<Check> discharge_voltage(Evidence& evidence) {
  const auto& rule = evidence.requirement().limits.discharge;
  const Design& design = evidence.design();
  if (!rule || design.dropper == nullptr) return std::nullopt;
  const double greatest_F =
      design.dropper_count * design.dropper->capacitance_F * (1 + design.dropper->tolerance);
  if (greatest_F <= rule->not_below_F) return std::nullopt;
  const double cold_degC = evidence.requirement().surroundings.ambient_degC.low;
  const double crest_V = evidence.shapes().rich.crest_V();
  const double cold_F = all_droppers_F(design, End::high, 0, cold_degC);
  const double chain_ohm = discharge_ohm(design, End::high);
  const double left_V = circuit::discharged_voltage_V(crest_V, chain_ohm, cold_F, rule->after_s);
  return with(at_most("discharge.voltage", left_V, allowed_voltage_V(*rule, cold_F, crest_V), "V",
                      at_corner("unplug", cold_degC, "dropper high, discharge high"),
                      "Vcrest·exp(-t/(Rb·C)) at the asked time; " + rule->basis),
              {{"line_crest_V", crest_V},
               {"discharge_chain_ohm", chain_ohm},
               {"dropper_F", cold_F},
               {"after_s", rule->after_s}});
}

}  // namespace dropfront::scoring
