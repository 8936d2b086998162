#include <string>

#include "dropfront/scoring/checks/checks.hpp"
#include "dropfront/scoring/checks/make_check.hpp"
#include "dropfront/scoring/stability.hpp"

namespace dropfront::scoring {

namespace {

std::string basis_of(StabilityShown shown) {
  switch (shown) {
    case StabilityShown::passive:
      return "steady rail minimum of the lean corner: its load is a constant current and its network "
             "passive, "
             "so a kick dies out";
    case StabilityShown::alternating:
      return "the shunt alternates from cycle to cycle: least rail of the last 32 of 64 periods";
    case StabilityShown::marched:
      break;
  }
  return "least rail of the last 32 of 64 periods after a 1 % kick of the lean state, the load by the "
         "stage's "
         "own law";
}

}  // namespace

std::optional<Check> supply_stable(Evidence& evidence) {
  const StabilityAnswer& answer = evidence.stability();
  // The searches hold the required rail to a microvolt.
  constexpr double kSearched_V = 1e-6;
  const double required_V = evidence.required_rail_V();
  double rail_V = answer.rail_min_V;
  if (rail_V < required_V && rail_V >= required_V - kSearched_V) rail_V = required_V;
  Check check =
      at_least("supply.stable", rail_V, required_V, "V", at_point(answer.at), basis_of(answer.shown));
  check.figures = {{"required_rail_V", required_V}, {"steady_rail_min_V", answer.at.state.rail_min_V}};
  return answer.usable ? check : unsolved(check, answer.reason);
}

}  // namespace dropfront::scoring
