#include "dropfront/circuit/derating.hpp"

#include "support/catch.hpp"

namespace dropfront::circuit {
namespace {

using Catch::Matchers::WithinRel;
constexpr double kRounding = 1e-12;  // one formula, one evaluation: rounding only

TEST_CASE("a resistor's allowed share never rises with ambient") {
  double before = resistor_power_share(-40);
  for (double ambient = -40; ambient <= 200; ambient += 0.5) {
    const double share = resistor_power_share(ambient);
    CHECK(share <= before);
    CHECK(share >= 0);
    before = share;
  }
}

TEST_CASE("a resistor carries full power to 70 degC and none at 155 degC") {
  // Chip resistor data sheets: full power to 70 degC, linear to 0 at 155 degC.
  CHECK(resistor_power_share(-25) == 1);
  CHECK(resistor_power_share(70) == 1);
  CHECK_THAT(resistor_power_share(112.5), WithinRel(0.5, kRounding));  // half way down the line
  CHECK(resistor_power_share(155) == 0);
  CHECK(resistor_power_share(170) == 0);
}

TEST_CASE("a ripple rating carried there and back is the rating itself") {
  for (double from : {50.0, 100.0, 120.0, 10e3, 100e3})
    for (double to : {50.0, 60.0, 100.0, 400.0, 100e3})
      CHECK_THAT(ripple_rating_factor(from, to) * ripple_rating_factor(to, from), WithinRel(1.0, kRounding));
}

TEST_CASE("a ripple rating never falls with the running frequency") {
  double before = 0;
  for (double running = 40; running < 300e3; running *= 1.1) {
    const double factor = ripple_rating_factor(120, running);
    CHECK(factor >= before);
    before = factor;
  }
}

TEST_CASE("a ripple rating at the mains is 0.8 of 120 Hz and half of 100 kHz") {
  // Common practice: makers' multiplier tables for general-purpose aluminium electrolytics.
  for (double mains : {50.0, 60.0}) {
    CHECK_THAT(ripple_rating_factor(120, mains), WithinRel(0.8, kRounding));
    CHECK_THAT(ripple_rating_factor(100e3, mains), WithinRel(0.5, kRounding));
  }
  CHECK_THAT(ripple_rating_factor(120, 120), WithinRel(1.0, kRounding));
}

}  // namespace
}  // namespace dropfront::circuit
