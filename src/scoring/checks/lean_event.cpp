#include "dropfront/scoring/checks/lean_event.hpp"

#include "dropfront/scoring/checks/make_check.hpp"
#include "dropfront/scoring/corner_figures.hpp"

namespace dropfront::scoring {

At at_run(Evidence& evidence, double ambient_degC, const std::string& ends, double phase_deg,
          const circuit::ElementValues& values, double local_degC, double clamp_junction_degC,
          const std::string& load) {
  const bool hot = ambient_degC == evidence.requirement().surroundings.ambient_degC.high;
  At at = at_corner(hot ? "lean_hot" : "lean_cold", ambient_degC, ends);
  at.load = load;
  at.phase_deg = phase_deg;
  at.values = corner_figures(values, local_degC, clamp_junction_degC);
  if (values.rail_power_W > 0) at.values.push_back({"rail_power_W", values.rail_power_W});
  return at;
}

At at_event(Evidence& evidence, const EventAnswer& worst, const std::string& load) {
  return at_run(evidence, worst.ambient_degC, worst.ends, worst.phase_deg, worst.values, worst.local_degC,
                worst.clamp_junction_degC, load);
}

}  // namespace dropfront::scoring
