#include "dropfront/search/aims.hpp"

#include <algorithm>
#include <limits>

namespace dropfront::search {
namespace {

void extend(std::vector<int>& head, int left, int places, std::vector<std::vector<int>>& out) {
  if (places == 1) {
    head.push_back(left);
    out.push_back(head);
    head.pop_back();
    return;
  }
  for (int n = left; n >= 0; --n) {
    head.push_back(n);
    extend(head, left - n, places - 1, out);
    head.pop_back();
  }
}

// Squared distance in lattice steps: integers, so ties are exact.
long distance(const std::vector<int>& a, const std::vector<int>& b) {
  long sum = 0;
  for (std::size_t k = 0; k < a.size(); ++k) sum += static_cast<long>(a[k] - b[k]) * (a[k] - b[k]);
  return sum;
}

}  // namespace

std::vector<std::vector<double>> spread_aims(int objectives, int at_least) {
  if (objectives < 1) return {};
  std::vector<std::vector<int>> lattice;
  int h = 1;
  for (;; ++h) {
    lattice.clear();
    std::vector<int> head;
    extend(head, h, objectives, lattice);
    if (objectives == 1 || static_cast<int>(lattice.size()) >= at_least) break;
  }
  std::vector<long> nearest(lattice.size(), std::numeric_limits<long>::max());
  std::vector<std::vector<double>> aims;
  for (std::size_t n = 0; n < lattice.size(); ++n) {
    std::size_t pick = lattice.size();
    for (std::size_t i = 0; i < lattice.size(); ++i) {
      const bool corner = *std::max_element(lattice[i].begin(), lattice[i].end()) == h;
      if (static_cast<int>(n) < objectives && !corner) continue;
      if (nearest[i] > 0 && (pick == lattice.size() || nearest[i] > nearest[pick])) pick = i;
    }
    std::vector<double> weights;
    for (int step : lattice[pick]) weights.push_back(static_cast<double>(step) / h);
    aims.push_back(std::move(weights));
    for (std::size_t i = 0; i < lattice.size(); ++i)
      nearest[i] = std::min(nearest[i], distance(lattice[i], lattice[pick]));
  }
  return aims;
}

}  // namespace dropfront::search
