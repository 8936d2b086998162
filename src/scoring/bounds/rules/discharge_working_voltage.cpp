#include "dropfront/circuit/discharge.hpp"
#include "dropfront/scoring/bounds/fundamental.hpp"
#include "dropfront/scoring/bounds/rules.hpp"

namespace dropfront::scoring::bounds {

/// Least r.m.s. voltage of the chain by its fundamental times the chain's own greatest share, over the
/// element's rating. Theorem.
double discharge_working_voltage(const BoxQuestion& question) {
  if (!question.ends.known_circuit()) return 0;
  const auto charge = question.charge(BoxCorner::rich);
  const double chain_Vrms =
      fundamental(question, BoxCorner::rich, charge, question.ends.greatest(Figure::series_high_ohm))
          .chain_Vrms;
  return question.least_share(question.box.discharges, [&](const Chain& chain) {
    if (chain.element == nullptr || chain.count < 1 || !chain.element->rated_voltage_Vrms) return 0.0;
    return chain_Vrms * circuit::greatest_voltage_share(chain.count, chain.element->tolerance) /
           *chain.element->rated_voltage_Vrms;
  });
}

}  // namespace dropfront::scoring::bounds
