#pragma once
#include <utility>
#include <vector>

#include "dropfront/search/box.hpp"
#include "dropfront/search/front_gauge.hpp"

namespace dropfront::search {

/// How far a box is from being discarded, and how much nearer its halves would come: to choose a split by.
class Prospect {
 public:
  /// `bound`: what is known of the box already, one an objective.
  Prospect(const Bounder& bounder, const FrontGauge& gauge, const Box& box, const std::vector<double>& bound);

  /// A guess at the work in both halves, to compare splits of the same box by. A half has left what remains
  /// of the way to its nearest limit, times what remains of the box's lead over the front.
  double work_left(const std::pair<Box, Box>& halves) const;

 private:
  struct Way {
    bool over = false;  ///< discarded already
    double lead = 0;
    std::vector<double> shares;
  };
  Way way_of(const Box& box) const;
  double left(const Box& half) const;

  const Bounder& bounder_;
  const FrontGauge& gauge_;
  const std::vector<double>& bound_;
  Way now_;
};

}  // namespace dropfront::search
