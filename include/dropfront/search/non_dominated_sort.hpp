#pragma once
#include <vector>

namespace dropfront::search {

/// Sorts points (one vector of minimised values each, all of one length, no NaN) into fronts: front 0 is
/// dominated by none, front k only by points of fronts before k and by one of front k - 1 at least. Indices
/// within a front ascend. Equal points share a front.
std::vector<std::vector<int>> non_dominated_sort(const std::vector<std::vector<double>>& points);

}  // namespace dropfront::search
