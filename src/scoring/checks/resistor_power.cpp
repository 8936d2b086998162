#include "dropfront/circuit/derating.hpp"
#include "dropfront/scoring/checks/checks.hpp"
#include "dropfront/scoring/checks/make_check.hpp"
#include "dropfront/scoring/checks/stress.hpp"

namespace dropfront::scoring {

/// Split in two, the same current heats both parts: each takes its share of the resistance.
std::optional<Check> resistor_power(Evidence& evidence) {
  const parts::Resistor& part = *evidence.design().series_resistor;
  const double share = evidence.requirement().derating.resistor_power;
  const double heating = evidence.supply().harmonics_given ? 1 : kUnstatedHarmonicsHeating;
  const auto judge = [&](const OperatingPoint& point) {
    const double loss = point.state.loss_W[static_cast<std::size_t>(circuit::Owner::series_resistor)];
    std::optional<double> limit;
    if (part.rated_power_W)
      limit = *part.rated_power_W * circuit::resistor_power_share(point.local_degC) * share;
    const double count = evidence.design().series_resistor_count;
    Check check =
        at_most("resistor.power", loss / count * heating, limit, "W", at_point(point),
                heating > 1 ? "loss x 1.15 for harmonics not stated; rating x ambient line x derating"
                            : "loss; rating x ambient line x derating");
    check.figures = {{"loss_W", loss},
                     {"parts_in_series", count},
                     {"harmonics_heating", heating},
                     {"ambient_line", circuit::resistor_power_share(point.local_degC)},
                     {"derating", share}};
    add_figure(check, "rated_power_W", part.rated_power_W);
    return check;
  };
  return worst_over(rich_points(evidence), judge);
}

}  // namespace dropfront::scoring
