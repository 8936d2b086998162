#include "dropfront/circuit/life.hpp"

#include <algorithm>
#include <cmath>

namespace dropfront::circuit {

double ripple_rise_K(double current_Arms, double rated_Arms) {
  constexpr double kRiseAtRating_K = 5;
  const double share = current_Arms / rated_Arms;
  return kRiseAtRating_K * share * share;
}

double electrolytic_life_h(double rated_h, double rated_degC, double surroundings_degC, double rise_K,
                           RippleTerm term) {
  constexpr double kLeast_degC = 35, kDoubling_K = 10, kHalving_K = 5;
  const double surroundings = std::max(surroundings_degC, kLeast_degC);
  const double ripple = term == RippleTerm::none ? 1 : std::exp2(-rise_K / kHalving_K);
  return rated_h * std::exp2((rated_degC - surroundings) / kDoubling_K) * ripple;
}

}  // namespace dropfront::circuit
