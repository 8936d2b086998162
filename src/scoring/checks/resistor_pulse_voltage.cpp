#include "dropfront/scoring/checks/checks.hpp"
#include "dropfront/scoring/checks/make_check.hpp"

namespace dropfront::scoring {

std::optional<Check> resistor_pulse_voltage(Evidence& evidence) {
  return at_most("resistor.pulse_voltage", 2 * evidence.shapes().rich.crest_V(),
                 evidence.design().series_resistor->overload_voltage_V, "V", at_corner("plug_in"),
                 "2·Vcrest across it at the first moment, whatever its value; overload voltage");
}

}  // namespace dropfront::scoring
