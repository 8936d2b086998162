#include "dropfront/scoring/checks/checks.hpp"
#include "dropfront/scoring/checks/make_check.hpp"

namespace dropfront::scoring {

std::optional<Check> standby_power(Evidence& evidence) {
  const auto& limit = evidence.requirement().limits.standby_power_W;
  if (!limit) return std::nullopt;
  const OperatingPoint& worst = evidence.standby_worst();
  Check check = at_most("standby.power", worst.state.input_power_W, *limit, "W", at_point(worst),
                        "nominal mains, production worst parts");
  check.figures = {{"input_current_Arms", worst.state.input_current_Arms}};
  return worst.state.usable() ? check : unsolved(check, worst.state.reason);
}

}  // namespace dropfront::scoring
