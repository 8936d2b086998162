#include "dropfront/circuit/pulse.hpp"
#include "dropfront/scoring/checks/checks.hpp"
#include "dropfront/scoring/checks/make_check.hpp"

namespace dropfront::scoring {
namespace {

/// Published surge curves of zeners follow t^(-1/2) down to about 10 us and stop there (from memory): a
/// shorter spike counts as that long.
constexpr double kShortestPulse_s = 10e-6;

}  // namespace

/// Plug-in lasts tens of microseconds, the data mostly speak of one pulse of milliseconds. Taken as the
/// shortest the part can bear, that pulse would fail every small zener behind any plug-in; so the line of
/// diffusion is followed below it, and the figures show the share without that beside the value.
std::optional<Check> clamp_pulse(Evidence& evidence) {
  const parts::Clamp& clamp = *evidence.design().clamp;
  if (!clamp.pulse_power_W || !clamp.pulse_time_s) {
    return at_most("clamp.pulse", std::nullopt, std::nullopt, "", at_corner("plug_in"),
                   "pulse_power or pulse_time is not given");
  }
  const PlugInAnswer& plug_in = evidence.plug_in();
  const circuit::PulseRating rating{*clamp.pulse_power_W, *clamp.pulse_time_s, clamp.max_junction_degC};
  const double stress = circuit::pulse_stress_W_sqrt_s(plug_in.clamp_trace, kShortestPulse_s);
  const double within_data = circuit::pulse_stress_W_sqrt_s(plug_in.clamp_trace, rating.time_s);
  const double warm_degC = plug_in.clamp_junction_degC;
  Check check = at_most("clamp.pulse", circuit::pulse_use(stress, rating, warm_degC), 1.0, "",
                        at_plug_in(plug_in.clamp),
                        "share of the single-pulse rating by heat diffusion, from the warm junction; "
                        "extrapolated below the data's shortest pulse (from memory)");
  check.figures = {{"stress_W_sqrt_s", stress},
                   {"share_extrapolated", circuit::pulse_use(stress, rating, warm_degC)},
                   {"share_without_extrapolation", circuit::pulse_use(within_data, rating, warm_degC)},
                   {"rated_pulse_power_W", rating.power_W},
                   {"rated_pulse_s", rating.time_s},
                   {"max_junction_degC", rating.max_junction_degC},
                   {"shortest_pulse_s", kShortestPulse_s}};
  return plug_in.usable ? check : unsolved(check, plug_in.reason);
}

}  // namespace dropfront::scoring
