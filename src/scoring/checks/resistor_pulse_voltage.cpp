#include <algorithm>

#include "dropfront/scoring/checks/checks.hpp"
#include "dropfront/scoring/checks/make_check.hpp"
#include "dropfront/scoring/corners.hpp"

namespace dropfront::scoring {

/// At plug-in twice the crest stands across it at the first moment, whatever its value. A surge puts its own
/// voltage there, less the source's share: before its front the resistor carries next to nothing, and the
/// dropper has not moved. A varistor in front helps on one polarity only.
std::optional<Check> resistor_pulse_voltage(Evidence& evidence) {
  const Design& design = evidence.design();
  const double crest_V = evidence.shapes().rich.crest_V(), share = series_resistor_share(design);
  const bool dropper = design.dropper != nullptr;  // may have been left at the opposite crest
  const double closing_V = (dropper ? 2 : 1) * crest_V;
  const auto& surge = evidence.requirement().limits.surge;
  const double series_ohm = series_resistor_ohm(design, End::high);
  // Without a dropper the line itself stands there too.
  const double open_V = surge ? surge->voltage_V + (dropper ? 0 : crest_V) : 0;
  const double surge_V = surge ? open_V * series_ohm / (series_ohm + surge->source_ohm) : 0;
  const bool surged = surge_V > closing_V;
  Check check =
      with(at_most("resistor.pulse_voltage", std::max(closing_V, surge_V) * share,
                   design.series_resistor->overload_voltage_V, "V",
                   at_corner(surged ? "surge" : "plug_in", {}, surged ? "series_resistor high" : ""),
                   surged    ? "the surge's voltage across it at its front; overload voltage"
                   : dropper ? "2·Vcrest across it at the first moment, whatever its value; overload voltage"
                             : "Vcrest across it, no dropper to be left charged; overload voltage"),
           {{"line_crest_V", crest_V}, {"share_of_one_part", share}});
  if (surge) {
    check.figures.push_back({"surge_V", surge->voltage_V});
    check.figures.push_back({"surge_source_ohm", surge->source_ohm});
    check.figures.push_back({"series_resistor_ohm", series_ohm});
  }
  return check;
}

}  // namespace dropfront::scoring
