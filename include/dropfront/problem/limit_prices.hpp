#pragma once
#include <vector>

#include "dropfront/scoring/score.hpp"

namespace dropfront::problem {

/// A member of a front by its number, and what it reaches.
struct PricedMember {
  int number = 0;
  scoring::Objectives objectives;
};

/// From one optimum to its neighbour: what is gained and what it costs more.
struct PriceStep {
  int from = 0, to = 0;  ///< numbers
  double gain = 0;       ///< A more margin, W less standby, mm2 less board; > 0
  double extra = 0;      ///< currency; > 0
  double per(double unit) const { return extra / gain * unit; }
};

/// What tightening one limit costs along a front.
struct LimitPrice {
  scoring::Objective objective;
  double unit = 0;               ///< of the price: 1 mA, 0.1 W, 100 mm2
  std::vector<PriceStep> steps;  ///< from the cheapest member on; prices never fall
};

/// Prices of margin, standby and board area, each as far as it and the cost are asked for. The members that
/// nothing beats in cost and that one quantity are members of any front of more objectives; steps lead along
/// the corners of their lower convex hull (what lies above a straight line between two others has no price at
/// which it would be chosen). They are as true as the front: of a proven front, of these lists.
std::vector<LimitPrice> limit_prices(const std::vector<scoring::Objective>& asked,
                                     const std::vector<PricedMember>& front);

}  // namespace dropfront::problem
