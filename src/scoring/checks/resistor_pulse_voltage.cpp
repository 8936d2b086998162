#include "dropfront/scoring/checks/checks.hpp"
#include "dropfront/scoring/checks/make_check.hpp"
#include "dropfront/scoring/corners.hpp"

namespace dropfront::scoring {

std::optional<Check> resistor_pulse_voltage(Evidence& evidence) {
  const double crest_V = evidence.shapes().rich.crest_V(), share = series_resistor_share(evidence.design());
  const bool dropper = evidence.design().dropper != nullptr;  // may have been left at the opposite crest
  return with(at_most("resistor.pulse_voltage", (dropper ? 2 : 1) * crest_V * share,
                      evidence.design().series_resistor->overload_voltage_V, "V", at_corner("plug_in"),
                      dropper ? "2·Vcrest across it at the first moment, whatever its value; overload voltage"
                              : "Vcrest across it, no dropper to be left charged; overload voltage"),
              {{"line_crest_V", crest_V}, {"share_of_one_part", share}});
}

}  // namespace dropfront::scoring
