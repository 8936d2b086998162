#include "dropfront/scoring/ripple_life.hpp"

#include <algorithm>
#include <cmath>

#include "dropfront/circuit/life.hpp"

namespace dropfront::scoring {

const std::vector<RippleLifeLaw>& ripple_life_laws() {
  static const std::vector<RippleLifeLaw> laws{
      {RippleLife::halves_each_5_K, "2^(-dT/5)",
       "as restated, copy not kept; 5 K at the rated ripple from memory"},
      {RippleLife::excess_over_5_K, "2^((dT0-dT)/5)", "from memory"},
      {RippleLife::excess_over_10_K, "2^((dT0-dT)/10)", "from memory"},
      {RippleLife::two_or_four, "K^((dT0-dT)/10)", "K 2 up to the rated ripple, 4 above; from memory"},
      {RippleLife::none, "none", "the problem asks for the temperature rule alone"},
  };
  return laws;
}

double rated_ripple_rise_K(double life_temperature_degC) {
  return std::clamp(10 - (life_temperature_degC - 85) / 4, 5.0, 10.0);
}

double ripple_life_factor(RippleLife law, double current_Arms, double rated_Arms,
                          double life_temperature_degC) {
  const double share = current_Arms / rated_Arms;
  const double rated_K = rated_ripple_rise_K(life_temperature_degC);
  const double excess_K = rated_K * (1 - share * share);  // rated rise less the rise
  switch (law) {
    case RippleLife::halves_each_5_K:
      return std::exp2(-circuit::ripple_rise_K(current_Arms, rated_Arms) / 5);
    case RippleLife::excess_over_5_K:
      return std::exp2(excess_K / 5);
    case RippleLife::excess_over_10_K:
      return std::exp2(excess_K / 10);
    case RippleLife::two_or_four:
      return std::exp2((excess_K < 0 ? 2 : 1) * excess_K / 10);
    case RippleLife::none:
      break;
  }
  return 1;
}

}  // namespace dropfront::scoring
