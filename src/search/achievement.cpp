#include "dropfront/search/achievement.hpp"

#include <algorithm>
#include <cmath>
#include <limits>

namespace dropfront::search {
namespace {

constexpr double least_weight = 1e-3;
constexpr double augmentation = 0.01;
// Relative shortfalls of a per cent weigh as much as a tenth of the whole extent of an objective.
constexpr double penalty = 10;

}  // namespace

ObjectiveRange::ObjectiveRange(int objectives)
    : low_(objectives, std::numeric_limits<double>::infinity()),
      high_(objectives, -std::numeric_limits<double>::infinity()) {}

void ObjectiveRange::take(const std::vector<double>& objectives) {
  taken_ = true;
  for (std::size_t k = 0; k < objectives.size(); ++k) {
    if (!std::isfinite(objectives[k])) continue;
    low_[k] = std::min(low_[k], objectives[k]);
    high_[k] = std::max(high_[k], objectives[k]);
  }
}

double ObjectiveRange::extent(int k) const {
  if (!(low_[k] <= high_[k])) return 1;
  const double magnitude = std::max(std::abs(low_[k]), std::abs(high_[k]));
  return std::max({high_[k] - low_[k], 1e-3 * magnitude, 1e-12});
}

double achievement(const std::vector<double>& objectives, double violation,
                   const std::vector<double>& weights, const ObjectiveRange& range) {
  double worst = -std::numeric_limits<double>::infinity();
  double sum = 0;
  for (std::size_t k = 0; k < objectives.size(); ++k) {
    const int at = static_cast<int>(k);
    const double term = std::max(weights[k], least_weight) * range.scaled(at, objectives[k]);
    worst = std::max(worst, term);
    sum += term;
  }
  return worst + augmentation * sum + penalty * violation;
}

}  // namespace dropfront::search
