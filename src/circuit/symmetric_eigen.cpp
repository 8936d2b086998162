#include "dropfront/circuit/symmetric_eigen.hpp"

#include <cmath>

namespace dropfront::circuit {

namespace {

/// One rotation that zeroes s[p][q]; the tangent is the smaller root, which never cancels.
void rotate(int n, SmallMatrix& s, SmallMatrix& vectors, int p, int q) {
  const double off = s[p][q];
  const double theta = (s[q][q] - s[p][p]) / (2 * off);
  const double t = std::copysign(1.0, theta) / (std::abs(theta) + std::sqrt(1 + theta * theta));
  const double c = 1 / std::sqrt(1 + t * t);
  const double sine = t * c;
  s[p][p] -= t * off;
  s[q][q] += t * off;
  s[p][q] = s[q][p] = 0;
  for (int k = 0; k < n; ++k) {
    if (k != p && k != q) {
      const double a = s[k][p];
      const double b = s[k][q];
      s[k][p] = s[p][k] = c * a - sine * b;
      s[k][q] = s[q][k] = sine * a + c * b;
    }
    const double a = vectors[k][p];
    const double b = vectors[k][q];
    vectors[k][p] = c * a - sine * b;
    vectors[k][q] = sine * a + c * b;
  }
}

}  // namespace

void symmetric_eigen(int n, SmallMatrix s, StateVector& values, SmallMatrix& vectors) {
  vectors = {};
  for (int i = 0; i < n; ++i) vectors[i][i] = 1;
  for (int sweep = 0; sweep < 30; ++sweep) {
    bool changed = false;
    for (int p = 0; p < n; ++p) {
      for (int q = p + 1; q < n; ++q) {
        if (std::abs(s[p][q]) <= 1e-17 * std::sqrt(std::abs(s[p][p] * s[q][q])) || s[p][q] == 0) continue;
        rotate(n, s, vectors, p, q);
        changed = true;
      }
    }
    if (!changed) break;
  }
  for (int i = 0; i < n; ++i) values[i] = s[i][i];
}

}  // namespace dropfront::circuit
