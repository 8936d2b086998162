// What no reservoir, clamp or ripple can raise: the charge that crosses the dropper.
#include <algorithm>
#include <cmath>

#include "dropfront/scoring/clamp_power.hpp"
#include "evidence_impl.hpp"

namespace dropfront::scoring {

namespace {

/// Charge balance with drops left out, plus the most the discharge chain can add.
double ceiling_A(const circuit::Arrangement& wiring, circuit::ElementValues values, double rail_V) {
  values.rectifier.threshold_V = 0;
  const double chain_A = values.mains.crest_V() / values.discharge_ohm;
  return charge_balance_A(wiring, values, rail_V) + (wiring.full_wave ? chain_A : 0.5 * chain_A);
}

}  // namespace

double Evidence::margin_ceiling_A() {
  auto& impl = *impl_;
  if (!impl.required) return INFINITY;
  const auto& solver = impl.lean_search.solver();
  const auto& wiring = *impl.design.arrangement;
  const double overhead_A = impl.overhead_A(Quiescent::data);
  double most_A = 0;
  for (const bool hot : {false, true}) {
    const auto values =
        impl.points.values(solver.recipe({End::low, End::low, End::low}), {}, impl.ambient_degC(hot));
    const double spare_A = ceiling_A(wiring, values, *impl.required) - overhead_A;
    if (!solver.stepping()) {
      most_A = std::max(most_A, spare_A);
      continue;
    }
    // Power v·I(v) with I falling in v: greatest at the clamp, or where the product turns. The clamp's own
    // warmth raises its voltage by less than a quarter.
    const double clamp_V = 1.25 * values.clamp.main.threshold_V + values.clamp.main.slope_ohm * spare_A;
    const double efficiency = impl.design.output_stage->efficiency.value_or(1);
    double power_W = 0;
    for (int k = 0; k <= 8; ++k) {
      // On each ninth of the range the product is at most its upper voltage times its lower end's current.
      const double low_V = *impl.required + (clamp_V - *impl.required) * k / 9;
      const double high_V = *impl.required + (clamp_V - *impl.required) * (k + 1) / 9;
      power_W = std::max(power_W, high_V * (ceiling_A(wiring, values, low_V) - overhead_A));
    }
    most_A = std::max(most_A, efficiency * power_W / stage_output_V(*impl.design.output_stage, End::high));
  }
  return most_A - impl.loads.heaviest_output_A();
}

}  // namespace dropfront::scoring
