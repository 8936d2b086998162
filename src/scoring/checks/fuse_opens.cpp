#include "dropfront/scoring/checks/checks.hpp"
#include "dropfront/scoring/checks/make_check.hpp"
#include "dropfront/scoring/corners.hpp"

namespace dropfront::scoring {

namespace {

/// Multiple of its rated current at which a time-lag fuse opens within three seconds (IEC 60127-2, from
/// memory). At 2.1 times it may take two minutes to half an hour: by then the series resistor has burnt.
constexpr double kOpeningMultiple = 4;

}  // namespace

/// A shorted dropper puts the line on the series resistor; what then flows must open the fuse, unless the
/// resistor opens by its own statement (resistor.opens). A fuse that stands the surge of a varistor is too
/// large for both.
std::optional<Check> fuse_opens(Evidence& evidence) {
  const Design& design = evidence.design();
  if (design.fuse == nullptr || design.dropper == nullptr) return std::nullopt;  // nothing can short
  const double line_Vrms = evidence.supply().voltage_Vrms.low;
  const double resistance_ohm = series_resistor_ohm(design, End::high);
  const parts::Resistor& part = *design.series_resistor;
  const double power_W = line_Vrms * line_Vrms / resistance_ohm / design.series_resistor_count;
  if (part.opens_at && part.rated_power_W && power_W >= *part.opens_at * *part.rated_power_W)
    return std::nullopt;
  const double rated_A = design.fuse->rated_current_A;
  return with(
      at_least("fuse.opens", line_Vrms / resistance_ohm, kOpeningMultiple * rated_A, "A",
               at_corner("shorted", std::nullopt, "series_resistor high"),
               "dropper shorted: V_low/Rs_max against four times the rated current, at which a time-lag "
               "fuse opens within 3 s (IEC 60127-2, from memory)"),
      {{"line_voltage_Vrms", line_Vrms},
       {"series_resistor_ohm", resistance_ohm},
       {"rated_current_A", rated_A}});
}

}  // namespace dropfront::scoring
