#include "dropfront/circuit/thermal.hpp"
#include "dropfront/scoring/checks/checks.hpp"
#include "dropfront/scoring/checks/make_check.hpp"
#include "dropfront/scoring/checks/stress.hpp"

namespace dropfront::scoring {

std::optional<Check> output_stage_junction(Evidence& evidence) {
  const parts::OutputStage& stage = *evidence.design().output_stage;
  if (stage.kind == parts::StageKind::direct) return std::nullopt;
  if (!stage.thermal_resistance_K_per_W || !stage.max_junction_degC) {
    return at_most("output_stage.junction", std::nullopt, std::nullopt, "degC", at_corner("rich_loaded"),
                   "thermal_resistance or max_junction is not given");
  }
  const double limit = *stage.max_junction_degC - evidence.requirement().derating.junction_K;
  const auto judge = [&](const OperatingPoint& point) {
    const double power = stage_loss_W(stage, point.state.rail_mean_V, point.load_current_A);
    return with(at_most("output_stage.junction",
                        circuit::temperature_degC(point.local_degC, *stage.thermal_resistance_K_per_W, power),
                        limit, "degC", at_point(point), "local ambient + Rth·P; maximum less the derating"),
                {{"power_W", power},
                 {"rail_mean_V", point.state.rail_mean_V},
                 {"thermal_resistance_K_per_W", *stage.thermal_resistance_K_per_W},
                 {"max_junction_degC", *stage.max_junction_degC},
                 {"derating_K", evidence.requirement().derating.junction_K}});
  };
  return worst_over(loaded_points(evidence), judge);
}

}  // namespace dropfront::scoring
