#include "dropfront/scoring/checks/checks.hpp"
#include "dropfront/scoring/checks/make_check.hpp"
#include "dropfront/scoring/corners.hpp"

namespace dropfront::scoring {

/// dv/dt = I/C with twice the crest across the series resistor at the first moment; the same on each of
/// several droppers in parallel.
std::optional<Check> dropper_slew(Evidence& evidence) {
  const Design& design = evidence.design();
  if (design.dropper == nullptr) return std::nullopt;
  const double hot_degC = evidence.requirement().surroundings.ambient_degC.high;
  const double capacitance = all_droppers_F(design, End::low, 1, hot_degC);
  const double resistance = series_resistor_ohm(design, End::low);
  const double step_V = 2 * evidence.shapes().rich.crest_V();
  return with(
      at_most("dropper.slew", step_V / (resistance * capacitance), design.dropper->slew_V_per_s, "V/s",
              at_corner("plug_in", hot_degC, "dropper low, series_resistor low"),
              "2·Vcrest/(Rs·C), closing on the opposite crest"),
      {{"line_crest_V", step_V / 2}, {"series_resistor_ohm", resistance}, {"dropper_F", capacitance}});
}

}  // namespace dropfront::scoring
