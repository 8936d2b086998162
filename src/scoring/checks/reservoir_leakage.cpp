#include <algorithm>
#include <cmath>

#include "dropfront/scoring/checks/checks.hpp"
#include "dropfront/scoring/checks/make_check.hpp"
#include "dropfront/scoring/stage_law.hpp"

namespace dropfront::scoring {

namespace {

/// An electrolytic's leakage is about five times as much at 85 degC as at 20 degC, where the data state it
/// (common practice, from memory), straight in log between and beyond; below 20 degC nothing is gained.
double warm_leakage_factor(double degC) {
  constexpr double kStated_degC = 20, kHot_degC = 85, kTimes = 5;
  return std::pow(kTimes, std::max(0.0, degC - kStated_degC) / (kHot_degC - kStated_degC));
}

}  // namespace

/// The margin takes the data's leakage off, stated at 20 degC and the rated voltage. In warm air the part
/// leaks more; at a rail below its rating less, in proportion as in the data's own k·C·V. Both at their
/// greatest, which never meet in one corner: the rail of the unloaded rich corner, the air of the hot one.
/// That current must fit into the data leakage and what the lean corner, at the lesser of both ambients,
/// leaves beside it. So a design can keep its margin by the data and still fail here, by what heat adds. A
/// step-down's margin at the output is carried to the rail at the clamp's greatest voltage, the least current
/// it can stand for.
std::optional<Check> reservoir_leakage(Evidence& evidence) {
  const LeanAnswer& lean = evidence.lean();
  const OperatingPoint& warm = evidence.rich_empty_hot();
  const OperatingPoint& high = evidence.rich_empty();
  const Design& design = evidence.design();
  const parts::OutputStage& stage = *design.output_stage;
  double spare_A = lean.margin_A;
  if (stage.kind == parts::StageKind::step_down)
    spare_A *=
        stage_output_V(stage, End::high) / (stage.efficiency.value_or(1) * design.clamp->voltage_max_V);
  const double rated_V = design.reservoir->rated_voltage_V;
  const double stated_A = design.reservoir->leakage_A;
  const double factor = warm_leakage_factor(warm.local_degC);
  const double leakage_A = stated_A * high.rail_greatest_V / rated_V * factor;
  Check check = at_most("reservoir.leakage", leakage_A, stated_A + spare_A, "A",
                        at_lean(lean, evidence.loads().heaviest_name),
                        "leakage at the greatest rail in the warmest air (x5 from 20 to 85 degC: common "
                        "practice, from memory) against the data leakage and the lean margin");
  check.figures = {{"data_leakage_A", stated_A},     {"rail_V", high.rail_greatest_V},
                   {"rated_voltage_V", rated_V},     {"air_degC", warm.local_degC},
                   {"warm_factor", factor},          {"current_margin_A", lean.margin_A},
                   {"spare_rail_current_A", spare_A}};
  if (!high.state.usable()) return unsolved(check, high.state.reason);
  return lean.usable ? check : unsolved(check, lean.reason);
}

}  // namespace dropfront::scoring
