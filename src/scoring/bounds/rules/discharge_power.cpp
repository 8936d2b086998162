#include "dropfront/circuit/derating.hpp"
#include "dropfront/circuit/discharge.hpp"
#include "dropfront/scoring/bounds/fundamental.hpp"
#include "dropfront/scoring/bounds/rules.hpp"

namespace dropfront::scoring::bounds {

/// Power of the chain's worst element at the least r.m.s. voltage by its fundamental, over the rating at the
/// high ambient (warmer air allows less). Theorem.
double discharge_power(const BoxQuestion& question) {
  if (!question.ends.known_circuit()) return 0;
  const auto charge = question.charge(BoxCorner::rich);
  const double chain_Vrms =
      fundamental(question, BoxCorner::rich, charge, question.ends.greatest(Figure::series_high_ohm))
          .chain_Vrms;
  const double share = circuit::resistor_power_share(question.context.ambient_high_degC()) *
                       question.context.requirement->derating.resistor_power;
  return question.least_share(question.box.discharges, [&](const Chain& chain) {
    if (chain.element == nullptr || chain.count < 1 || !chain.element->rated_power_W) return 0.0;
    const double power_W = circuit::greatest_element_power_W(
        chain_Vrms, chain.count, chain.element->resistance_ohm, chain.element->tolerance);
    return power_W / (*chain.element->rated_power_W * share);
  });
}

}  // namespace dropfront::scoring::bounds
