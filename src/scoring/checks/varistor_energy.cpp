#include <algorithm>

#include "dropfront/scoring/checks/checks.hpp"
#include "dropfront/scoring/checks/make_check.hpp"

namespace dropfront::scoring {

/// The rating is for 2 ms; a surge is shorter, and the peak current is a check of its own.
std::optional<Check> varistor_energy(Evidence& evidence) {
  const parts::Varistor* part = evidence.design().varistor;
  if (part == nullptr || !evidence.requirement().limits.surge) return std::nullopt;
  const auto law = varistor_law(*part, VaristorEnd::high);
  if (!law) {
    return at_most("varistor.energy", std::nullopt, std::nullopt, "J", at_corner("surge"),
                   "clamp_voltage or clamp_current is not given: it then counts for nothing in the surge");
  }
  const SurgeAnswer& surge = evidence.surge();
  const double peak_A = surge.varistor_peak.varistor_peak_A;
  Check check = with(at_most("varistor.energy", surge.varistor.varistor_energy_J, part->energy_J, "J",
                             at_surge(surge.varistor), "energy of one surge against the energy rating"),
                     {{"peak_current_A", peak_A},
                      {"let_through_V", law->voltage_V(std::max(peak_A, 1e-3))},
                      {"exponent", law->exponent()}});
  return surge.usable ? check : unsolved(check, surge.reason);
}

}  // namespace dropfront::scoring
