#include "dropfront/scoring/power_peak.hpp"

#include <cmath>

#include "support/catch.hpp"

using Catch::Matchers::WithinAbs;
using namespace dropfront::scoring;

TEST_CASE("The peak of a smooth hump is found to the square of the bracket") {
  const auto hump = [](double x) { return 3 - (x - 0.7) * (x - 0.7); };
  const auto peak = find_peak(hump, 0, 1, 1e-3, 30);
  REQUIRE_THAT(peak.x, WithinAbs(0.7, 1e-3));      // the tolerance asked for
  REQUIRE_THAT(peak.value, WithinAbs(3.0, 1e-6));  // its square
  REQUIRE(peak.value == hump(peak.x));
}

TEST_CASE("A sharp knee, as where a clamp lets go, is found within the calls allowed") {
  // Rising by the clamp voltage up to 0.62, then falling off steeply.
  const auto knee = [](double x) { return x < 0.62 ? 12 * x : 12 * 0.62 - 40 * (x - 0.62); };
  const auto peak = find_peak(knee, 0.3, 1, 2e-3, 14);
  REQUIRE(peak.value <= 12 * 0.62);
  REQUIRE(peak.value >= 0.99 * 12 * 0.62);  // one per cent: what 14 calls leave of such a corner
}

TEST_CASE("A function that only rises, or only falls, peaks at its end") {
  REQUIRE(find_peak([](double x) { return x; }, 0, 2, 1e-3, 30).x == 2);
  REQUIRE(find_peak([](double x) { return -x; }, 0, 2, 1e-3, 30).x == 0);
}

TEST_CASE("Never more calls than allowed") {
  int calls = 0;
  const auto counted = [&calls](double x) {
    ++calls;
    return std::sin(x);
  };
  find_peak(counted, 0, 3, 1e-12, 9);
  REQUIRE(calls == 9);
}
