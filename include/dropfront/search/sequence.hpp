#pragma once
#include <cstdint>
#include <vector>

namespace dropfront::search {

/// Point n of an additive low-discrepancy sequence in the unit cube [0, 1)^d: frac(shift + n alpha^k) with
/// 1/alpha the root of x^(d+1) = x + 1 (a generalised golden ratio). The shift follows from the seed; seed 0:
/// 1/2 on every axis, so that point 0 is the centre.
std::vector<double> spread_point(std::int64_t n, int dimensions, std::uint64_t seed);

}  // namespace dropfront::search
