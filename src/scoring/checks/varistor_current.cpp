#include "dropfront/scoring/checks/checks.hpp"
#include "dropfront/scoring/checks/make_check.hpp"

namespace dropfront::scoring {

std::optional<Check> varistor_current(Evidence& evidence) {
  const parts::Varistor* part = evidence.design().varistor;
  if (part == nullptr || !evidence.requirement().limits.surge) return std::nullopt;
  if (!varistor_law(*part, VaristorEnd::high)) {
    return at_most("varistor.current", std::nullopt, std::nullopt, "A", at_corner("surge"),
                   "clamp_voltage or clamp_current is not given: its current is not known");
  }
  const SurgeAnswer& surge = evidence.surge();
  Check check =
      with(at_most("varistor.current", surge.varistor_peak.varistor_peak_A, part->surge_current_A, "A",
                   at_surge(surge.varistor_peak), "peak against the 8/20 us rating for one pulse"),
           {{"energy_J", surge.varistor_peak.varistor_energy_J}});
  return surge.usable ? check : unsolved(check, surge.reason);
}

}  // namespace dropfront::scoring
