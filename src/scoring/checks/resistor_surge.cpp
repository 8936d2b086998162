#include "dropfront/scoring/checks/checks.hpp"
#include "dropfront/scoring/checks/make_check.hpp"
#include "dropfront/scoring/checks/stress.hpp"
#include "dropfront/scoring/corners.hpp"

namespace dropfront::scoring {

/// Joules for a wirewound part. A film's rating at 1 ms is carried along P·√t to the rectangle with the
/// surge's own energy and peak power, as at plug-in.
std::optional<Check> resistor_surge(Evidence& evidence) {
  if (!evidence.requirement().limits.surge) return std::nullopt;
  const SurgeAnswer& surge = evidence.surge();
  const Design& design = evidence.design();
  const parts::Resistor& part = *design.series_resistor;
  const double share = series_resistor_share(design);
  const bool film = part.construction == parts::Construction::film;
  std::optional<Check> worst;
  for (const SurgeRun& run : surge.resistors) {
    const double energy_J = run.resistor.energy_J;
    const double peak_W = run.resistor.peak_A * run.resistor.peak_A * run.values.series_resistor_ohm;
    const double pulse_s = peak_W > 0 ? energy_J / peak_W : 0;
    Check check =
        at_most("resistor.surge", energy_J * share, pulse_limit_J(part, pulse_s), "J", at_surge(run),
                film ? "surge energy; rating at 1 ms carried along P·sqrt(t) to energy / peak power"
                     : "surge energy against the joule rating");
    check.figures = {{"energy_J", energy_J},
                     {"share_of_one_part", share},
                     {"peak_current_A", run.resistor.peak_A},
                     {"pulse_s", pulse_s}};
    add_figure(check, "rated_energy_J", part.pulse_energy_J);
    worst = worst ? worse(*worst, check) : check;
  }
  if (surge.usable && worst) return worst;
  return unsolved(at_most("resistor.surge", std::nullopt, std::nullopt, "J", at_corner("surge"), ""),
                  surge.reason);
}

}  // namespace dropfront::scoring
