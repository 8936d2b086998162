#include "dropfront/scoring/checks/checks.hpp"
#include "dropfront/scoring/checks/make_check.hpp"

namespace dropfront::scoring {

/// The dropper sees the line less the dropper node. That node follows the current, a quarter turn ahead of
/// the line, so the r.m.s. across the dropper stays below the line's own as long as the clamp is well below
/// the crest: the whole line r.m.s. is the safe side, and needs no solution.
std::optional<Check> dropper_voltage(Evidence& evidence) {
  if (evidence.design().dropper == nullptr) return std::nullopt;
  const parts::Dropper& dropper = *evidence.design().dropper;
  const double share = evidence.requirement().derating.dropper_voltage;
  return with(
      at_most("dropper.voltage", evidence.shapes().rich.voltage_Vrms(), dropper.rated_voltage_Vrms * share,
              "V", at_corner("rich_empty"), "whole line r.m.s. at the high end, harmonics included"),
      {{"rated_voltage_Vrms", dropper.rated_voltage_Vrms}, {"derating", share}});
}

}  // namespace dropfront::scoring
