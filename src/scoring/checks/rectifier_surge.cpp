#include "dropfront/scoring/checks/checks.hpp"
#include "dropfront/scoring/checks/make_check.hpp"

namespace dropfront::scoring {

std::optional<Check> rectifier_surge(Evidence& evidence) {
  const PlugInAnswer& plug_in = evidence.plug_in();
  Check check = at_most("rectifier.surge", plug_in.rectifier_peak_A,
                        evidence.design().rectifier->surge_current_A, "A", at_plug_in(plug_in.resistor_low),
                        "greatest plug-in current against the 8.3 ms half-sine rating");
  check.figures = {{"line_peak_current_A", plug_in.input_peak_A}};
  if (!plug_in.usable) return unsolved(check, plug_in.reason);
  if (!evidence.requirement().limits.surge) return check;
  const SurgeAnswer& surge = evidence.surge();
  Check surged = with(at_most("rectifier.surge", surge.rectifier.rectifier_peak_A,
                              evidence.design().rectifier->surge_current_A, "A", at_surge(surge.rectifier),
                              "greatest current in the surge against the 8.3 ms half-sine rating"),
                      {{"line_peak_current_A", surge.rectifier.resistor.peak_A}});
  if (!surge.usable) surged = unsolved(surged, surge.reason);
  return worse(check, surged);
}

}  // namespace dropfront::scoring
