#include "dropfront/search/box_prospect.hpp"

#include <algorithm>
#include <cmath>

namespace dropfront::search {
namespace {

// Work grows so many times e over the whole way: found by trial, and of little weight.
constexpr double growth = 4;

}  // namespace

Prospect::Prospect(const Bounder& bounder, const FrontGauge& gauge, const Box& box,
                   const std::vector<double>& bound)
    : bounder_(bounder), gauge_(gauge), bound_(bound), now_(way_of(box)) {}

Prospect::Way Prospect::way_of(const Box& box) const {
  const Bounds found = bounder_.outlook(box);
  Way way;
  way.over = found.broken >= 0 || found.undefined;
  if (way.over) return way;
  way.shares = found.shares;
  std::vector<double> bound = bound_;
  for (std::size_t k = 0; k < bound.size() && k < found.objectives.size(); ++k)
    if (found.objectives[k] > bound[k]) bound[k] = found.objectives[k];
  if (found.corners.empty()) way.lead = gauge_.lead(bound, 0);
  for (std::vector<double> corner : found.corners) {
    for (std::size_t k = 0; k < corner.size(); ++k) corner[k] = std::max(corner[k], bound[k]);
    way.lead = std::max(way.lead, gauge_.lead(corner, way.lead));
  }
  way.over = !(way.lead > 0);
  return way;
}

double Prospect::left(const Box& half) const {
  const Way way = way_of(half);
  if (way.over) return 0;
  double shares = 1;
  for (std::size_t k = 0; k < way.shares.size() && k < now_.shares.size(); ++k)
    if (now_.shares[k] < 1) shares = std::min(shares, (1 - way.shares[k]) / (1 - now_.shares[k]));
  const double lead = std::isfinite(now_.lead) && now_.lead > 0 ? way.lead / now_.lead : 1;
  return std::clamp(shares, 0.0, 1.0) * std::clamp(lead, 0.0, 1.0);
}

double Prospect::work_left(const std::pair<Box, Box>& halves) const {
  return std::exp(growth * left(halves.first)) + std::exp(growth * left(halves.second));
}

}  // namespace dropfront::search
