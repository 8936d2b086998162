#include "dropfront/scoring/checks/checks.hpp"
#include "dropfront/scoring/checks/make_check.hpp"
#include "dropfront/scoring/corners.hpp"

namespace dropfront::scoring {

/// dv/dt = I/C with twice the crest across the series resistor at the first moment.
std::optional<Check> dropper_slew(Evidence& evidence) {
  const Design& design = evidence.design();
  const double hot_degC = evidence.requirement().surroundings.ambient_degC.high;
  const double capacitance = dropper_F(*design.dropper, End::low, true, hot_degC);
  const double resistance = resistor_ohm(*design.series_resistor, End::low);
  const double step_V = 2 * evidence.shapes().rich.crest_V();
  return at_most("dropper.slew", step_V / (resistance * capacitance), design.dropper->slew_V_per_s, "V/s",
                 at_corner("plug_in", hot_degC, "dropper low, series_resistor low"),
                 "2·Vcrest/(Rs·C), closing on the opposite crest");
}

}  // namespace dropfront::scoring
