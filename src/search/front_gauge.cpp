#include "dropfront/search/front_gauge.hpp"

#include <algorithm>
#include <limits>

#include "dropfront/search/achievement.hpp"

namespace dropfront::search {
namespace {

constexpr double beyond_weight = 2;

}  // namespace

FrontGauge::FrontGauge(const ParetoArchive& front, const std::vector<double>& least_extent)
    : objectives_(front.resolution().size()) {
  ObjectiveRange range(static_cast<int>(objectives_));
  for (const auto& member : front.entries())
    if (member.alive) range.take(member.objectives);
  for (std::size_t k = 0; k < objectives_; ++k)
    extent_.push_back(std::max({range.extent(static_cast<int>(k)), front.resolution()[k], least_extent[k]}));
  for (const auto& member : front.entries())
    if (member.alive)
      for (std::size_t k = 0; k < objectives_; ++k) members_.push_back(member.objectives[k] / extent_[k]);
  for (std::size_t k = 0; k < objectives_; ++k) best_.push_back(range.low(static_cast<int>(k)) / extent_[k]);
}

double FrontGauge::lead(const std::vector<double>& point, double enough) const {
  if (members_.empty()) return 1;
  double scaled[16];
  const std::size_t m = std::min<std::size_t>(objectives_, 16);
  for (std::size_t k = 0; k < m; ++k) scaled[k] = point[k] / extent_[k];
  double least = std::numeric_limits<double>::infinity();
  for (std::size_t i = 0; i < members_.size(); i += objectives_) {
    double most = members_[i] - scaled[0];
    for (std::size_t k = 1; k < m; ++k) most = std::max(most, members_[i + k] - scaled[k]);
    least = std::min(least, most);
    if (least <= enough) return least;
  }
  return least;
}

double FrontGauge::gain(const std::vector<double>& point, double enough) const {
  const double least = lead(point, enough);
  if (members_.empty() || least <= enough) return least;
  double beyond = 0;
  for (std::size_t k = 0; k < objectives_; ++k) beyond = std::max(beyond, best_[k] - point[k] / extent_[k]);
  return least + beyond_weight * beyond;
}

}  // namespace dropfront::search
