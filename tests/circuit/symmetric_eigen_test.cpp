#include "dropfront/circuit/symmetric_eigen.hpp"

#include <cmath>

#include "support/catch.hpp"

using Catch::Matchers::WithinAbs;
using Catch::Matchers::WithinRel;
using namespace dropfront::circuit;

TEST_CASE("Eigenvectors are orthonormal and rebuild the matrix") {
  for (int n = 1; n <= 4; ++n) {
    SmallMatrix s{};
    for (int i = 0; i < n; ++i) {
      for (int k = i; k < n; ++k) s[i][k] = s[k][i] = std::sin(1.7 * i + 2.9 * k + n);
    }
    StateVector values{};
    SmallMatrix v{};
    symmetric_eigen(n, s, values, v);
    for (int i = 0; i < n; ++i) {
      for (int k = 0; k < n; ++k) {
        double dot = 0;
        double rebuilt = 0;
        for (int m = 0; m < n; ++m) {
          dot += v[m][i] * v[m][k];
          rebuilt += v[i][m] * values[m] * v[k][m];
        }
        REQUIRE_THAT(dot, WithinAbs(i == k ? 1.0 : 0.0, 1e-14));  // rounding of a few rotations
        REQUIRE_THAT(rebuilt, WithinAbs(s[i][k], 1e-14));
      }
    }
  }
}

TEST_CASE("Eigenvalues twelve decades apart keep their relative accuracy") {
  // diag(1e6, 1e-6) turned by a small angle: closed forms lose the small one to cancellation.
  const double a = 1e-7;
  const double c = std::cos(a), t = std::sin(a);
  const double big = 1e6, small = 1e-6;
  SmallMatrix s{};
  s[0][0] = big * c * c + small * t * t;
  s[1][1] = big * t * t + small * c * c;
  s[0][1] = s[1][0] = (big - small) * c * t;
  StateVector values{};
  SmallMatrix v{};
  symmetric_eigen(2, s, values, v);
  REQUIRE_THAT(values[0], WithinRel(big, 1e-14));
  // The entries themselves carry the small value to 1e-16·big·a^2/small = 1e-12 or so.
  REQUIRE_THAT(values[1], WithinRel(small, 1e-8));
}
