#pragma once
#include <algorithm>
#include <array>
#include <cmath>
#include <utility>

namespace dropfront::circuit {

/// Solves m·x = rhs for n <= N unknowns by elimination with row exchange; the answer replaces `rhs`.
/// False where a pivot falls below 1e-12 of the greatest entry: a rail that only drifts has the multiplier
/// one, 1 - J is then singular, and any "solution" would be made of rounding.
template <int N>
bool solve_small(int n, std::array<std::array<double, N>, N> m, std::array<double, N>& rhs) {
  double greatest = 0;
  for (int r = 0; r < n; ++r) {
    for (int c = 0; c < n; ++c) greatest = std::max(greatest, std::abs(m[r][c]));
  }
  for (int p = 0; p < n; ++p) {
    int best = p;
    for (int r = p + 1; r < n; ++r) {
      if (std::abs(m[r][p]) > std::abs(m[best][p])) best = r;
    }
    std::swap(m[p], m[best]);
    std::swap(rhs[p], rhs[best]);
    if (!(std::abs(m[p][p]) > 1e-12 * greatest)) return false;
    for (int r = p + 1; r < n; ++r) {
      const double factor = m[r][p] / m[p][p];
      for (int c = p; c < n; ++c) m[r][c] -= factor * m[p][c];
      rhs[r] -= factor * rhs[p];
    }
  }
  for (int p = n - 1; p >= 0; --p) {
    for (int c = p + 1; c < n; ++c) rhs[p] -= m[p][c] * rhs[c];
    rhs[p] /= m[p][p];
  }
  return true;
}

}  // namespace dropfront::circuit
