#include "dropfront/scoring/bounds/rules.hpp"
#include "dropfront/scoring/corners.hpp"

namespace dropfront::scoring::bounds {

/// What a part must get before it opens over what the low line gives it, each part against itself. Theorem.
double resistor_opens(const BoxQuestion& question) {
  const double line_V = question.supply.supply->voltage_Vrms.low;
  return question.least_share(question.box.series_resistors, [&](const parts::Resistor* part) {
    if (part == nullptr || !part->opens_at || !part->rated_power_W) return 0.0;
    return *part->opens_at * *part->rated_power_W / (line_V * line_V / resistor_ohm(*part, End::high));
  });
}

}  // namespace dropfront::scoring::bounds
