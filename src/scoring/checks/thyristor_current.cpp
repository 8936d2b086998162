#include <algorithm>

#include "dropfront/scoring/checks/checks.hpp"
#include "dropfront/scoring/checks/make_check.hpp"
#include "dropfront/scoring/checks/stress.hpp"

namespace dropfront::scoring {

std::optional<Check> thyristor_current(Evidence& evidence) {
  const Design& design = evidence.design();
  if (design.thyristor == nullptr) return std::nullopt;
  // A plug-in on the crest with the reservoir full fires it at once: then it carries the whole pulse.
  const PlugInAnswer& plug_in = evidence.plug_in();
  double firing_A = 0;
  for (const OperatingPoint* point : hot_points(evidence)) {
    if (!point->state.usable() || point->state.thyristor_peak_A.empty()) continue;
    firing_A = std::max(firing_A, point->state.thyristor_peak_A.front());
  }
  const Check check = with(at_most("thyristor.current", std::max(plug_in.thyristor_peak_A, firing_A),
                                   design.thyristor->surge_current_A, "A", at_plug_in(plug_in.resistor_low),
                                   "greatest of plug-in pulse and firing spike against the surge rating"),
                           {{"plug_in_peak_A", plug_in.thyristor_peak_A}, {"firing_peak_A", firing_A}});
  return plug_in.usable ? check : unsolved(check, plug_in.reason);
}

}  // namespace dropfront::scoring
