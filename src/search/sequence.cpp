#include "dropfront/search/sequence.hpp"

#include <cmath>

namespace dropfront::search {

std::vector<double> spread_point(std::int64_t n, int dimensions, std::uint64_t seed) {
  double root = 1.5;
  for (int i = 0; i < 60; ++i) root = std::pow(1 + root, 1.0 / (dimensions + 1));
  std::vector<double> point(dimensions);
  double alpha = 1;
  for (int k = 0; k < dimensions; ++k) {
    alpha /= root;
    double shift = 0.5;
    if (seed != 0) {
      std::uint64_t h = seed + 0x9e3779b97f4a7c15u * static_cast<std::uint64_t>(k + 1);
      h = (h ^ (h >> 30)) * 0xbf58476d1ce4e5b9u;
      h = (h ^ (h >> 27)) * 0x94d049bb133111ebu;
      shift = static_cast<double>((h ^ (h >> 31)) >> 11) * 0x1p-53;
    }
    const double x = shift + static_cast<double>(n) * alpha;
    point[k] = x - std::floor(x);
  }
  return point;
}

}  // namespace dropfront::search
