#pragma once
#include <vector>

#include "dropfront/search/pareto.hpp"

namespace dropfront::search {

/// Measures how far a vector lies before or behind a front, as a share of the front's extent.
class FrontGauge {
 public:
  /// `least_extent`: one an objective; keeps the share meaningful while the front is small.
  FrontGauge(const ParetoArchive& front, const std::vector<double>& least_extent);

  /// min over members of max over objectives of (member - point) / extent. Positive: the point improves on
  /// every member in some objective by at least so much. Negative: how much it must improve to do so. To it
  /// is added twice what the point gains on the best value of an objective, since the ends of a front are
  /// what people ask for first. 1 for an empty front. Stops early, with a value <= `enough`, once the answer
  /// is known not to exceed `enough`.
  double gain(const std::vector<double>& point, double enough) const;

  /// The first of the two alone: by how much a vector (with -infinity where nothing is known) is not yet
  /// behind a member. 1 for an empty front.
  double lead(const std::vector<double>& point, double enough) const;

  const std::vector<double>& extent() const { return extent_; }

 private:
  std::size_t objectives_;
  std::vector<double> members_;  ///< scaled by the extent, one after the other
  std::vector<double> extent_;
  std::vector<double> best_;  ///< least of each objective, scaled
};

}  // namespace dropfront::search
