#include <cmath>

#include "dropfront/scoring/checks/checks.hpp"
#include "dropfront/scoring/checks/make_check.hpp"
#include "dropfront/scoring/checks/stress.hpp"

namespace dropfront::scoring {

std::optional<Check> resistor_voltage(Evidence& evidence) {
  const parts::Resistor& part = *evidence.design().series_resistor;
  const auto judge = [&](const OperatingPoint& point) {
    const double loss = point.state.loss_W[static_cast<std::size_t>(circuit::Owner::series_resistor)];
    const double count = evidence.design().series_resistor_count;
    return with(at_most("resistor.voltage", std::sqrt(loss * point.values.series_resistor_ohm) / count,
                        part.rated_voltage_Vrms, "V", at_point(point),
                        "r.m.s. in running against the limiting element voltage"),
                {{"loss_W", loss}, {"parts_in_series", count}});
  };
  return worst_over(rich_points(evidence), judge);
}

}  // namespace dropfront::scoring
