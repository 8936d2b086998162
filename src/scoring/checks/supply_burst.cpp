#include <string>

#include "dropfront/scoring/checks/checks.hpp"
#include "dropfront/scoring/checks/lean_event.hpp"
#include "dropfront/scoring/checks/make_check.hpp"
#include "dropfront/scoring/load_bursts.hpp"

namespace dropfront::scoring {

namespace {

Check judge(Evidence& evidence, const BurstAnswer& burst) {
  const EventAnswer& worst = burst.worst;
  std::string basis =
      "least rail during and after the burst at its worst mains phase, from the lean steady state at the "
      "heaviest load with the other bursts as their mean";
  if (!worst.recovers) basis += "; the rail does not recover from it";
  Check check = at_least("supply.burst", worst.rail_min_V, burst.required_V, "V",
                         at_event(evidence, worst, burst.name), std::move(basis));
  check.figures = {{"steady_rail_min_V", worst.steady_min_V},
                   {"required_rail_V", evidence.required_rail_V()},
                   {"burst_A", burst.burst_A},
                   {"burst_s", burst.duration_s}};
  return worst.usable ? check : unsolved(check, worst.reason);
}

}  // namespace

std::optional<Check> supply_burst(Evidence& evidence) {
  std::optional<Check> worst;
  for (const BurstAnswer& burst : evidence.load_bursts()) {
    Check check = judge(evidence, burst);
    worst = worst ? worse(*worst, check) : check;
  }
  return worst;
}

}  // namespace dropfront::scoring
