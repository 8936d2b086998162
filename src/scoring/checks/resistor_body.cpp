#include "dropfront/circuit/derating.hpp"
#include "dropfront/circuit/thermal.hpp"
#include "dropfront/scoring/checks/checks.hpp"
#include "dropfront/scoring/checks/make_check.hpp"
#include "dropfront/scoring/checks/stress.hpp"

namespace dropfront::scoring {
namespace {

/// Where the derating line of film and wirewound parts ends, their limiting body temperature.
constexpr double kHottestBody_degC = 155;
constexpr double kFullPower_degC = 70;

std::optional<double> body_resistance_K_per_W(const parts::Resistor& part) {
  if (part.thermal_resistance_K_per_W) return *part.thermal_resistance_K_per_W;
  if (part.rated_power_W) return (kHottestBody_degC - kFullPower_degC) / *part.rated_power_W;
  return std::nullopt;
}

}  // namespace

/// The air around the part is settled with the power taken from the line; the resistance itself is taken as
/// the data give it, without a temperature coefficient, so the body does not act back.
std::optional<Check> resistor_body(Evidence& evidence) {
  const parts::Resistor& part = *evidence.design().series_resistor;
  const auto resistance = body_resistance_K_per_W(part);
  if (!resistance) {
    return at_most("resistor.body", std::nullopt, std::nullopt, "degC", at_corner("rich_loaded"),
                   "thermal_resistance and rated_power are not given");
  }
  const double count = evidence.design().series_resistor_count;
  const double heating = evidence.supply().harmonics_given ? 1 : kUnstatedHarmonicsHeating;
  const auto judge = [&](const OperatingPoint& point) {
    const double loss_W = point.state.loss_W[static_cast<std::size_t>(circuit::Owner::series_resistor)];
    const double body_degC =
        circuit::temperature_degC(point.local_degC, *resistance, loss_W / count * heating);
    return with(at_most("resistor.body", body_degC, kHottestBody_degC, "degC", at_point(point),
                        "local ambient + Rth·P; 155 degC, where the ambient derating line ends"),
                {{"loss_W", loss_W},
                 {"parts_in_series", count},
                 {"harmonics_heating", heating},
                 {"thermal_resistance_K_per_W", *resistance}});
  };
  return worst_over(rich_points(evidence), judge);
}

}  // namespace dropfront::scoring
