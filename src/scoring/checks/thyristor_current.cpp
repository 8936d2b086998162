#include <algorithm>

#include "dropfront/scoring/checks/checks.hpp"
#include "dropfront/scoring/checks/make_check.hpp"
#include "dropfront/scoring/checks/stress.hpp"
#include "dropfront/scoring/corners.hpp"

namespace dropfront::scoring {

std::optional<Check> thyristor_current(Evidence& evidence) {
  const Design& design = evidence.design();
  if (design.thyristor == nullptr) return std::nullopt;
  // A plug-in on the crest with the reservoir full fires it at once: then it carries the whole pulse.
  const PlugInAnswer& plug_in = evidence.plug_in();
  double firing_A = 0;
  std::string reason = plug_in.reason;
  bool usable = plug_in.usable;
  // The rich corner has the series resistor at its high end; the spike is the node's fall over it.
  const double to_low_end = series_resistor_ohm(design, End::high) / series_resistor_ohm(design, End::low);
  for (const OperatingPoint* point : rich_points(evidence)) {
    if (!point->state.usable() || point->state.thyristor_peak_A.empty()) {
      usable = false;
      reason = point->state.reason;
      break;
    }
    firing_A = std::max(firing_A, point->state.thyristor_peak_A.front() * to_low_end);
  }
  const bool fires_worse = firing_A > plug_in.thyristor_peak_A;
  const At place =
      fires_worse ? at_corner("rich_loaded", {}, "series_resistor low") : at_plug_in(plug_in.resistor_low);
  const Check check = with(at_most("thyristor.current", std::max(plug_in.thyristor_peak_A, firing_A),
                                   design.thyristor->surge_current_A, "A", place,
                                   "greatest of plug-in pulse and firing spike against the surge rating"),
                           {{"plug_in_peak_A", plug_in.thyristor_peak_A}, {"firing_peak_A", firing_A}});
  if (!usable) return unsolved(check, reason);
  if (!evidence.requirement().limits.surge) return check;
  const SurgeAnswer& surge = evidence.surge();
  const double surge_A = surge.thyristor.thyristor_peak_A;
  Check surged =
      with(at_most("thyristor.current", surge_A, design.thyristor->surge_current_A, "A",
                   at_surge(surge.thyristor), "greatest current in the surge against the surge rating"),
           {{"surge_peak_A", surge_A}});
  if (!surge.usable) surged = unsolved(surged, surge.reason);
  return worse(check, surged);
}

}  // namespace dropfront::scoring
