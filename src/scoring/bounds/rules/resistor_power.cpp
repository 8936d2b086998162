#include "dropfront/circuit/derating.hpp"
#include "dropfront/scoring/bounds/fundamental.hpp"
#include "dropfront/scoring/bounds/rules.hpp"
#include "dropfront/scoring/checks/stress.hpp"
#include "dropfront/scoring/corners.hpp"

namespace dropfront::scoring::bounds {

/// Rs·I² with the least r.m.s. current by the fundamental (and the factor for unstated harmonics), over the
/// part's own rating at the high ambient (warmer air allows less). Theorem.
double resistor_power(const BoxQuestion& question) {
  if (!question.ends.known_circuit()) return 0;
  const auto charge = question.charge(BoxCorner::rich);
  const double heating = question.supply.supply->harmonics_given ? 1 : kUnstatedHarmonicsHeating;
  const double share = circuit::resistor_power_share(question.context.ambient_high_degC()) *
                       question.context.requirement->derating.resistor_power;
  return question.least_share(question.box.series_resistors, [&](const parts::Resistor* part) {
    if (!part->rated_power_W) return 0.0;
    const double series_ohm = resistor_ohm(*part, End::high);
    const double line_Arms = fundamental(question, BoxCorner::rich, charge, series_ohm).line_Arms;
    return heating * series_ohm * line_Arms * line_Arms / (*part->rated_power_W * share);
  });
}

}  // namespace dropfront::scoring::bounds
