#include <algorithm>

#include "dropfront/circuit/pulse.hpp"
#include "dropfront/scoring/checks/checks.hpp"
#include "dropfront/scoring/checks/make_check.hpp"
#include "dropfront/scoring/clamp_trace.hpp"

namespace dropfront::scoring {
namespace {

/// The same pulse so many times, `every_s` apart.
std::vector<circuit::PowerStep> closings_in_a_row(const std::vector<circuit::PowerStep>& trace, int closings,
                                                  double every_s) {
  double length_s = 0;
  for (const auto& step : trace) length_s += step.duration_s;
  std::vector<circuit::PowerStep> all = trace;
  for (int k = 1; k < closings; ++k) {
    all.push_back({std::max(0.0, every_s - length_s), 0});
    all.insert(all.end(), trace.begin(), trace.end());
  }
  return all;
}

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
  const int closings = evidence.requirement().connection.chatter;
  const auto trace = closings_in_a_row(plug_in.clamp_trace, closings, evidence.shapes().rich.period_s() / 2);
  const double stress = circuit::pulse_stress_W_sqrt_s(trace, kShortestClampPulse_s);
  const double within_data = circuit::pulse_stress_W_sqrt_s(trace, rating.time_s);
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
                   {"closings_in_a_row", static_cast<double>(closings)},
                   {"shortest_pulse_s", kShortestClampPulse_s}};
  return plug_in.usable ? check : unsolved(check, plug_in.reason);
}

}  // namespace dropfront::scoring
