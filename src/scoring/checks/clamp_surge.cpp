#include "dropfront/circuit/pulse.hpp"
#include "dropfront/scoring/checks/checks.hpp"
#include "dropfront/scoring/checks/make_check.hpp"
#include "dropfront/scoring/clamp_trace.hpp"

namespace dropfront::scoring {

/// As clamp.pulse, in the surge.
std::optional<Check> clamp_surge(Evidence& evidence) {
  if (!evidence.requirement().limits.surge) return std::nullopt;
  const parts::Clamp& clamp = *evidence.design().clamp;
  if (!clamp.pulse_power_W || !clamp.pulse_time_s) {
    return at_most("clamp.surge", std::nullopt, std::nullopt, "", at_corner("surge"),
                   "pulse_power or pulse_time is not given");
  }
  const SurgeAnswer& surge = evidence.surge();
  const circuit::PulseRating rating{*clamp.pulse_power_W, *clamp.pulse_time_s, clamp.max_junction_degC};
  const double stress = surge.clamp.clamp_stress_W_sqrt_s;
  Check check = at_most("clamp.surge", circuit::pulse_use(stress, rating, surge.clamp.clamp_junction_degC),
                        1.0, "", at_surge(surge.clamp),
                        "share of the single-pulse rating by heat diffusion, from the warm junction; "
                        "extrapolated below the data's shortest pulse (from memory)");
  check.figures = {{"stress_W_sqrt_s", stress},
                   {"rated_pulse_power_W", rating.power_W},
                   {"rated_pulse_s", rating.time_s},
                   {"max_junction_degC", rating.max_junction_degC},
                   {"shortest_pulse_s", kShortestClampPulse_s}};
  return surge.usable ? check : unsolved(check, surge.reason);
}

}  // namespace dropfront::scoring
