#include "dropfront/scoring/checks/checks.hpp"
#include "dropfront/scoring/checks/make_check.hpp"
#include "dropfront/scoring/corners.hpp"

namespace dropfront::scoring {

/// A shorted dropper puts the line on the series resistor: at the low line and its own high end it must still
/// get the power at which its maker says it opens. A part without such a statement shows nothing, whether a
/// fuse stands before it or not: no limit, never a pass.
std::optional<Check> resistor_opens(Evidence& evidence) {
  const Design& design = evidence.design();
  if (design.dropper == nullptr) return std::nullopt;  // nothing can short: the line is on it all the time
  const parts::Resistor& part = *design.series_resistor;
  const double line = evidence.supply().voltage_Vrms.low;
  std::optional<double> limit;
  std::string basis = "dropper shorted: V_low²/Rs_max against the opening multiple of the rating";
  if (part.opens_at && part.rated_power_W) {
    limit = *part.opens_at * *part.rated_power_W;
  } else if (part.fusible || part.opens_at) {
    basis = "dropper shorted: V_low²/Rs_max; opens_at or rated_power is not given";
  } else {
    basis = design.fuse ? "not a fusible part: only the fuse can open when the dropper shorts"
                        : "not a fusible part and no fuse: nothing is known to open when the dropper shorts";
  }
  const double resistance_ohm = series_resistor_ohm(design, End::high);
  const double count = design.series_resistor_count;
  Check check = at_least("resistor.opens", line * line / resistance_ohm / count, limit, "W",
                         at_corner("shorted", std::nullopt, "series_resistor high"), basis);
  check.figures = {
      {"line_voltage_Vrms", line}, {"series_resistor_ohm", resistance_ohm}, {"parts_in_series", count}};
  add_figure(check, "opens_at", part.opens_at);
  add_figure(check, "rated_power_W", part.rated_power_W);
  return check;
}

}  // namespace dropfront::scoring
