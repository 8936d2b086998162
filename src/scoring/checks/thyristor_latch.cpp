#include <cmath>
#include <numbers>

#include "dropfront/scoring/checks/checks.hpp"
#include "dropfront/scoring/checks/make_check.hpp"
#include "dropfront/scoring/corners.hpp"

namespace dropfront::scoring {

std::optional<Check> thyristor_latch(Evidence& evidence) {
  const Design& design = evidence.design();
  if (design.thyristor == nullptr) return std::nullopt;
  constexpr double kMargin = 3;  // peak dropper current over latching current (common practice)
  const double omega = 2 * std::numbers::pi * evidence.supply().frequency_Hz.low;
  const double least_F =
      dropper_F(*design.dropper, End::low, true, evidence.requirement().surroundings.ambient_degC.high);
  const double reactance_ohm = 1 / (omega * least_F);
  const double crest_V = std::numbers::sqrt2 * evidence.supply().voltage_Vrms.low;
  const double peak_A = crest_V / std::hypot(reactance_ohm, resistor_ohm(*design.series_resistor, End::high));
  std::optional<double> limit = design.thyristor->latching_current_A;
  if (limit) *limit *= kMargin;
  return at_least(
      "thyristor.latch", peak_A, limit, "A", at_corner("lean"),
      "peak dropper current at low line, least capacitance, against 3 x the latching current (common "
      "practice); with less it does not latch");
}

}  // namespace dropfront::scoring
