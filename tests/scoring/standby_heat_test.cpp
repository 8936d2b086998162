// Standby is solved with the zener as warm as standby leaves it, in air of 23 degC.
#include <numbers>

#include "dropfront/scoring/clamp_power.hpp"
#include "dropfront/scoring/evidence.hpp"
#include "scoring/support/example.hpp"
#include "support/catch.hpp"

using Catch::Matchers::WithinAbs;
using Catch::Matchers::WithinRel;
using namespace dropfront;
using namespace dropfront::scoring;

namespace {

test::Example with_24V(double tempco_per_K) {
  test::Example example("half-wave-clamp-ahead");
  example.clamp = test::zener_24V();
  example.clamp.temperature_coefficient_per_K = tempco_per_K;
  example.reservoir.rated_voltage_V = 35;
  return example;
}

const OperatingPoint& standby_of(Evidence& evidence, bool worst) {
  return worst ? evidence.standby_worst() : evidence.standby();
}

}  // namespace

TEST_CASE("In standby, nominal and worst, the junction stands Rth x P above the air and moves the zener") {
  for (const auto* wiring : {"half-wave-clamp-ahead", "bridge-clamp-across", "bridge-clamp-ahead"}) {
    test::Example example(wiring);
    example.clamp = test::zener_24V();
    example.requirement.surroundings.enclosure_K_per_W = 10;
    Evidence evidence(example.design(), example.requirement, example.supply());
    for (const OperatingPoint* point :
         {&evidence.standby(), &evidence.standby_worst(), &evidence.nominal()}) {
      INFO(wiring << " " << point->corner);
      REQUIRE(point->state.usable());
      const double air_degC = point->corner == "nominal" ? 25 : 23;  // the default ambient; IEC 62301
      const double local_degC = air_degC + 10 * point->state.input_power_W;
      const double clamp_W = clamp_power_W(*example.arrangement, point->values, point->state);
      // Temperatures settle to 0.05 K each.
      CHECK_THAT(point->local_degC, WithinAbs(local_degC, 0.05));
      CHECK_THAT(point->clamp_junction_degC, WithinAbs(local_degC + 100 * clamp_W, 0.1));
      CHECK(point->clamp_junction_degC > air_degC + 20);
      // The zener at +0.088 %/K from 25 degC.
      const bool worst = point->corner == "standby_worst";
      const double stated_V = worst ? 24 * 1.05 : 24;
      const double back_V = 0.0105 * (worst ? 2.5 : 25);
      const double warm = 1 + 0.00088 * (point->clamp_junction_degC - 25);
      CHECK_THAT(point->values.clamp.main.threshold_V,
                 WithinAbs(stated_V * warm - back_V, 24 * 0.00088 * 0.1));
    }
  }
}

TEST_CASE("A warming 24 V zener takes what its tempco says by hand: V, I and P to a fixed point") {
  // By hand, diodes at their data: I = f·C·(2·Vpk - V - 2·0.7), the chain adds about Vpk/(pi·Rb) to it;
  // P = V·(I - load) + 0.7·I in one part. V is what the current meets: 24·(1 + tempco·(23 + Rth·P - 25)) at
  // the test current, carried along the 25 ohm to pi/4 of the peak w·C·Vpk, the mean of a half sine weighted
  // with itself. Iterated.
  const double crest_V = 230 * std::numbers::sqrt2;
  const double load_A = 0.2e-3 + 55e-6;
  const auto by_hand = [&](double tempco_per_K) {
    const double along_V =
        25 * (std::numbers::pi / 4 * 2 * std::numbers::pi * 50 * 0.68e-6 * crest_V - 0.0105);
    double clamp_V = 24 + along_V;
    double clamp_W = 0;
    for (int pass = 0; pass < 20; ++pass) {
      const double mean_A =
          50 * 0.68e-6 * (2 * crest_V - clamp_V - 1.4) + crest_V / (std::numbers::pi * 940e3);
      clamp_W = clamp_V * (mean_A - load_A) + 0.7 * mean_A;
      clamp_V = 24 * (1 + tempco_per_K * (23 + 100 * clamp_W - 25)) + along_V;
    }
    return clamp_W;
  };
  double input_W[2], clamp_W[2];
  for (const bool warms : {false, true}) {
    auto example = with_24V(warms ? 0.00088 : 0.0);
    Evidence evidence(example.design(), example.requirement, example.supply());
    const auto& point = evidence.standby();
    clamp_W[warms] = clamp_power_W(*example.arrangement, point.values, point.state);
    input_W[warms] = point.state.input_power_W;
    // The diodes' slope, the resistor's lag and the half period's flanks are left out: 1 %.
    CHECK_THAT(clamp_W[warms], WithinRel(by_hand(warms ? 0.00088 : 0.0), 0.01));
    INFO(input_W[warms]);
  }
  // The rise itself, some 20 mW of half a watt: a twentieth of it for what the hand leaves out.
  const double more_W = by_hand(0.00088) - by_hand(0.0);
  CHECK(more_W > 0.015);
  CHECK_THAT(clamp_W[1] - clamp_W[0], WithinRel(more_W, 0.1));
  // The line gives the chain and the resistor what they had, within a tenth of that.
  CHECK_THAT(input_W[1] - input_W[0], WithinRel(more_W, 0.1));
}

TEST_CASE("Standby follows the sign of the tempco, and a better cooled zener takes less") {
  for (const bool worst : {false, true}) {
    double before_W = 0;
    for (const double tempco_per_K : {-0.0006, 0.0, 0.0005, 0.00088}) {
      auto example = with_24V(tempco_per_K);
      Evidence evidence(example.design(), example.requirement, example.supply());
      const double power_W = standby_of(evidence, worst).state.input_power_W;
      CHECK(power_W > before_W * 1.002);
      before_W = power_W;
    }
    auto cooled = with_24V(0.00088);
    cooled.clamp.thermal_resistance_K_per_W = 20;
    Evidence evidence(cooled.design(), cooled.requirement, cooled.supply());
    CHECK(standby_of(evidence, worst).state.input_power_W < before_W);
  }
}

TEST_CASE("Film in standby has its value at the air of 23 degC, and a warm enclosure takes from it") {
  auto example = with_24V(0.0);
  example.dropper.temperature_coefficient_per_K = -200e-6;
  for (const double enclosure_K_per_W : {0.0, 40.0}) {
    example.requirement.surroundings.enclosure_K_per_W = enclosure_K_per_W;
    Evidence evidence(example.design(), example.requirement, example.supply());
    const auto& point = evidence.standby();
    const double warm = 1 - 200e-6 * (3 + enclosure_K_per_W * point.state.input_power_W);
    CHECK_THAT(point.values.dropper_F, WithinRel(0.68e-6 * warm, 200e-6 * 0.05));  // air settles to 0.05 K
  }
}
