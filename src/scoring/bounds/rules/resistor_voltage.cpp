#include "dropfront/scoring/bounds/fundamental.hpp"
#include "dropfront/scoring/bounds/rules.hpp"
#include "dropfront/scoring/corners.hpp"

namespace dropfront::scoring::bounds {

/// Rs·I with the least r.m.s. current by the fundamental, over the element's own rating. Theorem.
double resistor_voltage(const BoxQuestion& question) {
  if (!question.ends.known_circuit()) return 0;
  const auto charge = question.charge(BoxCorner::rich);
  return question.least_share(question.box.series_resistors, [&](const parts::Resistor* part) {
    if (!part->rated_voltage_Vrms) return 0.0;
    const double series_ohm = resistor_ohm(*part, End::high);
    const double line_Arms = fundamental(question, BoxCorner::rich, charge, series_ohm).line_Arms;
    return series_ohm * line_Arms / *part->rated_voltage_Vrms;
  });
}

}  // namespace dropfront::scoring::bounds
