#include "dropfront/circuit/safe_step.hpp"

#include <cmath>

#include "support/catch.hpp"

using Catch::Matchers::WithinRel;
using dropfront::circuit::safe_step;
using dropfront::circuit::safe_step_rising;

TEST_CASE("The safe step is exact for the parabola it is built from") {
  // h = 2 - 3s - 4s^2/2 has its positive root at (-3 + 5)/4.
  REQUIRE_THAT(safe_step(2, -3, 4), WithinRel(0.5, 1e-14));
  REQUIRE_THAT(safe_step(2, 3, 4), WithinRel(2.0, 1e-14));
}

TEST_CASE("No sine whose curvature obeys the bound falls below zero within the safe step") {
  for (int i = 0; i < 200; ++i) {
    const double phase = 0.031 * i;
    const double offset = 1.0 + 0.01 * i;
    const double h = offset + std::sin(phase);
    const double step = safe_step(h, std::cos(phase), 1.0);
    for (int k = 0; k <= 20; ++k) {
      REQUIRE(offset + std::sin(phase + step * k / 20) > -1e-12);  // rounding only
    }
  }
}

TEST_CASE("A function that never falls is safe for ever") {
  REQUIRE(std::isinf(safe_step(1, 0, 0)));
  REQUIRE(std::isinf(safe_step(0, 2, 0)));
}

TEST_CASE("The rising step leaves a flat touch at once and stays below the true root") {
  // h = s^2/2 - s^3/6 from a flat zero: the root is at 3.
  REQUIRE_THAT(safe_step_rising(0, 0, 1, 1), WithinRel(3.0, 1e-14));
  // Each further positive term only moves the root outwards.
  REQUIRE(safe_step_rising(0.1, 0.2, 1, 1) >= 3.0);
}

TEST_CASE("The rising step does not speak where its signs do not fit") {
  REQUIRE(safe_step_rising(1, -1, 1, 1) == 0);
  REQUIRE(safe_step_rising(1, 1, -1, 1) == 0);
}
