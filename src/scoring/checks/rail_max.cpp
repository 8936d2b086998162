#include "dropfront/scoring/checks/checks.hpp"
#include "dropfront/scoring/checks/make_check.hpp"
#include "dropfront/scoring/checks/stress.hpp"

namespace dropfront::scoring {

std::optional<Check> rail_max(Evidence& evidence) {
  const OperatingPoint& empty = evidence.rich_empty();
  const Design& design = evidence.design();
  std::vector<std::optional<double>> limits{design.reservoir->rated_voltage_V *
                                            evidence.requirement().derating.reservoir_voltage};
  if (has_input_rating(*design.output_stage)) limits.push_back(design.output_stage->input_max_V);
  Check check = at_most_each(
      "rail.max", empty.rail_greatest_V, limits, "V", at_point(empty),
      "no drop in the series diodes; lesser of the reservoir's derated voltage and the stage's input_max");
  check.figures = {{"reservoir_rated_voltage_V", design.reservoir->rated_voltage_V},
                   {"derating", evidence.requirement().derating.reservoir_voltage}};
  add_figure(check, "input_max_V", design.output_stage->input_max_V);
  return empty.state.usable() ? check : unsolved(check, empty.state.reason);
}

}  // namespace dropfront::scoring
