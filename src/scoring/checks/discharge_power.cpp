#include "dropfront/circuit/derating.hpp"
#include "dropfront/circuit/discharge.hpp"
#include "dropfront/scoring/checks/checks.hpp"
#include "dropfront/scoring/checks/make_check.hpp"
#include "dropfront/scoring/checks/stress.hpp"

namespace dropfront::scoring {

std::optional<Check> discharge_power(Evidence& evidence) {
  const Design& design = evidence.design();
  if (!design.discharge || design.discharge_count < 1) return std::nullopt;
  const parts::Resistor& part = *design.discharge;
  const double share = evidence.requirement().derating.resistor_power;
  const auto judge = [&](const OperatingPoint& point) {
    const double power = circuit::greatest_element_power_W(
        discharge_chain_Vrms(point), design.discharge_count, part.resistance_ohm, part.tolerance);
    std::optional<double> limit;
    if (part.rated_power_W)
      limit = *part.rated_power_W * circuit::resistor_power_share(point.local_degC) * share;
    Check check = at_most("discharge.power", power, limit, "W", at_point(point),
                          "worst element of the chain; rating x ambient line x derating");
    check.figures = {{"chain_Vrms", discharge_chain_Vrms(point)},
                     {"elements", static_cast<double>(design.discharge_count)},
                     {"element_ohm", part.resistance_ohm},
                     {"tolerance", part.tolerance},
                     {"ambient_line", circuit::resistor_power_share(point.local_degC)},
                     {"derating", share}};
    add_figure(check, "rated_power_W", part.rated_power_W);
    return check;
  };
  return worst_over(rich_points(evidence), judge);
}

}  // namespace dropfront::scoring
