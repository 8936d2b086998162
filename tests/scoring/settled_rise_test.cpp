#include "dropfront/scoring/settled_rise.hpp"

#include <cmath>
#include <functional>

#include "support/catch.hpp"

using Catch::Matchers::WithinAbs;
using namespace dropfront::scoring;

namespace {

struct Found {
  double rise_K;
  int passes;
};

Found settle(const std::function<double(double)>& implied, double start_K) {
  SettledRise settled(0.1);
  double used = start_K;
  for (int pass = 1; pass <= 20; ++pass) {
    const double next = settled.next(used, implied(used));
    if (settled.done()) return {used, pass};
    used = next;
  }
  return {std::nan(""), 99};
}

}  // namespace

TEST_CASE("A power that hardly depends on the junction settles by substitution") {
  const auto found = settle([](double x) { return 40 + 0.02 * (x - 40); }, 0);
  REQUIRE_THAT(found.rise_K, WithinAbs(40.0, 0.12));  // the tolerance, over 1 - 0.02
  REQUIRE(found.passes <= 3);
}

TEST_CASE("Where substitution would swing for ever, the two sides close in") {
  // The warmer the clamp, the more the load takes and the less it dissipates.
  const auto swinging = [](double x) { return 120 - 3 * x; };  // 30 by algebra
  const auto found = settle(swinging, 0);
  REQUIRE_THAT(found.rise_K, WithinAbs(30.0, 0.05));  // the tolerance, over 1 + 3
  const auto stepped = [](double x) { return 130 / (1 + std::exp((x - 50) / 3)); };
  const auto at_step = settle(stepped, 0);
  REQUIRE_THAT(stepped(at_step.rise_K), WithinAbs(at_step.rise_K, 0.1));
  REQUIRE(at_step.passes <= 10);
}
