#include "dropfront/search/non_dominated_sort.hpp"

#include <algorithm>
#include <numeric>

#include "dropfront/search/objective_key.hpp"

namespace dropfront::search {

std::vector<std::vector<int>> non_dominated_sort(const std::vector<std::vector<double>>& points) {
  std::vector<int> order(points.size());
  std::iota(order.begin(), order.end(), 0);
  // In lexicographic order nothing dominates an earlier point, so each joins the first front none of whose
  // members dominates it.
  std::stable_sort(order.begin(), order.end(), [&](int a, int b) { return points[a] < points[b]; });
  std::vector<std::vector<int>> fronts;
  for (int i : order) {
    auto home = std::find_if(fronts.begin(), fronts.end(), [&](const std::vector<int>& front) {
      return std::none_of(front.rbegin(), front.rend(),
                          [&](int member) { return dominates(points[member], points[i]); });
    });
    if (home == fronts.end()) home = fronts.insert(home, std::vector<int>{});
    home->push_back(i);
  }
  for (auto& front : fronts) std::sort(front.begin(), front.end());
  return fronts;
}

}  // namespace dropfront::search
