#pragma once
#include <string_view>
#include <vector>

#include "dropfront/scoring/requirement.hpp"

namespace dropfront::scoring {

/// One published shape of the ripple term: its name in a problem file, and how it is known.
struct RippleLifeLaw {
  RippleLife law;
  std::string_view name;
  std::string_view basis;
};

/// All of them in the order of RippleLife. The makers' formulas disagree by design, so the one used is named.
const std::vector<RippleLifeLaw>& ripple_life_laws();

/// Core rise at the rated ripple: 10 K for types rated up to 85 degC, 5 K from 105 degC up (from memory),
/// straight in between so that a higher rating never shortens a life.
double rated_ripple_rise_K(double life_temperature_degC);

/// Factor on the life without ripple, with x = I/I_rated at the running frequency, dT0 the rise at the rated
/// ripple and dT = dT0·x²:
///   halves_each_5_K   2^(-dT/5), dT = 5 K·x²: no credit below the rating
///   excess_over_5_K   2^((dT0 - dT)/5)
///   excess_over_10_K  2^((dT0 - dT)/10)
///   two_or_four       K^((dT0 - dT)/10), K = 2 up to the rating, 4 above
///   none              1
/// `rated_Arms` > 0. Falls with the current; 1 at the rating for the middle three.
double ripple_life_factor(RippleLife law, double current_Arms, double rated_Arms,
                          double life_temperature_degC);

}  // namespace dropfront::scoring
