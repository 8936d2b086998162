#include <algorithm>

#include "dropfront/scoring/checks/checks.hpp"
#include "dropfront/scoring/checks/make_check.hpp"

namespace dropfront::scoring {
namespace {

/// Distance of [low, high] from the wanted voltage, at its worst end; exactly the limit where an end stands
/// on the band's edge (5·1.04 - 5 is not 5·0.04 in binary).
double distance_V(const OutputNeed& need, double low_V, double high_V) {
  const double allowed = need.voltage_V * need.tolerance;
  const double distance = std::max(need.voltage_V - low_V, high_V - need.voltage_V);
  const bool inside =
      low_V >= need.voltage_V * (1 - need.tolerance) && high_V <= need.voltage_V * (1 + need.tolerance);
  return inside ? std::min(distance, allowed) : distance;
}

}  // namespace

std::optional<Check> output_band(Evidence& evidence) {
  const OutputNeed& need = evidence.requirement().output;
  const parts::OutputStage& stage = *evidence.design().output_stage;
  const double allowed = need.voltage_V * need.tolerance;
  if (stage.kind != parts::StageKind::direct) {
    const double distance = distance_V(need, stage.output_voltage_V * (1 - stage.tolerance),
                                       stage.output_voltage_V * (1 + stage.tolerance));
    return with(at_most("output.band", distance, allowed, "V", at_corner(""),
                        "the stage's own tolerance against the asked band, in regulation"),
                {{"asked_voltage_V", need.voltage_V},
                 {"asked_tolerance", need.tolerance},
                 {"stage_voltage_V", stage.output_voltage_V},
                 {"stage_tolerance", stage.tolerance}});
  }
  // The rail is the output: least at the heaviest load in the lean corner, greatest unloaded.
  const auto judge = [&](const OperatingPoint& point) {
    const bool rich = &point == &evidence.rich_empty();
    const double low = rich ? need.voltage_V : point.state.rail_min_V;
    const double high = rich ? point.rail_greatest_V : need.voltage_V;
    return with(at_most("output.band", distance_V(need, low, high), allowed, "V", at_point(point),
                        "the rail is the output: its farther end from the asked voltage"),
                {{"asked_voltage_V", need.voltage_V},
                 {"asked_tolerance", need.tolerance},
                 {"rail_V", rich ? high : low}});
  };
  return worst_over({&evidence.lean_cold(), &evidence.lean_hot(), &evidence.rich_empty()}, judge);
}

}  // namespace dropfront::scoring
