#include "dropfront/scoring/checks/checks.hpp"
#include "dropfront/scoring/checks/make_check.hpp"
#include "dropfront/scoring/checks/stress.hpp"

namespace dropfront::scoring {

std::optional<Check> rail_transient(Evidence& evidence) {
  const Design& design = evidence.design();
  std::vector<std::optional<double>> limits{design.reservoir->surge_voltage_V};
  if (has_input_rating(*design.output_stage)) limits.push_back(design.output_stage->input_max_V);
  const auto judge = [&](double rail_V, At at, const char* basis) {
    Check check = at_most_each("rail.transient", rail_V, limits, "V", std::move(at), basis);
    add_figure(check, "surge_voltage_V", design.reservoir->surge_voltage_V);
    add_figure(check, "input_max_V", design.output_stage->input_max_V);
    return check;
  };
  const PlugInAnswer& plug_in = evidence.plug_in();
  Check check = judge(
      plug_in.rail_max_V, at_plug_in(plug_in.rail),
      "plug-in at the opposite crest, full reservoir, ESR included; lesser of the reservoir's surge voltage "
      "and the stage's input_max");
  check.figures.insert(check.figures.begin(), {"closing_voltage_V", 2 * plug_in.crest_V});
  if (!plug_in.usable) return unsolved(check, plug_in.reason);
  if (!evidence.requirement().limits.surge) return check;
  const SurgeAnswer& surge = evidence.surge();
  Check surged = judge(surge.rail.rail_max_V, at_surge(surge.rail),
                       "surge, full reservoir, ESR included; lesser of the reservoir's surge voltage and the "
                       "stage's input_max");
  if (!surge.usable) surged = unsolved(surged, surge.reason);
  return worse(check, surged);
}

}  // namespace dropfront::scoring
