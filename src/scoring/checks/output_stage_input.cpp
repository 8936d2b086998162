#include "dropfront/scoring/checks/checks.hpp"
#include "dropfront/scoring/checks/make_check.hpp"
#include "dropfront/scoring/checks/stress.hpp"

namespace dropfront::scoring {

std::optional<Check> output_stage_input(Evidence& evidence) {
  const parts::OutputStage& stage = *evidence.design().output_stage;
  if (!has_input_rating(stage)) return std::nullopt;
  const auto judge = [&](const OperatingPoint& point) {
    return with(at_most("output_stage.input", point.rail_greatest_V, stage.input_max_V, "V", at_point(point),
                        "greatest rail under load against input_max"),
                {{"rail_max_V", point.state.rail_max_V}});
  };
  return worst_over(loaded_points(evidence), judge);
}

}  // namespace dropfront::scoring
