#pragma once
#include <vector>

namespace dropfront::search {

/// Volume that the points (minimised, all of one length) dominate below `reference`; exact. Points that do
/// not lie below the reference in every value add nothing. One value: a length; two: a sorted sum; three: a
/// sweep along the last value over the staircase of the first two; four and more: inclusion by limited sets
/// (While, Bradstreet and Barone, A Fast Way of Calculating Exact Hypervolumes, IEEE Trans. Evol. Comput.
/// 16(1), 2012, from memory).
double hypervolume(const std::vector<std::vector<double>>& points, const std::vector<double>& reference);

}  // namespace dropfront::search
