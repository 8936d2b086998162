#include "dropfront/scoring/checks/checks.hpp"
#include "dropfront/scoring/checks/make_check.hpp"
#include "dropfront/scoring/checks/stress.hpp"

namespace dropfront::scoring {

std::optional<Check> rail_transient(Evidence& evidence) {
  const PlugInAnswer& plug_in = evidence.plug_in();
  const Design& design = evidence.design();
  std::vector<std::optional<double>> limits{design.reservoir->surge_voltage_V};
  if (has_input_rating(*design.output_stage)) limits.push_back(design.output_stage->input_max_V);
  Check check = at_most_each(
      "rail.transient", plug_in.rail_max_V, limits, "V", at_plug_in(plug_in.rail),
      "plug-in at the opposite crest, full reservoir, ESR included; lesser of the reservoir's surge voltage "
      "and the stage's input_max");
  check.figures = {{"closing_voltage_V", 2 * plug_in.crest_V}};
  add_figure(check, "surge_voltage_V", design.reservoir->surge_voltage_V);
  add_figure(check, "input_max_V", design.output_stage->input_max_V);
  return plug_in.usable ? check : unsolved(check, plug_in.reason);
}

}  // namespace dropfront::scoring
