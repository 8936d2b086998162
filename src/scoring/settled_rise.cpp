#include "dropfront/scoring/settled_rise.hpp"

#include <cmath>

namespace dropfront::scoring {

double SettledRise::next(double used_K, double implied_K) {
  const double excess_K = implied_K - used_K;
  done_ = std::abs(excess_K) <= tolerance_K_;
  if (done_) return used_K;
  auto& side = excess_K > 0 ? below_ : above_;
  auto& other = excess_K > 0 ? above_ : below_;
  // The same side twice running: the other side's weight is halved, so that it moves too (Illinois rule).
  same_side_ = excess_K > 0 ? (same_side_ > 0 ? same_side_ + 1 : 1) : (same_side_ < 0 ? same_side_ - 1 : -1);
  side = Side{used_K, excess_K};
  if (!other) return implied_K;
  if (same_side_ > 1 || same_side_ < -1) other->excess_K *= 0.5;
  return (below_->used_K * above_->excess_K - above_->used_K * below_->excess_K) /
         (above_->excess_K - below_->excess_K);
}

}  // namespace dropfront::scoring
