#include "dropfront/circuit/discharge.hpp"
#include "dropfront/scoring/checks/checks.hpp"
#include "dropfront/scoring/checks/make_check.hpp"
#include "dropfront/scoring/checks/stress.hpp"

namespace dropfront::scoring {

std::optional<Check> discharge_working_voltage(Evidence& evidence) {
  const Design& design = evidence.design();
  if (!design.discharge || design.discharge_count < 1) return std::nullopt;
  const parts::Resistor& part = *design.discharge;
  const double share = circuit::greatest_voltage_share(design.discharge_count, part.tolerance);
  const auto judge = [&](const OperatingPoint& point) {
    const double chain_Vrms = discharge_chain_Vrms(point);
    return with(at_most("discharge.working_voltage", chain_Vrms * share, part.rated_voltage_Vrms, "V",
                        at_point(point), "share R_max/(R_max + sum of R_min) of the chain's r.m.s. voltage"),
                {{"chain_Vrms", chain_Vrms},
                 {"elements", static_cast<double>(design.discharge_count)},
                 {"greatest_share", share}});
  };
  return worst_over(rich_points(evidence), judge);
}

}  // namespace dropfront::scoring
