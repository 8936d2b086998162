#include "dropfront/circuit/discharge.hpp"
#include "dropfront/scoring/checks/checks.hpp"
#include "dropfront/scoring/checks/make_check.hpp"

namespace dropfront::scoring {

/// The chain stands across the dropper: it sees the film's own voltage, its elements share it by their
/// tolerance. A rated overload voltage is stated for seconds, so this errs on the safe side.
std::optional<Check> discharge_surge(Evidence& evidence) {
  const Design& design = evidence.design();
  if (!evidence.requirement().limits.surge || !design.discharge || design.discharge_count < 1) {
    return std::nullopt;
  }
  const SurgeAnswer& surge = evidence.surge();
  const double share = circuit::greatest_voltage_share(design.discharge_count, design.discharge->tolerance);
  const double chain_V = surge.dropper.dropper_peak_V;
  Check check =
      with(at_most("discharge.surge", chain_V * share, design.discharge->overload_voltage_V, "V",
                   at_surge(surge.dropper),
                   "peak of the dropper's voltage x R_max/(R_max + sum of R_min); overload voltage"),
           {{"chain_peak_V", chain_V},
            {"elements", static_cast<double>(design.discharge_count)},
            {"greatest_share", share}});
  return surge.usable ? check : unsolved(check, surge.reason);
}

}  // namespace dropfront::scoring
