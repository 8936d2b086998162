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
  const auto& ambient = evidence.requirement().surroundings.ambient_degC;
  // Film loses capacitance with heat, so the hot, old, smallest one decides.
  const double least_F = all_droppers_F(design, End::low, 1, ambient.high);
  const double series_ohm = series_resistor_ohm(design, End::high);
  const double crest_V = evidence.shapes().lean.crest_V();  // of the flattened low line
  const double peak_A = crest_V / std::hypot(1 / (omega * least_F), series_ohm);
  std::optional<double> limit = design.thyristor->latching_current_A;
  if (limit) *limit *= kMargin;
  const Check check = at_least(
      "thyristor.latch", peak_A, limit, "A",
      at_corner("lean", ambient.high, "dropper low, series_resistor high"),
      "peak dropper current against 3 x the latching current (common practice); with less it does not latch");
  return with(check,
              {{"line_crest_V", crest_V}, {"dropper_F", least_F}, {"series_resistor_ohm", series_ohm}});
}

}  // namespace dropfront::scoring
