#include "dropfront/scoring/bounds/rules.hpp"

namespace dropfront::scoring::bounds {

/// Vcrest (bridge) or twice that over the best reverse voltage of the list. Theorem.
double rectifier_reverse(const BoxQuestion& question) {
  const double crest_V = question.supply.rich.crest_V;
  const double stress_V = question.full_wave() ? crest_V : 2 * crest_V;
  return question.least_share(question.box.rectifiers, [&](const parts::Rectifier* part) {
    return part == nullptr || !part->reverse_voltage_V ? 0 : stress_V / *part->reverse_voltage_V;
  });
}

}  // namespace dropfront::scoring::bounds
