#pragma once
#include <algorithm>

#include "dropfront/scoring/bounds/charge.hpp"

namespace dropfront::scoring {

/// Least mean power in one clamp part, rich and empty, hot: all the charge the rail does not draw passes the
/// clamp at no less than its threshold. Half-wave V0·(I - load), ahead with its forward direction Vd·I;
/// bridge V0·(2·I - load), ahead in halves with the other's forward drop. Theorem.
class ClampLoad {
 public:
  explicit ClampLoad(const BoxQuestion& question)
      : question_(&question),
        charge_(question.charge(BoxCorner::rich)),
        spare_A_(std::max(0.0, charge_.both_A - load_most_A(question, BoxCorner::rich, 0))) {}

  double least_W(const parts::Clamp& part) const {
    const double clamp_V = high_clamp_span(part, question_->ends.rich_heat()).least_V;
    if (!question_->ahead()) return clamp_V * spare_A_;
    if (question_->full_wave()) return 0.5 * (clamp_V + charge_.drop_least_V) * spare_A_;
    return clamp_V * spare_A_ + charge_.drop_least_V * charge_.each_way_A;
  }

 private:
  const BoxQuestion* question_;
  CornerCharge charge_;
  double spare_A_;
};

}  // namespace dropfront::scoring
