#pragma once
#include <vector>

namespace dropfront::search {

/// Evenly spread weight vectors over the objective simplex: the lattice of all vectors of `objectives`
/// non-negative multiples of 1/h that sum to 1, with the least h that gives at least `at_least` of them.
/// There are binomial(h + objectives - 1, objectives - 1). Order: the corners first, then each time the one
/// farthest from those before it (ties: lattice order), so that a cut-off list is spread too.
std::vector<std::vector<double>> spread_aims(int objectives, int at_least);

}  // namespace dropfront::search
