#include "dropfront/scoring/checks/checks.hpp"
#include "dropfront/scoring/checks/make_check.hpp"

namespace dropfront::scoring {

std::optional<Check> rectifier_surge(Evidence& evidence) {
  const PlugInAnswer& plug_in = evidence.plug_in();
  Check check = at_most("rectifier.surge", plug_in.rectifier_peak_A,
                        evidence.design().rectifier->surge_current_A, "A", at_plug_in(plug_in.resistor_low),
                        "greatest plug-in current against the 8.3 ms half-sine rating");
  check.figures = {{"line_peak_current_A", plug_in.input_peak_A}};
  return plug_in.usable ? check : unsolved(check, plug_in.reason);
}

}  // namespace dropfront::scoring
