#pragma once
#include <vector>

namespace dropfront::search {

/// Least and greatest of each objective over a set of vectors: the scale on which objectives are compared.
/// Values that are not finite are ignored.
class ObjectiveRange {
 public:
  explicit ObjectiveRange(int objectives);
  void take(const std::vector<double>& objectives);
  bool empty() const { return !taken_; }
  double low(int k) const { return low_[k]; }
  double high(int k) const { return high_[k]; }
  /// high - low, but at least a thousandth of the magnitude, so that nothing is divided by zero.
  double extent(int k) const;
  /// (value - low) / extent.
  double scaled(int k, double value) const { return (value - low_[k]) / extent(k); }

 private:
  bool taken_ = false;
  std::vector<double> low_, high_;
};

/// Augmented weighted Chebyshev distance from the ideal, plus the violation (graded, >= 0) as an exact
/// penalty; finite for finite input. Least for the design that serves the aim `weights` best. Zero weights
/// count as 0.001, so that no objective is quite ignored.
double achievement(const std::vector<double>& objectives, double violation,
                   const std::vector<double>& weights, const ObjectiveRange& range);

}  // namespace dropfront::search
